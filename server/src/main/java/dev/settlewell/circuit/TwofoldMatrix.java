package dev.settlewell.circuit;

/**
 * A small square matrix in twice the precision of double: each entry is the unevaluated sum of two
 * doubles, relative error some 2^-102.
 *
 * <p>Error-free sums and products after D. E. Knuth, The Art of Computer Programming 2, section
 * 4.2.2, and T. J. Dekker, A floating-point technique for extending the available precision, Numer.
 * Math. 18 (1971). Magnitudes must stay between some 1e-140 and 1e140.
 */
final class TwofoldMatrix {
  private static final double SPLITTER = 0x1p27 + 1;

  private final int size;
  private final double[] high;
  private final double[] low;

  TwofoldMatrix(int size) {
    this.size = size;
    high = new double[size * size];
    low = new double[size * size];
  }

  static TwofoldMatrix identity(int size) {
    TwofoldMatrix identity = new TwofoldMatrix(size);
    for (int i = 0; i < size; i++) {
      identity.add(i, i, 1);
    }
    return identity;
  }

  /** Adds a number to the entry. */
  void add(int row, int column, double value) {
    accumulate(row * size + column, value, 0);
  }

  /** Divides a row by a number. */
  void divideRow(int row, double divisor) {
    for (int at = row * size; at < (row + 1) * size; at++) {
      double quotient = high[at] / divisor;
      double product = quotient * divisor;
      double remainder = (high[at] - product - productError(quotient, divisor) + low[at]) / divisor;
      set(at, quotient, remainder);
    }
  }

  /** Multiplies the entry by a power of two: exact. */
  void scale(int row, int column, double powerOfTwo) {
    high[row * size + column] *= powerOfTwo;
    low[row * size + column] *= powerOfTwo;
  }

  /** Multiplies all entries by a number that may be rounded (its error is the caller's). */
  TwofoldMatrix times(double factor) {
    TwofoldMatrix scaled = new TwofoldMatrix(size);
    for (int at = 0; at < high.length; at++) {
      double product = high[at] * factor;
      scaled.set(at, product, productError(high[at], factor) + low[at] * factor);
    }
    return scaled;
  }

  TwofoldMatrix plus(TwofoldMatrix other) {
    TwofoldMatrix sum = new TwofoldMatrix(size);
    for (int at = 0; at < high.length; at++) {
      sum.set(at, high[at], low[at]);
      sum.accumulate(at, other.high[at], other.low[at]);
    }
    return sum;
  }

  TwofoldMatrix times(TwofoldMatrix other) {
    double[] leading = leading(high);
    double[] otherLeading = leading(other.high);
    TwofoldMatrix product = new TwofoldMatrix(size);
    for (int i = 0; i < size; i++) {
      for (int j = 0; j < size; j++) {
        double sum = 0;
        double rest = 0;
        for (int k = 0; k < size; k++) {
          int left = i * size + k;
          int right = k * size + j;
          double term = high[left] * other.high[right];
          double next = sum + term;
          double part = next - sum;
          rest += (sum - (next - part)) + (term - part);
          rest += productError(high[left], leading[left], other.high[right], otherLeading[right]);
          rest += high[left] * other.low[right] + low[left] * other.high[right];
          sum = next;
        }
        product.set(i * size + j, sum, rest);
      }
    }
    return product;
  }

  private void accumulate(int at, double value, double rest) {
    double sum = high[at] + value;
    double part = sum - high[at];
    double error = (high[at] - (sum - part)) + (value - part);
    set(at, sum, error + low[at] + rest);
  }

  /** Stores value + rest, where rest is small against value. */
  private void set(int at, double value, double rest) {
    high[at] = value + rest;
    low[at] = rest - (high[at] - value);
  }

  /** a b less its rounded value. */
  private static double productError(double a, double b) {
    return productError(a, leading(a), b, leading(b));
  }

  private static double productError(double a, double aLeading, double b, double bLeading) {
    double aRest = a - aLeading;
    double bRest = b - bLeading;
    return ((aLeading * bLeading - a * b) + aLeading * bRest + aRest * bLeading) + aRest * bRest;
  }

  private static double[] leading(double[] values) {
    double[] leading = new double[values.length];
    for (int at = 0; at < values.length; at++) {
      leading[at] = leading(values[at]);
    }
    return leading;
  }

  /** The upper half of the digits. */
  private static double leading(double a) {
    double scaled = SPLITTER * a;
    return scaled - (scaled - a);
  }

  /** Largest sum of magnitudes in a row. */
  double norm() {
    double norm = 0;
    for (int i = 0; i < size; i++) {
      double sum = 0;
      for (int j = 0; j < size; j++) {
        sum += Math.abs(high[i * size + j]);
      }
      norm = Math.max(norm, sum);
    }
    return norm;
  }

  double[][] rounded() {
    double[][] rounded = new double[size][size];
    for (int at = 0; at < high.length; at++) {
      rounded[at / size][at % size] = high[at];
    }
    return rounded;
  }

  /** I - this, rounded at the end only. */
  double[][] roundedLoss() {
    TwofoldMatrix loss = identity(size);
    for (int at = 0; at < high.length; at++) {
      loss.accumulate(at, -high[at], -low[at]);
    }
    return loss.rounded();
  }
}
