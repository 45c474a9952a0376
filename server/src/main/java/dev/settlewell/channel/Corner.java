package dev.settlewell.channel;

import java.util.ArrayList;
import java.util.List;
import java.util.function.ToDoubleFunction;

/**
 * The worst corner of a box of tolerances: each parameter at the end that has the sign of its own
 * effect, all together. What has no effect of its own (a resistor that only leakage flows through)
 * goes to the end that is worse beside the others.
 */
final class Corner {
  private Corner() {}

  static double extreme(
      List<Spread> spreads,
      double[] from,
      double x,
      double ambient,
      boolean upward,
      ToDoubleFunction<double[]> value) {
    double base = value.applyAsDouble(from);
    double[] all = from.clone();
    double[] one = from.clone();
    List<Spread> undecided = new ArrayList<>();
    for (Spread spread : spreads) {
      int i = spread.parameter();
      double kept = one[i];
      ChannelModel.move(one, spread, true, x, ambient);
      double up = value.applyAsDouble(one) - base;
      one[i] = kept;
      ChannelModel.move(one, spread, false, x, ambient);
      double down = value.applyAsDouble(one) - base;
      one[i] = kept;
      if (isNothing(up, base) && isNothing(down, base)) {
        undecided.add(spread);
        continue;
      }
      double best = upward ? Math.max(up, down) : Math.min(up, down);
      if (upward ? best > 0 : best < 0) {
        ChannelModel.move(all, spread, best == up, x, ambient);
      }
    }
    return besides(undecided, all, x, ambient, upward, value);
  }

  /** Whether an effect is rounding. */
  static boolean isNothing(double effect, double base) {
    return Math.abs(effect) <= 1e-12 * Math.abs(base);
  }

  private static double besides(
      List<Spread> undecided,
      double[] all,
      double x,
      double ambient,
      boolean upward,
      ToDoubleFunction<double[]> value) {
    double worst = value.applyAsDouble(all);
    for (Spread spread : undecided) {
      int i = spread.parameter();
      double kept = all[i];
      double end = kept;
      for (boolean up : new boolean[] {true, false}) {
        all[i] = kept;
        ChannelModel.move(all, spread, up, x, ambient);
        double there = value.applyAsDouble(all);
        if (upward ? there > worst : there < worst) {
          worst = there;
          end = all[i];
        }
      }
      all[i] = end;
    }
    return worst;
  }
}
