package dev.settlewell.sensor;

import java.util.function.DoubleUnaryOperator;

/** A curve by a formula and its inverse, fenced in by a domain. */
final class FormulaCurve implements Curve {
  private final double low;
  private final double high;
  private final DoubleUnaryOperator formula;
  private final DoubleUnaryOperator inverse;
  private final double least;
  private final double greatest;

  FormulaCurve(double low, double high, DoubleUnaryOperator formula, DoubleUnaryOperator inverse) {
    this.low = low;
    this.high = high;
    this.formula = formula;
    this.inverse = inverse;
    double atLow = formula.applyAsDouble(low);
    double atHigh = formula.applyAsDouble(high);
    this.least = Math.min(atLow, atHigh);
    this.greatest = Math.max(atLow, atHigh);
  }

  @Override
  public double at(double x) {
    return low <= x && x <= high ? formula.applyAsDouble(x) : Double.NaN;
  }

  @Override
  public double inverse(double y) {
    if (!(least <= y && y <= greatest)) {
      return Double.NaN;
    }
    // Rounding may carry the inverse of an end just outside the domain.
    return Math.min(high, Math.max(low, inverse.applyAsDouble(y)));
  }

  @Override
  public double low() {
    return low;
  }

  @Override
  public double high() {
    return high;
  }
}
