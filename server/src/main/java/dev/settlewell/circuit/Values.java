package dev.settlewell.circuit;

/** The domain of element values: what lies outside is a fault of the caller, not of the sheet. */
final class Values {
  private Values() {}

  static void requireNotNegative(String name, double value) {
    if (!(value >= 0)) {
      throw new IllegalArgumentException(name + " must be 0 or more, not " + value);
    }
  }

  static void requireFinite(String name, double value) {
    requireNotNegative(name, value);
    if (Double.isInfinite(value)) {
      throw new IllegalArgumentException(name + " must be finite");
    }
  }

  static void requirePositive(String name, double value) {
    requireFinite(name, value);
    if (value == 0) {
      throw new IllegalArgumentException(name + " must be more than 0");
    }
  }
}
