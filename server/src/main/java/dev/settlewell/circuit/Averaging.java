package dev.settlewell.circuit;

import org.apache.commons.math3.analysis.solvers.BrentSolver;
import org.apache.commons.math3.util.FastMath;

/**
 * How the mean of several samples weakens a sine, against the sine's frequency.
 *
 * <p>The gain of the mean of M samples at the instants t_i is {@code |sum exp(-j 2 pi f t_i)| / M};
 * where the samples are evenly spaced at the rate f_s this is {@code |sin(pi M f/f_s) / (M sin(pi
 * f/f_s))|} (the Dirichlet kernel). It repeats at every multiple of f_s, where it is 1: a mean
 * filters relative to its own rate only.
 */
public final class Averaging {
  private Averaging() {}

  /**
   * Gain of the mean over samples at these true instants, 0 to 1.
   *
   * @param instants in seconds, at least one
   */
  public static double gain(double hertz, double[] instants) {
    double real = 0;
    double imaginary = 0;
    for (double instant : instants) {
      double turns = hertz * instant;
      double angle = 2 * FastMath.PI * (turns - Math.rint(turns));
      real += FastMath.cos(angle);
      imaginary += FastMath.sin(angle);
    }
    return Math.min(1, FastMath.hypot(real, imaginary) / instants.length);
  }

  /**
   * Gain of the mean of {@code count} samples taken evenly at {@code rate}, 0 to 1.
   *
   * @param rate samples per second, above 0
   * @param count at least 1
   */
  public static double evenGain(double hertz, double rate, int count) {
    // The remainder is exact, so that neither a null nor a multiple of the rate is blurred.
    return kernel(StrictMath.IEEEremainder(hertz, rate) / rate, count);
  }

  /**
   * The largest {@link #evenGain} for any frequency from {@code lowHertz} to {@code highHertz} at
   * any rate from {@code lowRate} to {@code highRate}, both ends included.
   *
   * <p>The gain depends on {@code x = f/f_s} alone and has the period 1. Where the span of x holds
   * an integer the answer is 1. Else the span lies between two integers, where the side lobes fall
   * towards the middle: the answer is at an end of the span or at the peak of an outermost lobe
   * whose peak lies inside. The cost depends neither on the span nor on the count.
   */
  public static double worstEvenGain(
      double lowHertz, double highHertz, double lowRate, double highRate, int count) {
    double low = lowHertz / highRate;
    double high = highHertz / lowRate;
    if (count == 1 || Math.ceil(low) <= high) {
      return 1;
    }
    double worst =
        Math.max(evenGain(lowHertz, highRate, count), evenGain(highHertz, lowRate, count));
    double turn = Math.floor(low);
    double from = low - turn;
    double to = high - turn;
    int first = (int) Math.floor(from * count);
    int last = (int) Math.floor(to * count);
    for (int lobe : new int[] {first, first + 1, last - 1, last}) {
      if (lobe >= 1 && lobe <= count - 2) {
        double peak = lobePeak(lobe, count);
        if (from <= peak && peak <= to) {
          worst = Math.max(worst, kernel(peak, count));
        }
      }
    }
    return worst;
  }

  /** Where between the nulls {@code lobe/M} and {@code (lobe+1)/M} the side lobe has its peak. */
  private static double lobePeak(int lobe, int count) {
    if (2 * lobe + 1 == count) {
      return 0.5;
    }
    if (2 * lobe + 1 > count) {
      return 1 - lobePeak(count - 1 - lobe, count);
    }
    // Below the middle the falling denominator pulls the peak towards the nearer integer.
    return new BrentSolver(1e-15, 1e-15)
        .solve(
            100,
            x -> {
              double pi = FastMath.PI;
              return count * FastMath.cos(pi * count * x) * FastMath.sin(pi * x)
                  - FastMath.sin(pi * count * x) * FastMath.cos(pi * x);
            },
            (double) lobe / count,
            (lobe + 0.5) / count);
  }

  /** The Dirichlet kernel at {@code x} periods per sample. */
  private static double kernel(double x, int count) {
    double fraction = x - Math.rint(x);
    if (fraction == 0) {
      return 1;
    }
    double turns = count * fraction / 2;
    double numerator = FastMath.sin(2 * FastMath.PI * (turns - Math.rint(turns)));
    return Math.min(1, Math.abs(numerator / (count * FastMath.sin(FastMath.PI * fraction))));
  }
}
