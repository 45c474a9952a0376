package dev.settlewell.circuit;

import java.util.function.ToDoubleFunction;
import org.apache.commons.math3.optim.MaxEval;
import org.apache.commons.math3.optim.nonlinear.scalar.GoalType;
import org.apache.commons.math3.optim.univariate.BrentOptimizer;
import org.apache.commons.math3.optim.univariate.SearchInterval;
import org.apache.commons.math3.optim.univariate.UnivariateObjectiveFunction;

/**
 * Bounded local search for the worst case over a box of tolerances.
 *
 * <p>A coarse grid (the two ends of each parameter, and the middle of those that are searched),
 * then, from its best point, two rounds of one-dimensional searches (R. P. Brent, Algorithms for
 * Minimization without Derivatives, 1973, chapter 5) along one parameter after the other. The
 * search is local: a summit that rises between the grid's points and apart from the one it climbs
 * stays unseen.
 */
public final class WorstCase {
  private static final int ROUNDS = 2;

  /** Where a one-dimensional search stops, as part of the box's side. */
  private static final double CLOSE = 1e-3;

  private final ToDoubleFunction<double[]> f;
  private final double[] low;
  private final double[] high;
  private final boolean[] corner;
  private int left;
  private double[] best;
  private double value = Double.NEGATIVE_INFINITY;

  private WorstCase(
      ToDoubleFunction<double[]> f, double[] low, double[] high, boolean[] corner, int left) {
    this.f = f;
    this.low = low;
    this.high = high;
    this.corner = corner;
    this.left = left;
  }

  /**
   * Where the worst case found lies, and its value.
   *
   * @param point one value for each parameter
   * @param value of the function there
   */
  public record Result(double[] point, double value) {}

  /**
   * Maximises a function over a box.
   *
   * @param low least value of each parameter
   * @param high greatest value of each parameter; equal to the least one where it has no tolerance
   * @param corner true: only the two ends are tried (monotone parameters)
   * @param evaluations at most so many calls of the function, 1 or more
   */
  public static Result maximise(
      ToDoubleFunction<double[]> f,
      double[] low,
      double[] high,
      boolean[] corner,
      int evaluations) {
    WorstCase search = new WorstCase(f, low, high, corner, Math.max(1, evaluations));
    search.grid();
    for (int round = 0; round < ROUNDS; round++) {
      search.climb(ROUNDS - round);
    }
    return new Result(search.best.clone(), search.value);
  }

  private boolean fixed(int i) {
    return !(high[i] > low[i]);
  }

  /** Ends and middles while they fit half the calls; else ends alone; else one after the other. */
  private void grid() {
    int half = left / 2;
    boolean middles = points(true) <= half;
    boolean ends = middles || points(false) <= half;
    double[] start = new double[low.length];
    for (int i = 0; i < start.length; i++) {
      start[i] = corner[i] || fixed(i) ? high[i] : middle(i);
    }
    if (ends) {
      grid(start, 0, middles);
      return;
    }
    evaluate(start);
    for (int i = 0; i < low.length && left > 0; i++) {
      evaluateEnds(i);
    }
  }

  private double points(boolean middles) {
    double points = 1;
    for (int i = 0; i < low.length; i++) {
      points *= fixed(i) ? 1 : corner[i] || !middles ? 2 : 3;
    }
    return points;
  }

  private void grid(double[] point, int parameter, boolean middles) {
    if (parameter == low.length) {
      evaluate(point.clone());
      return;
    }
    point[parameter] = high[parameter];
    grid(point, parameter + 1, middles);
    if (fixed(parameter)) {
      return;
    }
    point[parameter] = low[parameter];
    grid(point, parameter + 1, middles);
    if (middles && !corner[parameter]) {
      point[parameter] = middle(parameter);
      grid(point, parameter + 1, middles);
    }
  }

  private double middle(int i) {
    return low[i] + (high[i] - low[i]) / 2;
  }

  /** One search along each parameter, sharing the calls that are left. */
  private void climb(int roundsLeft) {
    int searched = 0;
    for (int i = 0; i < low.length; i++) {
      searched += corner[i] || fixed(i) ? 0 : 1;
    }
    int share = searched == 0 ? 0 : left / (searched * roundsLeft);
    for (int i = 0; i < low.length; i++) {
      if (fixed(i)) {
        continue;
      }
      if (corner[i]) {
        evaluateEnds(i);
      } else {
        search(i, Math.min(share, left));
      }
    }
  }

  /** Tries the ends of a parameter from the best point so far, where that is not there already. */
  private void evaluateEnds(int i) {
    double[] from = best;
    for (double end : new double[] {low[i], high[i]}) {
      if (from[i] != end && left > 0) {
        evaluate(with(from, i, end));
      }
    }
  }

  /** Searches between the grid's neighbours of the best point so far. */
  private void search(int i, int calls) {
    if (calls < 3) {
      return;
    }
    double[] from = best;
    double side = high[i] - low[i];
    double at = (from[i] - low[i]) / side;
    double from0 = Math.max(0, at - 0.5);
    double to1 = Math.min(1, at + 0.5);
    double start = Math.min(to1, Math.max(from0, at <= 0 ? 0.19 : at >= 1 ? 0.81 : at));
    int leave = left - calls;
    new BrentOptimizer(1e-15, CLOSE, (iteration, previous, current) -> left <= leave)
        .optimize(
            new UnivariateObjectiveFunction(
                part -> evaluate(with(from, i, Math.min(high[i], low[i] + part * side)))),
            GoalType.MAXIMIZE,
            new SearchInterval(from0, to1, start),
            new MaxEval(Integer.MAX_VALUE));
  }

  private static double[] with(double[] point, int i, double value) {
    double[] changed = point.clone();
    changed[i] = value;
    return changed;
  }

  private double evaluate(double[] point) {
    left--;
    double result = f.applyAsDouble(point);
    if (best == null || result > value) {
      best = point;
      value = result;
    }
    return result;
  }
}
