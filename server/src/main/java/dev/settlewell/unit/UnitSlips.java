package dev.settlewell.unit;

import dev.settlewell.text.Problem;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** What was meant by a unit that the format does not spell so, or that the key does not take. */
final class UnitSlips {
  /** Names and habits of other trades, by their lower-case spelling. */
  private static final Map<String, String> NAMES =
      Map.ofEntries(
          Map.entry("ohms", "Ω"),
          Map.entry("kohms", "kΩ"),
          Map.entry("volt", "V"),
          Map.entry("volts", "V"),
          Map.entry("amp", "A"),
          Map.entry("amps", "A"),
          Map.entry("ampere", "A"),
          Map.entry("amperes", "A"),
          Map.entry("farad", "F"),
          Map.entry("watt", "W"),
          Map.entry("watts", "W"),
          Map.entry("hertz", "Hz"),
          Map.entry("sec", "s"),
          Map.entry("secs", "s"),
          Map.entry("second", "s"),
          Map.entry("seconds", "s"),
          Map.entry("msec", "ms"),
          Map.entry("usec", "µs"),
          Map.entry("µsec", "µs"),
          Map.entry("nsec", "ns"),
          Map.entry("metre", "m"),
          Map.entry("metres", "m"),
          Map.entry("meter", "m"),
          Map.entry("meters", "m"),
          Map.entry("percent", "%"),
          Map.entry("pct", "%"),
          Map.entry("c", "°C"),
          Map.entry("ºc", "°C"),
          Map.entry("deg", "°C"),
          Map.entry("celsius", "°C"),
          Map.entry("cel", "°C"),
          Map.entry("°k", "K"),
          Map.entry("degk", "K"),
          Map.entry("kelvin", "K"),
          Map.entry("lsbs", "LSB"),
          Map.entry("clocks", "cycles"),
          Map.entry("clk", "cycles"),
          Map.entry("samples/s", "S/s"),
          Map.entry("sa/s", "S/s"),
          Map.entry("ksa/s", "kS/s"),
          Map.entry("msa/s", "MS/s"),
          Map.entry("[ppm]", "ppm"));

  /** Units of other systems that no case of a letter turns into one of ours: siemens. */
  private static final String SIEMENS = "[pnuµμmkMG]?S(/.*)?";

  private UnitSlips() {}

  /** True where a key takes this unit. */
  static boolean accepts(Expected expected, Unit unit) {
    if (expected.measured().isPresent() && expected.measured().get().comparableWith(unit)) {
      return true;
    }
    boolean any = expected.dimensions().isEmpty() && expected.measured().isEmpty();
    return any || expected.dimensions().contains(unit.dimension());
  }

  /** The units most likely meant at a key, the likeliest first. */
  static List<String> likely(Expected expected) {
    Set<String> units = new LinkedHashSet<>();
    expected.measured().ifPresent(unit -> units.add(UnitTable.canonical(unit.written())));
    for (Dimension dimension : expected.dimensions()) {
      List<String> these = new ArrayList<>(UnitTable.likely(dimension));
      if (dimension == Dimension.RESISTANCE && expected.shuntSized()) {
        these = List.of("mΩ", "Ω");
      } else if (dimension == Dimension.TEMPERATURE && expected.temperatureDifference()) {
        these = List.of("K", "°C");
      }
      units.addAll(these);
    }
    return List.copyOf(units);
  }

