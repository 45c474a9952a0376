package dev.settlewell.unit;

import java.math.BigDecimal;

/**
 * A number as the grammar writes it, with its sign.
 *
 * @param from first character in the value's text, the sign included
 * @param digits strict decimal text: {@code -4.7}, {@code 1e-9}
 */
record Numeral(int from, int to, String digits) {
  /** Beyond this nothing physical is meant, and products of values stay finite. */
  private static final double LARGEST = 1e30;

  boolean isTooLarge() {
    return !(Math.abs(times(0)) <= LARGEST);
  }

  /** True for a number other than zero that is too small to be told from it. */
  boolean isTooSmall() {
    if (Math.abs(times(0)) >= 1 / LARGEST) {
      return false;
    }
    String mantissa = digits.split("[eE]", 2)[0];
    return mantissa.chars().anyMatch(c -> c >= '1' && c <= '9');
  }

  /** This number times a power of ten, correctly rounded: shifted in decimal, not multiplied. */
  double times(int power) {
    int e = Math.max(digits.indexOf('e'), digits.indexOf('E'));
    if (power == 0 || e < 0) {
      return Double.parseDouble(power == 0 ? digits : digits + "e" + power);
    }
    String exponent = digits.substring(e + 1);
    if (exponent.length() > 8) {
      return Double.parseDouble(digits);
    }
    return Double.parseDouble(digits.substring(0, e) + "e" + (Integer.parseInt(exponent) + power));
  }

  /** The value in a unit, coherent; a point in kelvin becomes °C. */
  Quantity in(Unit unit, boolean temperatureDifference) {
    double value = times(UnitTable.power(unit));
    if (temperatureDifference || !UnitTable.isKelvin(unit)) {
      return new Quantity(value, unit);
    }
    BigDecimal celsius = BigDecimal.valueOf(value).subtract(new BigDecimal("273.15"));
    return new Quantity(celsius.doubleValue(), UnitTable.CELSIUS);
  }
}
