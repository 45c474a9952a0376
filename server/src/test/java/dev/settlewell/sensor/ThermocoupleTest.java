package dev.settlewell.sensor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import dev.settlewell.PublishedTable;
import dev.settlewell.sensor.Thermocouple.Type;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

class ThermocoupleTest {
  /** NIST ITS-90 Thermocouple Database (SRD 60), the printed tables; 0.001 mV. */
  @ParameterizedTest
  @EnumSource(names = {"J", "K", "T"})
  void everyPrintedPoint(Type type) {
    String table = "thermocouple-" + type.name().toLowerCase(Locale.ROOT);
    for (String[] row : PublishedTable.rows(table)) {
      double celsius = Double.parseDouble(row[0]);
      double printed = Double.parseDouble(row[1]);
      assertThat(1e3 * Thermocouple.emf(type, celsius))
          .as("%s °C", row[0])
          .isCloseTo(printed, within(0.0005 + 1e-9));
    }
  }

  /**
   * NIST Monograph 175, some printed points of the other types (from memory); they hold the
   * coefficients of every piece.
   */
  @ParameterizedTest
  @CsvSource({
    "B, 100, 0.033",
    "B, 500, 1.242",
    "B, 1000, 4.834",
    "B, 1820, 13.820",
    "E, -270, -9.835",
    "E, -100, -5.237",
    "E, 100, 6.319",
    "E, 1000, 76.373",
    "N, -270, -4.345",
    "N, 100, 2.774",
    "N, 1000, 36.256",
    "N, 1300, 47.513",
    "R, -50, -0.226",
    "R, 100, 0.647",
    "R, 1000, 10.506",
    "R, 1500, 17.451",
    "R, 1768, 21.101",
    "S, -50, -0.236",
    "S, 100, 0.646",
    "S, 1000, 9.587",
    "S, 1500, 15.582",
    "S, 1768, 18.693"
  })
  void pointsOfTheOtherTypes(Type type, double celsius, double millivolts) {
    assertThat(1e3 * Thermocouple.emf(type, celsius)).isCloseTo(millivolts, within(0.0005 + 1e-9));
  }

  /**
   * NIST Monograph 175, ranges of error stated beside each inverse function (from memory): type,
   * from and to in °C, least and greatest error in °C, printed to one or two digits.
   */
  @ParameterizedTest
  @CsvSource({
    "B, 250, 700, -0.02, 0.03",
    "B, 700, 1820, -0.01, 0.02",
    "E, -200, 0, -0.01, 0.03",
    "E, 0, 1000, -0.02, 0.02",
    "J, -210, 0, -0.05, 0.03",
    "J, 0, 760, -0.04, 0.04",
    "J, 760, 1200, -0.04, 0.03",
    "K, -200, 0, -0.02, 0.04",
    "K, 0, 500, -0.05, 0.04",
    "K, 500, 1372, -0.05, 0.06",
    "N, -200, 0, -0.02, 0.03",
    "N, 0, 600, -0.02, 0.03",
    "N, 600, 1300, -0.04, 0.02",
    "R, -50, 250, -0.02, 0.02",
    "R, 250, 1064, -0.005, 0.005",
    "R, 1200, 1664.5, -0.001, 0.001",
    "R, 1664.5, 1768.1, -0.001, 0.002",
    "S, -50, 250, -0.02, 0.02",
    "S, 250, 1064, -0.01, 0.01",
    "S, 1200, 1664.5, -0.0002, 0.0002",
    "S, 1664.5, 1768.1, -0.002, 0.002",
    "T, -200, 0, -0.02, 0.04",
    "T, 0, 400, -0.03, 0.03"
  })
  void approximateInverseWithinItsStatedError(
      Type type, double from, double to, double least, double greatest) {
    double lowest = Double.POSITIVE_INFINITY;
    double highest = Double.NEGATIVE_INFINITY;
    for (int i = 5; i <= 1995; i++) {
      double celsius = from + (to - from) * i / 2000;
      double volts = Thermocouple.emf(type, celsius);
      double error = Thermocouple.approximateInverse(type, volts) - celsius;
      lowest = Math.min(lowest, error);
      highest = Math.max(highest, error);
    }
    double digit = Math.abs(least) < 0.001 ? 0.00005 : Math.abs(least) < 0.01 ? 0.0005 : 0.005;
    assertThat(lowest).isGreaterThanOrEqualTo(least - digit);
    assertThat(highest).isLessThanOrEqualTo(greatest + digit);
  }

