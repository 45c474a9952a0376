package dev.settlewell.channel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;

/** Budgets by random trials (JCGM 101) beside those by the characteristic function. */
class SimulationTest {
  private static String sheet(String needs, String sensor, String path) {
    return """
    channel-sheet: 1
    supplies:
      ref: 2.5 V
    converters:
      adc:
        bits: 24
        reference: ref
        clock: 8 MHz
        conversion-cycles: 14
        hold-capacitor: 5 pF
        switch-resistance: 1 kΩ
        noise: 0.1 LSB
    scans:
      all: {converter: adc, rate: 10 Hz, order: [a]}
    channels:
      a:
        measures: %s
        sensor:
          %s
        path:
          %s
        acquisition: 1 ms
    """
        .formatted(needs, sensor, path);
  }

  /**
   * A rectangle of half width a: 95 % of it lie within 0.95 a, its standard deviation is a/√3 (JCGM
   * 100:2008, 4.3.7).
   */
  @Test
  void oneRectangleHoldsNinetyFivePercentWithinItsShare() {
    String text =
        sheet("0 V to 1 V", "voltage: {output: 0 V to 1 V, accuracy: ±10 mV}", "- capacitor: 1 nF");
    Simulation trials = Analyzer.simulate(TestSheets.link(text), "a", 7, 200_000).get(0);
    assertThat(trials.expanded()).isEqualTo(0.0095, within(1e-5));
    assertThat(trials.standard()).isEqualTo(0.010 / Math.sqrt(3), within(3e-5));
    assertThat(trials.reach()).isGreaterThan(0.0094).isLessThanOrEqualTo(0.01);
    assertThat(trials.trials()).isEqualTo(200_000);
  }

  @Test
  void theSameSeedGivesTheSameFigures() {
    String text =
        sheet("0 V to 1 V", "voltage: {output: 0 V to 1 V, accuracy: ±10 mV}", "- capacitor: 1 nF");
    List<Simulation> first = Analyzer.simulate(TestSheets.link(text), "a", 3, 5_000);
    assertThat(Analyzer.simulate(TestSheets.link(text), "a", 3, 5_000)).isEqualTo(first);
    assertThat(Analyzer.simulate(TestSheets.link(text), "a", 4, 5_000)).isNotEqualTo(first);
  }

  /** A thermistor far out on its curve answers a wide tolerance unevenly: trials must say so. */
  @Test
  void aChannelFarFromLinearIsTold() {
    String text =
        sheet(
            "100 °C to 140 °C",
            "thermistor: {r25: 10 kΩ ±60 %, beta: 3950 K}",
            "- pull-up: {resistor: 10 kΩ, to: ref}");
    Simulation trials = Analyzer.simulate(TestSheets.link(text), "a", 1, 100_000).get(0);
    assertThat(trials.agrees()).isFalse();
    assertThat(trials.verdict()).contains("disagree");
  }
}
