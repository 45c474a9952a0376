package dev.settlewell.circuit;

/**
 * Where a sine lands after sampling: {@code |f - round(f/f_o) f_o|}, from 0 to half the rate of
 * results f_o. Source: the sampling theorem, as in any text on the discrete Fourier transform.
 */
public final class Aliasing {
  /**
   * How near to a multiple of the rate, as a share of the rate, a line counts as standing still.
   */
  private static final double STANDING = 0.01;

  private Aliasing() {}

  /** The frequency at which results taken {@code outputRate} times a second show the sine. */
  public static double landing(double hertz, double outputRate) {
    return Math.abs(StrictMath.IEEEremainder(hertz, outputRate));
  }

  /** The frequencies, in hertz, at which a line may land. */
  public record Landing(double low, double high) {
    /** True where the line can land at or below the frequency. */
    public boolean reaches(double hertz) {
      return low <= hertz;
    }
  }

  /**
   * The exact span of where a line anywhere from {@code lowHertz} to {@code highHertz} may land
   * when the rate of results is anywhere from {@code lowRate} to {@code highRate}.
   *
   * <p>The landing is piecewise linear in both; its pieces meet where f is a multiple of the rate
   * (it lands at 0) and where f is an odd multiple of half the rate (a fold, it lands at half the
   * rate). So the lowest landing is 0 or at a corner of the tolerance box, the highest at a corner
   * or where a fold leaves the box towards higher rates.
   */
  public static Landing landing(
      double lowHertz, double highHertz, double lowRate, double highRate) {
    double low = Double.POSITIVE_INFINITY;
    double high = 0;
    for (double hertz : new double[] {lowHertz, highHertz}) {
      for (double rate : new double[] {lowRate, highRate}) {
        low = Math.min(low, landing(hertz, rate));
        high = Math.max(high, landing(hertz, rate));
      }
    }
    if (Math.ceil(lowHertz / highRate) <= highHertz / lowRate) {
      low = 0;
    }
    if (Math.ceil(lowHertz / highRate - 0.5) + 0.5 <= highHertz / highRate) {
      return new Landing(low, highRate / 2);
    }
    double foldedRate = highHertz / (Math.ceil(highHertz / highRate - 0.5) + 0.5);
    if (foldedRate >= lowRate && foldedRate <= highRate) {
      high = Math.max(high, foldedRate / 2);
    }
    return new Landing(low, high);
  }

  /**
   * True where a sine of this nominal frequency reads as an offset that never averages away: it is
   * within 1 % of the result rate of a multiple (not zero) of that rate.
   */
  public static boolean readsAsOffset(double hertz, double resultRate) {
    return Math.rint(hertz / resultRate) >= 1
        && landing(hertz, resultRate) <= STANDING * resultRate;
  }
}
