package dev.settlewell.channel;

/**
 * What a channel's pin does over its measured range, V: nominal, and with every error at its end.
 */
record PinRange(double nominalLow, double nominalHigh, double worstLow, double worstHigh) {

  static PinRange of(ChannelModel model) {
    double nominalLow = Double.POSITIVE_INFINITY;
    double nominalHigh = Double.NEGATIVE_INFINITY;
    double worstLow = Double.POSITIVE_INFINITY;
    double worstHigh = Double.NEGATIVE_INFINITY;
    ForwardModel forward = model.forward();
    for (double[] p : knownCorners(model)) {
      for (double x : model.points()) {
        double v = forward.volts(x, p);
        nominalLow = Math.min(nominalLow, v);
        nominalHigh = Math.max(nominalHigh, v);
        for (double ambient : model.ambients()) {
          worstLow = Math.min(worstLow, corner(model, p, x, ambient, false));
          worstHigh = Math.max(worstHigh, corner(model, p, x, ambient, true));
        }
      }
    }
    return new PinRange(nominalLow, nominalHigh, worstLow, worstHigh);
  }

  /** Nominal parameters with what varies and is known (a cold junction) at its ends. */
  static double[][] knownCorners(ChannelModel model) {
    double[] nominal = model.forward().nominal();
    if (model.known().isEmpty()) {
      return new double[][] {nominal};
    }
    double[] low = nominal.clone();
    double[] high = nominal.clone();
    for (Parameters.Known known : model.known()) {
      low[known.parameter()] = known.low();
      high[known.parameter()] = known.high();
    }
    return new double[][] {low, high};
  }

  private static double corner(
      ChannelModel model, double[] from, double x, double ambient, boolean upward) {
    return Corner.extreme(
        model.spreads(), from, x, ambient, upward, p -> model.forward().volts(x, p));
  }
}
