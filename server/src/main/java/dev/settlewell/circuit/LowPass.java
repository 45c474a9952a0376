package dev.settlewell.circuit;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import java.util.stream.IntStream;
import org.apache.commons.math3.analysis.solvers.BrentSolver;
import org.apache.commons.math3.analysis.solvers.LaguerreSolver;
import org.apache.commons.math3.complex.Complex;
import org.apache.commons.math3.util.FastMath;

/**
 * An all-pole low-pass filter: {@code H(s) = prod(-p_k) / prod(s - p_k)}, with the gain 1 at DC.
 *
 * <p>The corner is always where the power is half of that at DC (-3.01 dB), whatever the response;
 * {@link #chebyshevByRippleEdge} serves tables that state the end of the ripple band instead.
 *
 * <p>Orders run from 1 to {@value #LARGEST_ORDER}. Sources: for the poles of Butterworth and
 * Chebyshev filters, Zverev, Handbook of Filter Synthesis (1967), ch. 3; for Bessel filters, the
 * reverse Bessel polynomials of Thomson, Proc. IEE 96 (1949), 487.
 */
public final class LowPass {
  public static final int LARGEST_ORDER = 8;

  /** Half power in decibel: a ripple beyond it makes the -3 dB corner ambiguous. */
  public static final double LARGEST_RIPPLE_DECIBEL = 10 * FastMath.log10(2);

  private final List<Complex> poles;

  private LowPass(List<Complex> normalised, double scaleHertz) {
    if (!(scaleHertz > 0) || Double.isInfinite(scaleHertz)) {
      throw new IllegalArgumentException("no such corner frequency: " + scaleHertz + " Hz");
    }
    double scale = 2 * FastMath.PI * scaleHertz;
    poles = normalised.stream().map(pole -> pole.multiply(scale)).toList();
  }

  /** Maximally flat: {@code |H|^2 = 1 / (1 + (f/f_c)^2n)}. */
  public static LowPass butterworth(int order, double cornerHertz) {
    requireOrder(order);
    List<Complex> poles = new ArrayList<>();
    for (int k = 0; k < order; k++) {
      double angle = FastMath.PI * (2 * k + 1) / (2 * order);
      poles.add(new Complex(-FastMath.sin(angle), middleIsReal(order, k, FastMath.cos(angle))));
    }
    return new LowPass(poles, cornerHertz);
  }

  /** Maximally flat delay, scaled so that the corner is at half power (not at unit delay). */
  public static LowPass bessel(int order, double cornerHertz) {
    requireOrder(order);
    LowPass unitDelay = new LowPass(besselPoles(order), 1 / (2 * FastMath.PI));
    double corner =
        new BrentSolver(1e-14, 1e-14).solve(200, f -> unitDelay.power(f) - 0.5, 0.01, order);
    return new LowPass(unitDelay.poles, cornerHertz / (2 * FastMath.PI * corner));
  }

  /**
   * Equal ripple in the pass band, with the half-power corner (relative to DC) at {@code
   * cornerHertz}.
   *
   * @param rippleDecibel peak to trough, above 0 and at most {@link #LARGEST_RIPPLE_DECIBEL}
   */
  public static LowPass chebyshev(int order, double cornerHertz, double rippleDecibel) {
    return chebyshevByRippleEdge(
        order, cornerHertz / cornerOverRippleEdge(order, rippleDecibel), rippleDecibel);
  }

  /**
   * Equal ripple in the pass band, which ends at {@code edgeHertz}: the last frequency at which the
   * response is one ripple below its maximum.
   */
  public static LowPass chebyshevByRippleEdge(int order, double edgeHertz, double rippleDecibel) {
    double a = FastMath.asinh(1 / rippleFactor(order, rippleDecibel)) / order;
    List<Complex> poles = new ArrayList<>();
    for (int k = 0; k < order; k++) {
      double angle = FastMath.PI * (2 * k + 1) / (2 * order);
      poles.add(
          new Complex(
              -FastMath.sinh(a) * FastMath.sin(angle),
              middleIsReal(order, k, FastMath.cosh(a) * FastMath.cos(angle))));
    }
    return new LowPass(poles, edgeHertz);
  }

  /**
   * The highest corner, in hertz, at which a Butterworth filter still weakens a line to {@code
   * gain}: {@code f / (1/g^2 - 1)^(1/2n)}. Order 1 is one RC section.
   *
   * @param gain wanted at {@code hertz}, above 0 and below 1
   */
  public static double butterworthCorner(int order, double hertz, double gain) {
    requireOrder(order);
    return hertz / FastMath.pow(1 / (gain * gain) - 1, 1.0 / (2 * order));
  }

