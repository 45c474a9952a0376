package dev.settlewell.uncertainty;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import dev.settlewell.uncertainty.Distribution.Normal;
import dev.settlewell.uncertainty.Distribution.Rectangular;
import dev.settlewell.uncertainty.Distribution.Sine;
import dev.settlewell.uncertainty.Distribution.Student;
import dev.settlewell.uncertainty.Distribution.Triangular;
import java.util.List;
import org.junit.jupiter.api.Test;

class MonteCarloTest {
  private static final double SQRT3 = Math.sqrt(3);
  private static final int TRIALS = 200_000;

  private static double sum(double[] x) {
    double sum = 0;
    for (double value : x) {
      sum += value;
    }
    return sum;
  }

  /** JCGM 101:2008, 9.2.4 (from memory): [-17.0, 17.0] where the GUM framework says 19.9. */
  @Test
  void additiveModelWithOneDominatingRectangle() {
    List<Distribution> rows =
        List.of(
            new Rectangular(SQRT3),
            new Rectangular(SQRT3),
            new Rectangular(SQRT3),
            new Rectangular(10 * SQRT3));
    MonteCarlo.Result result = MonteCarlo.run(MonteCarloTest::sum, rows, 1, TRIALS, 0.95);
    assertThat(result.mean()).isCloseTo(0, within(0.12));
    assertThat(result.standard()).isCloseTo(10.1, within(0.1)); // printed 10.1
    assertThat(result.low()).isCloseTo(-17.0, within(0.1));
    assertThat(result.high()).isCloseTo(17.0, within(0.1));
  }

  /**
   * JCGM 101:2008, 9.4, comparison loss at zero (from memory, in 1e-6): y = x1² + x2² with u =
   * 0.005 each has the mean 50 and the standard uncertainty 50, and its shortest 95 % interval is
   * [0, 150]. Exactly: an exponential distribution, whose 95 % point is 50 ln 20 = 149.8. The
   * symmetric interval is [50 ln(40/39), 50 ln 40] = [1.27, 184.4].
   */
  @Test
  void comparisonLoss() {
    List<Distribution> inputs = List.of(new Normal(0.005), new Normal(0.005));
    MonteCarlo.Result result =
        MonteCarlo.run(x -> 1e6 * (x[0] * x[0] + x[1] * x[1]), inputs, 7, TRIALS, 0.95);
    assertThat(result.mean()).isCloseTo(50, within(0.6));
    assertThat(result.standard()).isCloseTo(50, within(1.2));
    assertThat(result.shortestLow()).isCloseTo(0, within(0.2));
    assertThat(result.shortestHigh()).isCloseTo(149.8, within(3.0));
    assertThat(result.low()).isCloseTo(1.27, within(0.1));
    assertThat(result.high()).isCloseTo(184.4, within(4.0));
  }

  /** JCGM 101:2008, table 1: each distribution has its standard uncertainty and its limit. */
  @Test
  void samplesHaveTheirStandardUncertainty() {
    List<Distribution> distributions =
        List.of(new Rectangular(2), new Triangular(2), new Sine(2), new Normal(2));
    for (Distribution distribution : distributions) {
      MonteCarlo.Result result = MonteCarlo.run(x -> x[0], List.of(distribution), 3, TRIALS, 0.95);
      assertThat(result.standard() / distribution.standard())
          .as("%s", distribution)
          .isCloseTo(1, within(0.01));
      assertThat(result.high()).isLessThanOrEqualTo(distribution.limit());
    }
  }

  /** JCGM 100:2008, table G.2: t95(4) = 2.78, t95(9) = 2.26. */
  @Test
  void samplesOfStudent() {
    assertThat(high(new Student(1, 4))).isCloseTo(2.78, within(0.04));
    assertThat(high(new Student(1, 9))).isCloseTo(2.26, within(0.03));
    assertThat(high(new Student(1, Double.POSITIVE_INFINITY))).isCloseTo(1.96, within(0.02));
  }

  private static double high(Distribution distribution) {
    return MonteCarlo.run(x -> x[0], List.of(distribution), 5, TRIALS, 0.95).high();
  }

  @Test
  void theSameSeedGivesTheSameFigures() {
    List<Distribution> inputs = List.of(new Normal(1), new Student(1, 3), new Sine(1));
    MonteCarlo.Result first = MonteCarlo.run(MonteCarloTest::sum, inputs, 42, 5000, 0.95);
    assertThat(MonteCarlo.run(MonteCarloTest::sum, inputs, 42, 5000, 0.95)).isEqualTo(first);
    assertThat(MonteCarlo.run(MonteCarloTest::sum, inputs, 43, 5000, 0.95)).isNotEqualTo(first);
  }

  /** Order statistics of JCGM 101:2008, 7.7.2, on trials that are 1, 2, … 100 in some order. */
  @Test
  void intervalsByTheStandardsOwnCount() {
    double[] next = {0};
    MonteCarlo.Result result =
        MonteCarlo.run(x -> next[0] = (next[0] + 37) % 101, List.of(), 1, 100, 0.95);
    // q = 95, r = (100 - 95 + 1) / 2 = 3: from the third value to the ninety-eighth.
    assertThat(result.low()).isEqualTo(3);
    assertThat(result.high()).isEqualTo(98);
    assertThat(result.shortestHigh() - result.shortestLow()).isEqualTo(95);
    assertThat(result.mean()).isEqualTo(50.5);
  }

  @Test
  void trialsWithoutANumberAreCounted() {
    List<Distribution> inputs = List.of(new Rectangular(1));
    MonteCarlo.Result half = MonteCarlo.run(x -> Math.sqrt(x[0]), inputs, 1, 10_000, 0.95);
    assertThat(half.trials() + half.undefined()).isEqualTo(10_000);
    assertThat(half.undefined()).isBetween(4700, 5300);
    assertThat(half.low()).isNotNegative();
    MonteCarlo.Result none = MonteCarlo.run(x -> Double.NaN, inputs, 1, 10, 0.95);
    assertThat(none.mean()).isNaN();
    assertThat(none.undefined()).isEqualTo(10);
    assertThat(MonteCarlo.run(x -> 5, inputs, 1, 1, 0.95).high()).isEqualTo(5);
    assertThatThrownBy(() -> MonteCarlo.run(x -> 5, inputs, 1, 0, 0.95))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
