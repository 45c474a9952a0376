package dev.settlewell.uncertainty;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import dev.settlewell.PublishedTable;
import dev.settlewell.uncertainty.Distribution.Normal;
import dev.settlewell.uncertainty.Distribution.Rectangular;
import dev.settlewell.uncertainty.Distribution.Sine;
import dev.settlewell.uncertainty.Distribution.Student;
import dev.settlewell.uncertainty.Distribution.Triangular;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import org.apache.commons.math3.stat.regression.SimpleRegression;
import org.junit.jupiter.api.Test;

/** Published worked examples. */
class CoverageTest {
  private static final double SQRT3 = Math.sqrt(3);

  private static List<Distribution> normal(double... standards) {
    return Arrays.stream(standards).<Distribution>mapToObj(Normal::new).toList();
  }

  private static List<Distribution> times(int n, Distribution row) {
    return Collections.nCopies(n, row);
  }

  /**
   * JCGM 100:2008, 4.3.7, 4.3.9 and table 1 of JCGM 101:2008: limits are not standard deviations.
   */
  @Test
  void standardUncertaintyOfALimit() {
    assertThat(new Rectangular(2e-6).standard()).isCloseTo(1.2e-6, within(0.05e-6)); // H.1.3.3
    assertThat(new Rectangular(0.05).standard()).isCloseTo(0.029, within(0.0005)); // H.1.3.6
    assertThat(new Sine(0.5).standard()).isCloseTo(0.35, within(0.005)); // H.1.3.4
    assertThat(new Triangular(1).standard()).isCloseTo(1 / Math.sqrt(6), within(1e-15));
    assertThat(new Normal(0.7).standard()).isEqualTo(0.7);
    assertThat(new Rectangular(2).limit()).isEqualTo(2);
    assertThat(new Sine(2).limit()).isEqualTo(2);
    assertThat(new Normal(2).limit()).isInfinite();
    assertThat(new Student(2, 9).limit()).isInfinite();
  }

  /** JCGM 100:2008, H.1, end gauge calibration: the contributions of table H.1, in nm. */
  @Test
  void gumEndGauge() {
    double length = 50.000623e6;
    List<Distribution> rows =
        List.of(
            new Student(25, 18), // standard gauge
            new Student(13 / Math.sqrt(5), 24), // repeated observations: 13 nm, mean of five
            new Student(10 / 2.57, 5), // comparator, random: 0.01 µm at t95(5)
            new Student(20 / 3.0, 8), // comparator, systematic: 0.02 µm at three sigma
            new Student(length * 0.1 * 1e-6 / SQRT3, 50), // difference of expansion ±1e-6, -0.1 °C
            new Student(length * 11.5e-6 * 0.05 / SQRT3, 2)); // difference of temperature ±0.05 °C
    assertThat(Coverage.combined(rows)).isCloseTo(31.66, within(0.05)); // printed 32
    assertThat(Coverage.effectiveDegreesOfFreedom(rows)).isBetween(16.0, 17.0); // 16.7, cut to 16
    // Printed 93: the rounded 32 nm times 2.92; 92.5 without the rounding.
    assertThat(Coverage.expanded(rows, 0.99)).isCloseTo(93, within(1.0));
    assertThat(Coverage.expanded(rows, 0.99))
        .isCloseTo(2.92 * Coverage.combined(rows), within(0.005 * 32));
  }

  /**
   * JCGM 100:2008, H.3, calibration of a thermometer (table H.6, from memory; the fit below gives
   * the standard's own results, which confirms it). By H.3.5 the correction at 30 °C is a sum of
   * two independent parts when the line is taken about the mean temperature.
   */
  @Test
  void gumThermometer() {
    double[] t = {
      21.521, 22.012, 22.512, 23.003, 23.507, 23.999, 24.513, 25.002, 25.503, 26.010, 26.511
    };
    double[] b = {
      -0.171, -0.169, -0.166, -0.159, -0.164, -0.165, -0.156, -0.157, -0.159, -0.161, -0.160
    };
    double mean = Arrays.stream(t).average().orElseThrow();
    SimpleRegression line = new SimpleRegression();
    for (int i = 0; i < t.length; i++) {
      line.addData(t[i] - mean, b[i]);
    }
    assertThat(mean).isCloseTo(24.0085, within(0.00005));
    assertThat(line.getIntercept()).isCloseTo(-0.1625, within(0.00005));
    assertThat(line.getInterceptStdErr()).isCloseTo(0.0011, within(0.00005));
    assertThat(line.getSlope()).isCloseTo(0.00218, within(0.000005));
    assertThat(line.getSlopeStdErr()).isCloseTo(0.00067, within(0.000005));

    List<Distribution> correctionAt30 =
        List.of(
            new Student(line.getInterceptStdErr(), 9),
            new Student((30 - mean) * line.getSlopeStdErr(), 9));
    assertThat(line.predict(30 - mean)).isCloseTo(-0.1494, within(0.00005));
    assertThat(Coverage.combined(correctionAt30)).isCloseTo(0.0041, within(0.00005));
  }