  /** The unit meant by a word that spells none; notes the slip, or gives the value up. */
  static Unit meant(Cursor cursor, Numeral numeral, Token word, Expected expected) {
    String text = word.text();
    Optional<Unit> own = ownWord(text, expected);
    if (own.isPresent()) {
      return own.get();
    }
    Optional<Unit> measured = expected.measured().filter(u -> u.symbol().equalsIgnoreCase(text));
    if (measured.isPresent() && measured.get().dimension() == Dimension.WORD) {
      String why = "the measured unit is spelled the same everywhere in its channel";
      note(cursor, word, why, measured.get().symbol());
      return measured.get();
    }
    Optional<String> prefixed = lonePrefix(text, expected);
    Optional<String> meant = prefixed.or(() -> Optional.ofNullable(NAMES.get(lower(text))));
    if (meant.isPresent()) {
      note(cursor, word, "the unit is spelled " + meant.get(), meant.get());
      return UnitTable.read(meant.get()).orElseThrow();
    }
    List<String> variants = variants(text, expected);
    if (variants.isEmpty()) {
      throw UnitConversions.refusal(cursor, numeral, word, expected);
    }
    if (!isCertain(text, variants)) {
      String why = "upper and lower case count in units, and " + text + " is none";
      throw cursor.refuse(Problem.Kind.WRONG_UNIT, word.from(), word.to(), why, variants);
    }
    note(cursor, word, "upper and lower case count in units", variants.get(0));
    return UnitTable.read(variants.get(0)).orElseThrow();
  }

  private static void note(Cursor cursor, Token word, String why, String spelling) {
    cursor.note(Problem.Kind.WRONG_UNIT, word.from(), word.to(), why, true, List.of(spelling));
  }

  /** A word of the user's own, where the key takes the measured unit; {@code deg} is an angle. */
  private static Optional<Unit> ownWord(String text, Expected expected) {
    boolean any = expected.dimensions().isEmpty() && expected.measured().isEmpty();
    boolean same = expected.measured().filter(unit -> unit.symbol().equals(text)).isPresent();
    boolean allowed = any || same || expected.dimensions().contains(Dimension.WORD);
    boolean slip =
        !same
            && (!variants(text, expected).isEmpty() && !text.matches(SIEMENS)
                || NAMES.containsKey(lower(text)) && !text.equals("deg")
                || UnitConversions.isKnown(text)
                || Leftovers.isRemark(text));
    return allowed && !slip ? Optional.of(UnitTable.word(text)) : Optional.empty();
  }

  /** Units that the key takes and that differ from the text in the case of letters only. */
  private static List<String> variants(String text, Expected expected) {
    int slash = text.lastIndexOf('/');
    List<String> all = new ArrayList<>(simpleVariants(text));
    if (all.isEmpty() && slash > 0) {
      String top = text.substring(0, slash);
      for (String variant : withItself(top)) {
        for (String per : List.of("K", "°C", "V", "s", "ms", "µs", "ns", "√Hz")) {
          if (per.equalsIgnoreCase(perSpelling(text.substring(slash + 1)))) {
            all.add(variant + "/" + per);
          }
        }
      }
    }
    return all.stream().filter(v -> accepts(expected, UnitTable.read(v).orElseThrow())).toList();
  }

  private static List<String> withItself(String top) {
    return UnitTable.read(top).isPresent()
        ? List.of(UnitTable.canonical(top))
        : simpleVariants(top);
  }

  private static String perSpelling(String per) {
    return switch (lower(per)) {
      case "rthz", "sqrthz", "√hz", "sqrt-hz" -> "√Hz";
      case "us", "μs" -> "µs";
      case "degc", "c" -> "°C";
      default -> per;
    };
  }

  private static List<String> simpleVariants(String text) {
    boolean micro = text.startsWith("U") || text.startsWith("u") || text.startsWith("Μ");
    String sought = micro && text.length() > 1 ? "µ" + text.substring(1) : text;
    Set<String> found = new LinkedHashSet<>();
    for (String spelling : UnitTable.spellings()) {
      if (spelling.equalsIgnoreCase(sought)) {
        found.add(UnitTable.canonical(spelling));
      }
    }
    return nearest(text, new ArrayList<>(found));
  }

  /** Variants that keep the first letter come first; but {@code mhz} is a megahertz as a rule. */
  private static List<String> nearest(String text, List<String> variants) {
    String first = text.substring(0, 1);
    variants.sort(
        Comparator.comparing(v -> isMegaAsARule(v) ? !v.startsWith("M") : !v.startsWith(first)));
    return variants;
  }

