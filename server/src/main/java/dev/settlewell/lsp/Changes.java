package dev.settlewell.lsp;

import dev.settlewell.text.Position;
import dev.settlewell.text.PositionEncoding;
import dev.settlewell.text.SourceText;
import java.util.List;
import java.util.Optional;
import org.eclipse.lsp4j.Range;
import org.eclipse.lsp4j.TextDocumentContentChangeEvent;

/** Applies what an editor says it changed. */
final class Changes {
  private Changes() {}

  /**
   * Each change counts in the text the one before it left. {@code rangeLength} is not looked at:
   * clients count it wrongly, and the range says the same.
   *
   * @return empty where a change lies outside the text: client and server no longer mean the same
   */
  static Optional<SourceText> apply(
      Optional<SourceText> text,
      String name,
      List<TextDocumentContentChangeEvent> changes,
      PositionEncoding encoding) {
    Optional<SourceText> current = text;
    for (TextDocumentContentChangeEvent change : changes) {
      if (change.getRange() == null) {
        current = Optional.of(SourceText.of(name, change.getText()));
      } else {
        current = current.flatMap(t -> replace(t, change.getRange(), change.getText(), encoding));
      }
    }
    return current;
  }

  private static Optional<SourceText> replace(
      SourceText text, Range range, String replacement, PositionEncoding encoding) {
    Position from = position(range.getStart());
    Position to = position(range.getEnd());
    boolean inside = from.line() >= 0 && from.line() < text.lineCount() && from.column() >= 0;
    boolean rising =
        to.line() > from.line() || to.line() == from.line() && to.column() >= from.column();
    if (!inside || !rising) {
      return Optional.empty();
    }
    int start = text.offset(from, encoding);
    int end = text.offset(to, encoding);
    String content = text.content();
    return Optional.of(
        SourceText.of(
            text.name(), content.substring(0, start) + replacement + content.substring(end)));
  }

  private static Position position(org.eclipse.lsp4j.Position position) {
    return new Position(position.getLine(), position.getCharacter());
  }
}
