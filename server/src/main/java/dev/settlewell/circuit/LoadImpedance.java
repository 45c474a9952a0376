package dev.settlewell.circuit;

import java.util.List;
import org.apache.commons.math3.complex.Complex;
import org.apache.commons.math3.util.FastMath;

/** What a source sees of a passive ladder. */
public final class LoadImpedance {
  private LoadImpedance() {}

  /**
   * Magnitude of the impedance to ground that the rungs present to their drive, the pin left open.
   *
   * <p>From the pin back: a capacitor adds j 2 π f C to the admittance, a resistor to a fixed
   * potential adds 1/R, a resistor in series adds R to the impedance. An amplifier whose load falls
   * below its open-loop output resistance at its closed-loop bandwidth is beyond the one-pole model
   * of {@link Drive.ClosedLoop} (common practice).
   *
   * @param rungs from the drive to the pin
   * @param hertz frequency in Hz, 0 or more
   * @return in Ω; infinity where nothing loads the drive
   */
  public static double magnitude(List<Rung> rungs, double hertz) {
    Values.requireNotNegative("frequency", hertz);
    // Impedance z/y, so that neither an open end (y = 0) nor a short (z = 0) is a special case.
    Complex z = Complex.ONE;
    Complex y = Complex.ZERO;
    for (int i = rungs.size() - 1; i >= 0; i--) {
      if (rungs.get(i) instanceof Rung.Capacitor capacitor) {
        y = y.add(z.multiply(new Complex(0, 2 * FastMath.PI * hertz * capacitor.farads())));
      } else if (rungs.get(i) instanceof Rung.Series series) {
        z = z.add(y.multiply(series.ohms()));
      } else if (rungs.get(i) instanceof Rung.Parallel parallel) {
        boolean shorted = parallel.ohms() == 0;
        y = shorted ? Complex.ONE : y.add(z.divide(parallel.ohms()));
        z = shorted ? Complex.ZERO : z;
      }
    }
    return z.abs() / y.abs();
  }
}
