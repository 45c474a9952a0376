package dev.settlewell.channel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Published settling figures, each written as the sheet that states it. */
class PublishedSettlingSheetsTest {

  /** One channel over the whole span of 1 V, whose hold capacitor starts each visit at 0 V. */
  private static String sheet(String converter, String rate, String channel) {
    return """
    channel-sheet: 1
    converters:
      adc:
        reference: 1 V
        hold-starts-at: 0 V
    %sscans:
      only: {converter: adc, rate: %s, order: [input]}
    channels:
      input:
        measures: 0 V to 1 V
    %s\
    """
        .formatted(converter.indent(4), rate, channel.indent(4));
  }

  private static double figure(String sheet, String name) {
    ChannelFigures channel = TestSheets.channel(sheet, "input");
    assertThat(channel.faults()).isEmpty();
    OptionalDouble value = channel.figures().value(name);
    assertThat(value).as(name + " of " + channel.figures().get(name)).isPresent();
    return value.getAsDouble();
  }

  /** A bare source of 1 MΩ at 1 pF: one microsecond is one time constant. */
  private static double timeConstants(int bits, String allowance) {
    String sheet =
        sheet(
            """
            bits: %s
            clock: 10 MHz
            conversion-cycles: 10
            hold-capacitor: 1 pF
            switch-resistance: 0 Ω
            """
                .formatted(bits),
            "1 kHz",
            """
            sensor: {voltage: {resistance: 1 MΩ}}
            acquisition: 1 µs
            settle-within: %s
            """
                .formatted(allowance));
    return figure(sheet, "required-acquisition") / 1e-6;
  }

  /** Analog Devices AN-1024 Rev. 0, Table 1: time constants to 1 LSB. */
  @ParameterizedTest
  @CsvSource({
    "6,4.16",
    "8,5.55",
    "10,6.93",
    "12,8.32",
    "14,9.70",
    "16,11.09",
    "18,12.48",
    "20,13.86",
    "22,15.25"
  })
  void timeConstantsToOneLsb(int bits, double printed) {
    assertThat(timeConstants(bits, "1 LSB")).isCloseTo(printed, within(0.0051));
  }

  /** Texas Instruments SBAA201A, Table 3-1: time constants to 1/2 LSB, the usual allowance. */
  @ParameterizedTest
  @CsvSource({"16,11.78", "18,13.17", "20,14.56", "22,15.94", "24,17.33"})
  void timeConstantsToHalfAnLsb(int bits, double printed) {
    assertThat(timeConstants(bits, "0.5 LSB")).isCloseTo(printed, within(0.0051));
  }

  /**
   * Texas Instruments SLAU056, chapter ADC12, and MSP430x1xx Family User's Guide, page 18-8:
   * sampling time with a fixed part.
   */
  @ParameterizedTest
  @CsvSource({"12, 40 pF, 800 ns, 5.13", "10, 20 pF, 800 ns, 2.63", "10, 20 pF, 2.5 µs, 4.33"})
  void samplingTimeOfDataSheets(int bits, String hold, String overhead, double microseconds) {
    String sheet =
        sheet(
            """
            bits: %s
            clock: 5 MHz
            conversion-cycles: 13
            hold-capacitor: %s
            switch-resistance: 2 kΩ
            acquisition-overhead: %s
            """
                .formatted(bits, hold, overhead),
            "1 kHz",
            """
            sensor: {voltage: {resistance: 10 kΩ}}
            acquisition: 8 µs
            """);
    assertThat(figure(sheet, "required-acquisition") * 1e6).isCloseTo(microseconds, within(0.0051));
  }

  /** ST STM32F103x4/x6 data sheet (15060 Rev 6), Table 47: 14 MHz, 12 bit, 1/4 LSB. */
  @ParameterizedTest
  @CsvSource({"1.5,0.4", "7.5,5.9", "13.5,11.4", "28.5,25.2", "41.5,37.2"})
  void largestSourceResistance(String cycles, double kilohms) {
    String sheet =
        sheet(
            """
            bits: 12
            clock: 14 MHz
            conversion-cycles: 12.5
            acquisition-cycles: [1.5, 7.5, 13.5, 28.5, 41.5]
            hold-capacitor: 8 pF
            switch-resistance: 1 kΩ
            """,
            "1 kHz",
            """
            sensor: {voltage: {resistance: 100 Ω}}
            acquisition: %s cycles
            settle-within: 0.25 LSB
            """
                .formatted(cycles));
    assertThat(figure(sheet, "largest-source-resistance") / 1e3).isCloseTo(kilohms, within(0.051));
  }

