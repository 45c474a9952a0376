package dev.settlewell.lsp;

import dev.settlewell.text.Edit;
import dev.settlewell.text.PositionEncoding;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import org.eclipse.lsp4j.Position;
import org.eclipse.lsp4j.Range;
import org.eclipse.lsp4j.TextEdit;

/** Offsets to the client's lines and columns, and back, in the encoding both agreed on. */
record Ranges(PositionEncoding encoding) {

  Range of(SourceText text, Span span) {
    return new Range(position(text, span.start()), position(text, span.end()));
  }

  Position position(SourceText text, int offset) {
    dev.settlewell.text.Position position = text.position(offset, encoding);
    return new Position(position.line(), position.column());
  }

  int offset(SourceText text, Position position) {
    return text.offset(
        new dev.settlewell.text.Position(position.getLine(), position.getCharacter()), encoding);
  }

  Span span(SourceText text, Range range) {
    int start = offset(text, range.getStart());
    return new Span(start, Math.max(start, offset(text, range.getEnd())));
  }

  TextEdit edit(SourceText text, Edit edit) {
    return new TextEdit(of(text, edit.place().span()), edit.replacement());
  }
}
