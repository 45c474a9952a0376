package dev.settlewell.unit;

/** The start symbols of the grammar of values; the schema names one for each key. */
public enum Form {
  /** {@code 4.7 kΩ ±1 % ±100 ppm/K}, {@code 50 % of ref}. */
  QUANTITY,
  /** A quantity in ohm or farad that may also be a letter-digit code: {@code 4k7 ±1 %}. */
  COMPONENT,
  /** Errors without a value: {@code ±1 % ±100 ppm/K}. */
  DEVIATION,
  /** {@code ±0.03 m worst-case}. */
  NEED,
  /** {@code 0 °C to 40 °C}, rising. */
  RANGE,
  /** A range that may fall, as a sensor's output may: {@code 20 mA to 4 mA}. */
  OUTPUT_RANGE,
  /** Digits: {@code 16}. */
  COUNT,
  /** A number without a unit: {@code -2.5}. */
  PLAIN,
  /** {@code 1/8}. */
  FRACTION,
  /** {@code 20}, {@code 20 V/V}, {@code 26 dB}. */
  RATIO
}
