package dev.settlewell.finding;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

/** Findings on circuits whose figures others have published: the message says their numbers. */
class PublishedFindingsTest {

  private static String message(String name, String sheet) {
    Judged judged = Judged.sheet(sheet);
    return judged.findings().stream()
        .filter(f -> f.name().equals(name))
        .findFirst()
        .map(f -> f.message() + " " + f.facts())
        .orElseThrow(() -> new AssertionError(name + " not among " + judged.shown()));
  }

  /**
   * Texas Instruments SLAU056, chapter on the 12-bit converter: 10 kΩ of source, 2 kΩ and 40 pF
   * inside, 12 bits, 800 ns on top: 5.13 µs (the source prints two decimals).
   */
  @Test
  void acquisitionOfTwelveBits() {
    String sheet =
        """
        channel-sheet: 1
        converters:
          adc:
            bits: 12
            reference: 2.5 V
            clock: 5 MHz
            conversion-cycles: 13
            hold-capacitor: 40 pF
            switch-resistance: 2 kΩ
            acquisition-overhead: 800 ns
            hold-starts-at: 0 V
        scans:
          all: {converter: adc, rate: 1 kHz, order: [source]}
        channels:
          source:
            measures: 0 V to 2.5 V
            sensor:
              voltage: {resistance: 10 kΩ}
            acquisition: 2 µs
        """;
    assertThat(message("acquisition-too-short", sheet)).contains("needs 5.13 µs");
  }

  /** ST UM0404: 100 nA through 50 kΩ are 5 mV, one count of 10 bits at 5 V (4.88 mV). */
  @Test
  void leakageOfOneCount() {
    String sheet =
        """
        channel-sheet: 1
        converters:
          adc: {bits: 10, reference: 5 V, pin-leakage: ±100 nA}
        scans:
          all: {converter: adc, rate: 1 kHz, order: [source]}
        channels:
          source:
            measures: 0 V to 4.5 V
            sensor:
              voltage: {resistance: 50 kΩ}
        """;
    assertThat(message("source-resistance-too-high", sheet)).contains("5.00 mV (1.02 LSB)");
  }

  /** An engineering forum's worked answer: 12 V into 5 V + 0.5 V through 330 Ω: 19.7 mA. */
  @Test
  void clampCurrentOfAnOverload() {
    String sheet =
        """
        channel-sheet: 1
        supplies: {five: 5 V}
        converters:
          adc: {bits: 10, supply: five, reference: five, clamp-voltage: 0.5 V, clamp-current: 5 mA}
        scans:
          all: {converter: adc, rate: 1 kHz, order: [source]}
        channels:
          source:
            measures: 0 V to 4.5 V
            sensor:
              voltage: {resistance: 0 Ω}
            path:
              - resistor: 330 Ω
            overload: 0 V to 12 V
        """;
    assertThat(message("pin-overstressed", sheet)).contains("19.7 mA");
  }

  /** Frequency Devices, Filter Design Guide: 140 Hz sampled at 100 Hz reads as 40 Hz. */
  @Test
  void whereALineLands() {
    String sheet =
        """
        channel-sheet: 1
        converters:
          adc: {bits: 12, reference: 2.5 V, clock: 1 MHz, conversion-cycles: 14}
        interferers:
          line: {frequency: 140 Hz, amplitude: 100 mV}
        scans:
          all: {converter: adc, rate: 100 Hz, order: [source]}
        channels:
          source:
            measures: 0.2 V to 2 V
            band: 45 Hz
            sensor:
              voltage: {resistance: 100 Ω}
            acquisition: 10 µs
            interferers: [line]
        """;
    assertThat(message("interferer-aliases-into-band", sheet)).contains("folds to 40.0 Hz,");
  }

  /** NAMUR NE 43: with 250 Ω the failure signal of 21.0 mA is 5.25 V, beyond a span of 5 V. */
  @Test
  void failureSignalOfALoop() {
    String sheet =
        """
        channel-sheet: 1
        converters:
          adc: {bits: 12, reference: 5 V}
        scans:
          all: {converter: adc, rate: 10 Hz, order: [loop]}
        channels:
          loop:
            measures: 4 mA to 21 mA
            sensor:
              current: {}
            path:
              - shunt: 250 Ω
        """;
    assertThat(message("over-range", sheet)).contains("reaches 5.25 V", "ends at 5.00 V");
  }

  /** 4095 x 16 = 65 520 fits 16 bits and 4095 x 32 = 131 040 takes 17: plain arithmetic. */
  @Test
  void bitsOfASum() {
    String sheet =
        """
        channel-sheet: 1
        converters:
          adc: {bits: 12, reference: 2.5 V}
        scans:
          all: {converter: adc, rate: 1 kHz, order: [source]}
        channels:
          source:
            measures: 0.2 V to 2 V
            sensor:
              voltage: {resistance: 100 Ω}
            average: 32
            accumulator: 16 bits
        """;
    assertThat(message("accumulator-overflows", sheet)).contains("takes 17 bits");
    assertThat(Judged.sheet(sheet.replace("average: 32", "average: 16")).names())
        .doesNotContain("accumulator-overflows");
  }
}
