package dev.settlewell.circuit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Published figures of settling, reservoirs and mean current. */
class SettlingPublishedTest {
  private static final double NO_SWITCH = 0;

  private static double counts(int bits) {
    return Math.pow(2, bits);
  }

  private static Ladder bare(double ohms) {
    return new Ladder(new Drive.Resistive(ohms), List.of());
  }

  private static Ladder reservoir(double ohms, double farads) {
    return new Ladder(new Drive.Resistive(ohms), List.of(new Rung.Capacitor(farads)));
  }

  private static List<Visit> one(double acquisition) {
    return List.of(new Visit(0, acquisition));
  }

  /** Time for a full-scale step to come within an allowance, in LSB of the given resolution. */
  private static double required(Ladder ladder, Sampler sampler, int bits, double allowanceLsb) {
    OptionalDouble required =
        Settling.requiredAcquisition(
            ladder, sampler, one(1e-9), 100, new double[] {-counts(bits)}, allowanceLsb, 50);
    return required.orElseThrow();
  }

  /** Analog Devices AN-1024 Rev. 0, Table 1: time constants to 1 LSB. */
  @ParameterizedTest
  @CsvSource({
    "6, 4.16",
    "8, 5.55",
    "10, 6.93",
    "12, 8.32",
    "14, 9.70",
    "16, 11.09",
    "18, 12.48",
    "20, 13.86",
    "22, 15.25"
  })
  void timeConstantsToOneLsb(int bits, double printed) {
    double constant = 11e3 * 10e-12;
    double required = required(bare(10e3), new Sampler(1e3, 10e-12), bits, 1);
    assertThat(required / constant).isCloseTo(printed, within(0.005));
  }

  /** Texas Instruments SBAA201A, Table 3-1: time constants to 1/2 LSB. */
  @ParameterizedTest
  @CsvSource({"16, 11.78", "18, 13.17", "20, 14.56", "22, 15.94", "24, 17.33"})
  void timeConstantsToHalfAnLsb(int bits, double printed) {
    double constant = 11e3 * 10e-12;
    double required = required(bare(10e3), new Sampler(1e3, 10e-12), bits, 0.5);
    assertThat(required / constant).isCloseTo(printed, within(0.005));
  }

  /**
   * Sampling time with a fixed part for the converter's own delay: Texas Instruments SLAU056,
   * chapter ADC12 (40 pF), and MSP430x1xx Family User's Guide p. 18-8 (20 pF).
   */
  @ParameterizedTest
  @CsvSource({
    "10e3, 2e3, 40e-12, 12, 0.8, 5.13",
    "10e3, 2e3, 20e-12, 10, 0.8, 2.63",
    "10e3, 2e3, 20e-12, 10, 2.5, 4.33"
  })
  void samplingTimeOfDataSheets(
      double source, double input, double hold, int bits, double fixedMicros, double printed) {
    double required = required(bare(source), new Sampler(input, hold), bits, 0.5);
    assertThat(required * 1e6 + fixedMicros).isCloseTo(printed, within(0.005));
  }

  /** ST STM32F103x4/x6 data sheet (15060 Rev 6), Table 47: 14 MHz, 12 bit, 1/4 LSB, 1 kΩ, 8 pF. */
  @ParameterizedTest
  @CsvSource({"1.5, 0.4", "7.5, 5.9", "13.5, 11.4", "28.5, 25.2", "41.5, 37.2"})
  void largestSourceResistance(double cycles, double printedKilohms) {
    Sampler sampler = new Sampler(1e3, 8e-12);
    OptionalDouble largest =
        Remedies.largest(
            ohms -> Settling.residuals(bare(ohms), sampler, one(cycles / 14e6), 1)[0][0],
            0.25 / counts(12),
            1,
            1e6);
    assertThat(largest.orElseThrow() / 1e3).isCloseTo(printedKilohms, within(0.05));
  }

