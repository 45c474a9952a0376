package dev.settlewell.vocabulary;

import java.util.Locale;

/**
 * What stands at a key: the schema's {@code x-form}. The first ten are read by the grammar of
 * values.
 */
public enum Shape {
  QUANTITY,
  COMPONENT,
  DEVIATION,
  NEED,
  RANGE,
  OUTPUT_RANGE,
  COUNT,
  PLAIN,
  FRACTION,
  RATIO,
  /** Words for people, or a path: anything. */
  TEXT,
  /** A name by the format's pattern, usually of something defined elsewhere. */
  NAME,
  /** One of the key's own words. */
  CHOICE,
  /** {@code true} or {@code false}. */
  FLAG,
  /** {@code 2027-06-30}. */
  DATE,
  /** A mapping of one known kind, or its short form. */
  PART,
  /** A mapping with exactly one key, which names the kind of what stands behind it. */
  ONE_KIND,
  LIST,
  /** Names (or numbers) of the user's own, each with a value of the same shape. */
  MAP;

  /** The word as the schema writes it: {@code output-range}. */
  public String word() {
    return name().toLowerCase(Locale.ROOT).replace('_', '-');
  }

  static Shape of(String word) {
    return valueOf(word.toUpperCase(Locale.ROOT).replace('-', '_'));
  }
}
