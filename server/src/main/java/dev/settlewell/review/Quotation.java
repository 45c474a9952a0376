package dev.settlewell.review;

import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;

/**
 * A line of a sheet with marks under a value: {@code acquisition: 24 cycles} and below it the
 * carets. A long line is cut to the value and what stands around it.
 */
record Quotation(String line, String marks) {
  private static final int LONGEST = 74;
  private static final int BEFORE = 24;

  static Quotation of(SourceText text, Span span) {
    Span line = text.line(text.lineAt(span.start()));
    int start = Math.min(span.start(), line.end());
    int end = Math.min(Math.max(span.end(), start), line.end());
    String before = Terminal.line(text.slice(new Span(line.start(), start)));
    String value = Terminal.line(text.slice(new Span(start, end)));
    String after = Terminal.line(text.slice(new Span(end, line.end())));
    before = before.startsWith("\uFEFF") ? before.substring(1) : before;
    int indentation = before.length() - before.stripLeading().length();
    before = before.substring(indentation);
    if (Terminal.width(before + value + after) > LONGEST) {
      before = lastOf(before, BEFORE);
      value = firstOf(value, LONGEST - Terminal.width(before));
      after = firstOf(after, Math.max(0, LONGEST - Terminal.width(before + value)));
    }
    String marks =
        " ".repeat(Terminal.width(before)) + "^".repeat(Math.max(1, Terminal.width(value)));
    return new Quotation((before + value + after).stripTrailing(), marks);
  }

  private static String lastOf(String text, int columns) {
    int length = text.codePointCount(0, text.length());
    return length <= columns
        ? text
        : "…" + text.substring(text.offsetByCodePoints(text.length(), 1 - columns));
  }

  private static String firstOf(String text, int columns) {
    int length = text.codePointCount(0, text.length());
    if (length <= columns) {
      return text;
    }
    return columns < 2 ? "" : text.substring(0, text.offsetByCodePoints(0, columns - 1)) + "…";
  }
}
