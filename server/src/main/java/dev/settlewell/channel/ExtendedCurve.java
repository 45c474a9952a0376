package dev.settlewell.channel;

import dev.settlewell.sensor.Curve;

/**
 * A curve that goes on as a straight line beyond its domain, by one degree's slope.
 *
 * <p>Only errors ask beyond the ends: an error at the last point of a range carries the reported
 * value a little outside. Whether a measured range leaves the curve is a finding of its own.
 */
record ExtendedCurve(Curve curve) {

  double at(double x) {
    if (x < curve.low()) {
      double step = (curve.high() - curve.low()) * 1e-3;
      double slope = (curve.at(curve.low() + step) - curve.at(curve.low())) / step;
      return curve.at(curve.low()) + slope * (x - curve.low());
    }
    if (x > curve.high()) {
      double step = (curve.high() - curve.low()) * 1e-3;
      double slope = (curve.at(curve.high()) - curve.at(curve.high() - step)) / step;
      return curve.at(curve.high()) + slope * (x - curve.high());
    }
    return curve.at(x);
  }

  /** The same for a resistance: far beyond the domain the straight line stops at 0 Ω. */
  double ohmsAt(double x) {
    return Math.max(0, at(x));
  }
}
