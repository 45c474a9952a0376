package dev.settlewell.circuit;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

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

  /** A line and its tolerance, in hertz. */
  public record Line(double low, double high) {}

  /** A span of rates, ends excluded, in hertz. */
  public record Rates(double low, double high) {
    private double distanceTo(double rate) {
      return Math.max(0, Math.max(low - rate, rate - high));
    }
  }

  /**
   * The span of nominal result rates nearest to {@code rate} (or around it) at which no line can
   * land in the band; empty where there is none from {@code lowest} to {@code highest}.
   *
   * <p>A line between f_1 and f_2 reaches the band from 0 to b at a rate r within the tolerance t
   * where, for some whole n, {@code (f_1 - b) / (n (1 + t)) <= r <= (f_2 + b) / (n (1 - t))}: the
   * answer is the nearest gap between these spans. A line that is in the band itself leaves none.
   *
   * @param lines an interferer's fundamental and harmonics, or those of several
   * @param tolerance of the rate, as a share of it, from 0 to below 1
   * @param bandHertz what must stay clear, 0 or more; rates that cannot carry it are left out
   * @param lowest above 0
   */
  public static Optional<Rates> ratesClearOf(
      List<Line> lines,
      double rate,
      double tolerance,
      double bandHertz,
      double lowest,
      double highest) {
    List<Rates> taken = new ArrayList<>();
    double floor = Math.max(lowest, 2 * bandHertz / (1 - tolerance));
    for (Line line : lines) {
      double from = (line.low() - bandHertz) / (1 + tolerance);
      double to = (line.high() + bandHertz) / (1 - tolerance);
      if (from <= 0) {
        return Optional.empty();
      }
      for (double n = Math.max(1, Math.ceil(from / highest)); to / n >= floor; n++) {
        boolean meetsNext = from / n <= to / (n + 1);
        taken.add(new Rates(meetsNext ? 0 : from / n, to / n));
        if (meetsNext) {
          // So do all that follow: nothing below is free.
          break;
        }
      }
    }
    taken.sort(Comparator.comparingDouble(Rates::low));
    return nearestGap(taken, rate, floor, highest);
  }

  private static Optional<Rates> nearestGap(
      List<Rates> taken, double rate, double lowest, double highest) {
    Rates nearest = null;
    double free = lowest;
    for (Rates next : taken) {
      nearest = nearer(nearest, new Rates(free, Math.min(next.low(), highest)), rate);
      free = Math.max(free, next.high());
    }
    return Optional.ofNullable(nearer(nearest, new Rates(free, highest), rate));
  }

  private static Rates nearer(Rates known, Rates gap, double rate) {
    if (!(gap.low() < gap.high())) {
      return known;
    }
    return known == null || gap.distanceTo(rate) < known.distanceTo(rate) ? gap : known;
  }
}
