package dev.settlewell.unit;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * The units of the format: symbols, prefixes, composites such as {@code ppm/K}.
 *
 * <p>Symbols and prefixes: the International System of Units (SI Brochure, 9th edition, tables 2, 4
 * and 7). The case of a letter always counts. Every unit here is a power of ten of its coherent
 * unit, so that a value is converted in decimal, without rounding.
 */
public final class UnitTable {
  /** A spelling without its prefix. */
  private record Symbol(String spelling, String canonical, Dimension dimension, String prefixes) {}

  /** A named composite, by its coherent spelling. */
  private record Composite(String symbol, Dimension dimension) {}

  private static final String ALL = "pnµmkMG";
  private static final String RATES = "kMG";

  private static final List<Symbol> BARE =
      List.of(
          new Symbol("°C", "°C", Dimension.TEMPERATURE, ""),
          new Symbol("degC", "°C", Dimension.TEMPERATURE, ""),
          new Symbol("℃", "°C", Dimension.TEMPERATURE, ""),
          new Symbol("%", "%", Dimension.RATIO, ""),
          new Symbol("ppm", "ppm", Dimension.RATIO, ""),
          new Symbol("LSB", "LSB", Dimension.LSB, ""),
          new Symbol("cycles", "cycles", Dimension.CYCLES, ""),
          new Symbol("cycle", "cycle", Dimension.CYCLES, ""),
          new Symbol("bits", "bits", Dimension.BITS, ""),
          new Symbol("bit", "bit", Dimension.BITS, ""),
          new Symbol("dB", "dB", Dimension.DECIBEL, ""));

  private static final List<Symbol> SYMBOLS =
      List.of(
          new Symbol("Ω", "Ω", Dimension.RESISTANCE, ALL),
          new Symbol("\u2126", "Ω", Dimension.RESISTANCE, ALL),
          new Symbol("ohm", "Ω", Dimension.RESISTANCE, ALL),
          new Symbol("Ohm", "Ω", Dimension.RESISTANCE, ALL),
          new Symbol("F", "F", Dimension.CAPACITANCE, ALL),
          new Symbol("V", "V", Dimension.VOLTAGE, ALL),
          new Symbol("A", "A", Dimension.CURRENT, ALL),
          new Symbol("W", "W", Dimension.POWER, ALL),
          new Symbol("Hz", "Hz", Dimension.FREQUENCY, ALL),
          new Symbol("SPS", "SPS", Dimension.FREQUENCY, RATES),
          new Symbol("S/s", "S/s", Dimension.FREQUENCY, RATES),
          new Symbol("s", "s", Dimension.TIME, ALL),
          new Symbol("m", "m", Dimension.LENGTH, ALL),
          new Symbol("g", "g", Dimension.MASS, ALL),
          new Symbol("N", "N", Dimension.FORCE, ALL),
          new Symbol("Pa", "Pa", Dimension.PRESSURE, ALL),
          new Symbol("K", "K", Dimension.TEMPERATURE, ALL),
          new Symbol("\u212A", "K", Dimension.TEMPERATURE, ALL));

  /** A decimal prefix, in one of its spellings. */
  private record Prefix(String spelling, String canonical, int power) {}

  private static final List<Prefix> PREFIXES =
      List.of(
          new Prefix("p", "p", -12),
          new Prefix("n", "n", -9),
          new Prefix("µ", "µ", -6),
          new Prefix("μ", "µ", -6),
          new Prefix("u", "µ", -6),
          new Prefix("m", "m", -3),
          new Prefix("k", "k", 3),
          new Prefix("M", "M", 6),
          new Prefix("G", "G", 9));

  private static final List<Composite> COMPOSITES =
      List.of(
          new Composite("1/K", Dimension.RATIO_DRIFT),
          new Composite("V/K", Dimension.VOLTAGE_DRIFT),
          new Composite("A/K", Dimension.CURRENT_DRIFT),
          new Composite("W/K", Dimension.POWER_PER_KELVIN),
          new Composite("V/s", Dimension.SLEW_RATE),
          new Composite("V/√Hz", Dimension.VOLTAGE_NOISE_DENSITY),
          new Composite("A/√Hz", Dimension.CURRENT_NOISE_DENSITY));

