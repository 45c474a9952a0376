package dev.settlewell.unit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import dev.settlewell.PublishedTable;
import dev.settlewell.unit.PreferredValues.Neighbours;
import dev.settlewell.unit.PreferredValues.Series;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class PreferredValuesTest {
  /** IEC 60063: walking up a decade meets every value of the standard and no other. */
  @ParameterizedTest
  @EnumSource
  void theSeriesOfTheStandard(Series series) {
    List<Double> walked = new ArrayList<>();
    for (double value = 1; value < 9.999; value = next(series, value)) {
      walked.add(value);
    }
    assertThat(walked).isEqualTo(standard(series));
  }

  private static double next(Series series, double value) {
    return PreferredValues.nextHigher(series, value * 1.0001);
  }

  private static List<Double> standard(Series series) {
    double scale = series.compareTo(Series.E24) <= 0 ? 10 : 100;
    return PublishedTable.rows("e-series").stream()
        .filter(row -> row[0].equals(series.name()))
        .map(row -> Integer.parseInt(row[1]) / scale)
        .toList();
  }

  @Test
  void neighboursInEveryDecade() {
    assertThat(PreferredValues.neighbours(Series.E24, 5.0e3))
        .isEqualTo(new Neighbours(4.7e3, 5.1e3));
    assertThat(PreferredValues.neighbours(Series.E12, 95e-9))
        .isEqualTo(new Neighbours(82e-9, 100e-9));
    assertThat(PreferredValues.neighbours(Series.E96, 9.99e6))
        .isEqualTo(new Neighbours(9.76e6, 10e6));
    assertThat(PreferredValues.nextLower(Series.E6, 1.0e-12)).isEqualTo(1.0e-12);
    assertThat(PreferredValues.nextHigher(Series.E3, 1.01)).isEqualTo(2.2);
  }

  /** A computed 4700.000000001 is 4.7 kΩ, not the step to 5.1 kΩ. */
  @ParameterizedTest
  @EnumSource
  void aPreferredValueIsItsOwnNeighbour(Series series) {
    for (double value : standard(series)) {
      for (double decade : new double[] {1e-12, 1e-6, 1, 1e3, 1e6}) {
        double scaled = value * decade;
        Neighbours around = PreferredValues.neighbours(series, scaled * (1 + 3e-16));
        assertThat(around.lower()).isEqualTo(around.higher());
        assertThat(around.lower() / scaled).isBetween(1 - 1e-15, 1 + 1e-15);
      }
    }
  }

  @Test
  void randomValuesLieBetween() {
    for (long seed = 1; seed <= 20; seed++) {
      Random random = new Random(seed);
      for (Series series : Series.values()) {
        double value = Math.pow(10, -14 + 26 * random.nextDouble());
        Neighbours around = PreferredValues.neighbours(series, value);
        assertThat(value)
            .as("seed %d, %s", seed, series)
            .isBetween(around.lower(), around.higher());
        assertThat(around.nearest(value)).isIn(around.lower(), around.higher());
        assertThat(around.higher() / around.lower()).isLessThan(2.3);
      }
    }
  }

  @Test
  void nothingNearZeroOrInfinity() {
    for (double value : new double[] {0, -1, Double.NaN, Double.POSITIVE_INFINITY}) {
      assertThatThrownBy(() -> PreferredValues.neighbours(Series.E24, value))
          .isInstanceOf(IllegalArgumentException.class);
    }
  }
}
