package dev.settlewell.unit;

/**
 * {@code low to high}, in the coherent unit; {@code low < high} except for a sensor's output, where
 * {@code low} is what stands first.
 */
public record Range(double low, double high, Unit unit) {
  public double width() {
    return high - low;
  }

  public boolean contains(double value) {
    return Math.min(low, high) <= value && value <= Math.max(low, high);
  }
}
