package dev.settlewell.circuit;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.apache.commons.math3.analysis.solvers.BrentSolver;
import org.apache.commons.math3.complex.Complex;
import org.apache.commons.math3.optim.MaxEval;
import org.apache.commons.math3.optim.nonlinear.scalar.GoalType;
import org.apache.commons.math3.optim.univariate.BrentOptimizer;
import org.apache.commons.math3.optim.univariate.SearchInterval;
import org.apache.commons.math3.optim.univariate.UnivariateObjectiveFunction;
import org.apache.commons.math3.optim.univariate.UnivariatePointValuePair;
import org.apache.commons.math3.util.FastMath;

/**
 * The response of a signal path to a voltage in series with the source, over frequency.
 *
 * <p>The path is solved as a circuit: from the source on, the Thevenin equivalent (voltage and
 * impedance) is carried from element to element, so that passive sections load each other as they
 * do on the board; an amplifier or active filter begins anew with its own output impedance. With a
 * {@link Sampler} the output is the hold capacitor as connected during acquisition; without one it
 * is the pin.
 *
 * <p>Frequencies in Hz, 0 or more; resistances in ohms. An infinite source resistance (a current
 * source) lets nothing through: make the shunt part of the Thevenin source first. Source: linear
 * network theory, any text on two-ports.
 */
public final class FrequencyResponse {
  /** Steps a decade in the search for the corner: finer than the ripple of an eighth order. */
  private static final int STEPS_A_DECADE = 32;

  private FrequencyResponse() {}

  /** Complex gain from the source to the hold capacitor, V/V; at 0 Hz the gain at DC. */
  public static Complex transfer(
      double sourceOhms, List<? extends Element> chain, Sampler sampler, double hertz) {
    return transfer(sourceOhms, acquiring(chain, sampler), hertz);
  }

  /** Complex gain from the source to the last node of the chain, V/V. */
  public static Complex transfer(double sourceOhms, List<? extends Element> chain, double hertz) {
    return Thevenin.of(sourceOhms, chain, hertz).voltage();
  }

  /**
   * Absolute magnitude of {@link #transfer}, V/V: what an interferer's amplitude is multiplied by.
   */
  public static double gain(
      double sourceOhms, List<? extends Element> chain, Sampler sampler, double hertz) {
    return gain(sourceOhms, acquiring(chain, sampler), hertz);
  }

  /** Absolute magnitude at the last node of the chain, V/V. */
  public static double gain(double sourceOhms, List<? extends Element> chain, double hertz) {
    return transfer(sourceOhms, chain, hertz).abs();
  }

  /**
   * Magnitude relative to DC: 1 at 0 Hz, 1 less the droop at the band's edge. 0 where the path lets
   * nothing through at DC.
   */
  public static double relativeGain(
      double sourceOhms, List<? extends Element> chain, Sampler sampler, double hertz) {
    return relativeGain(sourceOhms, acquiring(chain, sampler), hertz);
  }

  /** Magnitude at the last node of the chain, relative to DC. */
  public static double relativeGain(
      double sourceOhms, List<? extends Element> chain, double hertz) {
    double atDc = gain(sourceOhms, chain, 0);
    return atDc == 0 ? 0 : gain(sourceOhms, chain, hertz) / atDc;
  }

  /**
   * The largest absolute magnitude, V/V, for a line anywhere from {@code lowHertz} to {@code
   * highHertz}. A passive path has real poles only, so that its gain falls with frequency;
   * resonances of buffers are searched on a grid of {@value #STEPS_A_DECADE} steps a decade and
   * then exactly.
   */
  public static double worstGain(
      double sourceOhms,
      List<? extends Element> chain,
      Sampler sampler,
      double lowHertz,
      double highHertz) {
    List<Element> whole = acquiring(chain, sampler);
    double worst = gain(sourceOhms, whole, lowHertz);
    if (whole.stream().allMatch(Rung.class::isInstance) || !(lowHertz < highHertz)) {
      return worst;
    }
    Spectrum spectrum = Spectrum.of(sourceOhms, whole);
    // Below a hundredth of the lowest pole nothing bends, and a logarithm wants no zero.
    double from = FastMath.log10(Math.max(lowHertz, Math.min(highHertz, spectrum.low()) / 100));
    double to = FastMath.log10(highHertz);
    int steps = 2 + (int) ((to - from) * STEPS_A_DECADE);
    double step = (to - from) / steps;
    double best = from;
    for (int i = 0; i <= steps; i++) {
      double decades = from + i * step;
      double gain = gain(sourceOhms, whole, FastMath.pow(10, decades));
      if (gain > worst) {
        worst = gain;
        best = decades;
      }
    }
    UnivariatePointValuePair peak =
        new BrentOptimizer(1e-9, 1e-12)
            .optimize(
                new MaxEval(200),
                GoalType.MAXIMIZE,
                new UnivariateObjectiveFunction(x -> gain(sourceOhms, whole, FastMath.pow(10, x))),
                new SearchInterval(Math.max(from, best - step), Math.min(to, best + step), best));
    return Math.max(worst, peak.getValue());
  }

