package dev.settlewell.circuit;

import java.util.OptionalDouble;
import java.util.function.DoubleUnaryOperator;
import org.apache.commons.math3.analysis.solvers.BrentSolver;

/**
 * How far a value must move for an error to stay within an allowance.
 *
 * <p>The caller gives the magnitude of the error as a function of the value, worst case over the
 * tolerances included. Neither function needs it monotone: values are walked in steps of an octave
 * from the side where the error is expected to be small, and the first value that does not suffice
 * ends the walk, so that everything between that side and the answer suffices.
 */
public final class Remedies {
  private static final double STEP_RATIO = 2;
  private static final double RELATIVE_ACCURACY = 1e-9;

  private Remedies() {}

  /**
   * The largest value up to which every value suffices, e.g. a factor on all resistances.
   *
   * @param error magnitude of the error as a function of the value
   * @param allowance largest magnitude allowed
   * @param lowest value to try, more than 0
   * @param highest value to try
   * @return empty where not even the lowest value suffices; the highest where all do
   */
  public static OptionalDouble largest(
      DoubleUnaryOperator error, double allowance, double lowest, double highest) {
    return furthest(error, allowance, lowest, highest, STEP_RATIO);
  }

  /**
   * The smallest value from which on every value suffices, e.g. a reservoir at the pin: with
   * growing capacitance the error first grows, because the source no longer settles, and falls only
   * where the reservoir alone fills the hold capacitor.
   *
   * @param error magnitude of the error as a function of the value
   * @param allowance largest magnitude allowed
   * @param lowest value to try, more than 0
   * @param highest value to try
   * @return empty where not even the highest value suffices; the lowest where all do
   */
  public static OptionalDouble smallest(
      DoubleUnaryOperator error, double allowance, double lowest, double highest) {
    return furthest(error, allowance, highest, lowest, 1 / STEP_RATIO);
  }

  private static OptionalDouble furthest(
      DoubleUnaryOperator error, double allowance, double from, double to, double ratio) {
    if (!(error.applyAsDouble(from) <= allowance)) {
      return OptionalDouble.empty();
    }
    double good = from;
    while (good != to) {
      double next = ratio > 1 ? Math.min(to, good * ratio) : Math.max(to, good * ratio);
      if (!(error.applyAsDouble(next) <= allowance)) {
        return OptionalDouble.of(limit(error, allowance, good, next));
      }
      good = next;
    }
    return OptionalDouble.of(to);
  }

  private static double limit(
      DoubleUnaryOperator error, double allowance, double good, double bad) {
    double low = Math.min(good, bad);
    double high = Math.max(good, bad);
    if (error.applyAsDouble(good) == allowance) {
      return good;
    }
    return new BrentSolver(RELATIVE_ACCURACY, low * RELATIVE_ACCURACY)
        .solve(200, value -> error.applyAsDouble(value) - allowance, low, high);
  }
}
