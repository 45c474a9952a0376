package dev.settlewell.circuit;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/**
 * Settling of the hold capacitor in the periodic steady state of a scan.
 *
 * <p>Each visit of a channel connects the hold capacitor, which arrives with a foreign voltage, and
 * leaves it after the acquisition with an error; in between, the capacitors of the ladder recover.
 * The steady state is that in which every period starts as the one before. The circuit is linear,
 * so all errors are proportional to the offsets with which the hold capacitor arrives.
 *
 * <p>Domain: any ladder with values of 0 or more; visits rising and not overlapping, the last one
 * ending before the first of the next period starts (a rest that would be negative counts as none).
 * Where nothing but capacitors holds the pin there is no open-circuit voltage, and a visit keeps
 * its whole offset. Error: below 1e-9 of the offset against an independent integration (Radau IIA
 * of order 5) while time constants lie within some 12 decades of each other.
 *
 * <p>Without capacitors in the ladder this is the single pole of every data sheet, t = R C ln
 * 2^(N+1) for a full-scale step to 1/2 LSB at N bits (e.g. Texas Instruments SLAU056, chapter
 * ADC12, sample timing).
 */
public final class Settling {
  private Settling() {}

  /**
   * Held errors of all visits of one channel, for a unit offset at each.
   *
   * @param visits the visits of this channel within one period
   * @param period of the scan in s
   * @return residual[i][j] = held error (V) at the end of visit i's acquisition per volt by which
   *     the hold capacitor starts visit j away from the ladder's open-circuit voltage
   */
  public static double[][] residuals(
      Ladder ladder, Sampler sampler, List<Visit> visits, double period) {
    return new SampledLadder(ladder, sampler).residuals(visits, period);
  }

  /**
   * Held errors of all visits of one channel: held voltage less open-circuit voltage, in V.
   *
   * @param offsets offsets[j] = start voltage of the hold capacitor at visit j minus the ladder's
   *     open-circuit voltage, in V
   */
  public static double[] errors(
      Ladder ladder, Sampler sampler, List<Visit> visits, double period, double[] offsets) {
    return Matrices.times(residuals(ladder, sampler, visits, period), offsets);
  }

  /**
   * The two ends of a held error, in V.
   *
   * @param low the most negative
   * @param high the most positive
   */
  public record Extremes(double low, double high) {

    /** The larger magnitude. */
    public double worst() {
      return Math.max(Math.abs(low), Math.abs(high));
    }
  }

  /**
   * The signed ends of each visit's error where every offset may lie anywhere between two bounds,
   * independently of the others. The errors are linear in the offsets: e_i = sum r_ij o_j, so each
   * end takes of every offset the bound that the sign of r_ij asks for.
   *
   * @param residuals as {@link #residuals} gives them
   * @param low least offset at each visit in V
   * @param high greatest offset at each visit in V
   */
  public static List<Extremes> extremes(double[][] residuals, double[] low, double[] high) {
    List<Extremes> extremes = new ArrayList<>();
    for (double[] row : residuals) {
      double least = 0;
      double greatest = 0;
      for (int j = 0; j < row.length; j++) {
        least += Math.min(row[j] * low[j], row[j] * high[j]);
        greatest += Math.max(row[j] * low[j], row[j] * high[j]);
      }
      extremes.add(new Extremes(least, greatest));
    }
    return extremes;
  }

  /**
   * The last acquisition time at which the worst error of all visits crosses the allowance: from
   * there on every longer one, up to the longest, suffices. All acquisitions of the channel are set
   * to that common time; the period and the starts of the visits stay.
   *
   * @param offsets as in {@link #errors}
   * @param allowance largest magnitude of the held error in V
   * @param longest acquisition to consider in s; where the next visit of the channel starts
   *     earlier, the time until then
   * @return in s; empty where the longest does not suffice
   */
  public static OptionalDouble requiredAcquisition(
      Ladder ladder,
      Sampler sampler,
      List<Visit> visits,
      double period,
      double[] offsets,
      double allowance,
      double longest) {
    return requiredAcquisition(
        ladder, sampler, visits, period, offsets, offsets, allowance, longest);
  }

  /**
   * The same where every offset may lie anywhere between two bounds, as in {@link #extremes}.
   *
   * @param low least offset at each visit in V
   * @param high greatest offset at each visit in V
   */
  public static OptionalDouble requiredAcquisition(
      Ladder ladder,
      Sampler sampler,
      List<Visit> visits,
      double period,
      double[] low,
      double[] high,
      double allowance,
      double longest) {
    SampledLadder sampled = new SampledLadder(ladder, sampler);
    return new AcquisitionSearch(sampled, visits, period, low, high, allowance, longest).find();
  }
}
