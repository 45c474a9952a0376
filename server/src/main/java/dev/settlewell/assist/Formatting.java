package dev.settlewell.assist;

import dev.settlewell.syntax.Comment;
import dev.settlewell.syntax.Node;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import dev.settlewell.unit.Form;
import dev.settlewell.unit.Spelling;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * One look for all sheets: values spelled one way, no blanks at line ends, comments behind values
 * of neighbouring lines in one column. Lines stay lines and nothing changes its meaning; a second
 * run changes nothing.
 */
public final class Formatting {
  /** Longer lines keep their comment close and do not push those of the others out. */
  private static final int MOST_COLUMNS = 60;

  private final Checked checked;
  private final SourceText text;
  private final List<Edit> edits = new ArrayList<>();

  private Formatting(Checked checked) {
    this.checked = checked;
    this.text = checked.text();
  }

  /** Nothing for a sheet whose YAML could not be read as it stands: the tree is then a guess. */
  public static List<Edit> of(Checked checked, Vocabulary vocabulary) {
    boolean broken =
        checked.tree().problems().stream().anyMatch(p -> p.kind() == Problem.Kind.SYNTAX);
    if (broken) {
      return List.of();
    }
    Formatting formatting = new Formatting(checked);
    Outline.of(checked.tree(), vocabulary).all().forEach(formatting::spelling);
    formatting.lineEnds();
    formatting.comments();
    formatting.edits.sort(Comparator.comparingInt(edit -> edit.place().start()));
    return List.copyOf(formatting.edits);
  }

  private void spelling(Piece piece) {
    if (!(piece.value() instanceof Node.Scalar scalar) || !scalar.exact()) {
      return;
    }
    Optional<Key> key =
        piece.kind().isPresent()
            ? piece.kind().flatMap(kind -> kind.shortKey().flatMap(kind::key))
            : piece.key();
    Optional<Form> form = key.flatMap(Formatting::form);
    boolean word = scalar.text().matches("[a-z][a-z0-9-]*");
    boolean wrong =
        checked.findings().stream()
            .anyMatch(
                f -> f.place().span().overlaps(scalar.place().span()) && !f.fixes().isEmpty());
    if (form.isEmpty() || word || wrong) {
      return;
    }
    String normal = Spelling.normal(form.get(), scalar.text());
    if (!normal.equals(scalar.text())) {
      int start = scalar.place().start() + scalar.inset();
      edits.add(new Edit(text.place(start, start + scalar.text().length()), normal));
    }
  }

  private static Optional<Form> form(Key key) {
    for (Form form : Form.values()) {
      if (form.name().equals(key.shape().name())) {
        return Optional.of(form);
      }
    }
    return Optional.empty();
  }

  private void lineEnds() {
    for (int line = 0; line < text.lineCount(); line++) {
      Span span = text.line(line);
      int end = span.end();
      while (end > span.start() && isBlank(text.content().charAt(end - 1))) {
        end--;
      }
      if (end < span.end() && !insideScalar(end)) {
        edits.add(new Edit(text.place(end, span.end()), ""));
      }
    }
  }

  /** Blanks at a line's end belong to a text that goes on over the line. */
  private boolean insideScalar(int offset) {
    return scalars(checked.tree().root()).stream()
        .map(scalar -> scalar.place().span())
        .anyMatch(span -> span.start() < offset && offset < span.end());
  }

  private static List<Node.Scalar> scalars(Node node) {
    List<Node.Scalar> found = new ArrayList<>();
    if (node instanceof Node.Scalar scalar) {
      found.add(scalar);
    } else if (node instanceof Node.Sequence sequence) {
      sequence.items().forEach(item -> found.addAll(scalars(item)));
    } else if (node instanceof Node.Mapping mapping) {
      mapping.entries().forEach(entry -> found.addAll(scalars(entry.value())));
    }
    return found;
  }

  /**
   * Comments behind values share a column, up to the next empty line. Where they do already they
   * stay: how far out is a matter of taste.
   */
  private void comments() {
    List<Comment> run = new ArrayList<>();
    for (Comment comment : checked.tree().comments()) {
      if (comment.ownLine()) {
        continue;
      }
      if (!run.isEmpty() && isApart(run.get(run.size() - 1), comment)) {
        align(run);
        run.clear();
      }
      run.add(comment);
    }
    align(run);
  }

  private boolean isApart(Comment before, Comment after) {
    for (int line = line(before) + 1; line < line(after); line++) {
      if (text.slice(text.line(line)).isBlank()) {
        return true;
      }
    }
    return false;
  }

  private int line(Comment comment) {
    return text.lineAt(comment.place().start());
  }

  private void align(List<Comment> run) {
    if (isAligned(run)) {
      return;
    }
    int column = 0;
    for (Comment comment : run) {
      int width = width(comment);
      if (width <= MOST_COLUMNS) {
        column = Math.max(column, width);
      }
    }
    for (Comment comment : run) {
      int end = codeEnd(comment);
      String blanks = " ".repeat(Math.max(2, column + 2 - width(comment)));
      if (!text.slice(new Span(end, comment.place().start())).equals(blanks)) {
        edits.add(new Edit(text.place(end, comment.place().start()), blanks));
      }
    }
  }

  private boolean isAligned(List<Comment> run) {
    return run.stream().map(c -> width(c) + gap(c)).distinct().count() <= 1
        && run.stream().allMatch(c -> gap(c) > 0);
  }

  private int gap(Comment comment) {
    return comment.place().start() - codeEnd(comment);
  }

  private int codeEnd(Comment comment) {
    int end = comment.place().start();
    int start = text.lineStart(line(comment));
    while (end > start && isBlank(text.content().charAt(end - 1))) {
      end--;
    }
    return end;
  }

  /** Columns of the line before its comment, as they will be once its values are respelled. */
  private int width(Comment comment) {
    int start = text.lineStart(line(comment));
    int end = codeEnd(comment);
    int width = text.content().codePointCount(start, end);
    for (Edit edit : edits) {
      if (edit.place().start() >= start && edit.place().end() <= end) {
        String before = text.slice(edit.place().span());
        width += edit.replacement().codePointCount(0, edit.replacement().length());
        width -= before.codePointCount(0, before.length());
      }
    }
    return width;
  }

  private static boolean isBlank(char c) {
    return c == ' ' || c == '\t';
  }
}
