package dev.settlewell.review;

import dev.settlewell.text.PositionEncoding;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;

/**
 * A stretch as people and reports count it: lines and columns from 1, the end column just behind
 * the last character.
 */
record Location(int line, int column, int endLine, int endColumn) {

  static Location of(SourceText text, Span span, PositionEncoding columns) {
    var start = text.position(span.start(), columns);
    var end = text.position(span.end(), columns);
    return new Location(start.line() + 1, start.column() + 1, end.line() + 1, end.column() + 1);
  }
}
