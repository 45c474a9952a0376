package dev.settlewell.syntax;

import dev.settlewell.syntax.Mending.Row;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Problem;
import dev.settlewell.text.Span;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;

/**
 * Walks through the lines of a sheet with the levels of indentation that are open, and mends the
 * lines that YAML cannot read, before it reads them. What is told from one line and the levels
 * above it is told here, at the place where it was typed; the parser would tell it lines below, and
 * lose the rest of the file.
 */
final class BlockScan {
  private final Mending mending;
  private final Quotes quotes;
  private final Starts starts;
  private final Shapes shapes;
  private final LeftOut leftOut;
  private final DocumentMarks marks;
  private final BlockValues values;
  private final Deque<Level> levels = new ArrayDeque<>();
  private final List<Level.Mend> mends = new ArrayList<>();
  private boolean started;

  BlockScan(Mending mending) {
    this.mending = mending;
    this.quotes = new Quotes(mending);
    this.starts = new Starts(mending);
    this.shapes = new Shapes(mending, quotes);
    this.leftOut = new LeftOut(mending, shapes);
    this.marks = new DocumentMarks(mending);
    this.values = new BlockValues(mending, quotes, shapes, this);
  }

  void scan() {
    int root = rootIndent();
    levels.push(new Level(false, root, root, null));
    for (mending.line = 0; mending.line < mending.text.lineCount(); mending.line++) {
      Row row = behindStray(marks.behindStart(mending.row(mending.line), started));
      if (!mending.empty(row) && !marks.takesWholeLine(row, started)) {
        line(row);
        started = true;
      }
    }
    for (Level.Mend mend : mends) {
      Fix fix = new Fix("Mend the indentation", mend.edits, false);
      mending.problems.add(
          new Problem(Problem.Kind.SYNTAX, mending.text.place(mend.span), mend.message, fix));
    }
  }

  /**
   * A character that begins nothing before a key or a dash: the line is read without it, in the
   * column where it stood before the character came in.
   */
  private Row behindStray(Row row) {
    int at = row.content();
    int next = mending.skipBlanks(at + 1);
    if (!shapes.stray(row, started ? levels.peek().indent : -1)) {
      return row;
    }
    String written = mending.slice(at, at + 1);
    mending.syntax(
        at,
        at + 1,
        "`" + written + "` does not belong before a key: remove it",
        mending.guess("Remove `" + written + "`", mending.edit(at, at + 1, "")));
    int indent = next - row.start() - 1;
    for (Level level : levels) {
      indent = level.indent == next - row.start() ? level.indent : indent;
    }
    mending.setIndent(new Row(row.number(), row.start(), next, row.end(), 0), indent);
    return new Row(row.number(), row.start(), next, row.end(), indent);
  }

  private int rootIndent() {
    int root = Integer.MAX_VALUE;
    for (int i = 0; i < mending.text.lineCount(); i++) {
      Row row = mending.row(i);
      if (!mending.empty(row) && !Quotes.closer(mending.draft.at(row.content()))) {
        root = Math.min(root, row.indent());
      }
    }
    return root == Integer.MAX_VALUE ? 0 : root;
  }

  // Which level a line belongs to.

  private void line(Row row) {
    Level astray = astray(row.indent());
    if (astray != null) {
      popAbove(astray);
      indent(row, astray.drafted, astray.astrayMend);
      sibling(row, astray, astray.drafted, astray.astrayMend);
      return;
    }
    Level popped = null;
    while (levels.size() > 1 && levels.peek().indent > row.indent()) {
      popped = levels.pop();
    }
    Level top = levels.peek();
    if (row.indent() == top.indent) {
      top.astray = -1;
      if (top.mend != null) {
        indent(row, top.drafted, top.mend);
      }
      sibling(row, top, top.drafted, top.mend);
    } else if (popped == null && top.last == Level.Last.OPEN && started) {
      child(row, top);
    } else if (popped != null || top.last != Level.Last.PLAIN || !shapes.isText(row)) {
      misplaced(row, top, popped);
    }
  }

