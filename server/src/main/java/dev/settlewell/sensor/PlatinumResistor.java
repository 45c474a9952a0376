package dev.settlewell.sensor;

/**
 * Platinum resistance thermometers after IEC 60751: resistance in ohm over temperature in °C.
 *
 * <p>R(t) = R0 (1 + A t + B t²) at and above 0 °C and R0 (1 + A t + B t² + C (t - 100 °C) t³)
 * below, with A = 3.9083e-3 /°C, B = -5.775e-7 /°C², C = -4.183e-12 /°C⁴, from -200 °C to 850 °C
 * (IEC 60751:2008, clause 4.2).
 */
public final class PlatinumResistor {
  private static final double LOW = -200;
  private static final double HIGH = 850;
  private static final double A = 3.9083e-3;
  private static final double B = -5.775e-7;
  private static final double C = -4.183e-12;

  /**
   * The tolerance classes of thermometers of IEC 60751:2008, table 4 (from memory): the limit is
   * {@code base + slope |t|} in °C, and each construction keeps to it over its own range.
   */
  public enum ToleranceClass {
    AA(0.1, 0.0017, -50, 250, 0, 150),
    A(0.15, 0.002, -100, 450, -30, 300),
    B(0.3, 0.005, -196, 600, -50, 500),
    C(0.6, 0.01, -196, 600, -50, 600);

    private final double base;
    private final double slope;
    private final double wireWoundLow;
    private final double wireWoundHigh;
    private final double filmLow;
    private final double filmHigh;

    ToleranceClass(
        double base,
        double slope,
        double wireWoundLow,
        double wireWoundHigh,
        double filmLow,
        double filmHigh) {
      this.base = base;
      this.slope = slope;
      this.wireWoundLow = wireWoundLow;
      this.wireWoundHigh = wireWoundHigh;
      this.filmLow = filmLow;
      this.filmHigh = filmHigh;
    }

    /** The low end of the class for wire-wound resistors, °C. */
    public double wireWoundLow() {
      return wireWoundLow;
    }

    /** The high end of the class for wire-wound resistors, °C. */
    public double wireWoundHigh() {
      return wireWoundHigh;
    }

    /** The low end of the class for film resistors, °C. */
    public double filmLow() {
      return filmLow;
    }

    /** The high end of the class for film resistors, °C. */
    public double filmHigh() {
      return filmHigh;
    }
  }

  private PlatinumResistor() {}

  /**
   * The curve of a resistor.
   *
   * @param r0 resistance at 0 °C, ohm, above 0
   * @throws IllegalArgumentException when it is not
   */
  public static Curve of(double r0) {
    if (!(r0 > 0 && r0 < Double.POSITIVE_INFINITY)) {
      throw new IllegalArgumentException("resistance at 0 °C out of range: " + r0);
    }
    return new FormulaCurve(
        LOW, HIGH, celsius -> r0 * ratio(celsius), ohm -> temperature(ohm / r0));
  }

  /**
   * The limit of error of a class, in °C: the formula of the class over the whole curve, whatever
   * the construction. Outside the range of its construction (see {@link ToleranceClass}) a maker
   * promises it only by agreement.
   *
   * @return NaN outside -200 °C to 850 °C
   */
  public static double tolerance(ToleranceClass tolerance, double celsius) {
    return LOW <= celsius && celsius <= HIGH
        ? tolerance.base + tolerance.slope * Math.abs(celsius)
        : Double.NaN;
  }

  /** R(t) / R0. */
  private static double ratio(double t) {
    double cubic = t < 0 ? C * (t - 100) * t : 0;
    return 1 + t * (A + t * (B + cubic));
  }

  private static double temperature(double ratio) {
    // The root of the parabola nearest 0 °C, in the form that loses no digits.
    double parabola = 2 * (ratio - 1) / (A + Math.sqrt(A * A + 4 * B * (ratio - 1)));
    return ratio >= 1
        ? parabola
        : Root.rising(
            t -> ratio(t) - ratio, t -> A + t * (2 * B + C * t * (4 * t - 300)), LOW, 0, parabola);
  }
}
