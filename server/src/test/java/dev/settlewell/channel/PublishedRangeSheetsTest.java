package dev.settlewell.channel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import dev.settlewell.PublishedTable;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** Published figures of resolution, range, leakage and sensors, each written as a sheet. */
class PublishedRangeSheetsTest {

  /** A channel that no scan samples: what can be said of its voltages. */
  private static String sheet(String supplies, String converter, String channel) {
    return """
    channel-sheet: 1
    supplies:
    %sconverters:
      adc:
    %schannels:
      input:
    %s\
    """
        .formatted(supplies.indent(2), converter.indent(4), channel.indent(4));
  }

  private static ChannelFigures channel(String supplies, String converter, String channel) {
    ChannelFigures figures = TestSheets.channel(sheet(supplies, converter, channel), "input");
    assertThat(figures.faults()).isEmpty();
    return figures;
  }

  private static double value(ChannelFigures channel, String name) {
    return channel
        .figures()
        .value(name)
        .orElseThrow(() -> new AssertionError(name + ": " + channel.figures().get(name)));
  }

  private static ChannelFigures converter(String converter) {
    return channel("", converter, "measures: 0 V to 10 V\nsensor: {voltage: {resistance: 0 Ω}}\n");
  }

  static List<String[]> weights() {
    return PublishedTable.rows("lsb-vs-resolution");
  }

  /** Weight of one LSB at 10 V full scale and ideal signal-to-noise ratio: handbook table. */
  @ParameterizedTest
  @MethodSource("weights")
  void weightOfOneLsb(
      String bits,
      String codes,
      String printed,
      String percent,
      String printedDecibel,
      String exact,
      String ppm,
      String decibel,
      String noise,
      String snr) {
    ChannelFigures channel = converter("bits: %s\nreference: 10 V\n".formatted(bits));
    double lsb = Double.parseDouble(exact);
    assertThat(value(channel, "lsb")).isCloseTo(lsb, within(1e-11 * lsb));
    // Printed to three figures at most, the smallest weights to two.
    assertThat(value(channel, "lsb")).isCloseTo(Double.parseDouble(printed), within(0.006 * lsb));
    assertThat(value(channel, "ideal-snr")).isCloseTo(Double.parseDouble(snr), within(1e-4));
  }

  /** Analog Devices MT-001: 6.02 N + 1.76 dB. */
  @ParameterizedTest
  @CsvSource({"8,49.92", "10,61.96", "12,74.0", "14,86.04", "16,98.08"})
  void idealSignalToNoise(int bits, double decibel) {
    ChannelFigures channel = converter("bits: %s\nreference: 10 V\n".formatted(bits));
    assertThat(value(channel, "ideal-snr")).isCloseTo(decibel, within(0.02));
  }

  /** National Instruments AT-MIO-16X User Manual, appendix A: 0 to 10 V and ±10 V, 16 bit. */
  @ParameterizedTest
  @CsvSource({"single-ended,152.6", "bipolar,305.2"})
  void bipolarInputsDoubleTheSpan(String input, double microvolts) {
    ChannelFigures channel = converter("bits: 16\nreference: 10 V\ninput: %s\n".formatted(input));
    assertThat(1e6 * value(channel, "lsb")).isCloseTo(microvolts, within(0.05));
    assertThat(value(channel, "full-scale")).isEqualTo(input.equals("bipolar") ? 20 : 10);
  }

  /** kT/C of 1 pF at 300 K: handbook, 64.3 µV with k = 1.38e-23; 64.36 with the exact k. */
  @Test
  void noiseOfTheHoldCapacitor() {
    ChannelFigures channel =
        channel(
            "",
            "bits: 12\nreference: 10 V\nhold-capacitor: 1 pF\n",
            "measures: 0 V to 10 V\nambient: 0 °C to 26.85 °C\nsensor: {voltage: {}}\n");
    assertThat(1e6 * value(channel, "hold-capacitor-noise")).isCloseTo(64.36, within(0.005));
    assertThat(1e6 * value(channel, "noise")).isCloseTo(64.36, within(0.005));
  }

  /** Largest bias of an averaged quantizer: Widrow and Kollár 2008, from memory. */
  @ParameterizedTest
  @CsvSource({"0.25,0.0927,0.0015", "0.3,0.0539,0.0003", "0.4,0.0135,0.00005", "0.5,0.00229,5e-6"})
  void biasOfAnAveragedQuantizer(String sigma, double bias, double tolerance) {
    ChannelFigures channel =
        converter("bits: 12\nreference: 10 V\nnoise: %s LSB\n".formatted(sigma));
    assertThat(value(channel, "averaging-bias")).isCloseTo(bias, within(tolerance));
  }

