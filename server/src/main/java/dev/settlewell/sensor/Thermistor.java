package dev.settlewell.sensor;

import org.apache.commons.math3.util.FastMath;

/**
 * Thermistors with a negative temperature coefficient: resistance in ohm over temperature in °C.
 *
 * <p>Both models are given the domain {@value #LOW} °C to {@value #HIGH} °C, the widest over which
 * such parts are sold. That is a fence, not a promise: a maker vouches for a beta only between the
 * two temperatures it was taken at, and for a set of coefficients only over the range it was fitted
 * to.
 */
public final class Thermistor {
  /** The low end of both models, °C. */
  public static final double LOW = -60;

  /** The high end of both models, °C. */
  public static final double HIGH = 300;

  private static final double KELVIN = 273.15;
  private static final double REFERENCE = 25 + KELVIN;

  private Thermistor() {}

  /**
   * The beta model, R(T) = R25 exp(B (1/T - 1/298.15 K)), T in kelvin (IEC 60539-1, the definition
   * of the B value).
   *
   * @param r25 resistance at 25 °C, ohm, above 0
   * @param beta B in kelvin, above 0
   * @throws IllegalArgumentException when either is not
   */
  public static Curve beta(double r25, double beta) {
    require(r25 > 0 && r25 < Double.POSITIVE_INFINITY, "resistance at 25 °C", r25);
    require(beta > 0 && beta < Double.POSITIVE_INFINITY, "beta", beta);
    return new FormulaCurve(
        LOW,
        HIGH,
        celsius -> r25 * FastMath.exp(beta * (1 / (celsius + KELVIN) - 1 / REFERENCE)),
        ohm -> 1 / (1 / REFERENCE + FastMath.log(ohm / r25) / beta) - KELVIN);
  }

  /**
   * The B value that carries one resistance into the other: B = ln(R1/R2) / (1/T1 - 1/T2) (IEC
   * 60539-1).
   *
   * @return B in kelvin; NaN when the temperatures are equal or a resistance is not above 0
   */
  public static double betaBetween(double celsius1, double ohm1, double celsius2, double ohm2) {
    if (celsius1 == celsius2 || !(ohm1 > 0 && ohm2 > 0)) {
      return Double.NaN;
    }
    return FastMath.log(ohm1 / ohm2) / (1 / (celsius1 + KELVIN) - 1 / (celsius2 + KELVIN));
  }

  /**
   * The Steinhart-Hart equation, 1/T = A + B ln R + C (ln R)³, T in kelvin, R in ohm (Steinhart and
   * Hart, Deep-Sea Research 15 (1968) 497).
   *
   * <p>The way from temperature to resistance is the one real root of the cubic in ln R, in its
   * hyperbolic form, which loses no digits where C is small.
   *
   * @param b above 0, and
   * @param c at least 0, so that the resistance falls with temperature everywhere
   * @throws IllegalArgumentException when they are not, or {@code a} is not finite
   */
  public static Curve steinhartHart(double a, double b, double c) {
    require(Math.abs(a) < Double.POSITIVE_INFINITY, "A", a);
    require(b > 0 && b < Double.POSITIVE_INFINITY, "B", b);
    require(c >= 0 && c < Double.POSITIVE_INFINITY, "C", c);
    return new FormulaCurve(
        LOW,
        HIGH,
        celsius -> FastMath.exp(logResistance(b, c, 1 / (celsius + KELVIN) - a)),
        ohm -> {
          double log = FastMath.log(ohm);
          return 1 / (a + log * (b + c * log * log)) - KELVIN;
        });
  }

  /** The root L of b L + c L³ = d. */
  private static double logResistance(double b, double c, double d) {
    if (c == 0) {
      return d / b;
    }
    double root = Math.sqrt(b / (3 * c));
    return 2 * root * FastMath.sinh(FastMath.asinh(3 * d / (2 * b * root)) / 3);
  }

  private static void require(boolean holds, String name, double value) {
    if (!holds) {
      throw new IllegalArgumentException(name + " out of range: " + value);
    }
  }
}
