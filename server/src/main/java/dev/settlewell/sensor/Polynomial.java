package dev.settlewell.sensor;

/**
 * A polynomial with a stretch it is meant for; c[0] + c[1] x + c[2] x² + …
 *
 * <p>Not a record: arrays have no value equality.
 */
final class Polynomial {
  final double low;
  final double high;
  private final double[] c;

  Polynomial(double low, double high, double... coefficients) {
    this.low = low;
    this.high = high;
    this.c = coefficients;
  }

  boolean holds(double x) {
    return low <= x && x <= high;
  }

  /**
   * The value at x by the compensated Horner scheme (Graillat, Langlois and Louvet 2005): as if
   * computed with twice the digits. The terms of the low-temperature thermocouple functions cancel
   * to one part in ten thousand, where plain Horner loses the digits an inverse needs.
   */
  double at(double x) {
    double value = c[c.length - 1];
    double error = 0;
    for (int i = c.length - 2; i >= 0; i--) {
      double product = value * x;
      double productError = Math.fma(value, x, -product);
      double sum = product + c[i];
      double part = sum - product;
      double sumError = (product - (sum - part)) + (c[i] - part);
      value = sum;
      error = error * x + (productError + sumError);
    }
    return value + error;
  }

  double slope(double x) {
    double value = 0;
    for (int i = c.length - 1; i > 0; i--) {
      value = value * x + i * c[i];
    }
    return value;
  }
}