  /** Motorola M68HC16 Z-series User's Manual, Table 8-10: 7.6 in every cell, 10 bit, 1/2 count. */
  @ParameterizedTest
  @CsvSource({
    "100 Ω, 100 pF, 76e-9",
    "100 Ω, 10 nF, 7.6e-6",
    "1 kΩ, 10 nF, 76e-6",
    "10 kΩ, 1 nF, 76e-6",
    "100 kΩ, 100 pF, 76e-6",
    "10 kΩ, 100 nF, 7.6e-3",
    "100 kΩ, 1 µF, 0.76"
  })
  void settlingTimeOfAnInput(String ohms, String farads, double seconds) {
    String sheet =
        sheet(
            """
            bits: 10
            clock: 2 MHz
            conversion-cycles: 16
            hold-capacitor: %s
            switch-resistance: 0 Ω
            """
                .formatted(farads),
            "0.5 Hz",
            """
            sensor: {voltage: {resistance: %s}}
            acquisition: 1 µs
            """
                .formatted(ohms));
    double found = figure(sheet, "required-acquisition");
    assertThat(found).isCloseTo(seconds, within(0.005 * seconds));
  }

  /**
   * Reservoir of {@code farads} behind {@code ohms}, hold 1.6 pF, 12 bit, 0.1 µs of acquisition.
   */
  private static String reservoir(String rate, String ohms, String farads, String within) {
    return sheet(
        """
        bits: 12
        clock: 10 MHz
        conversion-cycles: 13
        hold-capacitor: 1.6 pF
        switch-resistance: 100 Ω
        """,
        rate,
        """
        sensor: {voltage: {resistance: %s}}
        path:
          - capacitor: %s
        acquisition: 0.1 µs
        settle-within: %s
        """
            .formatted(ohms, farads, within));
  }

  /** Texas Instruments SPRUI07, §7.2.2.2.2: C_hold 2^n / allowance for a quarter of an LSB. */
  @Test
  void smallestReservoirForAQuarterLsb() {
    String sheet = reservoir("1 Hz", "100 kΩ", "33 nF", "0.25 LSB");
    assertThat(figure(sheet, "smallest-reservoir") / 1e-9).isCloseTo(26.2, within(0.05));
  }

  /**
   * Texas Instruments SPRUI07, §7.2.2.2.2: 33 nF recovers in 1 ms within two time constants behind
   * 15.2 kΩ. What remains then, by Table 7-2, is 1/(1 - e^-2) of what a single share leaves.
   */
  @Test
  void largestSourceThatRechargesTheReservoir() {
    double single = 1.6e-12 / 33e-9 * 4096;
    double allowance = single / (1 - StrictMath.exp(-2));
    String sheet = reservoir("1 kHz", "1 kΩ", "33 nF", allowance + " LSB");
    assertThat(figure(sheet, "largest-source-resistance") / 1e3).isCloseTo(15.2, within(0.1));
  }

  /** Texas Instruments SPRUI07, Table 7-2: accumulated droop over single-shot error, in %. */
  @ParameterizedTest
  @CsvSource({"0.25,352", "0.5,154", "0.75,90", "1,58", "2,16", "3,5", "4,2", "5,1"})
  void accumulatedDroop(double timeConstants, double percent) {
    double hertz = 1 / (timeConstants * 10e3 * 100e-9);
    double error =
        figure(reservoir(hertz + " Hz", "10 kΩ", "100 nF", "1 LSB"), "settling-error-lsb");
    double single = 1.6e-12 / 100e-9 * 4096;
    assertThat(100 * (error / single - 1)).isCloseTo(percent, within(0.55));
  }

