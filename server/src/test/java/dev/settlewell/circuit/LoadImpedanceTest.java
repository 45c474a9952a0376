package dev.settlewell.circuit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;

class LoadImpedanceTest {
  @Test
  void nothingIsNoLoad() {
    assertThat(LoadImpedance.magnitude(List.of(new Rung.Series(10)), 1e6)).isInfinite();
    assertThat(LoadImpedance.magnitude(List.of(new Rung.Capacitor(1e-9)), 0)).isInfinite();
  }

  /** |R + 1/(j w C)| = sqrt(R^2 + 1/(w C)^2), any text on circuits. */
  @Test
  void seriesResistorAndCapacitor() {
    double reactance = 1 / (2 * Math.PI * 100e3 * 10e-9);
    assertThat(
            LoadImpedance.magnitude(
                List.of(new Rung.Series(120), new Rung.Capacitor(10e-9)), 100e3))
        .isCloseTo(Math.hypot(120, reactance), within(1e-9));
  }

  @Test
  void resistorsAtDirectCurrentAndBehindAShort() {
    List<Rung> divider =
        List.of(
            new Rung.Series(100),
            new Rung.Parallel(300),
            new Rung.Series(200),
            new Rung.Parallel(400),
            new Rung.Capacitor(1e-6));
    assertThat(LoadImpedance.magnitude(divider, 0)).isCloseTo(100 + 200, within(1e-9));
    List<Rung> shorted = List.of(new Rung.Series(47), new Rung.Parallel(0), new Rung.Series(1e3));
    assertThat(LoadImpedance.magnitude(shorted, 1e3)).isEqualTo(47);
  }
}
