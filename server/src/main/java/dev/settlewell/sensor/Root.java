package dev.settlewell.sensor;

import java.util.function.DoubleUnaryOperator;

/** The one root finder of the curves that have no inverse in closed form. */
final class Root {
  private static final int STEPS = 100;

  private Root() {}

  /**
   * The root of a rising function between {@code low} and {@code high}: Newton's method, with a
   * bisection wherever its step would leave the bracket. A function that keeps one sign over the
   * whole bracket gives the end nearest to zero.
   *
   * @param start where to begin; NaN begins in the middle
   */
  static double rising(
      DoubleUnaryOperator function,
      DoubleUnaryOperator slope,
      double low,
      double high,
      double start) {
    double a = low;
    double b = high;
    double x = a < start && start < b ? start : 0.5 * (a + b);
    for (int i = 0; i < STEPS; i++) {
      double f = function.applyAsDouble(x);
      if (f == 0) {
        return x;
      }
      if (f < 0) {
        a = x;
      } else {
        b = x;
      }
      double next = x - f / slope.applyAsDouble(x);
      if (!(a < next && next < b)) {
        next = 0.5 * (a + b);
      }
      if (Math.abs(next - x) <= 2 * Math.ulp(x)) {
        return next;
      }
      x = next;
    }
    return x;
  }
}
