package dev.settlewell.sensor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class ThermistorTest {
  /** The widely published coefficient set of a 10 kΩ thermistor. */
  @Test
  void steinhartHartPublishedSet() {
    Curve curve = Thermistor.steinhartHart(0.001129148, 0.000234125, 8.76741e-8);
    assertThat(curve.inverse(10e3)).isCloseTo(25.000, within(0.0005));
    assertThat(curve.at(25)).isCloseTo(10e3, within(1.0));
  }

  /** IEC 60539-1: B from R25 and R85 is what the beta curve of R25 gives back at 85 °C. */
  @Test
  void betaFromTwoResistances() {
    // B25/85 = ln(R25/R85) / (1/298.15 K - 1/358.15 K), worked by hand for R25/R85 = e².
    double beta = Thermistor.betaBetween(25, 10e3 * Math.E * Math.E, 85, 10e3);
    assertThat(beta).isCloseTo(2 * 298.15 * 358.15 / 60, within(1e-8));
    Curve curve = Thermistor.beta(10e3 * Math.E * Math.E, beta);
    assertThat(curve.at(25)).isCloseTo(10e3 * Math.E * Math.E, within(1e-9));
    assertThat(curve.at(85)).isCloseTo(10e3, within(1e-9));
    assertThat(curve.inverse(10e3)).isCloseTo(85, within(1e-10));
    assertThat(Thermistor.betaBetween(25, 1, 25, 2)).isNaN();
  }

  /** With C = 0 the equation is the beta model with B = 1/B₁. */
  @Test
  void steinhartHartHoldsTheBetaModel() {
    double b = 1 / 3435.0;
    double a = 1 / 298.15 - b * Math.log(10e3);
    Curve beta = Thermistor.beta(10e3, 3435);
    for (double c : new double[] {0, 1e-18}) {
      Curve curve = Thermistor.steinhartHart(a, b, c);
      for (double celsius = -60; celsius <= 300; celsius += 7.5) {
        assertThat(curve.at(celsius) / beta.at(celsius)).isCloseTo(1, within(1e-9));
      }
    }
  }

  @Test
  void refusesWhatIsNoThermistor() {
    assertThatThrownBy(() -> Thermistor.beta(0, 3435)).isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> Thermistor.beta(1e4, -1)).isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> Thermistor.steinhartHart(1e-3, -2e-4, 1e-7))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> Thermistor.steinhartHart(Double.NaN, 2e-4, 1e-7))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
