package dev.settlewell.unit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What the grammar takes, and the value it takes it for; decimal prefixes by the SI Brochure. */
class ValuesAcceptedTest {
  private static final Expected ANY = Expected.of();
  private static final Expected OHM = Expected.of(Dimension.RESISTANCE);
  private static final Expected FARAD = Expected.of(Dimension.CAPACITANCE);
  private static final Expected VOLT = Expected.of(Dimension.VOLTAGE);
  private static final Expected POINT = Expected.of(Dimension.TEMPERATURE);
  private static final Expected DIFFERENCE =
      new Expected(List.of(Dimension.TEMPERATURE), Optional.empty(), true, false, false);

  @ParameterizedTest
  @CsvSource(
      quoteCharacter = '"',
      value = {
        "4.7 kΩ, 4700, Ω, RESISTANCE",
        "4.7 k\u2126, 4700, Ω, RESISTANCE",
        "4.7 kohm, 4700, Ω, RESISTANCE",
        "4.7 kOhm, 4700, Ω, RESISTANCE",
        "4.7\u00A0kΩ, 4700, Ω, RESISTANCE",
        "100 nF, 1e-7, F, CAPACITANCE",
        "100nF, 1e-7, F, CAPACITANCE",
        "1e-9 F, 1e-9, F, CAPACITANCE",
        "4.7 µF, 4.7e-6, F, CAPACITANCE",
        "4.7 μF, 4.7e-6, F, CAPACITANCE",
        "4.7 uF, 4.7e-6, F, CAPACITANCE",
        "12 MHz, 12e6, Hz, FREQUENCY",
        "50Hz, 50, Hz, FREQUENCY",
        "200 SPS, 200, Hz, FREQUENCY",
        "200 kSPS, 2e5, Hz, FREQUENCY",
        "200 S/s, 200, Hz, FREQUENCY",
        "2 MS/s, 2e6, Hz, FREQUENCY",
        "2.5 V, 2.5, V, VOLTAGE",
        "+5 V, 5, V, VOLTAGE",
        "-0.3 V, -0.3, V, VOLTAGE",
        "\u22120.3 V, -0.3, V, VOLTAGE",
        "20 mA, 0.02, A, CURRENT",
        "0.5 LSB, 0.5, LSB, LSB",
        "24 cycles, 24, cycles, CYCLES",
        "1 cycle, 1, cycles, CYCLES",
        "16 bits, 16, bits, BITS",
        "2 mm, 0.002, m, LENGTH",
        "2 kg, 2000, g, MASS",
        "-40 °C, -40, °C, TEMPERATURE",
        "-40 degC, -40, °C, TEMPERATURE",
        "-40 ℃, -40, °C, TEMPERATURE",
        "300 K, 26.85, °C, TEMPERATURE",
        "0 K, -273.15, °C, TEMPERATURE",
        "2 mV/V, 0.002, 1, RATIO",
        "50 %, 0.5, 1, RATIO",
        "25 ppm, 25e-6, 1, RATIO",
        "0.5 µV/K, 0.5e-6, V/K, VOLTAGE_DRIFT",
        "25 ppm/K, 25e-6, 1/K, RATIO_DRIFT",
        "25 ppm/°C, 25e-6, 1/K, RATIO_DRIFT",
        "10 V/µs, 1e7, V/s, SLEW_RATE",
        "10 V/us, 1e7, V/s, SLEW_RATE",
        "8 nV/√Hz, 8e-9, V/√Hz, VOLTAGE_NOISE_DENSITY",
        "8 nV/rtHz, 8e-9, V/√Hz, VOLTAGE_NOISE_DENSITY",
        "8 mW/K, 0.008, W/K, POWER_PER_KELVIN",
        "0.2 m/s, 0.2, m/s, OTHER",
        "200 mm/s, 0.2, m/s, OTHER",
        "3 dB, 3, dB, DECIBEL",
        "7 pH, 7, pH, WORD",
        "45 %RH, 45, %RH, WORD",
        "2 bar, 2, bar, WORD",
        "1500 rpm, 1500, rpm, WORD",
        "20 mS, 20, mS, WORD",
        "12 l/min, 12, l/min, WORD",
        "90 deg, 90, deg, WORD",
      })
  void quantity(String raw, double value, String symbol, Dimension dimension) {
    Toleranced read = accepted(Values.quantity(raw, ANY));
    assertThat(read.value()).isEqualTo(value);
    assertThat(read.unit().symbol()).isEqualTo(symbol);
    assertThat(read.unit().dimension()).isEqualTo(dimension);
    assertThat(read.deviation().isNone()).isTrue();
  }