  private Level astray(int indent) {
    for (Level level : levels) {
      if (level.astray == indent) {
        return level;
      }
    }
    return null;
  }

  private void popAbove(Level level) {
    while (levels.peek() != level) {
      levels.pop();
    }
  }

  /** A line in a column that no open level has: it goes to the nearest. */
  private void misplaced(Row row, Level top, Level popped) {
    if (shapes.isText(row)) {
      leftOut.noColon(row, top);
      return;
    }
    Level to = top;
    if (popped != null
        && popped.indent - row.indent() <= row.indent() - top.indent
        && fitsChildren(row, popped)) {
      levels.push(popped);
      to = popped;
    }
    String message =
        "indented by "
            + row.indent()
            + ", but what it stands beside by "
            + to.indent
            + ": write "
            + to.indent
            + " blanks before it";
    Level.Mend mend =
        new Level.Mend(
            new Span(row.content(), Math.max(shapes.keyEnd(row), row.content())), message);
    mends.add(mend);
    to.astray = row.indent();
    to.astrayMend = mend;
    indent(row, to.drafted, mend);
    sibling(row, to, to.drafted, mend);
  }

  /** A key that is moved deeper must stay above what it holds. */
  private boolean fitsChildren(Row row, Level level) {
    int next = mending.nextContent(row.number());
    int colon = shapes.colon(row.content(), row.end());
    boolean open = colon >= 0 && mending.skipBlanks(colon + 1) >= row.end();
    return !open
        || next < 0
        || mending.row(next).indent() <= row.indent()
        || mending.row(next).indent() > level.indent;
  }

  private void indent(Row row, int indent, Level.Mend mend) {
    mending.setIndent(row, indent);
    mend.edits.add(mending.edit(row.start(), row.content(), " ".repeat(indent)));
  }

  // What stands on a level.

  private void sibling(Row row, Level level, int drafted, Level.Mend mend) {
    int at = row.content();
    boolean item = shapes.isItem(at) || shapes.tightItem(at, row.end());
    if (level.list && !item) {
      Level below = below(level);
      if (below != null && below.indent == level.indent && !below.list) {
        levels.pop();
        sibling(row, below, drafted, mend);
      } else {
        noDash(row, level);
      }
    } else if (!level.list && item) {
      if (!started && dashIsStray(row)) {
        strayDash(row, level);
      } else if (level.last == Level.Last.OPEN) {
        level.last = Level.Last.CLOSED;
        Level list = new Level(true, row.indent(), drafted, mend);
        levels.push(list);
        item(row, list, at, drafted, mend);
      } else if (shapes.tightItem(at, row.end())) {
        strayDash(row, level);
      } else {
        leftOut.dropBlock(row, "a list item stands here where a key is wanted");
      }
    } else if (item) {
      item(row, level, at, drafted, mend);
    } else {
      entry(row, level);
    }
  }

  private void strayDash(Row row, Level level) {
    int at = row.content();
    int key = mending.skipBlanks(at + 1);
    mending.syntax(
        at,
        at + 1,
        "a dash does not belong before a key here: remove it",
        mending.guess("Remove the dash", mending.edit(at, key, "")));
    mending.draft.drop(at, key);
    entry(row, level, key);
  }

  /** True where keys stand beside a dash, and no other dash: it is one too many. */
  private boolean dashIsStray(Row row) {
    int keys = 0;
    int next = row.number();
    while ((next = mending.nextContent(next)) >= 0 && mending.row(next).indent() >= row.indent()) {
      Row below = mending.row(next);
      if (below.indent() == row.indent()) {
        if (shapes.isItem(below.content())) {
          return false;
        }
        keys += shapes.isText(below) ? 0 : 1;
      }
      if (keys == 2) {
        return shapes.hasKey(mending.skipBlanks(row.content() + 1), row.end());
      }
    }
    return false;
  }

