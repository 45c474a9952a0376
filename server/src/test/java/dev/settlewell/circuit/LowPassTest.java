package dev.settlewell.circuit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import org.apache.commons.math3.complex.Complex;
import org.apache.commons.math3.util.FastMath;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class LowPassTest {
  /** Frequency Devices, Filter Design Guide, Appendix A (1999): six-pole Butterworth. */
  @ParameterizedTest
  @CsvSource({
    "0.8, -0.289, 0.0005", "0.9, -1.080, 0.0005", "1.1, -6.17, 0.005", "1.5, -21.2, 0.05",
    "2, -36.1, 0.05", "3, -57.3, 0.05", "5, -83.9, 0.05", "10, -120, 0.5"
  })
  void sixPoleButterworth(double ratio, double decibel, double tolerance) {
    assertThat(decibel(LowPass.butterworth(6, 40), 40 * ratio))
        .isCloseTo(decibel, within(tolerance));
  }

  /**
   * Frequency Devices, Filter Design Guide, Appendix A (1999): six-pole Bessel, -3.01 dB at f_c.
   */
  @ParameterizedTest
  @CsvSource({
    "0.5, -0.728, 0.0005",
    "0.8, -1.89, 0.005",
    "1.2, -4.44, 0.005",
    "2, -14.2, 0.05",
    "3, -30.7, 0.05",
    "5, -55.9, 0.05",
    "10, -91.6, 0.05"
  })
  void sixPoleBessel(double ratio, double decibel, double tolerance) {
    assertThat(decibel(LowPass.bessel(6, 1e3), 1e3 * ratio)).isCloseTo(decibel, within(tolerance));
  }

  /** Journal of Southwest Jiaotong University 10062: second order at ten times the corner. */
  @Test
  void secondOrderAtTenTimesTheCorner() {
    assertThat(decibel(LowPass.butterworth(2, 1), 10)).isCloseTo(-40, within(0.5));
    assertThat(decibel(LowPass.bessel(2, 1), 10)).isCloseTo(-35.9, within(0.06));
    assertThat(decibel(LowPass.chebyshevByRippleEdge(2, 1, 3), 10)).isCloseTo(-43, within(0.5));
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 4, 5, 6, 7, 8})
  void halfPowerAtTheCornerAndOneAtDc(int order) {
    LowPass[] filters = {
      LowPass.butterworth(order, 123),
      LowPass.bessel(order, 123),
      LowPass.chebyshev(order, 123, 0.1),
      LowPass.chebyshev(order, 123, 3)
    };
    for (LowPass filter : filters) {
      assertThat(filter.order()).isEqualTo(order);
      assertThat(filter.at(0).subtract(Complex.ONE).abs()).isLessThan(1e-12);
      assertThat(filter.at(123).abs()).isCloseTo(FastMath.sqrt(0.5), within(1e-10));
      assertThat(filter.poles()).allSatisfy(pole -> assertThat(pole.getReal()).isNegative());
    }
  }

  /** The definitions, without their poles: 1/(1+x^2n), and 1/(1 + e^2 T_n(x)^2) against DC. */
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 4, 5, 6, 7, 8})
  void magnitudesAreThoseOfTheDefinitions(int order) {
    double e2 = FastMath.pow(10, 0.05) - 1;
    LowPass chebyshev = LowPass.chebyshevByRippleEdge(order, 1, 0.5);
    LowPass butterworth = LowPass.butterworth(order, 1);
    for (double x = 0; x < 4; x += 0.037) {
      double flat = 1 / FastMath.sqrt(1 + FastMath.pow(x, 2 * order));
      assertThat(butterworth.at(x).abs()).isCloseTo(flat, within(1e-12));
      double polynomial =
          x <= 1
              ? FastMath.cos(order * FastMath.acos(x))
              : FastMath.cosh(order * FastMath.acosh(x));
      double dc = order % 2 == 0 ? 1 + e2 : 1;
      double ripple = FastMath.sqrt(dc / (1 + e2 * polynomial * polynomial));
      assertThat(chebyshev.at(x).abs()).isCloseTo(ripple, within(1e-11));
    }
  }

  /**
   * Poles of the second- and third-order Bessel filter for unit delay: the roots of s^2 + 3s + 3
   * and of s^3 + 6s^2 + 15s + 15 (Thomson 1949). The delay at DC, sum of Re(-1/p), tells the scale.
   */
  @Test
  void besselPolesAreRootsOfTheReversePolynomials() {
    for (int order : new int[] {2, 3}) {
      LowPass filter = LowPass.bessel(order, 1);
      double delay = filter.poles().stream().mapToDouble(p -> -p.reciprocal().getReal()).sum();
      for (Complex pole : filter.poles()) {
        Complex s = pole.multiply(delay);
        Complex value =
            order == 2
                ? s.multiply(s).add(s.multiply(3)).add(3)
                : s.pow(3).add(s.multiply(s).multiply(6)).add(s.multiply(15)).add(15);
        assertThat(value.abs()).isLessThan(1e-10);
      }
    }
  }

  /** One RC section: 40 dB take a corner a hundredth of the line, but for 5e-5 of it. */
  @Test
  void cornersAndOrdersThatWeakenALine() {
    double corner = LowPass.butterworthCorner(1, 1e3, 0.01);
    assertThat(corner).isCloseTo(10, within(0.001));
    for (int order = 1; order <= 8; order++) {
      double lowered = LowPass.butterworthCorner(order, 1e3, 0.003);
      assertThat(LowPass.butterworth(order, lowered).at(1e3).abs()).isCloseTo(0.003, within(1e-12));
    }
    // Appendix A of the Filter Design Guide: six poles give 36.1 dB at twice the corner.
    assertThat(LowPass.butterworthOrder(50, 100, FastMath.pow(10, -36.0 / 20))).hasValue(6);
    assertThat(LowPass.butterworthOrder(50, 100, FastMath.pow(10, -37.0 / 20))).hasValue(7);
    assertThat(LowPass.butterworthOrder(50, 100, 1e-3)).isEmpty();
    assertThat(LowPass.butterworthOrder(50, 40, 0.5)).isEmpty();
  }

  @Test
  void refusesWhatIsNoFilter() {
    assertThatIllegalArgumentException().isThrownBy(() -> LowPass.butterworth(0, 1));
    assertThatIllegalArgumentException().isThrownBy(() -> LowPass.bessel(9, 1));
    assertThatIllegalArgumentException().isThrownBy(() -> LowPass.chebyshev(2, 1, 0));
    assertThatIllegalArgumentException().isThrownBy(() -> LowPass.chebyshev(2, 1, 3.1));
    assertThatIllegalArgumentException().isThrownBy(() -> LowPass.butterworth(2, 0));
    assertThatIllegalArgumentException().isThrownBy(() -> LowPass.butterworth(2, Double.NaN));
  }

  private static double decibel(LowPass filter, double hertz) {
    return 20 * FastMath.log10(filter.at(hertz).abs());
  }
}