  /** Two resistors of 1 kΩ ±1 % at 10 V: 4.95 to 5.05 V, exact corners. */
  @Test
  void cornersOfAHalvingDivider() {
    String path = "path:\n  - divider: {upper: 1 kΩ ±1 %, lower: 1 kΩ ±1 %}\n";
    String sensor = "sensor: {voltage: {}}\n";
    String adc = "bits: 12\nreference: 10 V\n";
    assertThat(value(channel("", adc, "measures: 0 V to 10 V\n" + sensor + path), "pin-high"))
        .isCloseTo(5.05, within(1e-9));
    assertThat(value(channel("", adc, "measures: 10 V to 11 V\n" + sensor + path), "pin-low"))
        .isCloseTo(4.95, within(1e-9));
  }

  /** 20 kΩ over 10 kΩ, ±1 %: +1.338 % and -1.329 % of the ratio (first order 1.333 %). */
  @Test
  void cornersOfAThirdingDivider() {
    String path = "path:\n  - divider: {upper: 20 kΩ ±1 %, lower: 10 kΩ ±1 %}\n";
    String sensor = "sensor: {voltage: {}}\n";
    String adc = "bits: 12\nreference: 10 V\n";
    double high = value(channel("", adc, "measures: 0 V to 9 V\n" + sensor + path), "pin-high");
    double low = value(channel("", adc, "measures: 9 V to 10 V\n" + sensor + path), "pin-low");
    assertThat(100 * (high / 3 - 1)).isCloseTo(1.338, within(0.0005));
    assertThat(100 * (low / 3 - 1)).isCloseTo(-1.329, within(0.0005));
  }

  /** Clamp current: engineering Q&A, 12 V against 5 V + 0.5 V through 330 Ω and 10 kΩ. */
  @ParameterizedTest
  @CsvSource({"330 Ω,19.7,0.05", "10 kΩ,0.65,0.005"})
  void currentIntoTheClamp(String ohms, double milliamperes, double tolerance) {
    ChannelFigures channel =
        channel(
            "logic: 5 V\n",
            "bits: 10\nreference: logic\nsupply: logic\nclamp-voltage: 0.5 V\n",
            """
            measures: 0 V to 5 V
            sensor: {voltage: {}}
            path:
              - resistor: %s
            overload: 0 V to 12 V
            """
                .formatted(ohms));
    assertThat(1e3 * value(channel, "overload-current")).isCloseTo(milliamperes, within(tolerance));
  }

  /** The clamp current is largest at the least supply and the least resistance: Ohm's law. */
  @Test
  void currentIntoTheClampTakesTheLeastSupply() {
    ChannelFigures channel =
        channel(
            "logic: 5 V ±10 %\n",
            "bits: 10\nreference: logic\nsupply: logic\nclamp-voltage: 0.5 V\n",
            """
            measures: 0 V to 5 V
            sensor: {voltage: {}}
            path:
              - resistor: 1 kΩ ±5 %
            overload: -2 V to 12 V
            """);
    assertThat(1e3 * value(channel, "overload-current-high"))
        .isCloseTo((12 - 4.5 - 0.5) / 0.95, within(1e-9));
    assertThat(1e3 * value(channel, "overload-current-low"))
        .isCloseTo((2 - 0.5) / 0.95, within(1e-9));
  }

  /**
   * Leakage through the source resistance: Motorola M68HC16 Z-series User's Manual, Table 8-11, 10
   * bit and 5.12 V; ST UM0404, 100 nA through 50 kΩ is one count of 5 V.
   */
  @ParameterizedTest
  @CsvSource({
    "10 kΩ,100 nA,5.12 V,0.2,0.0005",
    "100 kΩ,50 nA,5.12 V,1,0.0005",
    "100 kΩ,1 µA,5.12 V,20,0.0005",
    "50 kΩ,100 nA,5 V,1,0.03"
  })
  void leakageThroughTheSource(
      String ohms, String leakage, String reference, double counts, double tolerance) {
    ChannelFigures channel =
        channel(
            "",
            "bits: 10\nreference: %s\npin-leakage: ±%s\n".formatted(reference, leakage),
            "measures: 0 V to 5 V\nsensor: {voltage: {resistance: %s}}\n".formatted(ohms));
    assertThat(value(channel, "leakage-error-lsb")).isCloseTo(counts, within(tolerance));
  }