  private Level below(Level level) {
    Level above = null;
    for (Level each : levels) {
      if (above == level) {
        return each;
      }
      above = each;
    }
    return null;
  }

  private void child(Row row, Level parent) {
    int named = firstNamed(row, parent);
    if (named > 0) {
      takeOutNameless(row, named);
      return;
    }
    int at = row.content();
    boolean item = shapes.isItem(at) || shapes.tightItem(at, row.end());
    if (!item && shapes.isText(row) && (shapes.opens(at) || !keysFollow(row))) {
      parent.last = values.value(at, row, parent, "");
      return;
    }
    parent.last = Level.Last.CLOSED;
    boolean stray = item && dashIsStray(row);
    Level level = new Level(item && !stray, row.indent(), row.indent(), null);
    levels.push(level);
    if (stray) {
      strayDash(row, level);
    } else if (item) {
      item(row, level, at, row.indent(), null);
    } else {
      entry(row, level);
    }
  }

  /**
   * The line on which the block under a key really begins, where the first lines under it stand as
   * deep as what is below the names that follow: the line that named them is gone. Negative where
   * nothing like that is so. One name alone in another column may as well be the one that slipped;
   * two of them, each with lines of its own below, are not.
   */
  private int firstNamed(Row row, Level parent) {
    int first = -1;
    int column = -1;
    int names = 0;
    int next = row.number();
    while ((next = mending.nextContent(next)) >= 0) {
      Row below = mending.row(next);
      if (below.indent() <= parent.indent) {
        break;
      }
      if (below.indent() >= row.indent() || column >= 0 && below.indent() != column) {
        continue;
      }
      int under = mending.nextContent(next);
      if (!opensBlock(below) || under < 0 || mending.row(under).indent() != row.indent()) {
        return -1;
      }
      first = first < 0 ? next : first;
      column = below.indent();
      names++;
    }
    return names > 1 ? first : -1;
  }

  /** A key with nothing behind its colon. */
  private boolean opensBlock(Row row) {
    String written = mending.slice(row.content(), row.end()).replaceAll("\\s#.*", "").strip();
    return written.endsWith(":");
  }

  /** What no line names costs itself; the names behind it are read. */
  private void takeOutNameless(Row row, int named) {
    mending.syntax(
        row.content(),
        row.end(),
        "the line that names this is missing: write `name:` above it, in the column of the names"
            + " that follow");
    for (int line = row.number(); line < named; line++) {
      Row lost = mending.row(line);
      mending.draft.blank(lost.start(), Math.max(lost.start(), lost.end()));
    }
    mending.line = named - 1;
  }

  /** True where a line that looks like a text has keys beside or below it: its colon is missing. */
  private boolean keysFollow(Row row) {
    int next = row.number();
    while ((next = mending.nextContent(next)) >= 0) {
      Row below = mending.row(next);
      if (below.indent() < row.indent()) {
        return false;
      }
      if (!shapes.isText(below)) {
        return below.indent() == row.indent() || next == mending.nextContent(row.number());
      }
    }
    return false;
  }

  private void item(Row row, Level list, int dash, int drafted, Level.Mend mend) {
    int at = dash;
    Level level = list;
    while (true) {
      int inserted = 0;
      if (!mending.gap(at + 1)) {
        inserted = 1;
        mending.syntax(
            at,
            at + 1,
            "a blank is missing after the dash: write `- " + mending.slice(at + 1, at + 2) + "…`",
            mending.safe("Put a blank after the dash", mending.edit(at + 1, at + 1, " ")));
        mending.draft.insert(at + 1, " ");
      }
      int content = mending.skipBlanks(at + 1);
      if (content >= row.end() || mending.comment(content)) {
        level.last = Level.Last.OPEN;
        return;
      }
      int column = content - row.content() + inserted;
      content = behindStrayMark(content, row.end());
      boolean nested = shapes.isItem(content);
      boolean number = Character.isDigit(mending.draft.at(content)); // `- 1:30` is no key
      boolean key =
          !nested
              && (number
                  ? shapes.colon(content, row.end()) >= 0
                  : shapes.hasKey(content, row.end()));
      if (!nested && !key) {
        level.last = values.value(content, row, level, "");
        return;
      }
      level.last = Level.Last.CLOSED;
      Level inner = new Level(nested, row.indent() + column, drafted + column, mend);
      levels.push(inner);
      if (key) {
        entry(row, inner, content);
        return;
      }
      level = inner;
      at = content;
    }
  }