  /** NIST TN 1297, table B.1, the same as JCGM 100:2008, table G.2. */
  @Test
  void studentFactorsAsPrinted() {
    double[] probabilities = {0.6827, 0.90, 0.95, 0.9545, 0.99, 0.9973};
    for (String[] row : PublishedTable.rows("student-t")) {
      double nu = row[0].equals("inf") ? Double.POSITIVE_INFINITY : Double.parseDouble(row[0]);
      for (int i = 0; i < probabilities.length; i++) {
        // A misprint: 1.70 stands for 1.690.
        if (nu == 35 && i == 1) {
          continue;
        }
        String printed = row[i + 1];
        double place = Math.pow(10, -(printed.length() - printed.indexOf('.') - 1));
        // The table's 68.27, 95.45 and 99.73 % stand for 1, 2 and 3 sigma exactly; rounded as
        // printed they move the few-degrees factors by up to 2 parts in 1000.
        double exact = i == 0 ? 0.682689492 : i == 3 ? 0.954499736 : i == 5 ? 0.997300204 : 0;
        double factor = Coverage.studentFactor(exact > 0 ? exact : probabilities[i], nu);
        assertThat(factor)
            .as("nu = %s, %s", row[0], probabilities[i])
            .isCloseTo(Double.parseDouble(printed), within(0.5 * place + 1e-6));
      }
    }
  }

  /** JCGM 101:2008, 9.2.2 to 9.2.4 (from memory): the additive model. */
  @Test
  void additiveModelOfTheSupplement() {
    assertThat(Coverage.expanded(normal(1, 1, 1, 1), 0.95)).isCloseTo(3.92, within(0.005));
    assertThat(Coverage.expanded(times(4, new Rectangular(SQRT3)), 0.95))
        .isCloseTo(3.88, within(0.005));
    List<Distribution> dominated =
        List.of(
            new Rectangular(SQRT3),
            new Rectangular(SQRT3),
            new Rectangular(SQRT3),
            new Rectangular(10 * SQRT3));
    assertThat(Coverage.expanded(dominated, 0.95)).isCloseTo(17.0, within(0.05));
    // What the framework of the GUM gives: 19.9, since it takes the sum for a normal one.
    double framework =
        Coverage.studentFactor(0.95, Double.POSITIVE_INFINITY) * Coverage.combined(dominated);
    assertThat(framework).isCloseTo(19.9, within(0.05));
  }

  /** Closed form of 9.2.3: the fourth-order Irwin-Hall tail is (4 - s)⁴/4! for s above 3. */
  @Test
  void fourRectanglesInClosedForm() {
    double closed = 2 * SQRT3 * (2 - Math.pow(24 * 0.025, 0.25));
    assertThat(closed).isCloseTo(3.8794, within(0.00005));
    assertThat(Coverage.expanded(times(4, new Rectangular(SQRT3)), 0.95))
        .isCloseTo(closed, within(1e-6));
  }

  /** k = 2 is not always 95 %: a lone rectangle needs 1.645, the dominated sum above 1.675. */
  @Test
  void coverageFactorDependsOnTheShape() {
    List<Distribution> rectangle = List.of(new Rectangular(1));
    assertThat(Coverage.expanded(rectangle, 0.95) / Coverage.combined(rectangle))
        .isCloseTo(0.95 * SQRT3, within(1e-12));
  }

  /** A tracking pair acts as one row: what acts twice adds before it is squared. */
  @Test
  void oneParameterActingTwiceIsOneRow() {
    assertThat(Coverage.combined(normal(1 + 1))).isEqualTo(2);
    assertThat(Coverage.combined(normal(1, 1))).isCloseTo(Math.sqrt(2), within(1e-15));
  }

