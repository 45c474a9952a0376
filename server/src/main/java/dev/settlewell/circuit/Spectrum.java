package dev.settlewell.circuit;

import java.util.List;
import java.util.function.DoubleUnaryOperator;
import org.apache.commons.math3.util.FastMath;

/**
 * The stretch of the frequency axis that holds every pole of a chain, and integrals over the whole
 * axis that know where to look.
 *
 * <p>Bounds of an RC section: the slowest time constant is at most the sum of all resistances times
 * the sum of all capacitances; the fastest rate is at most twice the sum of all conductances over
 * the least capacitance (Gershgorin's theorem on C^-1 G). An amplifier's output impedance counts as
 * its whole resistance, which puts its resonance with a load inside the stretch.
 *
 * @param low in hertz; infinity where there is no pole
 * @param high in hertz; 0 where there is no pole
 */
record Spectrum(double low, double high) {
  /** Beyond the outermost pole a spectrum holds about e^-27 = 2e-12 of its integral. */
  private static final double REACH = 27;

  private static final double COARSEST_STEP = 0.3;
  private static final double FINEST_STEP = 5e-4;

  /** Halving a step squares the error: two sums this near mean that the finer is good to 1e-11. */
  private static final double TOLERANCE = 1e-6;

  private static final Spectrum NONE = new Spectrum(Double.POSITIVE_INFINITY, 0);

  static Spectrum of(double sourceOhms, List<? extends Element> chain) {
    Spectrum whole = NONE;
    Section section = new Section(sourceOhms);
    for (Element element : chain) {
      if (element instanceof Rung rung) {
        section.add(rung);
      } else {
        whole = whole.and(section.spectrum()).and(ofBuffer(element));
        section = new Section(drivingOhms(element));
      }
    }
    return whole.and(section.spectrum());
  }

  boolean hasPoles() {
    return high > 0;
  }

  /**
   * The integral of {@code density} from 0 Hz to infinity, for a spectrum that is flat below the
   * lowest pole and falls at least as 1/f^2 above the highest.
   *
   * <p>The trapezoidal rule in ln f, halved until it stands: for an analytic integrand its error
   * falls as exp(-2 pi d / step), d being the angle between the nearest pole and the imaginary axis
   * (Trefethen and Weideman, SIAM Review 56 (2014), 385). Relative error below 1e-10.
   */
  double integral(DoubleUnaryOperator density) {
    double from = FastMath.log(low) - REACH;
    double to = FastMath.log(high) + REACH;
    double step = COARSEST_STEP;
    double sum = sum(density, from, to, step);
    double integral = sum * step;
    while (step > FINEST_STEP) {
      sum += sum(density, from + step / 2, to, step);
      step /= 2;
      double finer = sum * step;
      if (Math.abs(finer - integral) <= TOLERANCE * Math.abs(finer)) {
        return finer;
      }
      integral = finer;
    }
    return integral;
  }

  private static double sum(DoubleUnaryOperator density, double from, double to, double step) {
    double sum = 0;
    int count = (int) ((to - from) / step);
    for (int i = 0; i <= count; i++) {
      double hertz = FastMath.exp(from + i * step);
      sum += hertz * density.applyAsDouble(hertz);
    }
    return sum;
  }

  private Spectrum and(Spectrum other) {
    return new Spectrum(Math.min(low, other.low), Math.max(high, other.high));
  }

  private static Spectrum ofBuffer(Element buffer) {
    if (buffer instanceof Amplifier amplifier) {
      return Double.isInfinite(amplifier.poleHertz())
          ? NONE
          : new Spectrum(amplifier.poleHertz(), amplifier.poleHertz());
    }
    Spectrum spectrum = NONE;
    for (var pole : ((ActiveFilter) buffer).response().poles()) {
      double hertz = pole.abs() / (2 * FastMath.PI);
      spectrum = spectrum.and(new Spectrum(hertz, hertz));
    }
    return spectrum;
  }

  /** The resistance that a buffer can show to what it drives. */
  static double drivingOhms(Element buffer) {
    if (buffer instanceof Amplifier amplifier) {
      return Double.isInfinite(amplifier.poleHertz()) ? 0 : amplifier.outputOhms();
    }
    return ((ActiveFilter) buffer).outputOhms();
  }

  /** What the passive elements between two buffers add up to. */
  private static final class Section {
    private double ohms;
    private double siemens;
    private double farads;
    private double leastFarads = Double.POSITIVE_INFINITY;

    /** False while the node is that of an ideal voltage source: a capacitor there does nothing. */
    private boolean behindResistance;

    Section(double sourceOhms) {
      resistor(sourceOhms);
      behindResistance = sourceOhms > 0;
    }

    void add(Rung rung) {
      if (rung instanceof Rung.Series series) {
        resistor(series.ohms());
        behindResistance |= series.ohms() > 0;
      } else if (rung instanceof Rung.Parallel parallel) {
        resistor(parallel.ohms());
      } else if (rung instanceof Rung.Capacitor capacitor
          && behindResistance
          && capacitor.farads() > 0) {
        farads += capacitor.farads();
        leastFarads = Math.min(leastFarads, capacitor.farads());
      }
    }

    Spectrum spectrum() {
      if (farads == 0 || siemens == 0) {
        return NONE;
      }
      double turn = 2 * FastMath.PI;
      return new Spectrum(1 / (turn * ohms * farads), 2 * siemens / (turn * leastFarads));
    }

    private void resistor(double value) {
      if (value > 0 && !Double.isInfinite(value)) {
        ohms += value;
        siemens += 1 / value;
      }
    }
  }
}
