package dev.settlewell.unit;

/**
 * A unit as written, and what it stands for.
 *
 * @param written as the text has it, without change: {@code kΩ}
 * @param symbol the coherent unit, without prefix: {@code Ω}, {@code 1} for a share, {@code °C} for
 *     temperatures, the word itself for a word
 * @param scale one of {@code written} in {@code symbol}: 1000; for K as a temperature point the
 *     offset is applied by the reader
 */
public record Unit(String written, String symbol, Dimension dimension, double scale) {
  public static final Unit ONE = new Unit("", "1", Dimension.RATIO, 1);

  /** True where both may be compared: same dimension and same coherent spelling. */
  public boolean comparableWith(Unit other) {
    return dimension == other.dimension && symbol.equals(other.symbol);
  }
}