  static final Unit CELSIUS = new Unit("°C", "°C", Dimension.TEMPERATURE, 1);
  static final Unit OHM = new Unit("Ω", "Ω", Dimension.RESISTANCE, 1);
  static final Unit FARAD = new Unit("F", "F", Dimension.CAPACITANCE, 1);

  /** Bare units, symbols and prefixed symbols, by their spelling. */
  private static final Map<String, Parsed> SIMPLE = allSimple();

  private UnitTable() {}

  /** The unit that a word spells exactly, or empty. */
  public static Optional<Unit> read(String word) {
    return parse(word).map(Parsed::unit);
  }

  /** A word of the user's own: no prefix, compared by its spelling. */
  static Unit word(String word) {
    return new Unit(word, word, Dimension.WORD, 1);
  }

  /**
   * The same unit as the format spells it: {@code Ω} for {@code ohm}, {@code µ} for {@code u},
   * {@code °C} for {@code degC}. A word that is no unit of the table stays as it is.
   */
  public static String canonical(String word) {
    return parse(word).map(Parsed::canonical).orElse(word);
  }

  /** True where values of this coherent unit are written with prefixes. */
  static boolean bearsPrefix(String symbol) {
    String first = symbol.contains("/") ? symbol.substring(0, symbol.indexOf('/')) : symbol;
    return SYMBOLS.stream().anyMatch(s -> s.canonical().equals(first) && !first.equals("K"));
  }

  /** True for K and its multiples: as a point on the scale it is counted from absolute zero. */
  static boolean isKelvin(Unit unit) {
    return unit.dimension() == Dimension.TEMPERATURE && canonical(unit.written()).endsWith("K");
  }

  /** The decimal exponent of {@link Unit#scale()}. */
  static int power(Unit unit) {
    return (int) Math.round(StrictMath.log10(unit.scale()));
  }

  /** What a drift in this dimension is called, where the format has a name for it. */
  static Optional<Dimension> drift(Dimension dimension) {
    return switch (dimension) {
      case RATIO -> Optional.of(Dimension.RATIO_DRIFT);
      case VOLTAGE -> Optional.of(Dimension.VOLTAGE_DRIFT);
      case CURRENT -> Optional.of(Dimension.CURRENT_DRIFT);
      case POWER -> Optional.of(Dimension.POWER_PER_KELVIN);
      default -> Optional.empty();
    };
  }

  /** {@code ppm} of {@code ppm/K}; empty where the word is no such drift. */
  static Optional<Unit> numeratorPerKelvin(String word) {
    int slash = word.lastIndexOf('/');
    if (slash < 0
        || !List.of("K", "°C", "degC", "\u212A", "℃").contains(word.substring(slash + 1))) {
      return Optional.empty();
    }
    return simple(word.substring(0, slash)).map(Parsed::unit);
  }

  /** The units most likely meant, the likeliest first, as the format spells them. */
  public static List<String> likely(Dimension dimension) {
    return switch (dimension) {
      case RESISTANCE -> List.of("kΩ", "Ω", "MΩ");
      case CAPACITANCE -> List.of("nF", "µF", "pF");
      case VOLTAGE -> List.of("V", "mV");
      case CURRENT -> List.of("mA", "µA", "nA", "A");
      case POWER -> List.of("mW", "W");
      case FREQUENCY -> List.of("Hz", "kHz", "MHz");
      case TIME -> List.of("µs", "ms", "ns", "s");
      case LENGTH -> List.of("m", "mm");
      case MASS -> List.of("kg", "g");
      case FORCE -> List.of("N", "kN");
      case PRESSURE -> List.of("kPa", "Pa");
      case TEMPERATURE -> List.of("°C", "K");
      case RATIO -> List.of("%", "ppm");
      case DECIBEL -> List.of("dB");
      case LSB -> List.of("LSB");
      case CYCLES -> List.of("cycles");
      case BITS -> List.of("bits");
      case SLEW_RATE -> List.of("V/µs");
      case VOLTAGE_NOISE_DENSITY -> List.of("nV/√Hz");
      case CURRENT_NOISE_DENSITY -> List.of("pA/√Hz");
      case VOLTAGE_DRIFT -> List.of("µV/K");
      case CURRENT_DRIFT -> List.of("nA/K");
      case RATIO_DRIFT -> List.of("ppm/K");
      case POWER_PER_KELVIN -> List.of("mW/K");
      case WORD, OTHER -> List.of();
    };
  }

