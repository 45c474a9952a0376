package dev.settlewell.circuit;

import java.util.List;
import java.util.OptionalDouble;

/** Settling of the hold capacitor in the periodic steady state of a scan. */
public final class Settling {
  private Settling() {}

  /**
   * Residual errors of all visits of one channel.
   *
   * @return residual[i][j] = held error (V) at the end of visit i's acquisition per volt by which
   *     the hold capacitor starts visit j away from the ladder's open-circuit voltage
   */
  public static double[][] residuals(
      Ladder ladder, Sampler sampler, List<Visit> visits, double period) {
    throw new UnsupportedOperationException("not built yet");
  }

  /**
   * Held errors in V of all visits.
   *
   * @param offsets offsets[j] = start voltage of the hold capacitor at visit j minus the ladder's
   *     open-circuit voltage, in V
   */
  public static double[] errors(
      Ladder ladder, Sampler sampler, List<Visit> visits, double period, double[] offsets) {
    throw new UnsupportedOperationException("not built yet");
  }

  /**
   * The last time at which the worst error crosses the allowance, all acquisitions set to that
   * common time, period and starts held; empty where none up to {@code longest} does.
   */
  public static OptionalDouble requiredAcquisition(
      Ladder ladder,
      Sampler sampler,
      List<Visit> visits,
      double period,
      double[] offsets,
      double allowance,
      double longest) {
    throw new UnsupportedOperationException("not built yet");
  }
}