  /** TI SLAAE47A, tables 5-2 and 5-3: root sums of stages, in ppm. */
  @Test
  void stagesOfASignalChain() {
    assertThat(Coverage.combined(normal(140, 60))).isCloseTo(152.32, within(0.005));
    assertThat(Coverage.combined(normal(210, 90, 1.2, 0.6, 200.02, 0.25)))
        .isCloseTo(303.66, within(0.005));
  }

  /** TI INA285-Q1 data sheet SBOS554C: offset, gain and linearity of a shunt amplifier, in %. */
  @Test
  void shuntAmplifier() {
    assertThat(Coverage.combined(normal(0.20, 0.40, 0.01))).isCloseTo(0.45, within(0.005));
    assertThat(Coverage.combined(normal(0.70, 1.40, 0.01))).isCloseTo(1.56, within(0.01));
  }

  /**
   * National Instruments 6259 specifications, absolute accuracy at full scale, printed 1,920 µV:
   * gain 83 ppm of the 10 V reading and offset 101 ppm of the 10 V range, and three sigma of the
   * mean of 100 readings with 280 µV of noise (84 µV), all added.
   */
  @Test
  void dataAcquisitionCard() {
    Distribution gain = new Rectangular(83e-6 * 10);
    Distribution offset = new Rectangular(101e-6 * 10);
    Distribution noise = new Normal(280e-6 / Math.sqrt(100));
    assertThat(3 * noise.standard()).isCloseTo(84e-6, within(1e-12));
    assertThat(gain.limit() + offset.limit() + 3 * noise.standard())
        .isCloseTo(1920e-6, within(10e-6));
  }

  /** Rosemount reference manual 00809-0100-4021, appendix A: worst case and root sum, in °C. */
  @Test
  void temperatureTransmitter() {
    List<Distribution> limits =
        List.of(
            new Rectangular(0.10),
            new Rectangular(0.02),
            new Rectangular(0.015),
            new Rectangular(0.01));
    assertThat(limits.stream().mapToDouble(Distribution::limit).sum())
        .isCloseTo(0.145, within(1e-12));
    // The manual takes the root of the summed squares of the limits themselves.
    assertThat(SQRT3 * Coverage.combined(limits)).isCloseTo(0.10, within(0.005));
  }

  /**
   * JCGM 100:2008, G.4.1: type A rows alone give t(ν_eff) u_c; beside a large limit they vanish.
   */
  @Test
  void typeARows() {
    assertThat(Coverage.expanded(List.of(new Student(0.5, 5)), 0.95))
        .isCloseTo(0.5 * 2.57, within(0.005));
    List<Distribution> pair = List.of(new Student(3, 9), new Student(3, 9));
    assertThat(Coverage.effectiveDegreesOfFreedom(pair)).isCloseTo(18, within(1e-9));
    assertThat(Coverage.expanded(pair, 0.95)).isCloseTo(Math.sqrt(18) * 2.10, within(0.03));
    List<Distribution> beside = List.of(new Student(1e-3, 4), new Rectangular(1));
    assertThat(Coverage.expanded(beside, 0.95)).isCloseTo(0.95, within(1e-4));
    assertThat(Coverage.effectiveDegreesOfFreedom(times(3, new Rectangular(1)))).isInfinite();
  }

  @Test
  void nothingAddsNothing() {
    assertThat(Coverage.expanded(List.of(), 0.95)).isZero();
    assertThat(Coverage.combined(List.of())).isZero();
    List<Distribution> zeros =
        List.of(new Rectangular(0), new Normal(0), new Sine(0), new Student(0, 3));
    assertThat(Coverage.expanded(zeros, 0.95)).isZero();
    assertThat(Coverage.effectiveDegreesOfFreedom(zeros)).isInfinite();
    List<Distribution> beside = List.of(new Rectangular(0), new Rectangular(1), new Normal(0));
    assertThat(Coverage.expanded(beside, 0.95)).isEqualTo(0.95);
  }

  @Test
  void refusesWhatIsNoDistribution() {
    assertThatThrownBy(() -> new Rectangular(-1)).isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> new Normal(Double.NaN)).isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> new Sine(Double.POSITIVE_INFINITY))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> new Student(1, 0.5)).isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> Coverage.expanded(List.of(), 1))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
