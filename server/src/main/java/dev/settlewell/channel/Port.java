package dev.settlewell.channel;

/**
 * A linear source seen at one node, as {@code volts = v/d} behind {@code ohms = r/d}.
 *
 * <p>The common divisor lets one type hold an ideal voltage source ({@code r = 0}) and an ideal
 * current source ({@code d = 0}) without infinities on the way: a current source becomes ordinary
 * as soon as something hangs at its node.
 */
record Port(double v, double r, double d) {

  static Port voltage(double volts, double ohms) {
    return new Port(volts, ohms, 1);
  }

  static Port current(double amperes, double siemens) {
    return new Port(amperes, 1, siemens);
  }

  double volts() {
    return v / d;
  }

  /** Thevenin resistance; infinite where nothing hangs at a current source. */
  double ohms() {
    return d == 0 ? Double.POSITIVE_INFINITY : r / d;
  }

  boolean isFloating() {
    return d == 0;
  }

  Port series(double ohms) {
    return new Port(v, r + ohms * d, d);
  }

  /** A resistor from this node to a fixed potential. */
  Port parallel(double ohms, double toVolts) {
    if (ohms == 0) {
      return voltage(toVolts, 0);
    }
    double siemens = 1 / ohms;
    return new Port(v + toVolts * siemens * r, r, d + siemens * r);
  }

  /** A current into this node. */
  Port injected(double amperes) {
    return new Port(v + amperes * r, r, d);
  }
}