  /**
   * The lowest order of a Butterworth filter that weakens a line to {@code gain}; empty where
   * {@value #LARGEST_ORDER} poles do not suffice, as always below the corner for less than half
   * power.
   *
   * @param gain wanted at {@code hertz}, above 0 and below 1
   */
  public static OptionalInt butterworthOrder(double cornerHertz, double hertz, double gain) {
    return IntStream.rangeClosed(1, LARGEST_ORDER)
        .filter(order -> cornerHertz <= butterworthCorner(order, hertz, gain))
        .findFirst();
  }

  /** The response at a frequency in hertz. */
  public Complex at(double hertz) {
    double w = 2 * FastMath.PI * hertz;
    double real = 1;
    double imaginary = 0;
    for (Complex pole : poles) {
      // p / (p - jw), in plain doubles: integrals over the response ask for it thousands of times.
      double a = pole.getReal();
      double b = pole.getImaginary();
      double square = a * a + (b - w) * (b - w);
      double re = (a * a + b * (b - w)) / square;
      double im = a * w / square;
      double product = real * re - imaginary * im;
      imaginary = real * im + imaginary * re;
      real = product;
    }
    return new Complex(real, imaginary);
  }

  /** The poles in rad/s, all with a negative real part. */
  public List<Complex> poles() {
    return poles;
  }

  public int order() {
    return poles.size();
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof LowPass filter && poles.equals(filter.poles);
  }

  @Override
  public int hashCode() {
    return poles.hashCode();
  }

  @Override
  public String toString() {
    return "LowPass" + poles;
  }

  private double power(double hertz) {
    double gain = at(hertz).abs();
    return gain * gain;
  }

  /**
   * Half power against DC: an even order starts in a trough, so that DC itself lies at {@code 1 /
   * (1 + e^2)} of the maximum; an odd order starts at the maximum.
   */
  private static double cornerOverRippleEdge(int order, double rippleDecibel) {
    double e = rippleFactor(order, rippleDecibel);
    double polynomial = order % 2 == 0 ? Math.sqrt(1 + 2 * e * e) / e : 1 / e;
    return FastMath.cosh(FastMath.acosh(polynomial) / order);
  }

  private static double rippleFactor(int order, double rippleDecibel) {
    requireOrder(order);
    if (!(rippleDecibel > 0 && rippleDecibel <= LARGEST_RIPPLE_DECIBEL)) {
      throw new IllegalArgumentException("no such ripple: " + rippleDecibel + " dB");
    }
    return Math.sqrt(FastMath.expm1(rippleDecibel / 10 * FastMath.log(10)));
  }

  /** The roots of the reverse Bessel polynomial, for unit delay. */
  private static List<Complex> besselPoles(int order) {
    double[] coefficients = new double[order + 1];
    coefficients[order] = 1;
    for (int k = order - 1; k >= 0; k--) {
      // a_k / a_(k+1) of a_k = (2n-k)! / (2^(n-k) k! (n-k)!)
      coefficients[k] = coefficients[k + 1] * (2 * order - k) * (k + 1) / (2.0 * (order - k));
    }
    Complex[] roots = new LaguerreSolver(1e-14).solveAllComplex(coefficients, 0);
    List<Complex> poles = new ArrayList<>();
    for (Complex root : roots) {
      // A real root comes with an imaginary rest of rounding; the others keep well away from it.
      boolean real = Math.abs(root.getImaginary()) < 1e-6;
      poles.add(polished(coefficients, real ? new Complex(root.getReal()) : root));
    }
    return poles;
  }

  private static Complex polished(double[] coefficients, Complex root) {
    Complex z = root;
    for (int round = 0; round < 3; round++) {
      Complex value = Complex.ZERO;
      Complex slope = Complex.ZERO;
      for (int k = coefficients.length - 1; k >= 0; k--) {
        slope = slope.multiply(z).add(value);
        value = value.multiply(z).add(coefficients[k]);
      }
      z = z.subtract(value.divide(slope));
    }
    return z;
  }

  /** The middle pole of an odd order is real; a cosine of pi/2 leaves a rest of rounding. */
  private static double middleIsReal(int order, int k, double imaginary) {
    return 2 * k + 1 == order ? 0 : imaginary;
  }

  private static void requireOrder(int order) {
    if (order < 1 || order > LARGEST_ORDER) {
      throw new IllegalArgumentException("no such order of a low-pass: " + order);
    }
  }
}
