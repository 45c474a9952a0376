package dev.settlewell.circuit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;

class RemediesTest {
  private static final Sampler SAMPLER = new Sampler(1e3, 10e-12);
  private static final List<Visit> VISIT = List.of(new Visit(0, 1e-6));

  /** One pole: k R = T / (C ln 2^(N+1)), the switch left out of the factor. */
  @Test
  void largestFactorOnTheResistancesOfABareSource() {
    Ladder ladder = new Ladder(new Drive.Resistive(15e3), List.of(new Rung.Series(5e3)));
    double expected = (1e-6 / (10e-12 * Math.log(8192)) - 1e3) / 20e3;
    assertThat(
            Remedies.largest(
                    k ->
                        Settling.residuals(ladder.scaledResistances(k), SAMPLER, VISIT, 1e-3)[0][0],
                    1 / 8192.0,
                    1e-6,
                    1e3)
                .orElseThrow())
        .isCloseTo(expected, within(1e-7 * expected));
  }

  /** Too short even for the switch alone. */
  @Test
  void noFactorSufficesWhereTheSwitchAloneIsTooSlow() {
    List<Visit> visit = List.of(new Visit(0, 50e-9));
    Ladder ladder = new Ladder(new Drive.Resistive(10e3), List.of());
    assertThat(
            Remedies.largest(
                k -> Settling.residuals(ladder.scaledResistances(k), SAMPLER, visit, 1e-3)[0][0],
                1 / 8192.0,
                1e-6,
                1e3))
        .isEmpty();
  }

  /** Small capacitances suffice too, but the answer is that of the reservoir's branch. */
  @Test
  void smallestReservoirIsOnTheLargeBranch() {
    assertThat(error(0)).isLessThan(1 / 8192.0);
    assertThat(error(100e-12)).isGreaterThan(0.03);
    double smallest = Remedies.smallest(RemediesTest::error, 1 / 8192.0, 1e-12, 1e-3).orElseThrow();
    // Charge sharing C_hold (2^(N+1) - 1) within a few per cent, for the source hardly helps.
    assertThat(smallest).isCloseTo(8191 * 10e-12, within(0.05 * 82e-9));
    assertThat(error(smallest * 1.0001)).isLessThan(1 / 8192.0);
    assertThat(error(smallest / 1.0001)).isGreaterThan(1 / 8192.0);
  }

  private static double error(double farads) {
    Ladder ladder = new Ladder(new Drive.Resistive(9e3), List.of(new Rung.Capacitor(farads)));
    return Settling.residuals(ladder, SAMPLER, VISIT, 0.1)[0][0];
  }

  /** Mean current times resistance stays, however large the reservoir. */
  @Test
  void noReservoirSufficesWhereTheSourceRechargesTooSlowly() {
    assertThat(
            Remedies.smallest(
                farads ->
                    Settling.residuals(
                        new Ladder(new Drive.Resistive(100e3), List.of(new Rung.Capacitor(farads))),
                        SAMPLER,
                        VISIT,
                        1e-4)[0][0],
                1 / 8192.0,
                1e-12,
                1))
        .isEmpty();
  }

  @Test
  void allValuesMaySuffice() {
    assertThat(Remedies.largest(k -> 0, 1, 1e-3, 1e3)).hasValue(1e3);
    assertThat(Remedies.smallest(k -> 0, 1, 1e-3, 1e3)).hasValue(1e-3);
    assertThat(Remedies.largest(k -> Double.NaN, 1, 1e-3, 1e3)).isEmpty();
  }
}
