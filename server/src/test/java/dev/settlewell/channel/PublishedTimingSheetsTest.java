package dev.settlewell.channel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.apache.commons.math3.util.FastMath;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Published times, landings of lines and responses of filters, each written as a sheet. */
class PublishedTimingSheetsTest {

  private static String sheet(
      String clock, String conversion, String scan, String lines, String channel) {
    return """
    channel-sheet: 1
    converters:
      adc:
        bits: 12
        reference: 1 V
        clock: %s
        conversion-cycles: %s
        hold-capacitor: 0.001 pF
        switch-resistance: 1 Ω
    scans:
      only: {converter: adc, %s}
    interferers:
      line: {%s, amplitude: 1 mV}
    channels:
      input:
        measures: 0 V to 1 V
    %s\
    """
        .formatted(clock, conversion, scan, lines, channel.indent(4));
  }

  private static ChannelFigures channel(String scan, String lines, String channel) {
    ChannelFigures figures =
        TestSheets.channel(sheet("100 MHz", "10", scan, lines, channel), "input");
    assertThat(figures.faults()).isEmpty();
    return figures;
  }

  private static Alias alias(String rate, String frequency, String channel) {
    ChannelFigures figures =
        channel(
            "rate: %s, order: [input]".formatted(rate),
            "frequency: " + frequency,
            channel + "acquisition: 10 ns\ninterferers: [line]\n");
    assertThat(figures.aliases()).hasSize(1);
    return figures.aliases().get(0);
  }

  /**
   * National Instruments help 370592AB-01; Frequency Devices, Filter Design Guide; Wheeler and
   * Ganji, Introduction to Engineering Experimentation, chapter 5; a National Instruments paper on
   * aliasing (the last four, from memory).
   */
  @ParameterizedTest
  @CsvSource({
    "6 MHz,5 MHz,1e6",
    "100 Hz,140 Hz,40",
    "5 Hz,10 Hz,0",
    "100 Hz,25 Hz,25",
    "100 Hz,70 Hz,30",
    "100 Hz,160 Hz,40",
    "100 Hz,510 Hz,10"
  })
  void landsWherePublished(String rate, String frequency, double hertz) {
    Alias alias = alias(rate, frequency, "sensor: {voltage: {}}\n");
    assertThat(alias.landsLow()).isCloseTo(hertz, within(1e-6));
    assertThat(alias.landsHigh()).isCloseTo(hertz, within(1e-6));
    assertThat(alias.readsAsOffset()).isEqualTo(hertz == 0);
  }

  /** Tektronix: 100 kS/s over eight channels are 12.5 kS/s each, aliasing above 6.25 kHz. */
  @ParameterizedTest
  @CsvSource({"6.2 kHz,false", "6.3 kHz,true"})
  void eachChannelHasItsShareOfTheRate(String frequency, boolean aliased) {
    String others = "";
    for (int i = 2; i <= 8; i++) {
      others +=
          "other-%s: {measures: 0 V to 1 V, sensor: {voltage: {}}, acquisition: 2 µs}\n"
              .formatted(i);
    }
    String order = "input, other-2, other-3, other-4, other-5, other-6, other-7, other-8";
    String sheet =
        sheet(
                "1 MHz",
                "8",
                "rate: continuous, order: [%s]".formatted(order),
                "frequency: " + frequency,
                "sensor: {voltage: {}}\nacquisition: 2 µs\ninterferers: [line]\n")
            + others.indent(2);
    ChannelFigures figures = TestSheets.channel(sheet, "input");
    assertThat(figures.figures().value("result-rate").orElseThrow())
        .isCloseTo(12.5e3, within(1e-6));
    assertThat(figures.aliases().get(0).aliased()).isEqualTo(aliased);
  }

  private static double decibel(Alias alias) {
    return 20 * FastMath.log10(alias.gain());
  }

  /** Frequency Devices, Appendix A (1999): six poles, relative to the -3 dB corner. */
  @ParameterizedTest
  @CsvSource({
    "butterworth,800 Hz,-0.289,0.0005",
    "butterworth,900 Hz,-1.080,0.0005",
    "butterworth,1.1 kHz,-6.17,0.005",
    "butterworth,1.5 kHz,-21.2,0.06",
    "butterworth,2 kHz,-36.1,0.06",
    "butterworth,3 kHz,-57.3,0.06",
    "butterworth,5 kHz,-83.9,0.06",
    "butterworth,10 kHz,-120,0.6",
    "bessel,500 Hz,-0.728,0.0006",
    "bessel,800 Hz,-1.89,0.006",
    "bessel,1.2 kHz,-4.44,0.006",
    "bessel,2 kHz,-14.2,0.06",
    "bessel,3 kHz,-30.7,0.06",
    "bessel,5 kHz,-55.9,0.06",
    "bessel,10 kHz,-91.6,0.06"
  })
  void sixPoles(String response, String frequency, double printed, double tolerance) {
    Alias alias =
        alias(
            "1 MHz",
            frequency,
            """
            sensor: {voltage: {}}
            path:
              - filter: {response: %s, order: 6, corner: 1 kHz}
            """
                .formatted(response));
    assertThat(decibel(alias)).isCloseTo(printed, within(tolerance));
  }

