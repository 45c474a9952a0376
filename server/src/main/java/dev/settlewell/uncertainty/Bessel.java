package dev.settlewell.uncertainty;

import org.apache.commons.math3.util.FastMath;

/** The Bessel function of the first kind and order zero. */
final class Bessel {
  /** From here on the asymptotic expansion serves. */
  static final double FAR = 25;

  private Bessel() {}

  /**
   * J0(x) for x at least 0, within 6e-8: the polynomials of Abramowitz and Stegun, Handbook of
   * Mathematical Functions, 9.4.1 and 9.4.3 (from memory, held against a library in the tests).
   */
  static double j0(double x) {
    if (x <= 3) {
      double y = x * x / 9;
      return 1
          + y
              * (-2.2499997
                  + y
                      * (1.2656208
                          + y * (-0.3163866 + y * (0.0444479 + y * (-0.0039444 + y * 0.0002100)))));
    }
    double y = 3 / x;
    double amplitude =
        0.79788456
            + y
                * (-0.00000077
                    + y
                        * (-0.00552740
                            + y
                                * (-0.00009512
                                    + y * (0.00137237 + y * (-0.00072805 + y * 0.00014476)))));
    double phase =
        x
            - 0.78539816
            + y
                * (-0.04166397
                    + y
                        * (-0.00003954
                            + y
                                * (0.00262573
                                    + y * (-0.00054125 + y * (-0.00029333 + y * 0.00013558)))));
    return amplitude * FastMath.cos(phase) / Math.sqrt(x);
  }

  /**
   * J0(x) for x at least {@value #FAR}, within 1e-8, from the sine and cosine of x: Hankel's
   * asymptotic expansion (Abramowitz and Stegun, 9.2.5, 9.2.9 and 9.2.10). For a caller who steps
   * through x and has them for a few multiplications.
   */
  static double j0Far(double x, double cos, double sin) {
    double z = 1 / (x * x);
    double p = 1 + z * (-9.0 / 128 + z * (3675.0 / 32768));
    double q = (-1.0 / 8 + z * (75.0 / 1024 + z * (-59535.0 / 262144))) / x;
    // cos(x - π/4) and sin(x - π/4), each times √2
    return (p * (cos + sin) - q * (sin - cos)) / Math.sqrt(FastMath.PI * x);
  }
}
