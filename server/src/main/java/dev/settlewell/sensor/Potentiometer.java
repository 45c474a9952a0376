package dev.settlewell.sensor;

/** A potentiometer as a voltage divider. */
public final class Potentiometer {
  private Potentiometer() {}

  /**
   * The resistance seen at the wiper with the track across a stiff source: the two parts of the
   * track in parallel, R f (1 - f). Zero at both ends, a quarter of the track in the middle.
   *
   * @param total resistance of the track, ohm
   * @param fraction f, the wiper's place, 0 to 1
   */
  public static double wiperResistance(double total, double fraction) {
    return 0 <= fraction && fraction <= 1 ? total * fraction * (1 - fraction) : Double.NaN;
  }
}
