package dev.settlewell.sensor;

/**
 * A curve through points, joined by straight lines: a table out of a data sheet or a calibration.
 *
 * <p>The points may be listed from either end; y may rise or fall with x.
 */
public final class PiecewiseLinear implements Curve {
  private final double[] x;
  private final double[] y;

  /**
   * The curve through the points (x[i], y[i]).
   *
   * @throws IllegalArgumentException unless there are two points or more, all finite, and both x
   *     and y strictly rise or fall throughout
   */
  public PiecewiseLinear(double[] x, double[] y) {
    if (x.length != y.length || x.length < 2) {
      throw new IllegalArgumentException("a table needs two points or more");
    }
    this.x = x.clone();
    this.y = y.clone();
    if (!monotone(x) || !monotone(y)) {
      throw new IllegalArgumentException("a table must rise or fall throughout");
    }
  }

  private static boolean monotone(double[] values) {
    double direction = Math.signum(values[1] - values[0]);
    for (int i = 1; i < values.length; i++) {
      double step = (values[i] - values[i - 1]) * direction;
      if (!(step > 0 && step < Double.POSITIVE_INFINITY)) {
        return false;
      }
    }
    return true;
  }

  /**
   * The segment {@code x} lies in: i for "between point i and point i + 1, as listed". A point
   * belongs to the segment before it, the first to the one after. -1 outside the domain.
   */
  public int segment(double x) {
    return segment(this.x, x);
  }

  private static int segment(double[] values, double value) {
    boolean rising = values[0] < values[values.length - 1];
    for (int i = 0; i + 1 < values.length; i++) {
      double low = rising ? values[i] : values[i + 1];
      double high = rising ? values[i + 1] : values[i];
      if (low <= value && value <= high) {
        return i;
      }
    }
    return -1;
  }

  @Override
  public double at(double x) {
    return interpolate(this.x, y, x);
  }

  @Override
  public double inverse(double y) {
    return interpolate(this.y, x, y);
  }

  private static double interpolate(double[] from, double[] to, double value) {
    int i = segment(from, value);
    if (i < 0) {
      return Double.NaN;
    }
    // From the nearer point, so that every point of the table comes out exactly.
    int near = Math.abs(value - from[i]) <= Math.abs(value - from[i + 1]) ? i : i + 1;
    return to[near] + (to[i + 1] - to[i]) / (from[i + 1] - from[i]) * (value - from[near]);
  }

  @Override
  public double low() {
    return Math.min(x[0], x[x.length - 1]);
  }

  @Override
  public double high() {
    return Math.max(x[0], x[x.length - 1]);
  }
}
