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
      double remainder =
          (high[at] - product - productError(quotient, divisor, product) + low[at]) / divisor;
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
      scaled.set(at, product, productError(high[at], factor, product) + low[at] * factor);
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
    TwofoldMatrix product = new TwofoldMatrix(size);
    for (int i = 0; i < size; i++) {
      for (int k = 0; k < size; k++) {
        for (int j = 0; j < size; j++) {
          product.accumulateProduct(i * size + j, this, i * size + k, other, k * size + j);
        }
      }
    }
    return product;
  }

  private void accumulateProduct(int at, TwofoldMatrix a, int i, TwofoldMatrix b, int j) {
    double product = a.high[i] * b.high[j];
    double rest =
        productError(a.high[i], b.high[j], product) + a.high[i] * b.low[j] + a.low[i] * b.high[j];
    accumulate(at, product, rest);
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

  private static double productError(double a, double b, double product) {
    double aHigh = leading(a);
    double bHigh = leading(b);
    double aLow = a - aHigh;
    double bLow = b - bHigh;
    return ((aHigh * bHigh - product) + aHigh * bLow + aLow * bHigh) + aLow * bLow;
  }

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
