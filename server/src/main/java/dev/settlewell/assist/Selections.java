package dev.settlewell.assist;

import dev.settlewell.text.Span;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayList;
import java.util.List;

/** The stretches around a cursor from small to large: the word, its value, its entry, its block. */
public final class Selections {
  private Selections() {}

  /** Each stretch lies inside the next and is smaller; the last is the whole text. */
  public static List<Span> around(Checked checked, Vocabulary vocabulary, int offset) {
    List<Span> spans = new ArrayList<>();
    Outline.of(checked.tree(), vocabulary)
        .at(offset)
        .ifPresent(piece -> piece.upwards().forEach(p -> add(p, offset, spans)));
    grow(spans, new Span(0, checked.text().length()));
    return spans;
  }

  private static void add(Piece piece, int offset, List<Span> spans) {
    if (piece.isOnLabel(offset)) {
      grow(spans, piece.label().orElseThrow().place().span());
    } else if (piece.value().place().span().touches(offset)) {
      grow(spans, piece.value().place().span());
    }
    grow(spans, piece.span());
  }

  private static void grow(List<Span> spans, Span next) {
    boolean larger =
        spans.isEmpty()
            || next.contains(spans.get(spans.size() - 1))
                && next.length() > spans.get(spans.size() - 1).length();
    if (larger && next.length() > 0) {
      spans.add(next);
    }
  }
}
