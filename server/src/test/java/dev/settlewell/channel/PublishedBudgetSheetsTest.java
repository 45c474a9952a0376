package dev.settlewell.channel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Published error budgets, each rebuilt as a sheet; 24 bits or more, so that codes cost nothing.
 */
class PublishedBudgetSheetsTest {

  private static Budget budget(String supplies, String converter, String channel) {
    String sheet =
        """
        channel-sheet: 1
        supplies:
        %sconverters:
          adc:
        %schannels:
          input:
        %s\
        """
            .formatted(supplies.indent(2), converter.indent(4), channel.indent(4));
    ChannelFigures figures = TestSheets.channel(sheet, "input");
    assertThat(figures.faults()).isEmpty();
    return figures.budget().orElseThrow();
  }

  private static double limit(Budget budget, String row) {
    return budget.rows().stream()
        .filter(r -> r.name().equals(row))
        .mapToDouble(BudgetRow::limit)
        .findFirst()
        .orElseThrow(() -> new AssertionError(row + " in " + budget.rows()));
  }

  /** Root of the summed squares of the limits, where all of them are rectangular. */
  private static double rootOfLimits(Budget budget) {
    assertThat(budget.rows()).allMatch(r -> r.distribution().equals("rectangular"));
    return Math.sqrt(3) * budget.combined();
  }

  /**
   * Reference drift for 1/2 LSB over 100 °C by the box method: Analog Devices MT-087, from memory.
   * The whole excursion counts, wherever the ambient lies in the box.
   */
  @ParameterizedTest
  @CsvSource({"8,19.53,0.005", "10,4.88,0.005", "12,1.22,0.005", "14,0.31,0.005", "16,0.08,0.005"})
  void referenceDriftByTheBox(int bits, double ppm, double tolerance) {
    Budget budget =
        budget(
            "ref: 10 V 1 ppm/K box 0 °C to 100 °C\n",
            "bits: %s\nreference: ref\n".formatted(bits),
            "measures: 0 V to 10 V\nambient: 20 °C to 30 °C\nsensor: {voltage: {}}\n");
    double lsb = 10 / Math.scalb(1.0, bits);
    // One ppm/K over 100 K is 1 mV of 10 V; it is a gain error of the reading, largest at the top.
    assertThat(lsb / 2 / limit(budget, "supply-ref-drift")).isCloseTo(ppm, within(tolerance));
    assertThat(budget.at()).isEqualTo(10);
  }

  /**
   * A 100:1 divider of ±5 % parts: SciPy, the single errors upwards add to 10.155 %, of which the
   * upper resistor's is 5.208 %, and the worst corner is 10.410 %. Downwards the lower resistor's
   * error is larger than upwards, 1 - 0.95 x 100 / 99.95 = 4.952 %, and a row states the larger.
   */
  @Test
  void cornerOfADividerIsWorseThanTheSum() {
    Budget budget =
        budget(
            "",
            "bits: 32\nreference: 2.5 V\n",
            """
            measures: 0 V to 200 V
            sensor: {voltage: {}}
            path:
              - divider: {upper: 99 kΩ ±5 %, lower: 1 kΩ ±5 %}
            """);
    assertThat(limit(budget, "divider-1-upper") / 2).isCloseTo(5.208, within(0.0006));
    assertThat(limit(budget, "divider-1-lower") / 2).isCloseTo(4.952, within(0.0006));
    assertThat(100 * budget.hardLimit() / 200).isCloseTo(10.410, within(0.0006));
  }

