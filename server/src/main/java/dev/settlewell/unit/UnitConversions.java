package dev.settlewell.unit;

import dev.settlewell.text.Problem;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Units that are well known but not spelled in a sheet, with the value in one that is. */
final class UnitConversions {
  /** Prefixes and the decimal exponent they stand for, the unit's own prefixes included. */
  private static final Map<String, Integer> POWERS =
      Map.ofEntries(
          Map.entry("f", -15),
          Map.entry("p", -12),
          Map.entry("n", -9),
          Map.entry("u", -6),
          Map.entry("µ", -6),
          Map.entry("μ", -6),
          Map.entry("m", -3),
          Map.entry("c", -2),
          Map.entry("d", -1),
          Map.entry("h", 2),
          Map.entry("k", 3),
          Map.entry("M", 6),
          Map.entry("G", 9),
          Map.entry("T", 12));

  /** Factors to units of the table; exact by definition (SI Brochure, table 8; 1 in = 25.4 mm). */
  private record Factor(String factor, String symbol, Dimension dimension) {}

  private static final Map<String, Factor> FACTORS =
      Map.of(
          "min", new Factor("60", "s", Dimension.TIME),
          "h", new Factor("3600", "s", Dimension.TIME),
          "in", new Factor("0.0254", "m", Dimension.LENGTH),
          "inch", new Factor("0.0254", "m", Dimension.LENGTH),
          "ft", new Factor("0.3048", "m", Dimension.LENGTH));

  /** What follows a unit without being one; the spelling to use instead. */
  private static final Map<String, String> SUFFIXES =
      Map.ofEntries(
          Map.entry("pp", " peak-to-peak"),
          Map.entry("p-p", " peak-to-peak"),
          Map.entry("pk-pk", " peak-to-peak"),
          Map.entry("rms", " rms"),
          Map.entry("RMS", " rms"),
          Map.entry("dc", ""),
          Map.entry("DC", ""),
          Map.entry("p", ""),
          Map.entry("pk", ""));

  private UnitConversions() {}

  /** True for words that are never a measured unit of the user's own. */
  static boolean isKnown(String text) {
    return text.equals("°F") || suffixed(text).isPresent() || oddPrefix(text).isPresent();
  }

  /** Gives up a value whose unit is no unit of the format; with the value in one that is. */
  static RuntimeException refusal(Cursor cursor, Numeral number, Token word, Expected expected) {
    String text = word.text();
    Optional<String> suffixed = suffixed(text);
    if (suffixed.isPresent()) {
      return cursor.mend(
          Problem.Kind.WRONG_UNIT, word.from(), word.to(), suffixWhy(text), suffixed.get());
    }
    String noUnit = text + " is no unit of the format";
    if (text.equals("°F") || text.equals("degF")) {
      return wrong(cursor, number.from(), word.to(), noUnit, List.of(celsius(number, expected)));
    }
    Optional<String> converted = converted(number, text, expected).or(() -> volts(number, text));
    if (converted.isPresent()) {
      return cursor.mend(
          Problem.Kind.WRONG_UNIT, number.from(), word.to(), noUnit, converted.get());
    }
    Optional<Code.Reading> code = Code.read(number.digits() + text);
    if (code.isPresent() && number.to() == word.from()) {
      throw code.get().notTaken(cursor, number.from(), word.to(), expected);
    }
    String why = noUnit + ": this key takes " + UnitSlips.takes(expected);
    return wrong(cursor, word.from(), word.to(), why, List.of());
  }

  private static RuntimeException wrong(
      Cursor cursor, int from, int to, String why, List<String> spellings) {
    return cursor.refuse(Problem.Kind.WRONG_UNIT, from, to, why, spellings);
  }

  private static String suffixWhy(String text) {
    return text.endsWith("c") || text.endsWith("C")
        ? "a unit bears no remark"
        : "how an amplitude is meant stands behind the unit";
  }

  private static Optional<String> suffixed(String text) {
    for (Map.Entry<String, String> suffix : SUFFIXES.entrySet()) {
      if (text.endsWith(suffix.getKey()) && text.length() > suffix.getKey().length()) {
        String stem = text.substring(0, text.length() - suffix.getKey().length());
        Optional<Unit> unit = UnitTable.read(stem);
        if (unit.isPresent() && isElectrical(unit.get())) {
          return Optional.of(UnitTable.canonical(stem) + suffix.getValue());
        }
      }
    }
    return Optional.empty();
  }

  private static boolean isElectrical(Unit unit) {
    return unit.dimension() == Dimension.VOLTAGE || unit.dimension() == Dimension.CURRENT;
  }

  private static Optional<String> converted(Numeral number, String text, Expected expected) {
    Factor factor = FACTORS.get(text);
    if (factor != null && takes(expected, factor.dimension())) {
      BigDecimal value = Engineering.decimal(number.times(0));
      double meant = value.multiply(new BigDecimal(factor.factor())).doubleValue();
      return Optional.of(Engineering.exact(meant, factor.symbol()));
    }
    Optional<Unit> unit = oddPrefix(text).or(() -> measuredWord(text, expected));
    return unit.map(
        u -> {
          double meant = number.times(POWERS.get(text.substring(0, 1)) + UnitTable.power(u));
          return Engineering.exact(meant, u.symbol());
        });
  }

  /** {@code mbar} where the channel measures in {@code bar}: a word bears no prefix. */
  private static Optional<Unit> measuredWord(String text, Expected expected) {
    return expected
        .measured()
        .filter(u -> u.dimension() == Dimension.WORD && POWERS.containsKey(text.substring(0, 1)))
        .filter(u -> u.symbol().equals(text.substring(1)));
  }

  private static String celsius(Numeral number, Expected expected) {
    boolean difference = expected.temperatureDifference();
    BigDecimal value = Engineering.decimal(number.times(0));
    BigDecimal above = difference ? value : value.subtract(BigDecimal.valueOf(32));
    BigDecimal celsius = above.divide(new BigDecimal("1.8"), MathContext.DECIMAL32);
    return Engineering.digits(celsius.doubleValue(), 6) + (difference ? " K" : " °C");
  }

  /** {@code 3V3} as supplies are named. */
  private static Optional<String> volts(Numeral number, String text) {
    boolean named = number.digits().matches("\\d{1,3}") && text.matches("V\\d{1,3}");
    return named ? Optional.of(number.digits() + "." + text.substring(1) + " V") : Optional.empty();
  }

  private static boolean takes(Expected expected, Dimension dimension) {
    return expected.dimensions().contains(dimension)
        || expected.measured().filter(unit -> unit.dimension() == dimension).isPresent();
  }

  /** The unit behind a prefix that it, or the format, does not bear: {@code m°C}, {@code cm}. */
  private static Optional<Unit> oddPrefix(String text) {
    if (text.length() < 2 || !POWERS.containsKey(text.substring(0, 1))) {
      return Optional.empty();
    }
    return UnitTable.read(text.substring(1))
        .filter(unit -> unit.scale() == 1 || unit.dimension() == Dimension.RATIO)
        .filter(unit -> !unit.written().contains("/"));
  }
}
