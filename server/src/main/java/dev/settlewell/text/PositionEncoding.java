package dev.settlewell.text;

/** What one column counts: the three encodings a language client may ask for. */
public enum PositionEncoding {
  /** Bytes of UTF-8. */
  UTF_8,
  /** Code units of UTF-16; a character beyond U+FFFF counts two. */
  UTF_16,
  /** Code points. */
  UTF_32
}
