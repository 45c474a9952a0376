package dev.settlewell.uncertainty;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import dev.settlewell.uncertainty.Distribution.Normal;
import dev.settlewell.uncertainty.Distribution.Rectangular;
import dev.settlewell.uncertainty.Distribution.Sine;
import dev.settlewell.uncertainty.Distribution.Triangular;
import java.util.Collections;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import org.apache.commons.math3.distribution.NormalDistribution;
import org.apache.commons.math3.special.BesselJ;
import org.apache.commons.math3.util.CombinatoricsUtils;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The numerics of the expanded uncertainty, held against distributions in closed form. */
class CoverageExactTest {
  private static final double[] PROBABILITIES = {0.5, 0.6827, 0.9, 0.95, 0.9545, 0.99, 0.9973};

  /**
   * Irwin-Hall distribution (Johnson, Kotz and Balakrishnan, Continuous Univariate Distributions).
   */
  @ParameterizedTest
  @ValueSource(ints = {2, 3, 4, 5, 8, 12})
  void equalRectangles(int n) {
    for (double p : PROBABILITIES) {
      double u = Coverage.expanded(Collections.nCopies(n, new Rectangular(1)), p);
      assertThat(irwinHall(n, 0.5 * (u + n))).isCloseTo(0.5 * (1 + p), within(3e-8));
    }
  }

  private static double irwinHall(int n, double s) {
    double sum = 0;
    for (int k = 0; k <= s && k <= n; k++) {
      double sign = k % 2 == 0 ? 1 : -1;
      sum += sign * CombinatoricsUtils.binomialCoefficientDouble(n, k) * Math.pow(s - k, n);
    }
    return sum / CombinatoricsUtils.factorialDouble(n);
  }

  /** Two unequal rectangles make a trapezoid (JCGM 101:2008, 6.4.4). */
  @ParameterizedTest
  @ValueSource(doubles = {1, 0.9, 0.5, 0.2, 0.08, 0.06, 0.051, 0.05, 0.01, 1e-3, 1e-5, 1e-8})
  void trapezoid(double ratio) {
    double a = 3;
    double b = a * ratio;
    for (double p : PROBABILITIES) {
      double exact = p * a <= a - b ? p * a : a + b - Math.sqrt(4 * a * b * (1 - p));
      assertThat(Coverage.expanded(List.of(new Rectangular(a), new Rectangular(b)), p))
          .as("p = %s", p)
          .isCloseTo(exact, within(1e-6 * a));
    }
  }

  /** A triangle is the sum of two equal rectangles. */
  @Test
  void triangleIsTwoRectangles() {
    for (double p : PROBABILITIES) {
      double two = Coverage.expanded(List.of(new Rectangular(1), new Rectangular(1)), p);
      assertThat(Coverage.expanded(List.of(new Triangular(2)), p)).isCloseTo(two, within(1e-6));
      List<Distribution> beside = List.of(new Triangular(2), new Normal(0.3));
      List<Distribution> apart = List.of(new Rectangular(1), new Rectangular(1), new Normal(0.3));
      assertThat(Coverage.expanded(beside, p)).isCloseTo(Coverage.expanded(apart, p), within(1e-9));
    }
  }

  /** A rectangle and a normal: the integral of the normal distribution function. */
  @ParameterizedTest
  @ValueSource(doubles = {1e-9, 1e-6, 1e-4, 1e-3, 0.01, 0.1, 0.3, 1, 3, 30, 1e4})
  void rectangleAndNormal(double sigma) {
    for (double p : PROBABILITIES) {
      double u = Coverage.expanded(List.of(new Rectangular(1), new Normal(sigma)), p);
      // P(|X| <= u) = G(u + 1) - G(u - 1) - 1 with G' the normal distribution function.
      double probability = integral(u + 1, sigma) - integral(u - 1, sigma) - 1;
      assertThat(probability).as("p = %s", p).isCloseTo(p, within(5e-7));
    }
  }

  private static double integral(double z, double sigma) {
    NormalDistribution normal = new NormalDistribution(null, 0, 1);
    double x = z / sigma;
    return z * normal.cumulativeProbability(x) + sigma * normal.density(x);
  }

  /** A sine and a rectangle, a sine and a sine: averaged over the angle of the first. */
  @ParameterizedTest
  @ValueSource(doubles = {1e-3, 0.03, 0.1, 0.5, 1, 2, 10})
  void sineAndAnother(double other) {
    for (double p : PROBABILITIES) {
      double withRectangle = Coverage.expanded(List.of(new Sine(1), new Rectangular(other)), p);
      assertThat(overAngle(withRectangle, x -> rectangle(x / other)))
          .as("rectangle, p = %s", p)
          .isCloseTo(p, within(5e-6));
      double withSine = Coverage.expanded(List.of(new Sine(1), new Sine(other)), p);
      assertThat(overAngle(withSine, x -> arcsine(x / other)))
          .as("sine, p = %s", p)
          .isCloseTo(p, within(5e-6));
    }
  }

  private static double overAngle(double u, DoubleUnaryOperator cumulative) {
    int n = 100_000;
    double sum = 0;
    for (int i = 0; i < n; i++) {
      double first = Math.sin(Math.PI * ((i + 0.5) / n - 0.5));
      sum += cumulative.applyAsDouble(u - first) - cumulative.applyAsDouble(-u - first);
    }
    return sum / n;
  }

  private static double rectangle(double x) {
    return Math.min(1, Math.max(0, 0.5 * (1 + x)));
  }

  private static double arcsine(double x) {
    return 0.5 + Math.asin(Math.min(1, Math.max(-1, x))) / Math.PI;
  }

  /** Against the library's Bessel function, which is slower and more exact than ours. */
  @Test
  void besselFunction() {
    for (double x = 0; x < 400; x += 0.37) {
      assertThat(Bessel.j0(x)).as("J0(%s)", x).isCloseTo(BesselJ.value(0, x), within(6e-8));
      if (x >= Bessel.FAR) {
        double far = Bessel.j0Far(x, Math.cos(x), Math.sin(x));
        assertThat(far).as("J0(%s)", x).isCloseTo(BesselJ.value(0, x), within(1e-8));
      }
    }
  }
}