  /**
   * A bridge and its amplifier, linear sum in ppm of 100 mV: Analog Devices MT-066 rev 0, figure 1:
   * offset 550, bias current in 350 Ω 1.8, gain 1500, nonlinearity 40, common mode (5 V through 120
   * dB, here as an error of the level) 50. Its noise is peak to peak and stands apart below.
   */
  @Test
  void bridgeAndAmplifier() {
    Budget budget =
        budget(
            "excitation: 5 V\n",
            "bits: 32\nreference: 0.1 V\nintegral-nonlinearity: ±0.004 %\n",
            """
            measures: 0 N to 1000 N
            sensor: {bridge: {sensitivity: 20 mV/V, excitation: excitation, resistance: 350 Ω}}
            path:
              - amplifier:
                  gain: 1
                  gain-error: ±0.15 %
                  offset: ±55 µV
                  level: 0 V ±5 µV
                  bias-current: ±0.5 nA
                  flicker-noise: 280 nV
            """);
    double ppm = 1e6 / 1000;
    assertThat(ppm * limit(budget, "amplifier-1-offset")).isCloseTo(550, within(0.01));
    assertThat(ppm * limit(budget, "amplifier-1-bias-current")).isCloseTo(1.8, within(0.06));
    assertThat(ppm * limit(budget, "amplifier-1-gain")).isCloseTo(1500, within(0.01));
    assertThat(ppm * limit(budget, "nonlinearity")).isCloseTo(40, within(0.01));
    assertThat(ppm * limit(budget, "amplifier-1-level")).isCloseTo(50, within(0.01));
    // Peak to peak is 6.6 sigma (common practice) and the row's limit 3 sigma.
    assertThat(ppm * limit(budget, "flicker-noise") * 6.6 / 3).isCloseTo(2.8, within(0.01));
    double noise = ppm * limit(budget, "flicker-noise");
    // Gain times offset: the corner is a little above the sum.
    assertThat(ppm * budget.hardLimit() - noise + 2.8).isCloseTo(2145, within(1.5));
  }

  /** A shunt amplifier's offset, gain and linearity as root of squares: TI INA285-Q1, SBOS554C. */
  @ParameterizedTest
  @CsvSource({"0.20,0.40,0.45,0.005", "0.70,1.40,1.56,0.01"})
  void shuntAmplifier(String offset, String gain, double percent, double tolerance) {
    Budget budget =
        budget(
            "",
            """
            bits: 32
            reference: 1 V
            offset-error: ±%s %%
            gain-error: ±%s %%
            integral-nonlinearity: ±0.01 %%
            """
                .formatted(offset, gain),
            "measures: 0 V to 1 V\nsensor: {voltage: {}}\n");
    assertThat(budget.at()).isEqualTo(1);
    assertThat(100 * rootOfLimits(budget)).isCloseTo(percent, within(tolerance));
  }

  /**
   * National Instruments 6259 specifications: 1,920 µV at 10 V; gain 83 ppm of reading, offset 101
   * ppm of range, three sigma of the mean of 100 readings with 280 µV of noise.
   */
  @Test
  void dataAcquisitionCard() {
    Budget budget =
        budget(
            "",
            """
            bits: 32
            reference: 10 V
            offset-error: ±101 ppm
            gain-error: ±83 ppm
            noise: 280 µV
            """,
            "measures: 0 V to 10 V\naverage: 100\nsensor: {voltage: {}}\n");
    assertThat(1e6 * limit(budget, "noise")).isCloseTo(84, within(0.01));
    assertThat(1e6 * budget.hardLimit()).isCloseTo(1920, within(10.0));
  }

  /** Rosemount reference manual 00809-0100-4021, appendix A: worst case 0.145 °C, RSS 0.10 °C. */
  @Test
  void temperatureTransmitter() {
    Budget budget =
        budget(
            "",
            """
            bits: 32
            reference: 1 V
            offset-error: ±0.02 %
            integral-nonlinearity: ±0.015 %
            gain-error: ±0.01 %
            """,
            """
            measures: 0 °C to 100 °C
            sensor: {voltage: {output: 0 V to 1 V, accuracy: ±0.10 °C}}
            """);
    assertThat(budget.hardLimit()).isCloseTo(0.145, within(0.0005));
    assertThat(rootOfLimits(budget)).isCloseTo(0.10, within(0.005));
  }

  /** Four rows of the size given, at 1 V full scale and in millivolts. */
  private static Budget fourRows(Stream<String> sizes) {
    String[] each = sizes.toArray(String[]::new);
    return budget(
        "",
        """
        bits: 32
        reference: 1 V
        offset-error: ±%s
        integral-nonlinearity: ±%s
        gain-error: ±%s
        """
            .formatted(each[0], each[1], each[2]),
        "measures: 0 V to 1 V\nsensor: {voltage: {accuracy: ±%s}}\n".formatted(each[3]));
  }

