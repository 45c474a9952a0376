package dev.settlewell.circuit;

/**
 * One acquisition of a channel within the period of its scan.
 *
 * @param start when the hold capacitor is connected, in s from the start of the period
 * @param acquisition how long it stays connected, in s
 */
public record Visit(double start, double acquisition) {
  public Visit {
    Values.requireFinite("start of a visit", start);
    Values.requireFinite("acquisition", acquisition);
  }

  double end() {
    return start + acquisition;
  }
}
