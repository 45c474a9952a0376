package dev.settlewell.sensor;

import java.util.List;
import org.apache.commons.math3.util.FastMath;

/**
 * Thermocouples: emf in volt over temperature in °C, on the scale ITS-90.
 *
 * <p>The reference functions are those of NIST Monograph 175, which IEC 60584-1 carries too, with
 * the reference junction at 0 °C. Other junction temperatures: add emf, never temperatures (see
 * {@link #temperature}).
 */
public final class Thermocouple {
  /** The letter-designated types. */
  public enum Type {
    B,
    E,
    J,
    K,
    N,
    R,
    S,
    T
  }

  /**
   * Where the curve of type B begins, °C. Its emf falls from 0 °C to a least value of -2.6 µV at 21
   * °C and is above zero only from 42.2 °C on: below, two temperatures share each emf.
   */
  private static final double TYPE_B_LOW = 50;

  private static final double MILLIVOLT = 1e-3;

  private Thermocouple() {}

  /**
   * The curve of a type over its whole range, of type B from 50 °C.
   *
   * <p>The published pieces do not meet to the last digit: for an emf at a seam the temperature is
   * uncertain by up to 2e-6 °C.
   */
  public static Curve of(Type type) {
    List<Polynomial> pieces = ThermocoupleTables.reference(type);
    double low = type == Type.B ? TYPE_B_LOW : pieces.get(0).low;
    double high = pieces.get(pieces.size() - 1).high;
    return new FormulaCurve(low, high, celsius -> emf(type, celsius), volts -> invert(type, volts));
  }

  /**
   * The emf in volt at a temperature, reference junction at 0 °C; of type B from 0 °C on.
   *
   * @return NaN outside the range of the reference function
   */
  public static double emf(Type type, double celsius) {
    for (Polynomial piece : ThermocoupleTables.reference(type)) {
      if (piece.holds(celsius)) {
        return MILLIVOLT * millivolts(type, piece, celsius);
      }
    }
    return Double.NaN;
  }

  /**
   * The temperature of the measuring junction, in °C: the emf of the cold junction is added to the
   * measured voltage, and the sum inverted.
   *
   * @param volts measured between the terminals
   * @param coldJunction temperature of the terminals, °C
   * @return NaN outside the curve
   */
  public static double temperature(Type type, double volts, double coldJunction) {
    return of(type).inverse(volts + emf(type, coldJunction));
  }

  /**
   * The temperature by the published approximate inverse, in °C: what firmware usually computes.
   * NIST states errors of up to some hundredths of a degree.
   *
   * @return NaN outside the range of the approximation
   */
  public static double approximateInverse(Type type, double volts) {
    double millivolts = volts / MILLIVOLT;
    for (Polynomial piece : ThermocoupleTables.inverse(type)) {
      if (piece.holds(millivolts)) {
        return piece.at(millivolts);
      }
    }
    return Double.NaN;
  }

  /**
   * The limit of error of a tolerance class, in °C, after IEC 60584-1:2013 (from memory): a
   * constant or a part of the temperature, whichever is greater.
   *
   * @param toleranceClass 1, 2 or 3
   * @return NaN where the standard sets no limit for the class, the type and the temperature
   */
  public static double toleranceLimit(Type type, int toleranceClass, double celsius) {
    return switch (type) {
      case T ->
          switch (toleranceClass) {
            case 1 -> limit(celsius, -40, 350, 0.5, 0.004);
            case 2 -> limit(celsius, -40, 350, 1, 0.0075);
            case 3 -> limit(celsius, -200, 40, 1, 0.015);
            default -> Double.NaN;
          };
      case E -> baseMetal(toleranceClass, celsius, 800, 900, true);
      case J -> baseMetal(toleranceClass, celsius, 750, 750, false);
      case K, N -> baseMetal(toleranceClass, celsius, 1000, 1200, true);
      case R, S ->
          switch (toleranceClass) {
            case 1 -> within(celsius, 0, 1600, Math.max(1, 1 + 0.003 * (celsius - 1100)));
            case 2 -> limit(celsius, 0, 1600, 1.5, 0.0025);
            default -> Double.NaN;
          };
      case B ->
          switch (toleranceClass) {
            case 2 -> within(celsius, 600, 1700, 0.0025 * celsius);
            case 3 -> limit(celsius, 600, 1700, 4, 0.005);
            default -> Double.NaN;
          };
    };
  }

  private static double baseMetal(
      int toleranceClass, double celsius, double high1, double high2, boolean hasClass3) {
    return switch (toleranceClass) {
      case 1 -> limit(celsius, -40, high1, 1.5, 0.004);
      case 2 -> limit(celsius, -40, high2, 2.5, 0.0075);
      case 3 -> hasClass3 ? limit(celsius, -200, 40, 2.5, 0.015) : Double.NaN;
      default -> Double.NaN;
    };
  }

  private static double limit(
      double celsius, double low, double high, double constant, double part) {
    return within(celsius, low, high, Math.max(constant, part * Math.abs(celsius)));
  }

  private static double within(double celsius, double low, double high, double limit) {
    return low <= celsius && celsius <= high ? limit : Double.NaN;
  }

  /** The temperature whose emf is {@code volts}, which the caller knows to be in range. */
  private static double invert(Type type, double volts) {
    double millivolts = volts / MILLIVOLT;
    double start = approximateInverse(type, volts);
    List<Polynomial> pieces = ThermocoupleTables.reference(type);
    int i = 0;
    while (i + 1 < pieces.size()
        && millivolts > millivolts(type, pieces.get(i), pieces.get(i).high)) {
      i++;
    }
    Polynomial piece = pieces.get(i);
    double low = type == Type.B ? Math.max(TYPE_B_LOW, piece.low) : piece.low;
    return Root.rising(
        t -> millivolts(type, piece, t) - millivolts,
        t -> slope(type, piece, t),
        low,
        piece.high,
        start);
  }

  private static double millivolts(Type type, Polynomial piece, double t) {
    return type == Type.K && piece.low == 0 ? piece.at(t) + bump(t) : piece.at(t);
  }

  private static double slope(Type type, Polynomial piece, double t) {
    return type == Type.K && piece.low == 0
        ? piece.slope(t) + bump(t) * 2 * ThermocoupleTables.K_A1 * (t - ThermocoupleTables.K_A2)
        : piece.slope(t);
  }

  /** The exponential term of type K, in mV. */
  private static double bump(double t) {
    double distance = t - ThermocoupleTables.K_A2;
    return ThermocoupleTables.K_A0 * FastMath.exp(ThermocoupleTables.K_A1 * distance * distance);
  }
}