  /** A leakage stated at one temperature doubles each 10 K above it: common practice. */
  @ParameterizedTest
  @CsvSource({"85,5e-3", "75,2.5e-3", "95,1e-2"})
  void leakageDoublesEachTenKelvin(String hottest, double volts) {
    ChannelFigures channel =
        channel(
            "",
            "bits: 10\nreference: 5 V\npin-leakage: ±100 nA at 85 °C\n",
            """
            measures: 0 V to 5 V
            ambient: 25 °C to %s °C
            sensor: {voltage: {resistance: 50 kΩ}}
            """
                .formatted(hottest));
    assertThat(value(channel, "leakage-error-measured")).isCloseTo(volts, within(1e-9));
    assertThat(channel.budget().orElseThrow().ambient()).isEqualTo(Double.parseDouble(hottest));
  }

  static Stream<String[]> platinum() {
    return PublishedTable.rows("pt100-iec60751").stream();
  }

  /** IEC 60751: a Pt100 driven by 1 mA gives its resistance in millivolts. */
  @ParameterizedTest
  @MethodSource("platinum")
  void platinumResistor(String celsius, String printed, String equation, String origin) {
    double t = Double.parseDouble(celsius);
    boolean top = t >= 849;
    String measures = top ? "0 °C to " + celsius + " °C" : celsius + " °C to 850 °C";
    ChannelFigures channel =
        channel(
            "",
            "bits: 16\nreference: 1 V\n",
            "measures: %s\nsensor: {rtd: {excitation: 1 mA}}\n".formatted(measures));
    double millivolts = 1e3 * value(channel, top ? "pin-nominal-high" : "pin-nominal-low");
    assertThat(millivolts).isCloseTo(Double.parseDouble(equation), within(1e-5));
    assertThat(millivolts).isCloseTo(Double.parseDouble(printed), within(0.0051));
  }

  static Stream<String[]> tolerances() {
    return PublishedTable.rows("pt100-tolerance").stream();
  }

  /** IEC 60751: the limit of a class, in °C, is a row of its own, at each temperature. */
  @ParameterizedTest
  @MethodSource("tolerances")
  void platinumClasses(String celsius, String classA, String ohmA, String classB, String ohmB) {
    double t = Double.parseDouble(celsius);
    String measures =
        t >= 850 ? "849.99 °C to 850 °C" : "%s °C to %s °C".formatted(celsius, t + 0.01);
    for (String[] each : new String[][] {{"A", classA}, {"B", classB}}) {
      if (each[1].isEmpty()) {
        continue;
      }
      ChannelFigures channel =
          channel(
              "",
              "bits: 24\nreference: 1 V\n",
              "measures: %s\nsensor: {rtd: {excitation: 1 mA, class: %s}}\n"
                  .formatted(measures, each[0]));
      BudgetRow row = row(channel, "sensor-class");
      double formula =
          each[0].equals("A") ? 0.15 + 0.002 * Math.abs(t) : 0.30 + 0.005 * Math.abs(t);
      assertThat(row.limit()).isCloseTo(formula, within(1e-4));
      assertThat(row.standard()).isCloseTo(row.limit() / Math.sqrt(3), within(1e-12));
    }
  }

  static Stream<String[]> typeK() {
    return everyTenth("thermocouple-k");
  }

  static Stream<String[]> typeJ() {
    return everyTenth("thermocouple-j");
  }

  static Stream<String[]> typeT() {
    return everyTenth("thermocouple-t");
  }

  private static Stream<String[]> everyTenth(String table) {
    return PublishedTable.rows(table).stream()
        .filter(row -> Integer.parseInt(row[0]) % 50 == 0 && Integer.parseInt(row[0]) > -200);
  }

  /** NIST SRD 60, Monograph 175; the cold junction stands at 0 °C. */
  @ParameterizedTest
  @MethodSource("typeK")
  void thermocoupleK(String celsius, String millivolts) {
    thermocouple("K", celsius, millivolts);
  }

  @ParameterizedTest
  @MethodSource("typeJ")
  void thermocoupleJ(String celsius, String millivolts) {
    thermocouple("J", celsius, millivolts);
  }

  @ParameterizedTest
  @MethodSource("typeT")
  void thermocoupleT(String celsius, String millivolts) {
    thermocouple("T", celsius, millivolts);
  }

  private static void thermocouple(String type, String celsius, String millivolts) {
    double t = Double.parseDouble(celsius);
    String measures = t < 200 ? celsius + " °C to 300 °C" : "0 °C to " + celsius + " °C";
    ChannelFigures channel = behindAmplifier(type, "0 °C to 0.001 °C", measures);
    double found = value(channel, t < 200 ? "pin-nominal-low" : "pin-nominal-high");
    // Printed to a microvolt; the cold junction's width costs 0.05 µV.
    assertThat(1e3 * found).isCloseTo(Double.parseDouble(millivolts), within(0.00056));
  }

