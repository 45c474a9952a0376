package dev.settlewell.unit;

import java.math.BigDecimal;

/**
 * The preferred numbers of resistors and capacitors (IEC 60063): what can be bought near a computed
 * value.
 *
 * <p>The series repeat in every decade. A value within one part in 1e9 of a preferred one counts as
 * that one, so that rounding never skips to the next part.
 */
public final class PreferredValues {
  private static final double SAME = 1e-9;

  /** The series of IEC 60063, by the number of values in a decade. */
  public enum Series {
    E3(every(8)),
    E6(every(4)),
    E12(every(2)),
    E24(every(1)),
    E48(geometric(48)),
    E96(geometric(96)),
    E192(geometric(192));

    /** The values of the decade 1 to 10: two digits up to E24, three from E48. */
    private final int[] mantissas;

    Series(int[] mantissas) {
      this.mantissas = mantissas;
    }

    private int[] mantissas() {
      return mantissas;
    }
  }

  /** The preferred values on both sides; both equal the value where it is a preferred one. */
  public record Neighbours(double lower, double higher) {
    /** The one at the smaller distance; the lower of two at the same. */
    public double nearest(double value) {
      return higher - value < value - lower ? higher : lower;
    }
  }

  private PreferredValues() {}

  /**
   * The greatest preferred value at or below {@code value}.
   *
   * @param value above 0 and finite
   */
  public static double nextLower(Series series, double value) {
    return neighbours(series, value).lower();
  }

  /**
   * The least preferred value at or above {@code value}.
   *
   * @param value above 0 and finite
   */
  public static double nextHigher(Series series, double value) {
    return neighbours(series, value).higher();
  }

  /**
   * The preferred values on both sides of {@code value}.
   *
   * @param value above 0 and finite
   * @throws IllegalArgumentException when it is not
   */
  public static Neighbours neighbours(Series series, double value) {
    if (!(value > 0 && value < Double.POSITIVE_INFINITY)) {
      throw new IllegalArgumentException("no preferred value near " + value);
    }
    int[] mantissas = series.mantissas();
    // The decade of the first digit, one lower: the walk up starts safely below the value.
    BigDecimal exact = new BigDecimal(value);
    int decade = exact.precision() - exact.scale() - 1;
    int digits = mantissas[0] == 10 ? 1 : 2;
    double lower = preferred(mantissas[mantissas.length - 1], decade - 1 - digits);
    for (int step = 0; ; step++) {
      int mantissa = mantissas[step % mantissas.length];
      double next = preferred(mantissa, decade - digits + step / mantissas.length);
      if (Math.abs(next - value) <= SAME * value) {
        return new Neighbours(next, next);
      }
      if (next > value) {
        return new Neighbours(lower, next);
      }
      lower = next;
    }
  }

  private static double preferred(int mantissa, int exponent) {
    return BigDecimal.valueOf(mantissa).scaleByPowerOfTen(exponent).doubleValue();
  }

  /** Every n-th value of E24, which follows the geometric series only roughly. */
  private static int[] every(int n) {
    int[] e24 = {
      10, 11, 12, 13, 15, 16, 18, 20, 22, 24, 27, 30, 33, 36, 39, 43, 47, 51, 56, 62, 68, 75, 82, 91
    };
    int[] values = new int[e24.length / n];
    for (int i = 0; i < values.length; i++) {
      values[i] = e24[i * n];
    }
    return values;
  }

  /** 100 · 10^(i/n), rounded; 919 is 920 in the standard, the one exception. */
  private static int[] geometric(int n) {
    int[] values = new int[n];
    for (int i = 0; i < n; i++) {
      int value = (int) StrictMath.round(100 * StrictMath.pow(10, (double) i / n));
      values[i] = value == 919 ? 920 : value;
    }
    return values;
  }
}
