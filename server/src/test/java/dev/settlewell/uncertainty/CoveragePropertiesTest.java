package dev.settlewell.uncertainty;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import dev.settlewell.uncertainty.Distribution.Normal;
import dev.settlewell.uncertainty.Distribution.Rectangular;
import dev.settlewell.uncertainty.Distribution.Sine;
import dev.settlewell.uncertainty.Distribution.Triangular;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** What must hold for any rows, on random ones. */
class CoveragePropertiesTest {
  private static Distribution row(int kind, double size) {
    return switch (kind) {
      case 0, 1 -> new Rectangular(size);
      case 2 -> new Normal(size);
      case 3 -> new Triangular(size);
      default -> new Sine(size);
    };
  }

  /** Rows of very different sizes: five decades, one to twenty rows. */
  private static List<Distribution> rows(Random random, int kinds) {
    List<Distribution> rows = new ArrayList<>();
    int n = 1 + random.nextInt(20);
    for (int i = 0; i < n; i++) {
      rows.add(row(random.nextInt(kinds), Math.pow(10, -5 + 5 * random.nextDouble())));
    }
    return rows;
  }

  private static List<Distribution> scaled(List<Distribution> rows, double factor) {
    return rows.stream().map(row -> scaled(row, factor)).toList();
  }

  private static Distribution scaled(Distribution row, double factor) {
    if (row instanceof Rectangular r) {
      return new Rectangular(factor * r.limit());
    }
    if (row instanceof Triangular t) {
      return new Triangular(factor * t.limit());
    }
    if (row instanceof Sine s) {
      return new Sine(factor * s.amplitude());
    }
    return new Normal(factor * row.standard());
  }

  /** JCGM 101:2008, clause 7: the same rows by random trials. */
  @Test
  void agreesWithMonteCarlo() {
    int trials = 100_000;
    for (long seed = 1; seed <= 40; seed++) {
      Random random = new Random(seed);
      List<Distribution> rows = rows(random, 5);
      double u = Coverage.expanded(rows, 0.95);
      MonteCarlo.Result inside =
          MonteCarlo.run(x -> Math.abs(sum(x)) <= u ? 1 : 0, rows, seed, trials, 0.95);
      // Five standard deviations of a count of trials.
      double scatter = 5 * Math.sqrt(0.95 * 0.05 / trials);
      assertThat(inside.mean()).as("seed %d, %s", seed, rows).isCloseTo(0.95, within(scatter));
    }
  }

  private static double sum(double[] x) {
    double sum = 0;
    for (double value : x) {
      sum += value;
    }
    return sum;
  }

  @Test
  void neverMoreThanTheHardLimits() {
    for (long seed = 1; seed <= 500; seed++) {
      List<Distribution> rows = rows(new Random(seed), 5);
      double hard = rows.stream().mapToDouble(Distribution::limit).sum();
      for (double p : new double[] {0.5, 0.95, 0.999999}) {
        assertThat(Coverage.expanded(rows, p)).as("seed %d, %s", seed, rows).isBetween(0.0, hard);
      }
    }
  }

  @Test
  void scalesWithItsRows() {
    for (long seed = 1; seed <= 200; seed++) {
      Random random = new Random(seed);
      List<Distribution> rows = rows(random, 5);
      double factor = Math.pow(10, -12 + 24 * random.nextDouble());
      assertThat(Coverage.expanded(scaled(rows, factor), 0.95) / Coverage.expanded(rows, 0.95))
          .as("seed %d", seed)
          .isCloseTo(factor, within(1e-8 * factor));
    }
  }

  @Test
  void orderDoesNotMatter() {
    for (long seed = 1; seed <= 200; seed++) {
      Random random = new Random(seed);
      List<Distribution> rows = rows(random, 5);
      List<Distribution> shuffled = new ArrayList<>(rows);
      Collections.shuffle(shuffled, random);
      double u = Coverage.expanded(rows, 0.95);
      assertThat(Coverage.expanded(shuffled, 0.95)).isCloseTo(u, within(1e-8 * u));
    }
  }

  /**
   * A larger limit never makes the sum narrower (Anderson's theorem, for distributions that fall
   * off from their middle; a sine does not, and a little noise on one does narrow its 95 %).
   */
  @Test
  void growsWithEveryLimit() {
    for (long seed = 1; seed <= 300; seed++) {
      Random random = new Random(seed);
      List<Distribution> rows = rows(random, 4);
      double before = Coverage.expanded(rows, 0.95);
      int i = random.nextInt(rows.size());
      rows.set(i, scaled(rows.get(i), 1 + random.nextDouble()));
      assertThat(Coverage.expanded(rows, 0.95))
          .as("seed %d, row %d of %s", seed, i, rows)
          .isGreaterThanOrEqualTo(before * (1 - 1e-6));
    }
  }

  @Test
  void growsWithTheProbability() {
    for (long seed = 1; seed <= 100; seed++) {
      List<Distribution> rows = rows(new Random(seed), 5);
      double last = 0;
      for (double p = 0.05; p < 1; p += 0.05) {
        double u = Coverage.expanded(rows, p);
        assertThat(u).as("seed %d, p = %s", seed, p).isGreaterThan(last);
        last = u;
      }
    }
  }
}
