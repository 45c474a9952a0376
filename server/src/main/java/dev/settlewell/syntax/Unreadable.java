package dev.settlewell.syntax;

/** Characters that no YAML reader takes, or that it takes for something the eye does not see. */
final class Unreadable {
  private Unreadable() {}

  /**
   * True for what the draft replaces by a blank of the same length: tabs, the wide and the fixed
   * blanks that word processors write, controls, foreign line breaks and halves of characters.
   */
  static boolean readAsBlank(char c) {
    return c == '\t' || isFixedBlank(c) || isForbidden(c) || Character.isSurrogate(c);
  }

  /** Blanks of other widths; the grammar of values takes them for blanks too. */
  static boolean isFixedBlank(char c) {
    return c == '\u00A0' || c == '\u2009' || c == '\u202F';
  }

  /**
   * Not a character to write in a sheet at all. Halves of pairs are judged with their neighbour.
   */
  static boolean isForbidden(char c) {
    boolean control =
        c < ' ' && c != '\t' && c != '\n' && c != '\r' || c >= '\u007F' && c < '\u00A0';
    boolean lineBreak = c == '\u2028' || c == '\u2029';
    return control || lineBreak || c == '\uFEFF' || c >= '\uFFFE';
  }

  /** True for a high surrogate without its low one, and the other way round. */
  static boolean isLoneSurrogate(CharSequence text, int offset) {
    char c = text.charAt(offset);
    if (Character.isHighSurrogate(c)) {
      return offset + 1 == text.length() || !Character.isLowSurrogate(text.charAt(offset + 1));
    }
    return Character.isLowSurrogate(c)
        && (offset == 0 || !Character.isHighSurrogate(text.charAt(offset - 1)));
  }
}