  /**
   * Journal of Southwest Jiaotong University 10062: second order at ten times 1 kHz, against DC.
   * There the Chebyshev's ripple ends at 1 kHz; a sheet states the frequency 3 dB below DC, which
   * is sqrt((1 + sqrt(2 + 1/ε²)) / 2) times that, 1.169 for 3 dB.
   */
  @ParameterizedTest
  @CsvSource({
    "butterworth,1 kHz,-40,0.5",
    "bessel,1 kHz,-35.9,0.5",
    "chebyshev,'1.169 kHz, ripple: 3 dB',-43,0.5"
  })
  void twoPoles(String response, String corner, double printed, double tolerance) {
    Alias alias =
        alias(
            "1 MHz",
            "10 kHz",
            """
            sensor: {voltage: {}}
            path:
              - filter: {response: %s, order: 2, corner: %s}
            """
                .formatted(response, corner));
    assertThat(decibel(alias)).isCloseTo(printed, within(tolerance));
  }

  /** Two sections of 1 kΩ and 1 µF at 1/(2πRC): loaded 1/3 (-9.54 dB), buffered -6.02 dB. */
  @ParameterizedTest
  @CsvSource({"'',-9.54", "'  - amplifier: {gain: 1}',-6.02"})
  void sectionsLoadEachOther(String between, double printed) {
    String buffer = between.isEmpty() ? "" : between + "\n";
    Alias alias =
        alias(
            "1 MHz",
            "159.154943091895 Hz",
            """
            sensor: {voltage: {}}
            path:
              - resistor: 1 kΩ
              - capacitor: 1 µF
            %s  - resistor: 1 kΩ
              - capacitor: 1 µF
            """
                .formatted(buffer));
    assertThat(decibel(alias)).isCloseTo(printed, within(0.005));
  }

  /** ST UM0306 §19.7: 1.5 + 12.5 cycles of 14 MHz are 1 µs. */
  @Test
  void scanTimeOfOneConversion() {
    String sheet =
        sheet(
            "14 MHz",
            "12.5",
            "rate: 1 kHz, order: [input]",
            "frequency: 50 Hz",
            "sensor: {voltage: {}}\nacquisition: 1.5 cycles\n");
    double seconds =
        TestSheets.analyze(sheet).scans().get("only").figures().value("scan-time").orElseThrow();
    assertThat(seconds).isCloseTo(1e-6, within(1e-15));
  }

  /** Freescale MC68HC908MR32 data sheet: 16 or 17 cycles of 1 MHz. */
  @ParameterizedTest
  @CsvSource({"16,16e-6", "17,17e-6"})
  void conversionTime(String cycles, double seconds) {
    String sheet =
        sheet(
            "1 MHz",
            cycles,
            "rate: 1 kHz, order: [input]",
            "frequency: 50 Hz",
            "sensor: {voltage: {}}\nacquisition: 1 cycles\n");
    assertThat(
            TestSheets.analyze(sheet)
                .scans()
                .get("only")
                .figures()
                .value("conversion-time")
                .orElseThrow())
        .isCloseTo(seconds, within(1e-15));
  }

  /**
   * Signal-to-noise ratio that jitter leaves, -20 log10(2π f σ): 100 fs at 100 MHz 84 dB, at 1 GHz
   * 64 dB (glossary of converter terms).
   */
  @ParameterizedTest
  @CsvSource({"100 MHz,84", "1000 MHz,64"})
  void jitterOfAMovingQuantity(String frequency, double decibel) {
    ChannelFigures figures =
        channel(
            "rate: 1 MHz, order: [input], jitter: 0.1 ps",
            "frequency: 50 Hz",
            """
            sensor: {voltage: {}}
            acquisition: 10 ns
            band: {frequency: %s, amplitude: 0.5 V}
            """
                .formatted(frequency));
    double noise = PublishedRangeSheetsTest.row(figures, "jitter").standard();
    assertThat(20 * FastMath.log10(0.5 / Math.sqrt(2) / noise)).isCloseTo(decibel, within(0.5));
  }

  /**
   * Samples of a channel over one period of a mains line cancel it; a mean of 20 ms with ±1 % of
   * mains leaves 40 dB (common practice), and the clock's tolerance counts as much.
   */
  @ParameterizedTest
  @CsvSource({
    "50 Hz,1 kHz,-200,-60",
    "50 Hz ±1 %,1 kHz,-40.3,-39.7",
    "50 Hz,1 kHz ±1 %,-40.3,-39.7",
    "50 Hz ±1 %,1 kHz ±1 %,-34.4,-33.6"
  })
  void meanOfOneMainsPeriod(String line, String rate, double least, double most) {
    Alias alias = alias(rate, line, "average: 20\nsensor: {voltage: {}}\n");
    double gain = Math.max(alias.gain(), 1e-10);
    assertThat(20 * FastMath.log10(gain)).isBetween(least, most);
  }
}