  /**
   * Mean current acts as a resistance 1/(f C): ST ST10F276 data sheet, 250 kHz and 4 pF give 1 MΩ;
   * Freescale MPC5604B/C data sheet Rev 9, 1 MHz and 3 pF give 330 kΩ (rounded from 333).
   */
  @ParameterizedTest
  @CsvSource({"250 kHz, 4 pF, 1000, 5", "1 MHz, 3 pF, 330, 5"})
  void meanCurrentActsAsAResistance(String rate, String hold, double kilohms, double tolerance) {
    String sheet =
        sheet(
            """
            bits: 12
            clock: 100 MHz
            conversion-cycles: 13
            hold-capacitor: %s
            switch-resistance: 100 Ω
            """
                .formatted(hold),
            rate,
            """
            sensor: {voltage: {resistance: 10 kΩ}}
            path:
              - capacitor: 1 µF
            acquisition: 50 ns
            """);
    double error = Math.abs(figure(sheet, "settling-error"));
    // The pin stands at 1 V - error, and the source's resistance carries the mean current.
    assertThat(10 * (1 - error) / error).isCloseTo(kilohms, within(tolerance));
  }

  /** 10 kΩ, switch 1 kΩ, 10 pF, 12 bit, a full-scale step from 0 V. */
  private static String tenPicofarads(String rate, String acquisition, String path) {
    return sheet(
        """
        bits: 12
        clock: 100 MHz
        conversion-cycles: 13
        hold-capacitor: 10 pF
        switch-resistance: 1 kΩ
        """,
        rate,
        """
        sensor: {voltage: {resistance: 10 kΩ}}
        path: [%s]
        acquisition: %s
        """
            .formatted(path, acquisition));
  }

  /** None, in between, a reservoir: the exact solution of the two-capacitor circuit, SciPy. */
  @ParameterizedTest
  @CsvSource({
    "'',1 kHz,0.46,0.005",
    "10 pF,1 kHz,16.4,0.05",
    "47 pF,1 kHz,129,0.5",
    "100 pF,1 kHz,153,0.5",
    "1 nF,1 kHz,36.8,0.05",
    "10 nF,1 kHz,4.05,0.005",
    "82 nF,1 kHz,0.71,0.005",
    "1 µF,1 kHz,0.43,0.005",
    "82 nF,10 kHz,4.34,0.005",
    "1 µF,10 kHz,4.11,0.005"
  })
  void threeRegimesOfAnExternalCapacitor(String farads, String rate, double lsb, double tolerance) {
    String path = farads.isEmpty() ? "" : "capacitor: " + farads;
    assertThat(figure(tenPicofarads(rate, "1 µs", path), "settling-error-lsb"))
        .isCloseTo(lsb, within(tolerance));
  }

  /** 47 to 220 pF: the worst lies inside the box; SciPy, ends 129 and 116, inside 154 LSB. */
  @ParameterizedTest
  @CsvSource({"47 pF,129", "220 pF,116", "'{min: 47 pF, typical: 100 pF, max: 220 pF}',154"})
  void worstCapacitanceLiesInsideItsTolerance(String farads, double lsb) {
    String sheet = tenPicofarads("1 kHz", "1 µs", "capacitor: " + farads);
    assertThat(figure(sheet, "settling-error-lsb")).isCloseTo(lsb, within(0.5));
  }

  /** The fastest clock shortens an acquisition in cycles; SciPy, -5 %, nominal, +5 %. */
  @ParameterizedTest
  @CsvSource({"95 MHz,0.18", "100 MHz,0.30", "105 MHz,0.48", "100 MHz ±5 %,0.48"})
  void fastestClockIsWorst(String clock, double lsb) {
    String sheet =
        tenPicofarads("1 kHz", "104.6 cycles", "").replace("clock: 100 MHz", "clock: " + clock);
    assertThat(figure(sheet, "settling-error-lsb")).isCloseTo(lsb, within(0.005));
  }

