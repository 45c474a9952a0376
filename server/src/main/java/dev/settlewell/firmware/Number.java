package dev.settlewell.firmware;

/**
 * A value as C computes it.
 *
 * @param whole true for an integer type, which divides towards zero
 * @param spread the sum of what half the last digits of its floating literals make of it
 */
record Number(double value, boolean whole, double spread) {
  static Number whole(double value) {
    return new Number(value, true, 0);
  }

  static Number real(double value, double spread) {
    return new Number(value, false, spread);
  }
}
