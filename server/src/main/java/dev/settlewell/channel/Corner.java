package dev.settlewell.channel;

import java.util.List;
import java.util.function.ToDoubleFunction;

/**
 * The worst corner of a box of tolerances: each parameter at the end that has the sign of its own
 * effect, all together.
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
    for (Spread spread : spreads) {
      int i = spread.parameter();
      double kept = one[i];
      ChannelModel.move(one, spread, true, x, ambient);
      double up = value.applyAsDouble(one) - base;
      one[i] = kept;
      ChannelModel.move(one, spread, false, x, ambient);
      double down = value.applyAsDouble(one) - base;
      one[i] = kept;
      double best = upward ? Math.max(up, down) : Math.min(up, down);
      if (upward ? best > 0 : best < 0) {
        ChannelModel.move(all, spread, best == up, x, ambient);
      }
    }
    return value.applyAsDouble(all);
  }
}
