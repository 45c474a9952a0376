package dev.settlewell.unit;

/**
 * One piece of a value's text, in UTF-16 offsets of that text.
 *
 * @param text as written, but with the blanks and the minus sign made plain
 */
record Token(Kind kind, int from, int to, String text) {

  enum Kind {
    /** Begins with a digit (or a point before one); may be a slip such as {@code 4,7}. */
    NUMBER,
    /** Letters and what units are spelled with. */
    WORD,
    /** What stands behind {@code of}. */
    NAME,
    PLUS_MINUS,
    PLUS,
    MINUS,
    SLASH,
    /** The middle of {@code +80/-20 %}. */
    SLASH_MINUS,
    OPEN,
    CLOSE,
    EQUALS,
    /** Any other character. */
    MARK,
    END
  }

  boolean is(Kind other) {
    return kind == other;
  }

  boolean is(String word) {
    return text.equals(word);
  }

  boolean touches(Token next) {
    return to == next.from;
  }
}