  /** NIST SRD 60, table of type K: 4.096 mV is 100 °C with the terminals at 0 °C. */
  @Test
  void coldJunctionIsAddedAsEmf() {
    assertThat(Thermocouple.temperature(Type.K, 4.096e-3, 0)).isCloseTo(100.0, within(0.02));
    assertThat(Thermocouple.temperature(Type.K, 4.096e-3, 25)).isCloseTo(124.3, within(0.05));
  }

  @ParameterizedTest
  @EnumSource
  void inverseLeadsBack(Type type) {
    Curve curve = Thermocouple.of(type);
    double last = Double.NEGATIVE_INFINITY;
    for (int i = 0; i <= 5000; i++) {
      double celsius =
          Math.min(curve.high(), curve.low() + (curve.high() - curve.low()) * i / 5000);
      double volts = curve.at(celsius);
      assertThat(volts).as("%s °C", celsius).isGreaterThan(last);
      assertThat(curve.inverse(volts)).isCloseTo(celsius, within(1e-9));
      last = volts;
    }
  }

  /** The published pieces differ at their seams by less than 1e-7 mV. */
  @ParameterizedTest
  @CsvSource({"B, 630.615", "J, 760", "K, 0", "R, 1064.18", "R, 1664.5", "S, 1064.18", "S, 1664.5"})
  void seamsHardlyShow(Type type, double seam) {
    Curve curve = Thermocouple.of(type);
    for (double offset : new double[] {-1e-7, -1e-9, 0, 1e-9, 1e-7}) {
      double celsius = seam + offset;
      assertThat(curve.inverse(curve.at(celsius))).isCloseTo(celsius, within(2e-6));
    }
    assertThat(curve.inverse(0.5 * (curve.at(seam) + curve.at(Math.nextUp(seam)))))
        .isCloseTo(seam, within(2e-6));
  }

  /** The least emf of type B, -2.6 µV at 21 °C (NIST Monograph 175): not single-valued there. */
  @Test
  void typeBIsACurveOnlyWhereItsEmfIsUnique() {
    assertThat(1e6 * Thermocouple.emf(Type.B, 21)).isCloseTo(-2.6, within(0.05));
    Curve curve = Thermocouple.of(Type.B);
    assertThat(curve.at(42)).isNaN();
    assertThat(curve.at(50)).isPositive();
    assertThat(curve.inverse(0)).isNaN();
    assertThat(Thermocouple.temperature(Type.B, Thermocouple.emf(Type.B, 1000), 0))
        .isCloseTo(1000, within(1e-9));
  }

  /** IEC 60584-1:2013, tolerance classes (from memory). */
  @ParameterizedTest
  @CsvSource({
    "T, 1, 100, 0.5",
    "T, 1, 300, 1.2",
    "T, 2, 20, 1",
    "T, 3, -200, 3",
    "E, 1, 800, 3.2",
    "J, 2, 750, 5.625",
    "K, 1, 25, 1.5",
    "K, 1, 1000, 4",
    "K, 2, 1000, 7.5",
    "K, 3, -200, 3",
    "N, 2, 25, 2.5",
    "R, 1, 1000, 1",
    "S, 1, 1600, 2.5",
    "S, 2, 1000, 2.5",
    "R, 2, 25, 1.5",
    "B, 2, 1000, 2.5",
    "B, 3, 700, 4",
    "B, 3, 1700, 8.5",
    "K, 1, 1001, NaN",
    "J, 3, -100, NaN",
    "B, 1, 1000, NaN",
    "R, 3, 500, NaN",
    "K, 4, 25, NaN",
    "B, 2, 500, NaN",
    "T, 1, -41, NaN"
  })
  void toleranceClasses(Type type, int toleranceClass, double celsius, double limit) {
    double computed = Thermocouple.toleranceLimit(type, toleranceClass, celsius);
    if (Double.isNaN(limit)) {
      assertThat(computed).isNaN();
    } else {
      assertThat(computed).isCloseTo(limit, within(1e-9));
    }
  }

  @Test
  void neverExtrapolates() {
    assertThat(Thermocouple.emf(Type.K, 1372.1)).isNaN();
    assertThat(Thermocouple.emf(Type.J, -210.1)).isNaN();
    assertThat(Thermocouple.of(Type.K).inverse(60e-3)).isNaN();
    assertThat(Thermocouple.approximateInverse(Type.K, -6e-3)).isNaN();
    assertThat(Thermocouple.temperature(Type.K, Double.NaN, 25)).isNaN();
  }
}
