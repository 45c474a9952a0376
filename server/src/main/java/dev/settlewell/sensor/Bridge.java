package dev.settlewell.sensor;

/** A full bridge, as in load cells and pressure sensors. */
public final class Bridge {
  private Bridge() {}

  /**
   * The differential output of a bridge, in volt: S V f.
   *
   * @param sensitivity S, output at full load per volt of excitation, V/V
   * @param excitation V, volt
   * @param fraction f, the load as a part of full load; negative where the bridge is reversed
   */
  public static double output(double sensitivity, double excitation, double fraction) {
    return sensitivity * excitation * fraction;
  }
}
