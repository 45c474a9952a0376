package dev.settlewell.sensor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What every curve promises, on random ones. */
class CurvePropertiesTest {
  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 20261201})
  void inverseLeadsBackOverTheDomain(long seed) {
    Random random = new Random(seed);
    for (Curve curve : curves(random)) {
      double width = curve.high() - curve.low();
      for (int i = 0; i < 200; i++) {
        double x = curve.low() + width * random.nextDouble();
        assertThat(curve.inverse(curve.at(x)))
            .as("seed %d, %s at %s", seed, curve.getClass(), x)
            .isCloseTo(x, within(1e-11 * width + 1e-9));
      }
      for (double end : new double[] {curve.low(), curve.high()}) {
        assertThat(curve.inverse(curve.at(end))).isCloseTo(end, within(1e-11 * width + 1e-9));
      }
      assertThat(curve.at(curve.low() - 1e-9 * width)).isNaN();
      assertThat(curve.at(curve.high() + 1e-9 * width)).isNaN();
      assertThat(curve.inverse(Double.NaN)).isNaN();
    }
  }

  @ParameterizedTest
  @ValueSource(longs = {4, 5, 6})
  void strictlyMonotone(long seed) {
    Random random = new Random(seed);
    for (Curve curve : curves(random)) {
      double direction = Math.signum(curve.at(curve.high()) - curve.at(curve.low()));
      double last = curve.at(curve.low());
      for (int i = 1; i <= 500; i++) {
        double x = Math.min(curve.high(), curve.low() + (curve.high() - curve.low()) * i / 500);
        double y = curve.at(x);
        assertThat((y - last) * direction).as("seed %d at %s", seed, x).isPositive();
        last = y;
      }
    }
  }

  private static List<Curve> curves(Random random) {
    List<Curve> curves = new ArrayList<>();
    for (int i = 0; i < 10; i++) {
      curves.add(Thermistor.beta(logUniform(random, 100, 1e6), 2500 + 2500 * random.nextDouble()));
      curves.add(
          Thermistor.steinhartHart(
              5e-4 + 1e-3 * random.nextDouble(),
              1.5e-4 + 2e-4 * random.nextDouble(),
              logUniform(random, 1e-12, 5e-7)));
      curves.add(PlatinumResistor.of(logUniform(random, 10, 10e3)));
      curves.add(table(random));
    }
    for (Thermocouple.Type type : Thermocouple.Type.values()) {
      curves.add(Thermocouple.of(type));
    }
    return curves;
  }

  private static Curve table(Random random) {
    int n = 2 + random.nextInt(10);
    double[] x = new double[n];
    double[] y = new double[n];
    int xSign = random.nextBoolean() ? 1 : -1;
    int ySign = random.nextBoolean() ? 1 : -1;
    x[0] = random.nextGaussian();
    y[0] = random.nextGaussian();
    for (int i = 1; i < n; i++) {
      x[i] = x[i - 1] + xSign * (0.01 + random.nextDouble());
      y[i] = y[i - 1] + ySign * (0.01 + random.nextDouble());
    }
    return new PiecewiseLinear(x, y);
  }

  private static double logUniform(Random random, double low, double high) {
    return low * Math.pow(high / low, random.nextDouble());
  }

  @Test
  void aTableGoesThroughItsPoints() {
    double[] x = {3, 2, 0.1, -7};
    double[] y = {0.3, 0.7, 1.1, 4};
    PiecewiseLinear table = new PiecewiseLinear(x, y);
    for (int i = 0; i < x.length; i++) {
      assertThat(table.at(x[i])).isEqualTo(y[i]);
      assertThat(table.inverse(y[i])).isEqualTo(x[i]);
    }
    assertThat(table.at(2.5)).isCloseTo(0.5, within(1e-15));
    assertThat(table.segment(2.5)).isZero();
    assertThat(table.segment(-1)).isEqualTo(2);
    assertThat(table.segment(4)).isEqualTo(-1);
    assertThat(table.segment(Double.NaN)).isEqualTo(-1);
  }

  @Test
  void aTableMustRiseOrFall() {
    double[][][] refused = {
      {{1}, {1}},
      {{1, 2}, {1}},
      {{1, 1}, {1, 2}},
      {{1, 2, 3}, {1, 2, 2}},
      {{1, 2, 1.5}, {1, 2, 3}},
      {{1, Double.NaN}, {1, 2}},
      {{1, 2}, {1, Double.POSITIVE_INFINITY}}
    };
    for (double[][] points : refused) {
      assertThatThrownBy(() -> new PiecewiseLinear(points[0], points[1]))
          .isInstanceOf(IllegalArgumentException.class);
    }
  }

  /** TI SBAA532A, section 5: 2 mV/V at 15 V gives 30 mV at full load. */
  @Test
  void bridgeAtFullLoad() {
    assertThat(Bridge.output(2e-3, 15, 1)).isCloseTo(30e-3, within(1e-12));
  }

  /**
   * Two resistors in parallel (Thevenin): a quarter of the track in the middle, none at the ends.
   */
  @Test
  void wiperOfAPotentiometer() {
    assertThat(Potentiometer.wiperResistance(10e3, 0.5)).isEqualTo(2500);
    assertThat(Potentiometer.wiperResistance(10e3, 0.2))
        .isCloseTo(1 / (1 / 2e3 + 1 / 8e3), within(1e-9));
    assertThat(Potentiometer.wiperResistance(10e3, 1)).isZero();
    assertThat(Potentiometer.wiperResistance(10e3, 1.1)).isNaN();
  }

  /** IEC 60539-1, definition of the dissipation factor. */
  @Test
  void selfHeating() {
    assertThat(SelfHeating.rise(16e-3, 8e-3)).isEqualTo(2);
    assertThat(SelfHeating.rise(1e-3, 0)).isNaN();
  }
}
