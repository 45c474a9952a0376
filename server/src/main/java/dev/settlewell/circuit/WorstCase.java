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
 * <p>A coarse grid (the two ends of each parameter, and points between them of those that are
 * searched), then, from its best point, two rounds of one-dimensional searches (R. P. Brent,
 * Algorithms for Minimization without Derivatives, 1973, chapter 5) along one parameter after the
 * other. The search is local: a summit that rises between the grid's points and apart from the one
 * it climbs stays unseen.
 */
public final class WorstCase {
  private static final int ROUNDS = 2;

  /** Points of the grid along a searched parameter, the finest first. */
  private static final int[] LEVELS = {5, 3, 2};

  /** Where a one-dimensional search stops, as part of the box's side. */
  private static final double CLOSE = 1e-3;

  private final ToDoubleFunction<double[]> f;
  private final double[] low;
  private final double[] high;
  private final boolean[] corner;

  /** How far a one-dimensional search goes either way, as part of the box's side. */
  private double reach = 0.5;

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

  /** As fine a grid as fits half the calls; where none does, one parameter after the other. */
  private void grid() {
    double[] start = new double[low.length];
    for (int i = 0; i < start.length; i++) {
      start[i] = corner[i] ? high[i] : at(i, 0.5);
    }
    for (int levels : LEVELS) {
      if (points(levels) <= left / 2) {
        reach = Math.min(reach, 1.0 / (levels - 1));
        grid(start, 0, levels);
        return;
      }
    }
    evaluate(start);
    for (int i = 0; i < low.length && left > 0; i++) {
      evaluateEnds(i);
    }
  }

  private double points(int levels) {
    double points = 1;
    for (int i = 0; i < low.length; i++) {
      points *= fixed(i) ? 1 : corner[i] ? 2 : levels;
    }
    return points;
  }

  private void grid(double[] point, int parameter, int levels) {
    if (parameter == low.length) {
      evaluate(point.clone());
      return;
    }
    int last = fixed(parameter) ? 0 : corner[parameter] ? 1 : levels - 1;
    for (int level = 0; level <= last; level++) {
      point[parameter] = at(parameter, last == 0 ? 1 : (double) level / last);
      grid(point, parameter + 1, levels);
    }
  }

  /** The value of a parameter at a part of its side, the ends exactly. */
  private double at(int i, double part) {
    return part >= 1 ? high[i] : low[i] + part * (high[i] - low[i]);
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
    double here = Math.min(1, Math.max(0, (from[i] - low[i]) / (high[i] - low[i])));
    double least = Math.max(0, here - reach);
    double greatest = Math.min(1, here + reach);
    boolean inside = here > least && here < greatest;
    int leave = left - calls;
    new BrentOptimizer(1e-15, CLOSE, (iteration, previous, current) -> left <= leave)
        .optimize(
            new UnivariateObjectiveFunction(part -> evaluate(with(from, i, at(i, part)))),
            GoalType.MAXIMIZE,
            inside
                ? new SearchInterval(least, greatest, here)
                : new SearchInterval(least, greatest),
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
    if (best == null || result > value || Double.isNaN(value)) {
      best = point;
      value = result;
    }
    return result;
  }
}