  private static ChannelFigures behindAmplifier(String type, String cold, String measures) {
    return channel(
        "",
        "bits: 16\nreference: 100 mV\ninput: bipolar\n",
        """
        measures: %s
        sensor:
          thermocouple: {type: %s, cold-junction: {range: %s, accuracy: ±0.5 °C}}
        path:
          - amplifier: {gain: 1}
        """
            .formatted(measures, type, cold));
  }

  /** NIST tables: 4.096 mV with terminals at 25 °C is 124.3 °C, for the emf is added first. */
  @Test
  void coldJunctionAddsItsEmf() {
    ChannelFigures channel = behindAmplifier("K", "25 °C to 25.001 °C", "0 °C to 124.3 °C");
    // A tenth of a degree of type K is 4 µV.
    assertThat(1e3 * value(channel, "pin-nominal-high")).isCloseTo(4.096, within(0.0021));
  }

  /** Published set 0.001129148, 0.000234125, 8.76741e-8: 10 kΩ at 25.000 °C. */
  @Test
  void thermistorBySteinhartAndHart() {
    ChannelFigures channel =
        channel(
            "ref: 2 V\n",
            "bits: 12\nreference: ref\n",
            """
            measures: 0 °C to 25 °C
            sensor: {thermistor: {steinhart-hart: [0.001129148, 0.000234125, 8.76741e-8]}}
            path:
              - pull-up: {resistor: 10 kΩ, to: ref}
            """);
    // 0.0005 °C is 2e-5 of the resistance, a quarter of which shows at the pin.
    assertThat(value(channel, "pin-nominal-low")).isCloseTo(1, within(1.1e-5));
  }

  /** NAMUR NE 43: measuring 3.8 to 20.5 mA, failure at 3.6 and 21 mA; with 250 Ω. */
  @ParameterizedTest
  @CsvSource({"3.8 mA to 20.5 mA,0.95,5.125", "3.6 mA to 21.0 mA,0.90,5.25"})
  void currentLoopSignals(String measures, double low, double high) {
    ChannelFigures channel =
        channel(
            "",
            "bits: 12\nreference: 5.5 V\n",
            "measures: %s\nsensor: {current: {}}\npath:\n  - shunt: 250 Ω\n".formatted(measures));
    assertThat(value(channel, "pin-nominal-low")).isCloseTo(low, within(1e-12));
    assertThat(value(channel, "pin-nominal-high")).isCloseTo(high, within(1e-12));
  }

  /** Texas Instruments SBAA532A, §5: 2 mV/V at 15 V gives 30 mV at full load. */
  @Test
  void bridgeAtFullLoad() {
    ChannelFigures channel =
        channel(
            "excitation: 15 V\n",
            "bits: 16\nreference: 100 mV\n",
            """
            measures: 0 N to 200 N
            sensor: {bridge: {sensitivity: 2 mV/V, excitation: excitation, resistance: 350 Ω}}
            """);
    assertThat(1e3 * value(channel, "pin-nominal-high")).isCloseTo(30, within(1e-12));
  }

  /** A resistance without a current through it, a current without a shunt: the sheet lacks one. */
  @ParameterizedTest
  @CsvSource(
      delimiter = ';',
      value = {
        "0 °C to 50 °C; {thermistor: {r25: 10 kΩ, beta: 3950 K}}; resistor: 1 kΩ; pull-up",
        "0 °C to 50 °C; {rtd: {}}; capacitor: 1 nF; pull-up",
        "0 bar to 9 bar; {table: {points: [[0 bar, 10 Ω], [9 bar, 180 Ω]]}}; resistor: 1 kΩ;"
            + " pull-up",
        "4 mA to 20 mA; {current: {}}; resistor: 1 kΩ; shunt"
      })
  void sensorThatNothingDrives(String measures, String sensor, String path, String lacking) {
    ChannelFigures channel =
        channel(
            "",
            "bits: 12\nreference: 3 V\n",
            "measures: %s\nsensor: %s\npath: [%s]\n"
                .formatted(measures.strip(), sensor.strip(), path.strip()));
    assertThat(channel.figures().get("lsb").orElseThrow().state())
        .isInstanceOfSatisfying(
            Figure.State.Missing.class,
            missing ->
                assertThat(missing.inputs())
                    .extracting(Figure.Input::pointer)
                    .containsExactly("/channels/input/path/" + lacking.strip()));
    assertThat(channel.budget()).isEmpty();
  }

  static BudgetRow row(ChannelFigures channel, String name) {
    return channel.budget().orElseThrow().rows().stream()
        .filter(r -> r.name().equals(name))
        .findFirst()
        .orElseThrow(() -> new AssertionError(name + " in " + channel.budget().get().rows()));
  }
}