  private static boolean isMegaAsARule(String variant) {
    return variant.endsWith("Hz") || variant.endsWith("Ω");
  }

  /**
   * True where the first variant is certainly meant: it is the only one, or keeps a small {@code m}
   * where mega makes no sense. Letters that are units or prefixes of their own are never certain.
   */
  private static boolean isCertain(String text, List<String> variants) {
    if (List.of("S", "M", "G", "k", "n", "p").contains(text)) {
      return false;
    }
    return variants.size() == 1 || text.startsWith("m") && !isMegaAsARule(variants.get(0));
  }

  /** {@code 100 n} at a capacitor: the unit is certain where the key takes one dimension only. */
  private static Optional<String> lonePrefix(String text, Expected expected) {
    Optional<String> base = base(expected);
    if (base.isEmpty()) {
      return Optional.empty();
    }
    if (base.get().equals("Ω") && lower(text).equals("r")) {
      return base;
    }
    String prefix = text.equals("u") || text.equals("μ") ? "µ" : text;
    String usual =
        switch (base.get()) {
          case "Ω" -> "kMG";
          case "F" -> "pnµ";
          default -> "pnµkMG";
        };
    return prefix.length() == 1 && usual.contains(prefix)
        ? Optional.of(prefix + base.get())
        : Optional.empty();
  }

  /** The unit without prefix of a key that takes one dimension and no measured unit. */
  static Optional<String> base(Expected expected) {
    boolean one = expected.dimensions().size() == 1 && expected.measured().isEmpty();
    return one ? base(expected.dimensions().get(0)) : Optional.empty();
  }

  private static Optional<String> base(Dimension dimension) {
    return switch (dimension) {
      case RESISTANCE -> Optional.of("Ω");
      case CAPACITANCE -> Optional.of("F");
      case VOLTAGE -> Optional.of("V");
      case CURRENT -> Optional.of("A");
      case POWER -> Optional.of("W");
      case FREQUENCY -> Optional.of("Hz");
      case TIME -> Optional.of("s");
      default -> Optional.empty();
    };
  }

  /** Gives up a value whose unit is known but not taken here. */
  static RuntimeException wrong(Cursor cursor, int from, int to, Unit unit, Expected expected) {
    Optional<String> base = base(expected);
    String why = unit.written() + " does not fit: this key takes " + takes(expected);
    List<String> spellings = asDrift(unit, expected);
    if (!spellings.isEmpty()) {
      why = "a drift is per kelvin";
    } else if (base.isPresent() && unit.written().equals("K") && !base.get().equals("F")) {
      why = "K is kelvin, and this key takes " + takes(expected);
      return cursor.mend(Problem.Kind.WRONG_UNIT, from, to, why, "k" + base.get());
    } else if (base.isPresent() && unit.written().equals("m")) {
      why = "m is metre, and this key takes " + takes(expected);
      spellings = List.of("m" + base.get(), "M" + base.get());
    }
    return cursor.refuse(Problem.Kind.WRONG_UNIT, from, to, why, spellings);
  }

  private static List<String> asDrift(Unit unit, Expected expected) {
    Optional<Dimension> drift = UnitTable.drift(unit.dimension());
    return drift.isPresent() && expected.dimensions().contains(drift.get())
        ? List.of(UnitTable.canonical(unit.written()) + "/K")
        : List.of();
  }

  /** What a key takes, in units. */
  static String takes(Expected expected) {
    List<String> units = likely(expected);
    if (units.isEmpty()) {
      return "a unit such as m or °C";
    }
    int last = units.size() - 1;
    return last == 0
        ? units.get(0)
        : String.join(", ", units.subList(0, last)) + " or " + units.get(last);
  }

  private static String lower(String text) {
    return text.toLowerCase(Locale.ROOT);
  }
}