  /** JCGM 101:2008, §9.2.2 (from memory): the sum of four N(0,1) lies within ±3.92 at 95 %. */
  @Test
  void fourNormalRows() {
    Budget budget = fourRows(Stream.of("0.1 % (k=1)", "0.1 % (k=1)", "0.1 % (k=1)", "0.1 % (k=1)"));
    assertThat(1e3 * budget.combined()).isCloseTo(2, within(1e-4));
    assertThat(1e3 * budget.expanded()).isCloseTo(3.92, within(0.005));
  }

  /** JCGM 101:2008, §9.2.3 (from memory; closed form 3.8794): four rectangles of unit variance. */
  @Test
  void fourRectangularRows() {
    String size = "0.1732050808 %";
    Budget budget = fourRows(Stream.of(size, size, size, size));
    assertThat(1e3 * budget.expanded()).isCloseTo(3.8794, within(0.0005));
    assertThat(budget.coverageFactor()).isCloseTo(3.8794 / 2, within(0.0003));
  }

  /** JCGM 101:2008, §9.2.4 (from memory): one rectangle ten times the others; 17.0, not 19.9. */
  @Test
  void oneDominatingRectangularRow() {
    String size = "0.1732050808 %";
    Budget budget = fourRows(Stream.of("1.732050808 %", size, size, size));
    assertThat(1e3 * budget.expanded()).isCloseTo(17.0, within(0.05));
    assertThat(1e3 * budget.hardLimit()).isCloseTo(Math.sqrt(3) * 13, within(0.05));
  }

  /** JCGM 100:2008, 4.3.4 and 4.3.7: a stated coverage divides by its factor, a limit by sqrt 3. */
  @ParameterizedTest
  @CsvSource({"0.3 %,normal,0", "0.2 % (k=2),normal,1", "0.3 % (k=3),normal,1"})
  void statedCoverage(String size, String distribution, double millivolts) {
    Budget budget =
        budget(
            "",
            "bits: 32\nreference: 1 V\ngain-error: ±%s\n".formatted(size),
            "measures: 0 V to 1 V\nsensor: {voltage: {}}\n");
    BudgetRow gain = budget.rows().get(0);
    if (millivolts == 0) {
      assertThat(gain.distribution()).isEqualTo("rectangular");
      assertThat(1e3 * gain.standard()).isCloseTo(3 / Math.sqrt(3), within(1e-9));
    } else {
      assertThat(gain.distribution()).isEqualTo(distribution);
      assertThat(1e3 * gain.standard()).isCloseTo(millivolts, within(1e-9));
      assertThat(gain.bounded()).isFalse();
      assertThat(1e3 * gain.limit()).isCloseTo(3 * millivolts, within(1e-9));
    }
  }

  /**
   * Averaging M with noise sigma: u² = (sigma² + 1/12)/M + b²/2 LSB²; SciPy, M = 16, the square
   * root of noise and quantization together.
   */
  @ParameterizedTest
  @CsvSource({"0.3,0.111", "0.4,0.124", "0.5,0.144"})
  void averagingBesideQuantization(String sigma, double lsb) {
    Budget budget =
        budget(
            "",
            "bits: 10\nreference: 1024 mV\nnoise: %s LSB\n".formatted(sigma),
            "measures: 0 V to 1 V\naverage: 16\nsensor: {voltage: {}}\n");
    assertThat(1e3 * budget.combined()).isCloseTo(lsb, within(0.0006));
  }

  /** TI SLAAE47A-style chain in one part: what acts in two ways adds before it is squared. */
  @Test
  void oneSupplyInTwoPlacesIsOneRow() {
    Budget budget =
        budget(
            "rail: 5 V ±1 %\n",
            "bits: 32\nreference: 5 V\n",
            """
            measures: 0 V to 4 V
            sensor: {voltage: {proportional-to: rail, output: 0 V to 4 V, resistance: 1 kΩ}}
            path:
              - pull-up: {resistor: 1 kΩ, to: rail}
            """);
    // (x + 5 V) / 2 scales with the rail as a whole: 1 % of 9 V at the top, told from x / 2.
    assertThat(limit(budget, "supply-rail")).isCloseTo(0.09, within(1e-6));
    assertThat(budget.rows().stream().filter(r -> r.name().startsWith("supply"))).hasSize(1);
  }
}
