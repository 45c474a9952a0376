package dev.settlewell.circuit;

import java.util.function.ToDoubleFunction;

/** Bounded local search for the worst case over a box of tolerances. */
public final class WorstCase {
  private WorstCase() {}

  /** Where the worst case found lies, and its value. */
  public record Result(double[] point, double value) {}

  /**
   * Maximises a function over a box.
   *
   * @param corner true: only the two ends are tried (monotone parameters)
   * @param evaluations at most so many calls of the function
   */
  public static Result maximise(
      ToDoubleFunction<double[]> f,
      double[] low,
      double[] high,
      boolean[] corner,
      int evaluations) {
    throw new UnsupportedOperationException("not built yet");
  }
}
