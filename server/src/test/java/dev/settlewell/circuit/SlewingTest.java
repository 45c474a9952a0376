package dev.settlewell.circuit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;

class SlewingTest {
  private static final double HERTZ = 1e6;
  private static final double SLEW_RATE = 1e6;

  @Test
  void smallStepsStayLinear() {
    assertThat(Slewing.time(SLEW_RATE / (2 * Math.PI * HERTZ), SLEW_RATE, HERTZ)).isZero();
    assertThat(Slewing.time(5, Double.POSITIVE_INFINITY, HERTZ)).isZero();
  }

  /** Against stepping the slew-limited loop dv/dt = min(SR, w (1 - v)) through a large step. */
  @Test
  void largeStepsCostTheirTime() {
    double w = 2 * Math.PI * HERTZ;
    double step = 3;
    double v = 0;
    double t = 0;
    double dt = 1e-11;
    while (step - v > SLEW_RATE / w) {
      v += Math.min(SLEW_RATE, w * (step - v)) * dt;
      t += dt;
    }
    assertThat(Slewing.time(-step, SLEW_RATE, HERTZ)).isCloseTo(t, within(1e-10));
  }

  @Test
  void isolatingResistorAndPinCapacitorKeepTheStepFromTheOutput() {
    Sampler sampler = new Sampler(900, 10e-12);
    assertThat(Slewing.outputStep(100, List.of(), sampler)).isCloseTo(0.1, within(1e-15));
    assertThat(Slewing.outputStep(0, List.of(), sampler)).isZero();
    assertThat(
            Slewing.outputStep(
                100, List.of(new Rung.Series(300), new Rung.Capacitor(990e-12)), sampler))
        .isCloseTo(0.01 * 0.25, within(1e-15));
  }

  /** An upper bound of what the output really does, for any network in between. */
  @Test
  void outputNeverMovesFurther() {
    for (long seed = 1; seed <= 50; seed++) {
      RandomCircuits.Sampled circuit = new RandomCircuits(seed).passive();
      double bound = Slewing.outputStep(1e3, circuit.ladder().rungs(), circuit.sampler());
      double furthest = 0;
      IntegratedLadder integrated =
          new IntegratedLadder(
              new Ladder(new Drive.Resistive(1e3), circuit.ladder().rungs()), circuit.sampler());
      for (double t = circuit.period() * 1e-6; t < circuit.period(); t *= 3) {
        furthest = Math.max(furthest, integrated.outputAfterConnection(t));
      }
      assertThat(furthest).as("seed %d", seed).isLessThanOrEqualTo(bound * (1 + 1e-6));
    }
  }
}
