package dev.settlewell.sensor;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import dev.settlewell.PublishedTable;
import dev.settlewell.sensor.PlatinumResistor.ToleranceClass;
import java.util.Set;
import org.junit.jupiter.api.Test;

class PlatinumResistorTest {
  private static final Curve PT100 = PlatinumResistor.of(100);

  /** IEC 60751, table of Pt100 resistances, printed to 0.01 ohm. */
  @Test
  void resistanceAsPrinted() {
    for (String[] row : PublishedTable.rows("pt100-iec60751")) {
      double celsius = Double.parseDouble(row[0]);
      double printed = Double.parseDouble(row[1]);
      assertThat(PT100.at(celsius)).as("%s °C", row[0]).isCloseTo(printed, within(0.00501));
      assertThat(PT100.at(celsius)).isCloseTo(Double.parseDouble(row[2]), within(0.000006));
      // The printed 18.52 is just below the curve's end at -200 °C, 18.52008.
      if (celsius > -200) {
        // 0.005 ohm is 0.017 °C where the curve is flattest, at 850 °C.
        assertThat(PT100.inverse(printed)).as("%s ohm", row[1]).isCloseTo(celsius, within(0.018));
      }
    }
  }

  /** IEC 60751, table of tolerances; limits in °C, and in ohm by the slope of the curve. */
  @Test
  void toleranceAsPrinted() {
    // Printed oddities left out: the limits of class B at 650 and 850 °C are rounded up (3.55 and
    // 4.55), and its ohms at 650, 700 and 850 °C do not follow the standard's own formula.
    Set<String> oddCelsius = Set.of("650", "850");
    Set<String> oddOhm = Set.of("650", "700", "850");
    for (String[] row : PublishedTable.rows("pt100-tolerance")) {
      double celsius = Double.parseDouble(row[0]);
      if (!row[1].isEmpty()) {
        checkTolerance(ToleranceClass.A, celsius, row[1], row[2], 0.001);
      }
      String celsiusB = oddCelsius.contains(row[0]) ? "" : row[3];
      String ohmB = oddOhm.contains(row[0]) ? "" : row[4];
      checkTolerance(ToleranceClass.B, celsius, celsiusB, ohmB, 0.05);
    }
  }

  private static void checkTolerance(
      ToleranceClass tolerance, double celsius, String limit, String ohm, double rounding) {
    double computed = PlatinumResistor.tolerance(tolerance, celsius);
    if (!limit.isEmpty()) {
      assertThat(computed)
          .as("class %s at %s °C", tolerance, celsius)
          .isCloseTo(Double.parseDouble(limit), within(rounding));
    }
    if (!ohm.isEmpty()) {
      double inside = Math.min(Math.max(celsius, -199), 849);
      double slope = (PT100.at(inside + 1) - PT100.at(inside - 1)) / 2;
      // Half of the last printed place, and what the slope half a degree off the ends costs.
      assertThat(computed * slope)
          .as("ohms of class %s at %s °C", tolerance, celsius)
          .isCloseTo(Double.parseDouble(ohm), within(0.0055));
    }
  }

  /** IEC 60751:2008, table 4 (from memory): AA and C, which the older table does not hold. */
  @Test
  void classesOfTheSecondEdition() {
    assertThat(PlatinumResistor.tolerance(ToleranceClass.AA, 100)).isCloseTo(0.27, within(1e-12));
    assertThat(PlatinumResistor.tolerance(ToleranceClass.C, -50)).isCloseTo(1.1, within(1e-12));
    assertThat(ToleranceClass.AA.wireWoundHigh()).isEqualTo(250);
    assertThat(ToleranceClass.A.filmLow()).isEqualTo(-30);
    assertThat(ToleranceClass.B.wireWoundLow()).isEqualTo(-196);
    assertThat(ToleranceClass.C.filmHigh()).isEqualTo(600);
  }

  @Test
  void neverExtrapolates() {
    assertThat(PT100.at(-200.001)).isNaN();
    assertThat(PT100.at(850.001)).isNaN();
    assertThat(PT100.at(Double.NaN)).isNaN();
    assertThat(PT100.inverse(18.52)).isNaN();
    assertThat(PT100.inverse(390.49)).isNaN();
    assertThat(PlatinumResistor.tolerance(ToleranceClass.B, 851)).isNaN();
    assertThatThrownBy(() -> PlatinumResistor.of(0)).isInstanceOf(IllegalArgumentException.class);
  }
}
