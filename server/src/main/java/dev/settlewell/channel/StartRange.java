package dev.settlewell.channel;

/**
 * Where the hold capacitor may start a visit, V.
 *
 * @param ownVoltage true where the visit before was of the same channel: it starts where it must
 *     end
 */
record StartRange(double low, double high, boolean ownVoltage) {

  static StartRange own() {
    return new StartRange(0, 0, true);
  }

  static StartRange at(double volts) {
    return new StartRange(volts, volts, false);
  }

  StartRange and(StartRange other) {
    if (ownVoltage) {
      return other;
    }
    return other.ownVoltage
        ? this
        : new StartRange(Math.min(low, other.low), Math.max(high, other.high), false);
  }
}