  @Test
  void kelvinWhereADifferenceIsMeantStaysAsItIs() {
    assertThat(accepted(Values.quantity("3435 K ±0.7 %", DIFFERENCE)).value()).isEqualTo(3435);
    assertThat(accepted(Values.quantity("300 K", POINT)).unit()).isEqualTo(UnitTable.CELSIUS);
  }

  @ParameterizedTest
  @CsvSource({
    "4k7, 4700",
    "2R2, 2.2",
    "R47, 0.47",
    "1M, 1e6",
    "4K7, 4700",
    "47K, 47000",
    "0R1, 0.1",
    "L47, 0.00047",
    "4L7, 0.0047",
    "10 kΩ, 1e4",
    "1G, 1e9"
  })
  void resistorCode(String raw, double ohms) {
    Toleranced read = accepted(Values.component(raw, OHM));
    assertThat(read.value()).isEqualTo(ohms);
    assertThat(read.unit().dimension()).isEqualTo(Dimension.RESISTANCE);
  }

  @ParameterizedTest
  @CsvSource({
    "100n, 1e-7",
    "4p7, 4.7e-12",
    "1µ0, 1e-6",
    "1u0, 1e-6",
    "10p, 1e-11",
    "4m7, 0.0047",
    "100 nF, 1e-7",
    "p47, 0.47e-12",
    "2F, 2",
    "2 F, 2"
  })
  void capacitorCode(String raw, double farads) {
    Toleranced read = accepted(Values.component(raw, FARAD));
    assertThat(read.value()).isEqualTo(farads);
    assertThat(read.unit().dimension()).isEqualTo(Dimension.CAPACITANCE);
  }

  @Test
  void codeWithErrors() {
    Toleranced read = accepted(Values.component("1M ±1 % ±100 ppm/K", OHM));
    assertThat(read.value()).isEqualTo(1e6);
    assertThat(read.deviation().tolerances().get(0).plus()).isEqualTo(0.01);
    assertThat(read.deviation().drift().orElseThrow().perKelvin()).isEqualTo(1e-4);
  }

  @ParameterizedTest
  @CsvSource({
    "±1 %, 0.01, 0.01",
    "±1%, 0.01, 0.01",
    "± 1 %, 0.01, 0.01",
    "+-1 %, 0.01, 0.01",
    "+/-20 %, 0.2, 0.2",
    "+80/-20 %, 0.2, 0.8",
    "+80/-20%, 0.2, 0.8"
  })
  void toleranceOfAValue(String tolerance, double minus, double plus) {
    Toleranced read = accepted(Values.quantity("4.7 kΩ " + tolerance, OHM));
    assertThat(read.deviation().tolerances())
        .singleElement()
        .satisfies(
            t -> {
              assertThat(t.minus()).isEqualTo(minus);
              assertThat(t.plus()).isEqualTo(plus);
              assertThat(t.isShare()).isTrue();
              assertThat(t.of()).isEqualTo(Tolerance.Of.UNSAID);
            });
  }

  @Test
  void boxDrift() {
    Toleranced read = accepted(Values.quantity("2.5 V ±0.1 % 25 ppm/K box -40 °C to 125 °C", VOLT));
    Drift drift = read.deviation().drift().orElseThrow();
    assertThat(drift.perKelvin()).isEqualTo(25e-6);
    assertThat(drift.box().orElseThrow().low()).isEqualTo(-40);
    assertThat(drift.box().orElseThrow().high()).isEqualTo(125);
  }

  @Test
  void absoluteToleranceAndBasis() {
    Toleranced read = accepted(Values.quantity("2.5 V ±2 mV (k=2 n=10)", VOLT));
    assertThat(read.deviation().tolerances().get(0).plus()).isEqualTo(0.002);
    assertThat(read.deviation().basis()).contains(new Basis(2, OptionalInt.of(10)));
  }

  @Test
  void deviationOfReadingAndAbsolute() {
    Unit metre = UnitTable.read("m").orElseThrow();
    Expected accuracy =
        new Expected(List.of(Dimension.RATIO), Optional.of(metre), true, false, false);
    Deviation read = accepted(Values.deviation("±0.1 % of reading ±2 mm", accuracy));
    assertThat(read.tolerances()).hasSize(2);
    assertThat(read.tolerances().get(0).of()).isEqualTo(Tolerance.Of.READING);
    assertThat(read.tolerances().get(1).plus()).isEqualTo(0.002);
    assertThat(accepted(Values.deviation("±1 % of full scale", accuracy)).tolerances().get(0).of())
        .isEqualTo(Tolerance.Of.FULL_SCALE);
    assertThat(accepted(Values.deviation("±1 % of span", accuracy)).tolerances().get(0).of())
        .isEqualTo(Tolerance.Of.SPAN);
  }

