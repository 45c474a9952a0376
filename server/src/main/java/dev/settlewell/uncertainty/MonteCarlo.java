package dev.settlewell.uncertainty;

import java.util.Arrays;
import java.util.List;
import java.util.function.ToDoubleFunction;
import org.apache.commons.math3.random.MersenneTwister;
import org.apache.commons.math3.random.RandomGenerator;

/**
 * Propagation of distributions by random trials (JCGM 101:2008, clause 7), for models that are not
 * linear. The same seed gives the same figures everywhere.
 */
public final class MonteCarlo {
  private MonteCarlo() {}

  /**
   * The figures of a run.
   *
   * @param mean of the model's output
   * @param standard its standard deviation
   * @param low low end of the probabilistically symmetric coverage interval
   * @param high its high end
   * @param shortestLow low end of the shortest coverage interval
   * @param shortestHigh its high end
   * @param trials how many trials gave a number
   * @param undefined how many gave none (NaN or infinite) and are left out
   */
  public record Result(
      double mean,
      double standard,
      double low,
      double high,
      double shortestLow,
      double shortestHigh,
      int trials,
      int undefined) {}

  /**
   * Runs the trials.
   *
   * @param model takes one value for each input, in order; must not keep the array
   * @param inputs independent, symmetric about zero
   * @param seed of the random numbers
   * @param trials at least 1
   * @param probability of the coverage intervals, above 0 and below 1
   * @return all NaN but the counts where no trial gave a number
   */
  public static Result run(
      ToDoubleFunction<double[]> model,
      List<Distribution> inputs,
      long seed,
      int trials,
      double probability) {
    if (trials < 1 || !(0 < probability && probability < 1)) {
      throw new IllegalArgumentException("no such run: " + trials + " trials, " + probability);
    }
    RandomGenerator random = new MersenneTwister(seed);
    double[] input = new double[inputs.size()];
    double[] output = new double[trials];
    int count = 0;
    for (int trial = 0; trial < trials; trial++) {
      for (int i = 0; i < input.length; i++) {
        input[i] = inputs.get(i).sample(random);
      }
      double y = model.applyAsDouble(input);
      if (Math.abs(y) < Double.POSITIVE_INFINITY) {
        output[count++] = y;
      }
    }
    return figures(Arrays.copyOf(output, count), trials - count, probability);
  }

  private static Result figures(double[] y, int undefined, double p) {
    int m = y.length;
    if (m == 0) {
      return new Result(
          Double.NaN, Double.NaN, Double.NaN, Double.NaN, Double.NaN, Double.NaN, 0, undefined);
    }
    Arrays.sort(y);
    double mean = Arrays.stream(y).average().orElseThrow();
    double squares = 0;
    for (double value : y) {
      squares += (value - mean) * (value - mean);
    }
    // JCGM 101:2008, 7.7: q trials inside, the interval from the r-th value to the (r + q)-th.
    int q = Math.min(m - 1, (int) (p * m + 0.5));
    int symmetric = (m - q + 1) / 2 - 1;
    int shortest = 0;
    for (int r = 1; r + q < m; r++) {
      if (y[r + q] - y[r] < y[shortest + q] - y[shortest]) {
        shortest = r;
      }
    }
    return new Result(
        mean,
        m > 1 ? Math.sqrt(squares / (m - 1)) : 0,
        y[symmetric],
        y[symmetric + q],
        y[shortest],
        y[shortest + q],
        m,
        undefined);
  }
}
