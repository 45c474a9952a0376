package dev.settlewell.circuit;

import java.util.OptionalInt;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.IntStream;
import org.apache.commons.math3.analysis.solvers.BrentSolver;
import org.apache.commons.math3.optim.MaxEval;
import org.apache.commons.math3.optim.nonlinear.scalar.GoalType;
import org.apache.commons.math3.optim.univariate.BrentOptimizer;
import org.apache.commons.math3.optim.univariate.SearchInterval;
import org.apache.commons.math3.optim.univariate.UnivariateObjectiveFunction;
import org.apache.commons.math3.optim.univariate.UnivariatePointValuePair;
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
  /** Beyond so many samples doubles no longer tell a lobe's peak from its middle. */
  private static final int MANY = 10_000_000;

  /** Multiples of the scan rate within which uneven visits are searched for their worst gain. */
  private static final int WIDEST_SEARCH = 8;

  private static final int POINTS_A_TURN = 24;

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

  /**
   * The smallest count whose {@link #worstEvenGain} over these spans is at most {@code gain}; empty
   * where no count up to {@code largestCount} reaches it, as always where a multiple of the rate
   * lies inside.
   */
  public static OptionalInt countFor(
      double gain,
      double lowHertz,
      double highHertz,
      double lowRate,
      double highRate,
      int largestCount) {
    if (Math.ceil(lowHertz / highRate) <= highHertz / lowRate) {
      return OptionalInt.empty();
    }
    return IntStream.rangeClosed(1, largestCount)
        .filter(n -> worstEvenGain(lowHertz, highHertz, lowRate, highRate, n) <= gain)
        .findFirst();
  }

  /**
   * The largest {@link #gain} of a mean over whole scans that visit the channel at uneven instants.
   *
   * <p>The gain is that of one scan's visits times {@link #evenGain} over the scans, both functions
   * of {@code x = f/f_s}. Evenly spread visits are {@link #worstEvenGain} at their own rate. Else
   * the sum is limited in how fast it can turn (Bernstein's inequality), so that {@value
   * #POINTS_A_TURN} points a turn miss its highest lobe by less than 1 %; over a span of more than
   * {@value #WIDEST_SEARCH} multiples of the scan rate the answer is the bound 1, which some
   * multiple comes near.
   *
   * @param phases of the visits within one scan, as shares of its period from 0 to 1, rising
   * @param scans in one mean
   */
  public static double worstGain(
      double lowHertz,
      double highHertz,
      double lowRate,
      double highRate,
      double[] phases,
      int scans) {
    int visits = phases.length;
    if (areEven(phases)) {
      return worstEvenGain(
          lowHertz, highHertz, visits * lowRate, visits * highRate, visits * scans);
    }
    double low = lowHertz / highRate;
    double high = highHertz / lowRate;
    if (high - low > WIDEST_SEARCH) {
      return 1;
    }
    DoubleUnaryOperator gain = x -> gain(x, phases) * kernel(x, scans);
    if (low == high) {
      return gain.applyAsDouble(low);
    }
    double step = 1.0 / (POINTS_A_TURN * scans);
    double best = high;
    for (double x = low; x < high; x += step) {
      best = gain.applyAsDouble(x) > gain.applyAsDouble(best) ? x : best;
    }
    UnivariatePointValuePair peak =
        new BrentOptimizer(1e-10, 1e-14)
            .optimize(
                new MaxEval(200),
                GoalType.MAXIMIZE,
                new UnivariateObjectiveFunction(gain::applyAsDouble),
                new SearchInterval(Math.max(low, best - step), Math.min(high, best + step), best));
    return Math.max(peak.getValue(), gain.applyAsDouble(best));
  }

  private static boolean areEven(double[] phases) {
    for (int i = 1; i < phases.length; i++) {
      if (Math.abs(phases[i] - phases[0] - (double) i / phases.length) > 1e-9) {
        return false;
      }
    }
    return true;
  }

  /**
   * Gain of an exponential average, {@code y += share (x - y)} at each sample: {@code a / |1 -
   * (1-a) exp(-j 2 pi f/f_s)|}.
   *
   * @param share of the newest sample, above 0 and at most 1
   */
  public static double exponentialGain(double hertz, double rate, double share) {
    double turns = StrictMath.IEEEremainder(hertz, rate) / rate;
    double half = FastMath.sin(FastMath.PI * turns);
    // |1 - q e^-jw|^2 = (1 - q)^2 + 4 q sin^2(w/2): no digits lost for small shares.
    return share / Math.sqrt(share * share + 4 * (1 - share) * half * half);
  }

  /** RMS of white noise behind an exponential average over that before it: sqrt(a/(2 - a)). */
  public static double exponentialNoise(double share) {
    return Math.sqrt(share / (2 - share));
  }

  /**
   * RMS of low-pass noise behind the mean of evenly spaced samples over that before it: {@code
   * 1/sqrt(M)} where the noise forgets itself between two samples, 1 where it does not move.
   *
   * <p>Noise of the bandwidth B through one pole has the autocorrelation {@code exp(-4 B |t|)};
   * more poles are taken as one of the same noise bandwidth.
   *
   * @param noiseBandwidth in hertz; infinity is white noise
   */
  public static double noise(double noiseBandwidth, double rate, int count) {
    double correlation = FastMath.exp(-4 * noiseBandwidth / rate);
    double sum = count;
    double power = 1;
    for (int lag = 1; lag < count && power > 1e-17; lag++) {
      power *= correlation;
      sum += 2 * (count - lag) * power;
    }
    return Math.sqrt(sum) / count;
  }

  /** Where between the nulls {@code lobe/M} and {@code (lobe+1)/M} the side lobe has its peak. */
  private static double lobePeak(int lobe, int count) {
    if (2 * lobe + 1 == count) {
      return 0.5;
    }
    if (2 * lobe + 1 > count) {
      return 1 - lobePeak(count - 1 - lobe, count);
    }
    if (count > MANY) {
      // Where the lobes are far narrower than a sample they peak in their middle.
      return (lobe + 0.5) / count;
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
