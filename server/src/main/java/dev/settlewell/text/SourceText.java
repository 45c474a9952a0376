package dev.settlewell.text;

import java.util.Arrays;

/**
 * The text of one sheet with an index of its lines: the one place where offsets become lines and
 * columns, and back.
 *
 * <p>A line ends at LF, CRLF or CR, as the language server protocol counts lines; other characters
 * that some readers take for line breaks (U+0085, U+2028) are ordinary here. All offsets are UTF-16
 * code units of {@link #content()}.
 */
public final class SourceText {
  private final String name;
  private final String content;
  private final int[] lineStarts;

  private SourceText(String name, String content) {
    this.name = name;
    this.content = content;
    this.lineStarts = indexLines(content);
  }

  public static SourceText of(String name, String content) {
    return new SourceText(name, content);
  }

  public String name() {
    return name;
  }

  public String content() {
    return content;
  }

  public int length() {
    return content.length();
  }

  /** At least one: an empty text has one empty line. */
  public int lineCount() {
    return lineStarts.length;
  }

  /** The line that holds the offset; an offset behind the text is held by the last line. */
  public int lineAt(int offset) {
    int found = Arrays.binarySearch(lineStarts, Math.max(0, offset));
    return found >= 0 ? found : -found - 2;
  }

  public int lineStart(int line) {
    return lineStarts[line];
  }

  /** The line without its line break. */
  public Span line(int line) {
    int start = lineStarts[line];
    int end = line + 1 < lineStarts.length ? lineStarts[line + 1] : content.length();
    while (end > start && isBreak(content.charAt(end - 1))) {
      end--;
    }
    return new Span(start, end);
  }

  /** The line break this text uses: that of its first line, LF where there is none. */
  public String lineBreak() {
    if (lineStarts.length == 1) {
      return "\n";
    }
    return content.substring(line(0).end(), lineStarts[1]);
  }

  public String slice(Span span) {
    return content.substring(span.start(), span.end());
  }

  public Place place(int start, int end) {
    return new Place(name, new Span(start, end));
  }

  public Place place(Span span) {
    return new Place(name, span);
  }

  /** Clamps: an offset outside the text is taken as its nearest end. */
  public Position position(int offset, PositionEncoding encoding) {
    int clamped = Math.max(0, Math.min(offset, content.length()));
    int line = lineAt(clamped);
    return new Position(line, columns(lineStarts[line], clamped, encoding));
  }

  /**
   * Clamps as the protocol demands: a column past the line's end is the line's end, a line past the
   * last is the text's end. A column inside a character is that character's start.
   */
  public int offset(Position position, PositionEncoding encoding) {
    if (position.line() < 0) {
      return 0;
    }
    if (position.line() >= lineStarts.length) {
      return content.length();
    }
    Span line = line(position.line());
    int offset = line.start();
    int column = 0;
    while (offset < line.end()) {
      int codePoint = content.codePointAt(offset);
      column += width(codePoint, encoding);
      if (column > position.column()) {
        break;
      }
      offset += Character.charCount(codePoint);
    }
    return offset;
  }

  private int columns(int from, int to, PositionEncoding encoding) {
    if (encoding == PositionEncoding.UTF_16) {
      return to - from;
    }
    int column = 0;
    int offset = from;
    while (offset < to) {
      int codePoint = content.codePointAt(offset);
      offset += Character.charCount(codePoint);
      if (offset > to) {
        break; // between two surrogates: the character's start
      }
      column += width(codePoint, encoding);
    }
    return column;
  }

  private static int width(int codePoint, PositionEncoding encoding) {
    return switch (encoding) {
      case UTF_16 -> Character.charCount(codePoint);
      case UTF_32 -> 1;
      case UTF_8 -> codePoint < 0x80 ? 1 : codePoint < 0x800 ? 2 : codePoint < 0x10000 ? 3 : 4;
    };
  }

  private static boolean isBreak(char c) {
    return c == '\n' || c == '\r';
  }

  private static int[] indexLines(String content) {
    int[] starts = new int[64];
    int count = 1;
    for (int i = 0; i < content.length(); i++) {
      char c = content.charAt(i);
      boolean ends = c == '\n' || c == '\r' && !content.startsWith("\n", i + 1);
      if (ends) {
        if (count == starts.length) {
          starts = Arrays.copyOf(starts, count * 2);
        }
        starts[count++] = i + 1;
      }
    }
    return Arrays.copyOf(starts, count);
  }
}