  /**
   * Motorola M68HC16 Z-series User's Manual, Table 8-10: the time to 1/2 count at 10 bits has the
   * mantissa 7.6 in every cell. The filter capacitor is the one that settles there.
   */
  @ParameterizedTest
  @CsvSource({
    "100, 100e-12, 76e-9",
    "100, 1e-9, 760e-9",
    "100, 10e-9, 7.6e-6",
    "100, 100e-9, 76e-6",
    "100, 1e-6, 760e-6",
    "1e3, 100e-12, 760e-9",
    "1e3, 1e-9, 7.6e-6",
    "1e3, 10e-9, 76e-6",
    "1e3, 100e-9, 760e-6",
    "1e3, 1e-6, 7.6e-3",
    "10e3, 100e-12, 7.6e-6",
    "10e3, 1e-9, 76e-6",
    "10e3, 10e-9, 760e-6",
    "10e3, 100e-9, 7.6e-3",
    "10e3, 1e-6, 76e-3",
    "100e3, 100e-12, 76e-6",
    "100e3, 1e-9, 760e-6",
    "100e3, 10e-9, 7.6e-3",
    "100e3, 100e-9, 76e-3",
    "100e3, 1e-6, 760e-3"
  })
  void settlingTimeOfAnInputFilter(double ohms, double farads, double printed) {
    double required = required(bare(ohms), new Sampler(NO_SWITCH, farads), 10, 0.5);
    assertThat(required).isCloseTo(printed, within(0.005 * printed));
  }

  /** Texas Instruments SPRUI07, section 7.2.2.2.2: 12 bit, 1/4 LSB, hold 1.6 pF: 26.2 nF. */
  @Test
  void smallestReservoirForAQuarterLsb() {
    Sampler sampler = new Sampler(100, 1.6e-12);
    OptionalDouble smallest =
        Remedies.smallest(
            farads -> Settling.residuals(reservoir(1e3, farads), sampler, one(5e-9), 1)[0][0],
            0.25 / counts(12),
            1e-12,
            1e-6);
    assertThat(smallest.orElseThrow() * 1e9).isCloseTo(26.2, within(0.05));
  }

  /**
   * Same section: with 33 nF the source recovers two time constants in 1 ms at 15.2 kΩ. Two time
   * constants mean an accumulated droop of 1/(1 - e^-2) single ones.
   */
  @Test
  void largestSourceThatRechargesTheReservoir() {
    Sampler sampler = new Sampler(100, 1.6e-12);
    double single = 1.6e-12 / (33e-9 + 1.6e-12);
    OptionalDouble largest =
        Remedies.largest(
            ohms -> Settling.residuals(reservoir(ohms, 33e-9), sampler, one(10e-9), 1e-3)[0][0],
            single / (1 - Math.exp(-2)),
            1e3,
            1e6);
    assertThat(largest.orElseThrow() / 1e3).isCloseTo(15.2, within(0.05));
  }

  /** Texas Instruments SPRUI07, Table 7-2: accumulated droop over the single-shot error. */
  @ParameterizedTest
  @CsvSource({"0.25, 352", "0.5, 154", "0.75, 90", "1, 58", "2, 16", "3, 5", "4, 2", "5, 1"})
  void accumulatedDroop(double timeConstants, double printedPercent) {
    Sampler sampler = new Sampler(1, 1e-12);
    double ohms = 1e3;
    double farads = 100e-9;
    List<Visit> visit = one(1e-9);
    double single = Settling.residuals(reservoir(ohms, farads), sampler, visit, 1)[0][0];
    double repeated =
        Settling.residuals(reservoir(ohms, farads), sampler, visit, timeConstants * ohms * farads)[
            0][0];
    assertThat((repeated / single - 1) * 100).isCloseTo(printedPercent, within(0.5));
  }

  /**
   * Mean current as a resistance 1/(f C): ST ST10F276 data sheet (250 kHz, 4 pF: 1 MΩ) and
   * Freescale MPC5604B/C data sheet Rev 9 (1 MHz, 3 pF: 333 kΩ, printed 330 kΩ). A large reservoir
   * sees it as a divider with the source.
   */
  @ParameterizedTest
  @CsvSource({"250e3, 4e-12, 1e6", "1e6, 3e-12, 333e3"})
  void meanCurrentActsAsAResistance(double hertz, double hold, double printed) {
    double source = 10e3;
    double residual =
        Settling.residuals(
            reservoir(source, 1e-6), new Sampler(100, hold), one(0.5 / hertz), 1 / hertz)[0][0];
    assertThat(source * (1 / residual - 1)).isCloseTo(printed, within(0.002 * printed));
  }
}
