package dev.settlewell.circuit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;

/** The steady state against the independent integration of {@link IntegratedLadder}. */
class SettlingIntegrationTest {
  /** Of full scale, a step of one volt. */
  private static final double TOLERANCE = 1e-9;

  @Test
  void randomPassiveCircuitsAgreeWithTheIntegration() {
    for (long seed = 1; seed <= 200; seed++) {
      RandomCircuits.Sampled circuit = new RandomCircuits(seed).passive();
      agree("seed " + seed, circuit, new IntegratedLadder(circuit.ladder(), circuit.sampler()));
    }
  }

  @Test
  void randomCircuitsBehindAnAmplifierAgreeWithTheIntegration() {
    for (long seed = 1; seed <= 40; seed++) {
      RandomCircuits.Sampled circuit = new RandomCircuits(seed).amplified();
      double fastestRinging = Math.sqrt(2 * Math.PI * 1e6 / 10 / 1e-12);
      agree(
          "seed " + seed,
          circuit,
          new IntegratedLadder(circuit.ladder(), circuit.sampler())
              .withLongestStep(Math.max(0.03 / fastestRinging, circuit.period() / 3e4)));
    }
  }

  /** A plain matrix exponential overflows here: 10 kΩ and 10 pF are 10^5 times as fast as 10 ms. */
  @Test
  void stiffCircuitAgreesWithTheIntegration() {
    Ladder ladder =
        new Ladder(
            new Drive.Resistive(10e3),
            List.of(new Rung.Capacitor(10e-12), new Rung.Series(1e3), new Rung.Capacitor(1e-12)));
    Sampler sampler = new Sampler(1e3, 10e-12);
    RandomCircuits.Sampled circuit =
        new RandomCircuits.Sampled(ladder, sampler, List.of(new Visit(0, 1e-6)), 10e-3);
    agree("stiff", circuit, new IntegratedLadder(ladder, sampler));
  }

  private static void agree(
      String what, RandomCircuits.Sampled circuit, IntegratedLadder integrated) {
    double[][] expected = integrated.residuals(circuit.visits(), circuit.period());
    double[][] actual =
        Settling.residuals(circuit.ladder(), circuit.sampler(), circuit.visits(), circuit.period());
    for (int i = 0; i < expected.length; i++) {
      for (int j = 0; j < expected.length; j++) {
        assertThat(actual[i][j])
            .as("%s, visit %d by visit %d of %s", what, i, j, circuit)
            .isCloseTo(expected[i][j], within(TOLERANCE));
      }
    }
  }
}
