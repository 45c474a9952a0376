package dev.settlewell.sensor;

/** What a sensor's own dissipation does to its temperature. */
public final class SelfHeating {
  private SelfHeating() {}

  /**
   * The rise above the surroundings, in kelvin, once settled: P / D (IEC 60539-1, the definition of
   * the dissipation factor).
   *
   * @param watts P, dissipated in the sensor
   * @param wattsPerKelvin D, dissipation constant in the medium it is in, above 0
   */
  public static double rise(double watts, double wattsPerKelvin) {
    return wattsPerKelvin > 0 ? watts / wattsPerKelvin : Double.NaN;
  }
}