  @Test
  void deviationAtAPoint() {
    Deviation read = accepted(Values.deviation("±80 nA at 85 °C", Expected.of(Dimension.CURRENT)));
    assertThat(read.tolerances().get(0).plus()).isEqualTo(80e-9);
    assertThat(read.at().orElseThrow().value()).isEqualTo(85);
  }

  @Test
  void driftAlone() {
    Expected volts = Expected.of(Dimension.VOLTAGE_DRIFT);
    Drift drift = accepted(Values.deviation("±0.5 µV/K", volts)).drift().orElseThrow();
    assertThat(drift.perKelvin()).isEqualTo(0.5e-6);
    assertThat(drift.unit().dimension()).isEqualTo(Dimension.VOLTAGE);
    Expected shares = Expected.of(Dimension.RATIO_DRIFT, Dimension.VOLTAGE_DRIFT);
    assertThat(accepted(Values.deviation("±10 ppm/°C", shares)).drift().orElseThrow().perKelvin())
        .isEqualTo(10e-6);
  }

  @Test
  void defaultsOfResistors() {
    Expected defaults = Expected.of(Dimension.RATIO, Dimension.RESISTANCE);
    Deviation read = accepted(Values.deviation("±1 % ±100 ppm/K", defaults));
    assertThat(read.tolerances()).hasSize(1);
    assertThat(read.drift()).isPresent();
  }

  @Test
  void needs() {
    Unit metre = UnitTable.read("m").orElseThrow();
    Expected measured =
        new Expected(List.of(Dimension.RATIO), Optional.of(metre), true, false, false);
    Need need = accepted(Values.need("±0.03 m", measured));
    assertThat(need.worstCase()).isFalse();
    assertThat(need.tolerances().get(0).plus()).isEqualTo(0.03);
    assertThat(accepted(Values.need("±0.03 m worst-case", measured)).worstCase()).isTrue();
    assertThat(accepted(Values.need("±1 % of reading ±2 mm", measured)).tolerances()).hasSize(2);
  }

  @ParameterizedTest
  @CsvSource({
    "0 °C to 40 °C, 0, 40",
    "0 to 6 m, 0, 6",
    "-20 to 20 A, -20, 20",
    "500 mV to 4.5 V, 0.5, 4.5",
    "0.5 MHz to 16 MHz, 5e5, 16e6",
    "273.15 K to 373.15 K, 0, 100",
    "0 bar to 10 bar, 0, 10",
    "0 to 100 %RH, 0, 100"
  })
  void range(String raw, double low, double high) {
    Range read = accepted(Values.range(raw, ANY));
    assertThat(read.low()).isCloseTo(low, within(1e-12));
    assertThat(read.high()).isCloseTo(high, within(1e-12));
  }

  @Test
  void outputRangeMayFall() {
    Range read = accepted(Values.outputRange("20 mA to 4 mA", Expected.of(Dimension.CURRENT)));
    assertThat(read.low()).isEqualTo(0.02);
    assertThat(read.high()).isEqualTo(0.004);
  }

  @Test
  void shareOfASupplyAndAmplitude() {
    Expected level = Expected.of(Dimension.VOLTAGE, Dimension.RATIO);
    Toleranced half = accepted(Values.quantity("50 % of ref", level));
    assertThat(half.of()).contains("ref");
    assertThat(half.value()).isEqualTo(0.5);
    assertThat(accepted(Values.quantity("50 % of logic-3v3 ±1 %", level)).of())
        .contains("logic-3v3");
    assertThat(accepted(Values.quantity("5 mV rms", VOLT)).amplitude())
        .contains(Toleranced.Amplitude.RMS);
    assertThat(accepted(Values.quantity("5 mV peak-to-peak ±10 %", VOLT)).amplitude())
        .contains(Toleranced.Amplitude.PEAK_TO_PEAK);
  }

  @Test
  void numbers() {
    assertThat(accepted(Values.number(Form.COUNT, "16"))).isEqualTo(16);
    assertThat(accepted(Values.number(Form.PLAIN, "-2.5"))).isEqualTo(-2.5);
    assertThat(accepted(Values.number(Form.PLAIN, "1.009249522e-3"))).isEqualTo(1.009249522e-3);
    assertThat(accepted(Values.number(Form.FRACTION, "1/8"))).isEqualTo(0.125);
    assertThat(accepted(Values.number(Form.RATIO, "20"))).isEqualTo(20);
    assertThat(accepted(Values.number(Form.RATIO, "20 V/V"))).isEqualTo(20);
    assertThat(accepted(Values.number(Form.RATIO, "26 dB"))).isCloseTo(19.9526, within(1e-4));
  }

  private static <T> T accepted(Reading<T> reading) {
    assertThat(reading.flaws()).isEmpty();
    return reading.value().orElseThrow();
  }
}
