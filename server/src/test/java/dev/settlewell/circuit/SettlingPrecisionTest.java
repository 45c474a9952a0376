package dev.settlewell.circuit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Values many decades apart against the 60-digit solution of {@link ExactLadder}. */
class SettlingPrecisionTest {
  /** Of full scale, a step of one volt. */
  private static final double TOLERANCE = 1e-9;

  @Test
  void passiveCircuitsOfExtremeValuesKeepTheirDigits() {
    for (long seed = 1; seed <= 40; seed++) {
      RandomCircuits random = new RandomCircuits(seed);
      agree(seed, random, new Drive.Resistive(random.logarithmic(1e-2, 1e12)));
    }
  }

  @Test
  void amplifiersOfExtremeValuesKeepTheirDigits() {
    for (long seed = 1; seed <= 15; seed++) {
      RandomCircuits random = new RandomCircuits(seed);
      Drive.ClosedLoop loop =
          new Drive.ClosedLoop(random.logarithmic(1, 1e4), random.logarithmic(1e2, 1e9));
      agree(seed, random, loop);
    }
  }

  private static void agree(long seed, RandomCircuits random, Drive drive) {
    List<Rung> rungs = new ArrayList<>();
    rungs.add(new Rung.Capacitor(random.logarithmic(1e-15, 1e-4)));
    int sections = random.below(3);
    for (int i = 0; i < sections; i++) {
      rungs.add(new Rung.Series(random.logarithmic(1e-2, 1e9)));
      rungs.add(new Rung.Capacitor(random.logarithmic(1e-15, 1e-4)));
    }
    Sampler sampler = new Sampler(random.logarithmic(1e-2, 1e5), random.logarithmic(1e-13, 1e-9));
    double acquisition = random.logarithmic(1e-8, 1e-4);
    double rest = random.logarithmic(1e-7, 1);
    Ladder ladder = new Ladder(drive, rungs);
    double actual =
        Settling.residuals(ladder, sampler, List.of(new Visit(0, acquisition)), acquisition + rest)[
            0][0];
    assertThat(actual)
        .as("seed %d: %s, %s, %s s and %s s", seed, ladder, sampler, acquisition, rest)
        .isCloseTo(new ExactLadder(ladder, sampler).residual(acquisition, rest), within(TOLERANCE));
  }
}
