package dev.settlewell.circuit;

import java.util.List;
import java.util.OptionalDouble;
import org.apache.commons.math3.analysis.solvers.BrentSolver;
import org.apache.commons.math3.optim.MaxEval;
import org.apache.commons.math3.optim.nonlinear.scalar.GoalType;
import org.apache.commons.math3.optim.univariate.BrentOptimizer;
import org.apache.commons.math3.optim.univariate.SearchInterval;
import org.apache.commons.math3.optim.univariate.UnivariateObjectiveFunction;
import org.apache.commons.math3.util.FastMath;

/**
 * Search for the last time at which the worst error crosses an allowance.
 *
 * <p>The error is no monotone function of the time: it may ring, and a reservoir that has shared
 * its charge drifts again. So the times are walked from the longest down, in steps that are small
 * against the time itself and against an oscillation, to the first that does not suffice. A summit
 * between two steps that comes near the allowance is looked at closely.
 */
final class AcquisitionSearch {
  /** Eight steps an octave. */
  private static final double STEP_RATIO = FastMath.pow(2, -1.0 / 8);

  private static final int STEPS_PER_OSCILLATION = 16;
  private static final int MOST_OSCILLATION_STEPS = 20_000;

  /** Of the allowance: between two steps a summit rises by less than the rest. */
  private static final double NEAR = 0.95;

  private final SampledLadder sampled;
  private final List<Visit> visits;
  private final double period;
  private final double[] offsets;
  private final double allowance;

  AcquisitionSearch(
      SampledLadder sampled,
      List<Visit> visits,
      double period,
      double[] offsets,
      double allowance) {
    this.sampled = sampled;
    this.visits = visits;
    this.period = period;
    this.offsets = offsets;
    this.allowance = allowance;
  }

  OptionalDouble upTo(double longest) {
    double time = Math.min(longest, shortestSpacing());
    double error = worst(time);
    if (!(error <= allowance)) {
      return OptionalDouble.empty();
    }
    double shortest = 1e-3 / sampled.acquiring().map(Propagator::fastestRate).orElse(1.0);
    Pace pace = pace();
    double laterTime = time;
    double laterError = error;
    while (time > 0) {
      double nextTime = time > shortest ? pace.before(time) : 0;
      double nextError = worst(nextTime);
      if (nextError > allowance) {
        return OptionalDouble.of(crossing(nextTime, time));
      }
      if (error > NEAR * allowance && error > nextError && error >= laterError) {
        double summit = summit(nextTime, laterTime);
        if (worst(summit) > allowance) {
          return OptionalDouble.of(crossing(summit, laterTime));
        }
      }
      laterTime = time;
      laterError = error;
      time = nextTime;
      error = nextError;
    }
    return OptionalDouble.of(0);
  }

  /** The largest magnitude of the held error over all visits, for one common acquisition. */
  private double worst(double acquisition) {
    List<Visit> common =
        visits.stream().map(visit -> new Visit(visit.start(), acquisition)).toList();
    double worst = 0;
    for (double error : Matrices.times(sampled.residuals(common, period), offsets)) {
      worst = Math.max(worst, Math.abs(error));
    }
    return worst;
  }

  private double shortestSpacing() {
    double shortest = period;
    for (int i = 1; i < visits.size(); i++) {
      shortest = Math.min(shortest, visits.get(i).start() - visits.get(i - 1).start());
    }
    if (!visits.isEmpty()) {
      double last = visits.get(visits.size() - 1).start();
      shortest = Math.min(shortest, period + visits.get(0).start() - last);
    }
    return Math.max(0, shortest);
  }

  /**
   * How far to step down.
   *
   * @param alive until when an oscillation matters, in s; 0 where there is none
   * @param step longest step until then
   */
  private record Pace(double alive, double step) {
    double before(double time) {
      double next = time * STEP_RATIO;
      return next < alive ? Math.max(next, Math.min(time, alive) - step) : next;
    }
  }

  private Pace pace() {
    Propagator.Ringing ringing =
        sampled.acquiring().flatMap(Propagator::ringing).orElse(null);
    if (ringing == null) {
      return new Pace(0, 0);
    }
    double largest = 0;
    for (double offset : offsets) {
      largest = Math.max(largest, Math.abs(offset));
    }
    // Until the oscillation has fallen far below the allowance.
    double alive = FastMath.log(1 + 1e4 * largest / allowance) / ringing.decay();
    double step = 2 * Math.PI / ringing.angular() / STEPS_PER_OSCILLATION;
    return new Pace(
        alive, Math.max(step, Math.min(alive, shortestSpacing()) / MOST_OSCILLATION_STEPS));
  }

  private double crossing(double before, double after) {
    if (worst(after) == allowance) {
      return after;
    }
    return new BrentSolver(1e-12, 1e-30).solve(200, time -> worst(time) - allowance, before, after);
  }

  private double summit(double low, double high) {
    return new BrentOptimizer(1e-6, 1e-30)
        .optimize(
            new UnivariateObjectiveFunction(this::worst),
            GoalType.MAXIMIZE,
            new SearchInterval(low, high),
            new MaxEval(200))
        .getPoint();
  }
}
