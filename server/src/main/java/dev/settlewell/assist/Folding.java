package dev.settlewell.assist;

import dev.settlewell.syntax.Comment;
import dev.settlewell.syntax.Node;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayList;
import java.util.List;

/** What an editor can fold: blocks of keys and lists, and comments of several lines. */
public final class Folding {
  /** Whole lines; the first stays visible. */
  public record Fold(int firstLine, int lastLine, boolean comment) {}

  private Folding() {}

  public static List<Fold> of(Checked checked, Vocabulary vocabulary) {
    List<Fold> folds = new ArrayList<>();
    SourceText text = checked.text();
    Outline.of(checked.tree(), vocabulary)
        .all()
        .filter(piece -> piece.role() != Piece.Role.ROOT)
        .filter(piece -> !(piece.value() instanceof Node.Scalar))
        .forEach(piece -> block(text, piece.span(), folds));
    comments(text, checked.tree().comments(), folds);
    return folds;
  }

  private static void block(SourceText text, Span span, List<Fold> folds) {
    int end = span.end();
    while (end > span.start() && Character.isWhitespace(text.content().charAt(end - 1))) {
      end--;
    }
    int first = text.lineAt(span.start());
    int last = text.lineAt(end);
    boolean known = folds.stream().anyMatch(f -> f.firstLine() == first && f.lastLine() == last);
    if (last > first && !known) {
      folds.add(new Fold(first, last, false));
    }
  }

  private static void comments(SourceText text, List<Comment> comments, List<Fold> folds) {
    int first = -1;
    int last = -1;
    for (Comment comment : comments) {
      int line = text.lineAt(comment.place().start());
      if (comment.ownLine() && line == last + 1 && first >= 0) {
        last = line;
        continue;
      }
      add(first, last, folds);
      first = comment.ownLine() ? line : -1;
      last = first;
    }
    add(first, last, folds);
  }

  private static void add(int first, int last, List<Fold> folds) {
    if (first >= 0 && last > first) {
      folds.add(new Fold(first, last, true));
    }
  }
}