  /** A wiper's resistance is zero at both ends; SciPy, middle 0.215, worst 0.257 LSB at 2/3. */
  @ParameterizedTest
  @CsvSource({
    "0 mm to 100 mm,0.257,66.7,1",
    "49.999 mm to 50 mm,0.215,50,0.01",
    "99.899 mm to 99.9 mm,0.04,99.9,0.01"
  })
  void wiperIsWorstInsideItsTravel(String measures, double lsb, double at, double near) {
    String sheet =
        """
        channel-sheet: 1
        supplies:
          ref: 1 V
        converters:
          adc:
            bits: 12
            reference: ref
            clock: 10 MHz
            conversion-cycles: 13
            hold-capacitor: 10 pF
            switch-resistance: 1 kΩ
            hold-starts-at: 0 V
        scans:
          only: {converter: adc, rate: 1 kHz, order: [input]}
        channels:
          input:
            measures: %s
            sensor: {potentiometer: {resistance: 40 kΩ, across: ref, spans: 0 mm to 100 mm}}
            path:
              - capacitor: 1 µF
            acquisition: 0.2 µs
        """
            .formatted(measures);
    ChannelFigures channel = TestSheets.channel(sheet, "input");
    Figure worst = channel.figures().get("settling-error-lsb").orElseThrow();
    assertThat(worst.value().orElseThrow()).isCloseTo(lsb, within(lsb == 0.04 ? 0.005 : 0.0006));
    assertThat(1e3 * worst.at().orElseThrow()).isCloseTo(at, within(near));
  }

  /**
   * Two visits 22 and 980 µs apart leave 2.01 and 3.61 LSB of half a full-scale step (SciPy); the
   * mean spacing would say 2.02.
   */
  @Test
  void unevenVisitsHaveTheirTrueInstants() {
    String sheet =
        """
        channel-sheet: 1
        converters:
          adc:
            bits: 12
            reference: 2 V
            clock: 10 MHz
            conversion-cycles: 90
            hold-capacitor: 10 pF
            switch-resistance: 1 kΩ
            hold-starts-at: 0 V
        scans:
          twice: {converter: adc, rate: 998.003992015968 Hz, order: [input, between, input]}
        channels:
          input:
            measures: 0 V to 1 V
            sensor: {voltage: {resistance: 10 kΩ}}
            path:
              - capacitor: 10 nF
            acquisition: 2 µs
          between:
            measures: 0 V to 1 V
            sensor: {voltage: {resistance: 10 kΩ}}
            path:
              - capacitor: 10 nF
            acquisition: 2 µs
        """;
    assertThat(figure(sheet, "settling-error-lsb")).isCloseTo(3.61, within(0.005));
  }

  /** A resistance that no acquisition can do without: a bare source never is short of charge. */
  @ParameterizedTest
  @ValueSource(strings = {"1 kHz", "100 kHz"})
  void bareSourceNeedsTheSameTimeAtAnyRate(String rate) {
    double needed = figure(tenPicofarads(rate, "1 µs", ""), "required-acquisition");
    assertThat(needed).isCloseTo(11e3 * 10e-12 * StrictMath.log(8192), within(1e-12));
  }

  /** With Ohm's law: the DC resistance at the pin of a divider of 30 kΩ and 10 kΩ is 7.5 kΩ. */
  @Test
  void sourceResistanceIsTheThevenin() {
    String sheet =
        tenPicofarads("1 kHz", "1 µs", "{divider: {upper: 20 kΩ, lower: 10 kΩ}}, resistor: 500 Ω");
    assertThat(figure(sheet, "source-resistance")).isCloseTo(8000, within(1e-6));
  }

  /** ST 15060 Rev 6, Table 47, and Freescale data sheets: cycles over the clock. */
  @ParameterizedTest
  @CsvSource({
    "1.5,0.11,0.005",
    "7.5,0.54,0.005",
    "13.5,0.96,0.005",
    "28.5,2.04,0.005",
    "41.5,2.96,0.005",
    "55.5,3.96,0.005",
    "71.5,5.11,0.005",
    "239.5,17.1,0.05"
  })
  void acquisitionTimeOfOfferedCycles(String cycles, double microseconds, double tolerance) {
    String sheet = tenPicofarads("1 kHz", cycles + " cycles", "").replace("100 MHz", "14 MHz");
    assertThat(figure(sheet, "acquisition") * 1e6).isCloseTo(microseconds, within(tolerance));
    assertThat(figure(sheet, "acquisition-cycles")).isEqualTo(Double.parseDouble(cycles));
  }
}
