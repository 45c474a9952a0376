package dev.settlewell.firmware;

/** A source with its comments, strings and joined lines blanked, at unchanged offsets. */
final class Blanking {
  private final String source;
  private final StringBuilder out;

  private Blanking(String source) {
    this.source = source;
    this.out = new StringBuilder(source);
  }

  static String of(String source) {
    return new Blanking(source).run();
  }

  private String run() {
    int at = 0;
    while (at < source.length()) {
      at = step(at);
    }
    return out.toString();
  }

  /** Blanks what begins here, and gives where to go on. */
  private int step(int at) {
    char c = source.charAt(at);
    if (c == '\\' && joinsLines(at)) {
      int end = source.charAt(at + 1) == '\r' && source.startsWith("\n", at + 2) ? at + 3 : at + 2;
      return blank(at, end);
    }
    if (source.startsWith("//", at)) {
      return blank(at, lineEnd(at));
    }
    if (source.startsWith("/*", at)) {
      int close = source.indexOf("*/", at + 2);
      return blank(at, close < 0 ? source.length() : close + 2);
    }
    if (c == '"' || c == '\'' && !separatesDigits(at)) {
      return blank(at, quoteEnd(at, c));
    }
    return at + 1;
  }

  private boolean joinsLines(int at) {
    return at + 1 < source.length()
        && (source.charAt(at + 1) == '\n' || source.charAt(at + 1) == '\r');
  }

  /** {@code 1'000}: C++14 and C23 separate digits with an apostrophe. */
  private boolean separatesDigits(int at) {
    return at > 0
        && at + 1 < source.length()
        && Character.digit(source.charAt(at - 1), 16) >= 0
        && Character.digit(source.charAt(at + 1), 16) >= 0;
  }

  private int lineEnd(int at) {
    int end = at;
    while (end < source.length() && source.charAt(end) != '\n') {
      // A joined line belongs to the comment.
      end += source.charAt(end) == '\\' && end + 1 < source.length() ? 2 : 1;
    }
    return Math.min(end, source.length());
  }

  private int quoteEnd(int at, char quote) {
    int end = at + 1;
    while (end < source.length() && source.charAt(end) != quote && source.charAt(end) != '\n') {
      end += source.charAt(end) == '\\' ? 2 : 1;
    }
    return Math.min(end + 1, source.length());
  }

  /** Line breaks stay, but for those that a backslash joins away. */
  private int blank(int from, int to) {
    boolean joined = source.charAt(from) == '\\';
    for (int i = from; i < to; i++) {
      if (joined || source.charAt(i) != '\n') {
        out.setCharAt(i, ' ');
      }
    }
    return to;
  }
}
