package dev.settlewell.unit;

/**
 * A limit of error, {@code -minus … +plus}, both magnitudes.
 *
 * @param minus not negative, in the coherent unit: a share (0.01 for 1 %) where the unit is %, ppm
 * @param plus not negative, likewise
 * @param of what a share is of, as far as the text says
 */
public record Tolerance(double minus, double plus, Unit unit, Of of) {
  /** What a percentage is of. */
  public enum Of {
    UNSAID,
    READING,
    SPAN,
    FULL_SCALE
  }

  public boolean isShare() {
    return unit.dimension() == Dimension.RATIO;
  }
}
