package dev.settlewell.channel;

import dev.settlewell.unit.Tolerance;
import dev.settlewell.unit.Toleranced;

/** The ends between which a stated value lies at its stated temperature. */
record Limits(double low, double nominal, double high) {

  static Limits of(Toleranced value) {
    double nominal = value.value();
    double minus = value.min().isPresent() ? nominal - value.min().getAsDouble() : 0;
    double plus = value.max().isPresent() ? value.max().getAsDouble() - nominal : 0;
    for (Tolerance t : value.deviation().tolerances()) {
      double unit = t.isShare() ? Math.abs(nominal) : 1;
      minus += t.minus() * unit;
      plus += t.plus() * unit;
    }
    return new Limits(nominal - minus, nominal, nominal + plus);
  }

  static Limits exact(double value) {
    return new Limits(value, value, value);
  }

  static double low(Toleranced value) {
    return of(value).low();
  }

  static double high(Toleranced value) {
    return of(value).high();
  }
}
