package dev.settlewell.circuit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.function.ToDoubleFunction;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class WorstCaseTest {
  private static final int EVALUATIONS = 60;

  /** A box of tolerances around a random multiplexed front end, and its error there. */
  private record Box(
      ToDoubleFunction<double[]> error, double[] low, double[] high, boolean[] corner) {}

  /** Pin capacitance, reservoir, their tolerances; hold capacitor and acquisition at corners. */
  private static Box random(long seed) {
    RandomCircuits random = new RandomCircuits(seed);
    double source = random.logarithmic(100, 100e3);
    double isolating = random.logarithmic(10, 10e3);
    double switchOhms = random.logarithmic(100, 5e3);
    double period = random.logarithmic(1e-5, 1e-2);
    double[] nominal = {
      random.logarithmic(10e-12, 10e-9),
      random.logarithmic(2e-12, 50e-12),
      random.logarithmic(2e-12, 30e-12),
      Math.min(period / 2, random.logarithmic(1e-7, 1e-5))
    };
    double[] tolerance = {random.uniform(0.05, 0.5), random.uniform(0.1, 0.6), 0.2, 0.05};
    double[] low = new double[4];
    double[] high = new double[4];
    for (int i = 0; i < 4; i++) {
      low[i] = nominal[i] * (1 - tolerance[i]);
      high[i] = nominal[i] * (1 + tolerance[i]);
    }
    ToDoubleFunction<double[]> error =
        point ->
            Math.abs(
                Settling.residuals(
                    new Ladder(
                        new Drive.Resistive(source),
                        List.of(
                            new Rung.Capacitor(point[0]),
                            new Rung.Series(isolating),
                            new Rung.Capacitor(point[1]))),
                    new Sampler(switchOhms, point[2]),
                    List.of(new Visit(0, point[3])),
                    period)[0][0]);
    return new Box(error, low, high, new boolean[] {false, false, true, true});
  }

  /** A full grid of the box: what the search must not fall short of. */
  private static double bruteForce(Box box) {
    double worst = 0;
    for (int i = 0; i <= 16; i++) {
      for (int j = 0; j <= 16; j++) {
        for (int corner = 0; corner < 4; corner++) {
          double[] point = {
            between(box, 0, i / 16.0),
            between(box, 1, j / 16.0),
            between(box, 2, corner & 1),
            between(box, 3, corner >> 1)
          };
          worst = Math.max(worst, box.error().applyAsDouble(point));
        }
      }
    }
    return worst;
  }

  private static double between(Box box, int i, double part) {
    return box.low()[i] + part * (box.high()[i] - box.low()[i]);
  }

  @Test
  void reachesBruteForceOnTwoHundredRandomCircuits() {
    for (long seed = 1; seed <= 200; seed++) {
      Box box = random(seed);
      AtomicInteger calls = new AtomicInteger();
      WorstCase.Result found =
          WorstCase.maximise(
              point -> {
                calls.incrementAndGet();
                return box.error().applyAsDouble(point);
              },
              box.low(),
              box.high(),
              box.corner(),
              EVALUATIONS);
      assertThat(calls).as("seed %d", seed).hasValueLessThanOrEqualTo(EVALUATIONS);
      assertThat(found.value())
          .as("seed %d", seed)
          .isGreaterThanOrEqualTo(bruteForce(box) * (1 - 1e-3));
      assertThat(box.error().applyAsDouble(found.point())).isEqualTo(found.value());
    }
  }

  @Test
  void findsASummitInsideTheBox() {
    WorstCase.Result found =
        WorstCase.maximise(
            p -> 5 - Math.pow(p[0] - 0.37, 2) - Math.pow(p[1] + 2.2, 2) - p[2],
            new double[] {0, -3, 1},
            new double[] {1, -2, 4},
            new boolean[] {false, false, true},
            EVALUATIONS);
    assertThat(found.value()).isCloseTo(4, within(1e-6));
    assertThat(found.point()[0]).isCloseTo(0.37, within(1e-2));
    assertThat(found.point()[1]).isCloseTo(-2.2, within(1e-2));
    assertThat(found.point()[2]).isEqualTo(1);
  }

  /** However little is allowed and however many parameters there are: a point within the box. */
  @ParameterizedTest
  @ValueSource(ints = {1, 2, 5, 10, 60, 200})
  void keepsToItsBudgetAndItsBox(int evaluations) {
    int parameters = 9;
    double[] low = new double[parameters];
    double[] high = new double[parameters];
    boolean[] corner = new boolean[parameters];
    for (int i = 0; i < parameters; i++) {
      low[i] = i;
      high[i] = i % 4 == 3 ? i : i + 0.5;
      corner[i] = i % 2 == 0;
    }
    AtomicInteger calls = new AtomicInteger();
    WorstCase.Result found =
        WorstCase.maximise(
            point -> {
              calls.incrementAndGet();
              for (int i = 0; i < parameters; i++) {
                assertThat(point[i]).isBetween(low[i], high[i]);
              }
              return -Arrays.stream(point).sum();
            },
            low,
            high,
            corner,
            evaluations);
    assertThat(calls.get()).isBetween(1, evaluations);
    if (evaluations >= 60) {
      assertThat(found.value()).isCloseTo(-36, within(0.01));
    }
  }

  @Test
  void aBoxWithoutExtentIsItsOnlyPoint() {
    WorstCase.Result found =
        WorstCase.maximise(
            point -> point[0], new double[] {3}, new double[] {3}, new boolean[] {false}, 60);
    assertThat(found.value()).isEqualTo(3);
  }

  /** From either rail a potentiometer has two summits, at 1/3 and 2/3 of its travel. */
  @Test
  void findsTheHigherOfTwoSummits() {
    double upperRail = 0.9;
    WorstCase.Result found =
        WorstCase.maximise(
            p -> p[0] * (1 - p[0]) * Math.max(p[0], upperRail - p[0]) * p[1],
            new double[] {0, 1},
            new double[] {1, 2},
            new boolean[] {false, true},
            EVALUATIONS);
    assertThat(found.point()[0]).isCloseTo(2 / 3.0, within(0.01));
    assertThat(found.value()).isCloseTo(2 * 4 / 27.0, within(1e-6));
  }

  /** A value that cannot be computed somewhere does not hide the others. */
  @Test
  void passesOverWhatIsNotANumber() {
    WorstCase.Result found =
        WorstCase.maximise(
            p -> p[0] < 0.3 ? Double.NaN : p[0],
            new double[] {0},
            new double[] {1},
            new boolean[] {false},
            EVALUATIONS);
    assertThat(found.value()).isEqualTo(1);
  }
}