  /** Every spelling of a unit that is no composite. */
  static Set<String> spellings() {
    return SIMPLE.keySet();
  }

  private record Parsed(Unit unit, String canonical) {}

  private static Optional<Parsed> parse(String word) {
    Optional<Parsed> simple = simple(word);
    int slash = word.lastIndexOf('/');
    return simple.isPresent() || slash < 0 ? simple : composite(word, slash);
  }

  private static Optional<Parsed> simple(String word) {
    return Optional.ofNullable(SIMPLE.get(word));
  }

  private static Map<String, Parsed> allSimple() {
    Map<String, Parsed> all = new LinkedHashMap<>();
    for (Symbol bare : BARE) {
      all.put(bare.spelling(), parsed(bare.spelling(), "", 0, bare));
    }
    for (Symbol symbol : SYMBOLS) {
      all.put(symbol.spelling(), parsed(symbol.spelling(), "", 0, symbol));
      for (Prefix prefix : PREFIXES) {
        if (symbol.prefixes().contains(prefix.canonical())) {
          String word = prefix.spelling() + symbol.spelling();
          all.put(word, parsed(word, prefix.canonical(), prefix.power(), symbol));
        }
      }
    }
    return Collections.unmodifiableMap(all);
  }

  private static Parsed parsed(String word, String prefix, int power, Symbol symbol) {
    int total =
        switch (symbol.canonical()) {
          case "%" -> -2;
          case "ppm" -> -6;
          default -> power;
        };
    Unit unit = new Unit(word, coherent(symbol), symbol.dimension(), scale(total));
    return new Parsed(unit, prefix + symbol.canonical());
  }

  private static String coherent(Symbol symbol) {
    return switch (symbol.dimension()) {
      case RATIO -> "1";
      case TEMPERATURE -> "°C";
      case FREQUENCY -> "Hz";
      case CYCLES -> "cycles";
      case BITS -> "bits";
      default -> symbol.canonical();
    };
  }

  private static Optional<Parsed> composite(String word, int slash) {
    Optional<Parsed> top = simple(word.substring(0, slash));
    String per = word.substring(slash + 1);
    if (top.isEmpty()) {
      return Optional.empty();
    }
    return switch (per) {
      case "K", "°C", "degC", "℃", "\u212A" -> over(word, top.get(), "K", canonical(per), 0);
      case "V" -> over(word, top.get(), "V", "V", 0);
      case "√Hz", "rtHz" -> over(word, top.get(), "√Hz", "√Hz", 0);
      case "s" -> over(word, top.get(), "s", "s", 0);
      case "ms" -> over(word, top.get(), "s", "ms", -3);
      case "µs", "μs", "us" -> over(word, top.get(), "s", "µs", -6);
      case "ns" -> over(word, top.get(), "s", "ns", -9);
      default -> Optional.empty();
    };
  }

  private static Optional<Parsed> over(
      String word, Parsed top, String per, String canonicalPer, int perPower) {
    double scale = scale(power(top.unit()) - perPower);
    String canonical = top.canonical() + "/" + canonicalPer;
    String symbol = (isKelvin(top.unit()) ? "°C" : top.unit().symbol()) + "/" + per;
    if (top.unit().symbol().equals(per)) {
      return Optional.of(new Parsed(new Unit(word, "1", Dimension.RATIO, scale), canonical));
    }
    Dimension dimension =
        COMPOSITES.stream()
            .filter(c -> c.symbol().equals(symbol))
            .map(Composite::dimension)
            .findFirst()
            .orElse(Dimension.OTHER);
    return Optional.of(new Parsed(new Unit(word, symbol, dimension, scale), canonical));
  }

  private static double scale(int power) {
    return Double.parseDouble("1e" + power);
  }
}