  /** {@code - ]resistor: …}: the mark is left out. */
  private int behindStrayMark(int at, int end) {
    if ("]}@%`,|>".indexOf(mending.draft.at(at)) < 0 || !shapes.wordKey(at + 1, end)) {
      return at;
    }
    String written = mending.slice(at, at + 1);
    mending.syntax(
        at,
        at + 1,
        "`" + written + "` does not belong before a key: remove it",
        mending.guess("Remove `" + written + "`", mending.edit(at, at + 1, "")));
    mending.draft.drop(at, at + 1);
    return at + 1;
  }

  private void entry(Row row, Level level) {
    int at = row.content();
    char first = mending.draft.at(at);
    if (!started && (first == '{' || first == '[') && holdsAll(at)) {
      level.last = values.value(at, row, new Level(false, -1, -1, null), "");
    } else if (first == '?' && mending.gap(at + 1)) {
      leftOut.dropBlock(row, "`?` begins a key that is no word: write `KEY: VALUE`");
    } else if (first == ':' && mending.gap(at + 1)) {
      leftOut.dropBlock(row, "a key is missing before this colon");
    } else if (shapes.hasKey(at, row.end())) {
      entry(row, level, at);
    } else {
      leftOut.noColon(row, level);
    }
  }

  private void entry(Row row, Level level, int at) {
    int colon = shapes.colon(at, row.end());
    int tight = mending.tightColon(at, row.end());
    if (tight >= 0 && (colon < 0 || tight < colon)) {
      colon = tight;
      starts.tightColon(at, colon, mending.beforeComment(at, row.end()));
    }
    boolean quoted = shapes.opens(at);
    int keyEnd = mending.trimmed(at, colon);
    String key = quoted ? mending.slice(at + 1, keyEnd - 1) : mending.slice(at, keyEnd);
    int value = mending.skipBlanks(colon + 1);
    level.last = values.value(value, row, level, key);
  }

  /** True where the bracket that opens the text is closed at its end: the sheet is one mapping. */
  private boolean holdsAll(int at) {
    int end = quotes.balanced(at, -1);
    int next = end < 0 ? -1 : mending.nextContent(mending.text.lineAt(end));
    return end >= 0 && (next < 0 || mending.draft.at(mending.row(next).content()) == '.');
  }

  /** A key in the column of a list's dashes. */
  private void noDash(Row row, Level list) {
    int at = row.content();
    int end = mending.beforeComment(at, row.end());
    Fix fix = mending.guess("Put a dash before it", mending.edit(at, at, "- "));
    mending.syntax(at, shapes.keyEnd(row), "a list item begins with a dash: write `- …`", fix);
    if (!shapes.hasKey(at, row.end())) {
      mending.draft.blank(at, row.end());
      return;
    }
    mending.draft.insert(at, "- ");
    list.last = Level.Last.CLOSED;
    Level inner = new Level(false, row.indent() + 2, list.drafted + 2, null);
    levels.push(inner);
    entry(row, inner, at);
  }

  /** Reads a second key on a line as if it stood on the next, one deeper than the first. */
  void entryBelow(Row row, Level above, int at) {
    above.last = Level.Last.CLOSED;
    Level level = new Level(false, above.indent + 1, above.drafted + 1, null);
    levels.push(level);
    entry(row, level, at);
  }

  /** How many levels are open. */
  int depth() {
    return levels.size();
  }
}