  /** Absolute magnitudes, V/V, at each of the frequencies. */
  public static double[] gains(
      double sourceOhms, List<? extends Element> chain, Sampler sampler, double[] hertz) {
    List<Element> whole = acquiring(chain, sampler);
    double[] gains = new double[hertz.length];
    for (int i = 0; i < hertz.length; i++) {
      gains[i] = gain(sourceOhms, whole, hertz[i]);
    }
    return gains;
  }

  /**
   * The lowest frequency, in hertz, at which the power has fallen to half of that at DC (-3.01 dB);
   * empty where it never does, or where nothing passes at DC.
   */
  public static OptionalDouble corner(
      double sourceOhms, List<? extends Element> chain, Sampler sampler) {
    return corner(sourceOhms, acquiring(chain, sampler));
  }

  /** The corner at the last node of the chain. */
  public static OptionalDouble corner(double sourceOhms, List<? extends Element> chain) {
    Spectrum spectrum = Spectrum.of(sourceOhms, chain);
    double half = gain(sourceOhms, chain, 0) * FastMath.sqrt(0.5);
    if (half == 0 || !spectrum.hasPoles()) {
      return OptionalDouble.empty();
    }
    // N coinciding poles bring the corner below the lowest of them by the square root of N.
    double from = FastMath.log10(spectrum.low()) - 1;
    double to = FastMath.log10(spectrum.high()) + 4;
    double step = 1.0 / STEPS_A_DECADE;
    if (gain(sourceOhms, chain, FastMath.pow(10, from)) <= half) {
      return OptionalDouble.of(FastMath.pow(10, from));
    }
    for (double at = from; at < to; at += step) {
      if (gain(sourceOhms, chain, FastMath.pow(10, at + step)) <= half) {
        double exponent =
            new BrentSolver(1e-14, 1e-14)
                .solve(
                    200,
                    x -> gain(sourceOhms, chain, FastMath.pow(10, x)) / half - 1,
                    at,
                    at + step);
        return OptionalDouble.of(FastMath.pow(10, exponent));
      }
    }
    return OptionalDouble.empty();
  }

  /**
   * Equivalent noise bandwidth in hertz: the integral of {@code |H|^2/|H(0)|^2} over frequency, so
   * that white noise of the density e at the source has the RMS value {@code e |H(0)| sqrt(B)} at
   * the hold capacitor. Infinite where the path has no pole; 0 where nothing passes at DC.
   */
  public static double noiseBandwidth(
      double sourceOhms, List<? extends Element> chain, Sampler sampler) {
    return noiseBandwidth(sourceOhms, acquiring(chain, sampler));
  }

  /** Equivalent noise bandwidth at the last node of the chain. */
  public static double noiseBandwidth(double sourceOhms, List<? extends Element> chain) {
    Spectrum spectrum = Spectrum.of(sourceOhms, chain);
    double atDc = gain(sourceOhms, chain, 0);
    if (atDc == 0) {
      return 0;
    }
    if (!spectrum.hasPoles()) {
      return Double.POSITIVE_INFINITY;
    }
    return spectrum.integral(
        hertz -> {
          double relative = gain(sourceOhms, chain, hertz) / atDc;
          return relative * relative;
        });
  }

  /**
   * Impedance in ohms, seen back from the last node of the chain; infinite where nothing holds it.
   */
  public static Complex outputImpedance(
      double sourceOhms, List<? extends Element> chain, double hertz) {
    return Thevenin.of(sourceOhms, chain, hertz).impedance();
  }

  /**
   * Magnitude in ohms of the load that passive elements, the closed switch and the hold capacitor
   * put on what drives them; infinite at 0 Hz where no resistor leads to a fixed potential.
   */
  public static double loadOhms(List<Rung> ladder, Sampler sampler, double hertz) {
    List<Element> whole = acquiring(ladder, sampler);
    // Voltage and current at the end of an open line, carried back to its start.
    Complex volts = Complex.ONE;
    Complex amperes = Complex.ZERO;
    for (int i = whole.size() - 1; i >= 0; i--) {
      if (whole.get(i) instanceof Rung.Series series) {
        volts = volts.add(amperes.multiply(series.ohms()));
      } else if (whole.get(i) instanceof Rung.Capacitor capacitor) {
        double siemens = 2 * FastMath.PI * hertz * capacitor.farads();
        amperes = amperes.add(volts.multiply(new Complex(0, siemens)));
      } else if (whole.get(i) instanceof Rung.Parallel parallel) {
        if (parallel.ohms() == 0) {
          volts = Complex.ZERO;
          amperes = Complex.ONE;
        } else {
          amperes = amperes.add(volts.divide(parallel.ohms()));
        }
      }
    }
    return volts.abs() / amperes.abs();
  }

  /** The chain with the closed switch and the hold capacitor behind it. */
  static List<Element> acquiring(List<? extends Element> chain, Sampler sampler) {
    List<Element> whole = new ArrayList<>(chain);
    whole.add(new Rung.Series(sampler.switchOhms()));
    whole.add(new Rung.Capacitor(sampler.holdFarads()));
    return whole;
  }
}
