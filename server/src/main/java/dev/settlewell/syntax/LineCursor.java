package dev.settlewell.syntax;

import static dev.settlewell.syntax.CursorFinder.with;

import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Where a cursor stands on a line that the tree does not cover: blank, half-typed or broken. What
 * the line belongs to is told from the blocks that are open above it and from columns.
 */
final class LineCursor {

  /**
   * A block that is open where the line stands.
   *
   * @param node empty where the block has nothing yet: its key or dash stands above, alone
   * @param column of its keys or dashes
   */
  private record Level(Optional<Node> node, boolean list, int column, List<String> path) {}

  private final SourceText text;
  private final SyntaxTree tree;
  private final int offset;
  private final int line;
  private final int lineStart;

  /** The first character that is no blank; the line's end on a blank line. */
  private final int start;

  private final int end;
  private final List<Level> levels = new ArrayList<>();

  LineCursor(SyntaxTree tree, int offset) {
    this.text = tree.text();
    this.tree = tree;
    this.offset = offset;
    line = text.lineAt(offset);
    lineStart = text.lineStart(line) + (line == 0 && text.content().startsWith("\uFEFF") ? 1 : 0);
    int at = lineStart;
    while (at < text.line(line).end() && text.content().charAt(at) <= ' ') {
      at++;
    }
    start = at;
    end = text.line(line).end();
  }

  Cursor find() {
    if (tree.root().flow()) {
      return new Cursor.Nowhere();
    }
    open(tree.root(), List.of());
    boolean blank = start >= end;
    int from = blank ? Math.max(lineStart, offset) : start;
    boolean dash = !blank && text.content().charAt(start) == '-';
    int wordStart = dash ? afterDash() : from;
    int wordEnd = wordEnd(wordStart);
    if (offset > wordEnd || offset < wordStart && !blank) {
      return offset < wordStart ? level(offset, offset, false, from) : new Cursor.Nowhere();
    }
    return level(wordStart, blank ? wordStart : wordEnd, dash, from);
  }

  private int afterDash() {
    int at = start + 1;
    while (at < end && text.content().charAt(at) == ' ') {
      at++;
    }
    return Math.min(at, Math.max(offset, start + 1));
  }

  /** The word that was begun; in front of anything else nothing was. */
  private int wordEnd(int from) {
    int at = from;
    while (at < end && Mending.wordChar(text.content().charAt(at))) {
      at++;
    }
    return at;
  }

  private Cursor level(int wordStart, int wordEnd, boolean dash, int from) {
    Level level = nearest(from - lineStart, dash);
    Span word = new Span(wordStart, wordEnd);
    if (level.list()) {
      int index = index(level);
      Node none = new Node.Absent(text.place(word.start(), word.start()));
      return new Cursor.InItem(
          with(level.path(), String.valueOf(index)), none, word, false, dash, level.column());
    }
    Optional<Node.Mapping> mapping = level.node().map(node -> (Node.Mapping) node);
    Span lead = new Span(Math.min(lineStart, wordStart), wordStart);
    return new Cursor.NewKey(level.path(), mapping, word, lead, level.column(), false);
  }

  /** How many items of the list stand above the line. */
  private int index(Level level) {
    int index = 0;
    for (Node item : ((Node.Sequence) level.node().orElseThrow()).items()) {
      index += item.place().start() < lineStart ? 1 : 0;
    }
    return index;
  }

  /**
   * The open block whose column is nearest. One that stands left of the next line's content is out
   * of the question: a key there would take over what follows.
   */
  private Level nearest(int column, boolean dash) {
    int least = nextColumn();
    Level best = null;
    for (Level level : levels) {
      if (level.column() < least && levels.stream().anyMatch(l -> l.column() >= least)) {
        continue;
      }
      boolean nearer =
          best == null || distance(level, column) <= distance(best, column) && level != best;
      boolean sameColumn = best != null && best.column() == level.column();
      if (sameColumn ? level.list() == dash : nearer) {
        best = level;
      }
    }
    return best;
  }

  private static int distance(Level level, int column) {
    return Math.abs(level.column() - column);
  }

  private int nextColumn() {
    for (int next = line + 1; next < text.lineCount(); next++) {
      String content = text.slice(text.line(next));
      String stripped = content.stripLeading();
      if (!stripped.isEmpty() && stripped.charAt(0) != '#') {
        return content.length() - stripped.length();
      }
    }
    return 0;
  }

  /** Adds the blocks that are open at the line's start, outermost first. */
  private void open(Node node, List<String> path) {
    if (!path.isEmpty() && CursorFinder.isAlias(node, text.content())) {
      return;
    }
    if (node instanceof Node.Mapping mapping && !mapping.flow()) {
      int column =
          mapping.entries().isEmpty() ? 0 : column(text, mapping.entries().get(0).place().start());
      levels.add(new Level(Optional.of(mapping), false, column, path));
      Node.Entry above = null;
      for (Node.Entry entry : mapping.entries()) {
        above = entry.key().place().start() < lineStart ? entry : above;
      }
      if (above != null) {
        open(above.value(), with(path, above.key().text()));
      }
    } else if (node instanceof Node.Sequence list && !list.flow()) {
      levels.add(new Level(Optional.of(list), true, column(text, list.place().start()), path));
      int above = -1;
      for (int i = 0; i < list.items().size(); i++) {
        above = list.items().get(i).place().start() < lineStart ? i : above;
      }
      if (above >= 0) {
        open(list.items().get(above), with(path, String.valueOf(above)));
      }
    } else if (node instanceof Node.Absent || node.place().start() >= lineStart) {
      openEmpty(path);
    }
  }

  /** A key or a dash that holds nothing yet may hold a block at any deeper column. */
  private void openEmpty(List<String> path) {
    int outer = levels.get(levels.size() - 1).column();
    int column = Math.max(start, offset) - lineStart;
    int cursor = start < end ? start - lineStart : column;
    if (cursor > outer) {
      levels.add(new Level(Optional.empty(), false, cursor, path));
    }
  }

  static int column(SourceText text, int at) {
    int lineStart = text.lineStart(text.lineAt(at));
    boolean mark = lineStart == 0 && text.content().startsWith("\uFEFF");
    return at - lineStart - (mark ? 1 : 0);
  }
}
