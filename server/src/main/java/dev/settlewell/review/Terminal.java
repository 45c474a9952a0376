package dev.settlewell.review;

import java.util.ArrayList;
import java.util.List;
import java.util.regex.Pattern;

/** Text as a terminal may show it. */
final class Terminal {
  private static final int REPLACEMENT = 0xFFFD;
  private static final Pattern COLOUR = Pattern.compile("\u001b\\[[0-9;]*m");

  private Terminal() {}

  /**
   * One line that a terminal shows and does not obey: control characters, line breaks and the marks
   * that turn the direction of writing become visible; a tab becomes a blank.
   */
  static String line(String text) {
    StringBuilder safe = new StringBuilder(text.length());
    text.codePoints().forEach(c -> safe.appendCodePoint(visible(c)));
    return safe.toString();
  }

  private static int visible(int c) {
    if (c == '\t') {
      return ' ';
    }
    boolean turns =
        c == 0x061C
            || c == 0x200E
            || c == 0x200F
            || 0x202A <= c && c <= 0x202E
            || 0x2066 <= c && c <= 0x2069;
    int type = Character.getType(c);
    boolean breaks = type == Character.LINE_SEPARATOR || type == Character.PARAGRAPH_SEPARATOR;
    boolean alone = type == Character.SURROGATE;
    return Character.isISOControl(c) || turns || breaks || alone ? REPLACEMENT : c;
  }

  /** Columns a line takes: wide characters of East Asian scripts two, combining marks none. */
  static int width(String line) {
    return line.codePoints().map(Terminal::width).sum();
  }

  private static int width(int c) {
    int type = Character.getType(c);
    boolean combines =
        type == Character.NON_SPACING_MARK
            || type == Character.ENCLOSING_MARK
            || type == Character.FORMAT;
    if (combines) {
      return 0;
    }
    boolean wide =
        0x1100 <= c && c <= 0x115F
            || 0x2E80 <= c && c <= 0xA4CF
            || 0xAC00 <= c && c <= 0xD7A3
            || 0xF900 <= c && c <= 0xFAFF
            || 0xFE30 <= c && c <= 0xFE6F
            || 0xFF00 <= c && c <= 0xFF60
            || 0xFFE0 <= c && c <= 0xFFE6
            || 0x1F300 <= c && c <= 0x1FAFF
            || 0x20000 <= c && c <= 0x3FFFD;
    return wide ? 2 : 1;
  }

  /**
   * Breaks a line at blanks where it is longer than {@code columns}; what goes on stands below, so
   * many columns in. The marks of colours count as nothing.
   */
  static List<String> wrapped(String line, int columns, int indentation) {
    List<String> parts = new ArrayList<>();
    String rest = line.stripTrailing();
    while (shownWidth(rest) > columns) {
      int end = breakAt(rest, columns, parts.isEmpty() ? 0 : indentation);
      if (end < 0) {
        break;
      }
      parts.add(rest.substring(0, end).stripTrailing());
      rest = " ".repeat(indentation) + rest.substring(end).stripLeading();
    }
    parts.add(rest);
    return parts;
  }

  /** The last blank that fits behind the indentation, else the first one behind; -1: none. */
  private static int breakAt(String line, int columns, int indentation) {
    int best = -1;
    int start = line.length() - line.stripLeading().length();
    for (int i = line.indexOf(' ', Math.max(start, indentation));
        i >= 0;
        i = line.indexOf(' ', i + 1)) {
      if (best >= 0 && shownWidth(line.substring(0, i)) > columns) {
        break;
      }
      best = i;
    }
    return best;
  }

  private static int shownWidth(String line) {
    return width(COLOUR.matcher(line).replaceAll(""));
  }

  static String padded(String text, int columns) {
    return text + " ".repeat(Math.max(0, columns - width(text)));
  }

  /** Right-aligned. */
  static String led(String text, int columns) {
    return " ".repeat(Math.max(0, columns - width(text))) + text;
  }
}
