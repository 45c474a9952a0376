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
 * Search for the last time at which the worst error crosses an allowance; used once.
 *
 * <p>The error is no monotone function of the time: it may ring, and a reservoir that has shared
 * its charge drifts again. So the times are walked from the longest down, in steps that are small
 * against the time itself, to the first that does not suffice. As long as an oscillation matters,
 * each step is looked at over one whole oscillation; between the steps its swing changes steadily.
 * A summit between two looks that comes near the allowance is searched.
 */
final class AcquisitionSearch {
  /** Eight steps an octave, four where nothing rings. */
  private static final double STEP_RATIO = FastMath.pow(2, -1.0 / 8);

  private static final double STEADY_STEP_RATIO = FastMath.pow(2, -1.0 / 4);

  private static final int LOOKS_PER_OSCILLATION = 16;

  /** An oscillation matters until it has fallen to this part of the allowance. */
  private static final double NEGLIGIBLE = 0.03;

  /** Of the allowance: between two looks a summit rises by less than the rest. */
  private static final double NEAR = 0.8;

  private final SampledLadder sampled;
  private final List<Visit> visits;
  private final double period;
  private final double[] low;
  private final double[] high;
  private final double allowance;
  private final double longest;

  /** Length of one oscillation in s, and the time until which it matters; 0 where none is. */
  private final double oscillation;

  private final double ringsUntil;

  /** The last two looks on the way down, both within the allowance. */
  private double recentTime;

  private double recentError;
  private double laterTime;
  private double laterError;

  AcquisitionSearch(
      SampledLadder sampled,
      List<Visit> visits,
      double period,
      double[] low,
      double[] high,
      double allowance,
      double longest) {
    this.sampled = sampled;
    this.visits = visits;
    this.period = period;
    this.low = low;
    this.high = high;
    this.allowance = allowance;
    this.longest = Math.min(longest, shortestSpacing());
    Propagator.Ringing ringing = sampled.acquiring().flatMap(Propagator::ringing).orElse(null);
    oscillation = ringing == null ? 0 : 2 * Math.PI / ringing.angular();
    ringsUntil = ringing == null ? 0 : negligibleFrom(ringing.decay());
  }

  private double negligibleFrom(double decay) {
    double largest = 0;
    for (int i = 0; i < low.length; i++) {
      largest = Math.max(largest, Math.max(Math.abs(low[i]), Math.abs(high[i])));
    }
    return FastMath.log(1 + largest / (NEGLIGIBLE * allowance)) / decay;
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

  /** Empty where the longest time does not suffice. */
  OptionalDouble find() {
    if (!(longest >= 0 && worst(longest) <= allowance)) {
      return OptionalDouble.empty();
    }
    startAt(longest);
    double negligible = 1e-3 / sampled.acquiring().map(Propagator::fastestRate).orElse(1.0);
    double ratio = oscillation == 0 ? STEADY_STEP_RATIO : STEP_RATIO;
    double time = longest;
    while (time > 0) {
      double next = time > negligible ? time * ratio : 0;
      OptionalDouble crossing =
          next < ringsUntil && time - next > 2 * oscillation
              ? overManyOscillations(next, time)
              : walk(time, next);
      if (crossing.isPresent()) {
        return crossing;
      }
      time = next;
    }
    return OptionalDouble.of(0);
  }

  private OptionalDouble overManyOscillations(double low, double high) {
    if (!failsWithinOscillation(low)) {
      startAt(low);
      return OptionalDouble.empty();
    }
    double fails = low;
    double suffices = high;
    while (suffices - fails > oscillation) {
      double middle = fails + (suffices - fails) / 2;
      if (failsWithinOscillation(middle)) {
        fails = middle;
      } else {
        suffices = middle;
      }
    }
    double from = Math.min(longest, suffices + 3 * oscillation);
    startAt(from);
    return walk(from, low);
  }

  private boolean failsWithinOscillation(double from) {
    for (int i = 0; i <= LOOKS_PER_OSCILLATION; i++) {
      double time = Math.min(longest, from + i * oscillation / LOOKS_PER_OSCILLATION);
      if (worst(time) > allowance) {
        return true;
      }
    }
    return false;
  }

  private void startAt(double time) {
    recentTime = time;
    recentError = worst(time);
    laterTime = time;
    laterError = Double.POSITIVE_INFINITY;
  }

  /** Looks at each time on the way down; in fine steps while an oscillation matters. */
  private OptionalDouble walk(double from, double to) {
    double time = from;
    while (time > to) {
      double step =
          to < ringsUntil && oscillation > 0 ? oscillation / LOOKS_PER_OSCILLATION : time - to;
      time = Math.max(to, time - step);
      OptionalDouble crossing = look(time);
      if (crossing.isPresent()) {
        return crossing;
      }
    }
    return OptionalDouble.empty();
  }

  private OptionalDouble look(double time) {
    double error = worst(time);
    if (error > allowance) {
      return OptionalDouble.of(crossing(time, recentTime));
    }
    if (recentError > NEAR * allowance && recentError > error && recentError >= laterError) {
      double summit = summit(time, laterTime);
      if (worst(summit) > allowance) {
        return OptionalDouble.of(crossing(summit, laterTime));
      }
    }
    laterTime = recentTime;
    laterError = recentError;
    recentTime = time;
    recentError = error;
    return OptionalDouble.empty();
  }

  /** The largest magnitude of the held error over all visits, for one common acquisition. */
  private double worst(double acquisition) {
    List<Visit> common =
        visits.stream().map(visit -> new Visit(visit.start(), acquisition)).toList();
    double worst = 0;
    double[][] residuals = sampled.residuals(common, period);
    for (Settling.Extremes extremes : Settling.extremes(residuals, low, high)) {
      worst = Math.max(worst, extremes.worst());
    }
    return worst;
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
