package dev.settlewell.unit;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.List;

/**
 * Numbers with engineering prefixes (powers of 1000), for people and for sheets. The same text on
 * every machine: no locale, no platform formatting.
 */
public final class Engineering {
  private static final int MESSAGE_DIGITS = 3;
  private static final List<String> PREFIXES = List.of("p", "n", "µ", "m", "", "k", "M", "G");
  private static final int NO_PREFIX = PREFIXES.indexOf("");

  private Engineering() {}

  /**
   * For messages: three significant digits, {@code 3.00 µs}, {@code 4.70 kΩ}; units without
   * prefixes drop zeros at the end and keep all digits of large values: {@code 4.7 LSB}, {@code
   * 1023 LSB}.
   *
   * @param symbol a coherent unit ({@link Unit#symbol()}); {@code 1} is written in percent
   */
  public static String message(double value, String symbol) {
    if (!Double.isFinite(value)) {
      return value > 0 ? "unlimited" : value < 0 ? "unlimited below" : "undefined";
    }
    boolean prefixed = UnitTable.bearsPrefix(symbol);
    BigDecimal exact = decimal(value).scaleByPowerOfTen(shift(symbol));
    int integerDigits = exact.precision() - exact.scale();
    int digits = prefixed ? MESSAGE_DIGITS : Math.max(MESSAGE_DIGITS, integerDigits);
    BigDecimal rounded = exact.round(new MathContext(digits, RoundingMode.HALF_UP));
    if (prefixed) {
      rounded = padded(rounded);
    } else {
      rounded = rounded.stripTrailingZeros();
    }
    return written(rounded, symbol);
  }

  /** For sheets: the fewest digits that read back to the same value, {@code 5.81 µs}. */
  public static String exact(double value, String symbol) {
    return written(decimal(value).scaleByPowerOfTen(shift(symbol)).stripTrailingZeros(), symbol);
  }

  /**
   * For computed values in sheets: so many significant digits, zeros at the end dropped.
   *
   * @param mode {@link RoundingMode#CEILING} where a larger value is the safe side, {@link
   *     RoundingMode#FLOOR} where a smaller one is: what is read back is never on the other side
   */
  public static String rounded(double value, int digits, RoundingMode mode, String symbol) {
    BigDecimal exact = decimal(value).scaleByPowerOfTen(shift(symbol));
    return written(exact.round(new MathContext(digits, mode)).stripTrailingZeros(), symbol);
  }

  /** A plain number with at most so many significant digits. */
  public static String digits(double value, int digits) {
    BigDecimal rounded = decimal(value).round(new MathContext(digits, RoundingMode.HALF_UP));
    return number(rounded.stripTrailingZeros());
  }

  /** The shortest decimal that reads back to the same double. */
  static BigDecimal decimal(double value) {
    if (value == 0) {
      return BigDecimal.ZERO;
    }
    BigDecimal binary = new BigDecimal(value);
    for (int digits = 15; digits < 17; digits++) {
      BigDecimal rounded = binary.round(new MathContext(digits, RoundingMode.HALF_EVEN));
      if (rounded.doubleValue() == value) {
        return rounded.stripTrailingZeros();
      }
    }
    return binary.round(new MathContext(17, RoundingMode.HALF_EVEN));
  }

  /** Shares are written in percent, drifts of shares in ppm/K, slew rates in V/µs. */
  private static int shift(String symbol) {
    return switch (symbol) {
      case "1" -> 2;
      case "1/K" -> 6;
      case "V/s" -> -6;
      default -> 0;
    };
  }

  private static String unit(String symbol) {
    return switch (symbol) {
      case "1" -> "%";
      case "1/K" -> "ppm/K";
      case "V/s" -> "V/µs";
      default -> symbol;
    };
  }

  private static BigDecimal padded(BigDecimal rounded) {
    int missing = MESSAGE_DIGITS - rounded.precision();
    return rounded.signum() == 0 || missing <= 0
        ? rounded
        : rounded.setScale(rounded.scale() + missing, RoundingMode.UNNECESSARY);
  }

  private static String written(BigDecimal value, String symbol) {
    String unit = unit(symbol);
    if (!UnitTable.bearsPrefix(symbol) || value.signum() == 0) {
      return number(value) + " " + unit;
    }
    int exponent = value.precision() - value.scale() - 1;
    int index = NO_PREFIX + Math.floorDiv(exponent, 3);
    if (index < 0 || index >= PREFIXES.size()) {
      return withExponent(value, exponent) + " " + unit;
    }
    int power = 3 * (index - NO_PREFIX);
    return value.movePointLeft(power).toPlainString() + " " + PREFIXES.get(index) + unit;
  }

  /** Plain digits where they are few, an exponent that the grammar reads where they are not. */
  private static String number(BigDecimal value) {
    int exponent = value.signum() == 0 ? 0 : value.precision() - value.scale() - 1;
    if (-5 < exponent && exponent < 15) {
      return value.signum() == 0 ? "0" : value.toPlainString();
    }
    return withExponent(value, exponent);
  }

  private static String withExponent(BigDecimal value, int exponent) {
    return value.movePointLeft(exponent).toPlainString() + "e" + exponent;
  }
}
