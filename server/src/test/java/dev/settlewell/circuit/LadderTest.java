package dev.settlewell.circuit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

class LadderTest {
  private static final Drive.Resistive CURRENT_SOURCE =
      new Drive.Resistive(Double.POSITIVE_INFINITY);

  /** A divider's Thevenin resistance is that of its halves in parallel. */
  @Test
  void dividerIsItsHalvesInParallel() {
    Ladder divider =
        new Ladder(new Drive.Resistive(0), List.of(new Rung.Series(30e3), new Rung.Parallel(10e3)));
    assertThat(divider.dcResistance()).isCloseTo(7.5e3, within(1e-9));
  }

  @Test
  void amplifierHoldsItsOutputAtDirectCurrent() {
    Ladder ladder =
        new Ladder(
            new Drive.ClosedLoop(200, 1e6),
            List.of(new Rung.Parallel(1e3), new Rung.Series(47), new Rung.Capacitor(1e-9)));
    assertThat(ladder.dcResistance()).isEqualTo(47);
  }

  @Test
  void currentSourceNeedsAPath() {
    assertThat(new Ladder(CURRENT_SOURCE, List.of(new Rung.Series(10))).dcResistance())
        .isInfinite();
    assertThat(
            new Ladder(CURRENT_SOURCE, List.of(new Rung.Parallel(250), new Rung.Series(10)))
                .dcResistance())
        .isEqualTo(260);
    assertThat(
            new Ladder(CURRENT_SOURCE, List.of(new Rung.Parallel(Double.POSITIVE_INFINITY)))
                .dcResistance())
        .isInfinite();
  }

  /** All resistances times k: the Thevenin resistance times k; capacitors stay. */
  @Test
  void scalesEveryResistanceAndNothingElse() {
    for (long seed = 1; seed <= 20; seed++) {
      Ladder ladder = new RandomCircuits(seed).passive().ladder();
      Ladder scaled = ladder.scaledResistances(3);
      assertThat(scaled.dcResistance())
          .as("seed %d", seed)
          .isCloseTo(3 * ladder.dcResistance(), within(1e-12 * ladder.dcResistance()));
      assertThat(capacitors(scaled)).isEqualTo(capacitors(ladder));
    }
    assertThat(new Ladder(new Drive.ClosedLoop(100, 1e6), List.of()).scaledResistances(3).drive())
        .isEqualTo(new Drive.ClosedLoop(300, 1e6));
    assertThat(new Ladder(CURRENT_SOURCE, List.of()).scaledResistances(0).drive())
        .isEqualTo(CURRENT_SOURCE);
  }

  private static List<Rung> capacitors(Ladder ladder) {
    List<Rung> capacitors = new ArrayList<>(ladder.rungs());
    capacitors.removeIf(rung -> !(rung instanceof Rung.Capacitor));
    return capacitors;
  }

  @Test
  void valuesOutsideTheirDomainAreRefused() {
    assertThatIllegalArgumentException().isThrownBy(() -> new Rung.Series(-1));
    assertThatIllegalArgumentException().isThrownBy(() -> new Rung.Series(Double.NaN));
    assertThatIllegalArgumentException()
        .isThrownBy(() -> new Rung.Capacitor(Double.POSITIVE_INFINITY));
    assertThatIllegalArgumentException().isThrownBy(() -> new Rung.Parallel(-1e-9));
    assertThatIllegalArgumentException().isThrownBy(() -> new Sampler(0, 0));
    assertThatIllegalArgumentException().isThrownBy(() -> new Drive.ClosedLoop(10, 0));
    assertThatIllegalArgumentException().isThrownBy(() -> new Visit(-1, 0));
  }
}
