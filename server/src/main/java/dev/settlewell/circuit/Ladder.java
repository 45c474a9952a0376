package dev.settlewell.circuit;

import java.util.List;

/**
 * A passive ladder from its drive to the pin of a converter.
 *
 * <p>The first rung stands at the output of the drive; after the last one comes the pin node. The
 * pin's own capacitance is the last {@link Rung.Capacitor}.
 *
 * @param drive what drives the first node
 * @param rungs from the drive to the pin
 */
public record Ladder(Drive drive, List<Rung> rungs) {

  public Ladder {
    rungs = List.copyOf(rungs);
  }

  /**
   * Thevenin resistance at the pin for direct current, in Ω; infinity where no path holds the pin.
   */
  public double dcResistance() {
    // An amplifier's closed loop holds its output at direct current: the inductance is a short.
    double ohms = drive instanceof Drive.Resistive resistive ? resistive.ohms() : 0;
    for (Rung rung : rungs) {
      if (rung instanceof Rung.Series series) {
        ohms += series.ohms();
      } else if (rung instanceof Rung.Parallel parallel) {
        ohms = parallel(ohms, parallel.ohms());
      }
    }
    return ohms;
  }

  /**
   * The same ladder with every resistance, the drive's included, multiplied by a factor.
   *
   * <p>Of an amplifier's output impedance the bandwidth stays: R_o and its L scale alike.
   *
   * @param factor finite, 0 or more
   */
  public Ladder scaledResistances(double factor) {
    Values.requireFinite("factor", factor);
    return new Ladder(
        scaled(drive, factor), rungs.stream().map(rung -> scaled(rung, factor)).toList());
  }

  private static Drive scaled(Drive drive, double factor) {
    if (drive instanceof Drive.Resistive resistive) {
      return new Drive.Resistive(times(resistive.ohms(), factor));
    }
    Drive.ClosedLoop loop = (Drive.ClosedLoop) drive;
    return new Drive.ClosedLoop(loop.outputOhms() * factor, loop.hertz());
  }

  private static Rung scaled(Rung rung, double factor) {
    if (rung instanceof Rung.Series series) {
      return new Rung.Series(series.ohms() * factor);
    }
    if (rung instanceof Rung.Parallel parallel) {
      return new Rung.Parallel(times(parallel.ohms(), factor));
    }
    return rung;
  }

  /** An absent path (infinity) stays absent whatever the factor. */
  private static double times(double ohms, double factor) {
    return Double.isInfinite(ohms) ? ohms : ohms * factor;
  }

  private static double parallel(double a, double b) {
    if (Double.isInfinite(a)) {
      return b;
    }
    if (Double.isInfinite(b) || a == 0) {
      return a;
    }
    return b / (1 + b / a);
  }
}
