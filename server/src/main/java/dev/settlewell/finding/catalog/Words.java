package dev.settlewell.finding.catalog;

import dev.settlewell.unit.Engineering;
import java.math.RoundingMode;

/** How messages write figures: three significant digits, engineering prefixes. */
final class Words {
  private static final int DIGITS = 3;

  private Words() {}

  /** {@code 5.81 µs}, {@code 4.7 LSB}, {@code 12.5 %} for the unit 1. */
  static String of(double value, String unit) {
    return Engineering.message(value, unit);
  }

  /** As a sheet would write it, without zeros that say nothing: {@code 4.7 kΩ}, {@code 100 nF}. */
  static String part(double value, String unit) {
    return Engineering.rounded(value, DIGITS, RoundingMode.HALF_UP, unit);
  }

  static String lsb(double value) {
    return of(value, "LSB");
  }

  /** {@code 12.5 %}. */
  static String share(double value) {
    return of(value, "1");
  }

  /** A plain number with three significant digits. */
  static String digits(double value) {
    return Engineering.digits(value, DIGITS);
  }

  /** Counts and codes: all of their digits. */
  static String count(double value) {
    return Engineering.digits(value, 12);
  }

  /** {@code 0.32 V to 2.62 V}. */
  static String range(double low, double high, String unit) {
    return of(low, unit) + " to " + of(high, unit);
  }
}
