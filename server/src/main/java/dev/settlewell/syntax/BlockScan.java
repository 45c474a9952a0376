package dev.settlewell.syntax;

import dev.settlewell.syntax.Mending.Row;
import dev.settlewell.text.Edit;
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

  /** How the entry read last on a level ended, which decides what may stand deeper below it. */
  private enum Last {
    /** {@code key:} or {@code -} alone: a deeper block may follow. */
    OPEN,
    /** A plain text: deeper lines without a colon go on with it. */
    PLAIN,
    /** Anything else: nothing deeper may follow. */
    CLOSED
  }

  /** A block mapping or block list that is open. */
  private static final class Level {
    final boolean list;

    /** Its column as written. */
    final int indent;

    /** Its column in the draft. */
    final int drafted;

    /** Where the column as written is mended, what is told of it; else null. */
    final Mend mend;

    /** A wrong column that some lines of this level were written at, and its report. */
    int astray = -1;

    Mend astrayMend;
    Last last = Last.OPEN;

    Level(boolean list, int indent, int drafted, Mend mend) {
      this.list = list;
      this.indent = indent;
      this.drafted = drafted;
      this.mend = mend;
    }
  }

  /** A wrong indentation; lines that follow it in the same column belong to the same report. */
  private static final class Mend {
    final Span span;
    final String message;
    final List<Edit> edits = new ArrayList<>();

    Mend(Span span, String message) {
      this.span = span;
      this.message = message;
    }
  }

  private final Mending mending;
  private final Quotes quotes;
  private final Starts starts;
  private final Deque<Level> levels = new ArrayDeque<>();
  private final List<Mend> mends = new ArrayList<>();
  private int number;
  private boolean started;

  BlockScan(Mending mending) {
    this.mending = mending;
    this.quotes = new Quotes(mending);
    this.starts = new Starts(mending);
  }

  void scan() {
    int root = rootIndent();
    levels.push(new Level(false, root, root, null));
    for (number = 0; number < mending.text.lineCount(); number++) {
      Row row = behindStart(mending.row(number));
      if (!mending.empty(row) && !documentMark(row)) {
        line(row);
        started = true;
      }
    }
    for (Mend mend : mends) {
      Fix fix = new Fix("Mend the indentation", mend.edits, false);
      mending.problems.add(
          new Problem(
              Problem.Kind.SYNTAX, mending.text.place(mend.span), mend.message, fix));
    }
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
    } else if (popped == null && top.last == Last.OPEN && started) {
      child(row, top);
    } else if (popped != null || top.last != Last.PLAIN || !isText(row)) {
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
    if (isText(row)) {
      noColon(row, top);
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
    Mend mend = new Mend(new Span(row.content(), Math.max(keyEnd(row), row.content())), message);
    mends.add(mend);
    to.astray = row.indent();
    to.astrayMend = mend;
    indent(row, to.drafted, mend);
    sibling(row, to, to.drafted, mend);
  }

  /** A key that is moved deeper must stay above what it holds. */
  private boolean fitsChildren(Row row, Level level) {
    int next = mending.nextContent(row.number());
    int colon = colon(row.content(), row.end());
    boolean open = colon >= 0 && mending.skipBlanks(colon + 1) >= row.end();
    return !open || next < 0 || mending.row(next).indent() <= row.indent()
        || mending.row(next).indent() > level.indent;
  }

  private void indent(Row row, int indent, Mend mend) {
    mending.setIndent(row, indent);
    mend.edits.add(mending.edit(row.start(), row.content(), " ".repeat(indent)));
  }

  private int keyEnd(Row row) {
    int colon = colon(row.content(), row.end());
    return colon >= 0 ? colon : mending.beforeComment(row.content(), row.end());
  }

  // What a line is.

  private boolean isItem(int at) {
    return mending.draft.at(at) == '-' && mending.gap(at + 1);
  }

  private boolean isText(Row row) {
    int at = row.content();
    return !isItem(at)
        && !tightItem(at, row.end())
        && colon(at, row.end()) < 0
        && mending.tightColon(at, row.end()) < 0;
  }

  /** {@code -resistor: 1 kΩ}: a dash that lacks its blank. */
  private boolean tightItem(int at, int end) {
    char next = mending.draft.at(at + 1);
    return mending.draft.at(at) == '-' && next >= 'a' && next <= 'z' && colon(at, end) >= 0;
  }

  /** The colon of the key that stands here; -1 where none does. */
  private int colon(int at, int end) {
    char first = mending.draft.at(at);
    int from = at;
    if (first == '[' || first == '{') {
      return -1;
    }
    if (first == '"' || first == '\'') {
      int close = quotes.endOnLine(at, end);
      int next = close < 0 ? -1 : mending.skipBlanks(close);
      return close >= 0 && mending.draft.at(next) == ':' && mending.gap(next + 1) ? next : -1;
    }
    for (int i = from; i < end; i++) {
      if (mending.draft.at(i) == ':' && mending.gap(i + 1)) {
        return i;
      }
      if (i > at && mending.comment(i)) {
        return -1;
      }
    }
    return -1;
  }

  // What stands on a level.

  private void sibling(Row row, Level level, int drafted, Mend mend) {
    int at = row.content();
    boolean item = isItem(at) || tightItem(at, row.end());
    if (level.list && !item) {
      Level below = below(level);
      if (below != null && below.indent == level.indent && !below.list) {
        levels.pop();
        sibling(row, below, drafted, mend);
      } else {
        noDash(row, level);
      }
    } else if (!level.list && item) {
      if (level.last == Last.OPEN) {
        level.last = Last.CLOSED;
        Level list = new Level(true, row.indent(), drafted, mend);
        levels.push(list);
        item(row, list, at, drafted, mend);
      } else {
        dropBlock(row, "a list item stands here where a key is wanted");
      }
    } else if (item) {
      item(row, level, at, drafted, mend);
    } else {
      entry(row, level);
    }
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
    int at = row.content();
    boolean item = isItem(at) || tightItem(at, row.end());
    if (!item && isText(row) && (opens(at) || !keysFollow(row))) {
      parent.last = value(at, row, parent, "");
      return;
    }
    parent.last = Last.CLOSED;
    Level level = new Level(item, row.indent(), row.indent(), null);
    levels.push(level);
    if (item) {
      item(row, level, at, row.indent(), null);
    } else {
      entry(row, level);
    }
  }

  private boolean opens(int at) {
    return "[{\"'".indexOf(mending.draft.at(at)) >= 0;
  }

  /** True where a line that looks like a text has keys beside or below it: its colon is missing. */
  private boolean keysFollow(Row row) {
    int next = row.number();
    while ((next = mending.nextContent(next)) >= 0) {
      Row below = mending.row(next);
      if (below.indent() < row.indent()) {
        return false;
      }
      if (!isText(below)) {
        return below.indent() == row.indent() || next == mending.nextContent(row.number());
      }
    }
    return false;
  }

  private void item(Row row, Level list, int dash, int drafted, Mend mend) {
    int at = dash;
    Level level = list;
    while (true) {
      if (!mending.gap(at + 1)) {
        mending.syntax(
            at,
            at + 1,
            "a blank is missing after the dash: write `- " + mending.slice(at + 1, at + 2) + "…`",
            mending.safe("Put a blank after the dash", mending.edit(at + 1, at + 1, " ")));
        mending.draft.insert(at + 1, " ");
      }
      int content = mending.skipBlanks(at + 1);
      if (content >= row.end() || mending.comment(content)) {
        level.last = Last.OPEN;
        return;
      }
      int column = content - row.content();
      boolean nested = isItem(content);
      boolean number = Character.isDigit(mending.draft.at(content)); // `- 1:30` is no key
      boolean key =
          !nested && (number ? colon(content, row.end()) >= 0 : hasKey(content, row.end()));
      if (!nested && !key) {
        level.last = value(content, row, level, "");
        return;
      }
      level.last = Last.CLOSED;
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

  private boolean hasKey(int at, int end) {
    return colon(at, end) >= 0 || mending.tightColon(at, end) >= 0;
  }

  private void entry(Row row, Level level) {
    int at = row.content();
    char first = mending.draft.at(at);
    if (!started && (first == '{' || first == '[') && holdsAll(at)) {
      level.last = value(at, row, new Level(false, -1, -1, null), "");
    } else if (first == '?' && mending.gap(at + 1)) {
      dropBlock(row, "`?` begins a key that is no word: write `KEY: VALUE`");
    } else if (first == ':' && mending.gap(at + 1)) {
      dropBlock(row, "a key is missing before this colon");
    } else if (hasKey(at, row.end())) {
      entry(row, level, at);
    } else if ("[]{}".indexOf(first) >= 0 && hasKey(mending.skipBlanks(at + 1), row.end())) {
      strayBracket(row, level);
    } else {
      noColon(row, level);
    }
  }

  /** A bracket before a key: the key is read without it. */
  private void strayBracket(Row row, Level level) {
    int at = row.content();
    int key = mending.skipBlanks(at + 1);
    char c = mending.draft.at(at);
    mending.syntax(
        at,
        at + 1,
        "`" + c + "` does not belong before a key: remove it",
        mending.guess("Remove `" + c + "`", mending.edit(at, key, "")));
    mending.draft.drop(at, key);
    entry(row, level, key);
  }

  private void entry(Row row, Level level, int at) {
    int colon = colon(at, row.end());
    int tight = mending.tightColon(at, row.end());
    if (tight >= 0 && (colon < 0 || tight < colon)) {
      colon = tight;
      starts.tightColon(at, colon, mending.beforeComment(at, row.end()));
    }
    String key = mending.slice(at, mending.trimmed(at, colon));
    int value = mending.skipBlanks(colon + 1);
    level.last = value(value, row, level, key);
  }

  /** True where the bracket that opens the text is closed at its end: the sheet is one mapping. */
  private boolean holdsAll(int at) {
    int end = quotes.balanced(at, -1);
    int next = end < 0 ? -1 : mending.nextContent(mending.text.lineAt(end));
    return end >= 0 && (next < 0 || mending.draft.at(mending.row(next).content()) == '.');
  }

  /**
   * {@code ---} before anything else opens the document; a second document is read into the first.
   */
  private boolean documentMark(Row row) {
    if (row.content() != row.start()) {
      return false;
    }
    String line = mending.slice(row.content(), row.end());
    if (!started && line.startsWith("%")) {
      return true;
    }
    boolean end = line.equals("...");
    boolean mark = line.equals("---") || line.startsWith("--- ") || end;
    boolean usual = end ? mending.nextContent(row.number()) < 0 : !started;
    if (mark && !usual) {
      mending.syntax(
          row.content(),
          row.content() + 3,
          "`" + line.substring(0, 3) + "` begins another document: a sheet is one",
          mending.guess("Remove the line", mending.edit(row.start(), nextLineStart(row), "")));
      mending.draft.blank(row.content(), row.end());
    }
    return mark;
  }

  /** The rest of a line that opens the document and has content too: {@code --- {a: 1}}. */
  private Row behindStart(Row row) {
    int content = mending.skipBlanks(row.content() + 3);
    boolean opens = !started && mending.slice(row.content(), row.end()).startsWith("--- ");
    if (!opens || mending.draft.at(content) == '#') {
      return row;
    }
    mending.draft.drop(row.content(), content);
    return new Row(row.number(), row.start(), content, row.end(), 0);
  }

  private int nextLineStart(Row row) {
    int next = row.number() + 1;
    return next < mending.text.lineCount() ? mending.text.lineStart(next) : row.end();
  }

  // Lines that are left out.

  private void noColon(Row row, Level level) {
    int at = row.content();
    int end = mending.beforeComment(at, row.end());
    int next = mending.nextContent(row.number());
    boolean holds = next >= 0 && mending.row(next).indent() > row.indent() && word(at, end);
    Fix fix = mending.guess("Put a colon after it", mending.edit(end, end, ":"));
    if (holds && row.indent() == level.indent) {
      mending.syntax(at, end, "a colon is missing: write `" + mending.slice(at, end) + ":`", fix);
      mending.draft.insert(end, ":");
      level.last = Last.OPEN;
      return;
    }
    int equals = mending.slice(at, end).indexOf('=');
    int key = equals < 0 ? end : mending.trimmed(at, at + equals);
    if (equals > 0 && word(at, key)) {
      int value = mending.skipBlanks(at + equals + 1);
      mending.syntax(
          at,
          end,
          "a value stands behind a colon: write `" + mending.slice(at, key) + ": …`",
          mending.guess("Write a colon", mending.edit(key, Math.min(value, end), ": ")));
    } else if (word(at, end)) {
      String written = mending.slice(at, end);
      mending.syntax(at, end, "`" + written + "` has no colon: write `" + written + ": …`", fix);
    } else {
      mending.syntax(at, end, "this line has no key: write `KEY: VALUE`");
    }
    mending.draft.blank(at, row.end());
  }

  private boolean word(int at, int end) {
    for (int i = at; i < end; i++) {
      if (!Mending.wordChar(mending.draft.at(i))) {
        return false;
      }
    }
    return end > at;
  }

  private void noDash(Row row, Level list) {
    int at = row.content();
    int end = mending.beforeComment(at, row.end());
    Fix fix = mending.guess("Put a dash before it", mending.edit(at, at, "- "));
    mending.syntax(at, keyEnd(row), "a list item begins with a dash: write `- …`", fix);
    if (!hasKey(at, row.end())) {
      mending.draft.blank(at, row.end());
      return;
    }
    mending.draft.insert(at, "- ");
    list.last = Last.CLOSED;
    Level inner = new Level(false, row.indent() + 2, list.drafted + 2, null);
    levels.push(inner);
    entry(row, inner, at);
  }

  /** Leaves a line out with all that stands deeper below it. */
  private void dropBlock(Row row, String message) {
    mending.syntax(
        row.content(), mending.beforeComment(row.content(), row.end()), message);
    mending.draft.blank(row.content(), row.end());
    int next;
    while ((next = mending.nextContent(number)) >= 0
        && mending.row(next).indent() > row.indent()) {
      Row below = mending.row(next);
      mending.draft.blank(below.content(), below.end());
      number = next;
    }
  }

  // Values.

  private Last value(int from, Row row, Level level, String key) {
    int end = row.end();
    int at = mending.textKeys.contains(key) ? from : behindProperties(from, end);
    if (at >= end || mending.comment(at)) {
      return Last.OPEN;
    }
    if (mending.textKeys.contains(key)) {
      return prose(at, row, level);
    }
    char c = mending.draft.at(at);
    if (c == '"' || c == '\'' || c == '[' || c == '{') {
      int close =
          c == '"' || c == '\''
              ? quotes.end(at, level.indent, 0)
              : new FlowScan(mending, quotes, level.indent).end(at);
      number = mending.text.lineAt(close);
      garbage(close, mending.row(number).end());
      return Last.CLOSED;
    }
    if (blockHeader(at, end)) {
      skipBlock(at, level);
      return Last.CLOSED;
    }
    int text = mending.beforeComment(at, end);
    if (c == '-' && mending.blank(at + 1)) {
      starts.dash(at, text);
    } else if (Starts.cannotBegin(mending, at, text)) {
      starts.refuse(at, text);
      return Last.CLOSED;
    } else if (c == '*') {
      return Last.CLOSED;
    } else if (starts.secondColon(at, text) >= 0) {
      return secondColon(at, text, row, level);
    }
    return Last.PLAIN;
  }

  /** Behind the tags, which are told, and the anchors before a value. */
  private int behindProperties(int from, int end) {
    int at = from;
    while (at < end && (mending.draft.at(at) == '!' || mending.draft.at(at) == '&')) {
      int next = at;
      if (mending.draft.at(at) == '!') {
        next = starts.tag(at);
      }
      while (!mending.gap(next)) {
        next++;
      }
      at = mending.skipBlanks(next);
    }
    return at;
  }

  /** {@code sensor: thermistor: …}: the inner key is read as if it stood on the next line. */
  private Last secondColon(int at, int end, Row row, Level level) {
    int colon = starts.secondColon(at, end);
    boolean key = word(at, colon) && Character.isLetter(mending.draft.at(at)) && !level.list;
    if (!key || levels.size() > TreeBuilder.MAX_DEPTH) {
      mending.syntax(
          at,
          end,
          "a second colon in one line: a text with `: ` in it stands in quotes",
          mending.quoteFix(at, end));
      mending.breakOff(at, end);
      return Last.CLOSED;
    }
    String inner = mending.slice(at, colon);
    String below = mending.text.lineBreak() + " ".repeat(level.indent + 2);
    mending.syntax(
        at,
        colon,
        "a second key in one line: write `" + inner + ":` on the line below, indented",
        mending.guess(
            "Put `" + inner + "` on a line of its own",
            mending.edit(mending.trimmed(row.content(), at), at, below)));
    mending.draft.insert(at, "\n" + " ".repeat(level.drafted + 1));
    level.last = Last.CLOSED;
    Level nested = new Level(false, level.indent + 1, level.drafted + 1, null);
    levels.push(nested);
    entry(row, nested, at);
    return Last.CLOSED;
  }

  private void garbage(int close, int end) {
    int at = mending.skipBlanks(close);
    if (at >= end || mending.draft.at(at) == '#') {
      return;
    }
    int to = mending.beforeComment(at, end);
    String written = mending.slice(at, to);
    mending.syntax(
        at,
        to,
        "nothing may follow the closing " + mending.slice(close - 1, close) + ": remove this",
        mending.guess("Remove `" + written + "`", mending.edit(close, to, "")));
    mending.draft.blank(at, to);
  }

  private boolean blockHeader(int at, int end) {
    char c = mending.draft.at(at);
    if (c != '|' && c != '>') {
      return false;
    }
    int i = at + 1;
    while (i < end && "+-123456789".indexOf(mending.draft.at(i)) >= 0 && i < at + 3) {
      i++;
    }
    return i == end || mending.gap(i) && mending.comment(mending.skipBlanks(i));
  }

  /** A block text goes on as deep as its first line, or as deep as its header says. */
  private void skipBlock(int at, Level level) {
    int indent = 0;
    for (int i = at + 1; i <= at + 2; i++) {
      char digit = mending.draft.at(i);
      indent = digit >= '1' && digit <= '9' ? level.indent + digit - '0' : indent;
    }
    int last = number;
    for (int next = number + 1; next < mending.text.lineCount(); next++) {
      Row row = mending.row(next);
      if (row.content() < row.end()) {
        indent = indent == 0 ? Math.max(row.indent(), level.indent + 1) : indent;
        if (row.indent() < indent) {
          break;
        }
        last = next;
      }
    }
    number = last;
    mending.verbatim.add(new Span(at, mending.row(last).end()));
  }

  /** The value of a key that holds prose: what YAML would not read to its end is read in quotes. */
  private Last prose(int at, Row row, Level level) {
    char c = mending.draft.at(at);
    int end = row.end();
    if (c == '"' || c == '\'') {
      int close = quotes.endOnLine(at, end);
      int next = close < 0 ? end : mending.skipBlanks(close);
      if (close < 0 || next >= end || mending.comment(next)) {
        return value(at, row, level, "");
      }
    }
    if (blockHeader(at, end) || c == '*' && !Starts.cannotBegin(mending, at, end)) {
      return value(at, row, level, "");
    }
    int stop = mending.beforeComment(at, end);
    if ((c == '[' || c == '{') && wholeFlow(at, level)) {
      return value(at, row, level, "");
    }
    if (c == '&' && !starts.misread(at, stop)) {
      return value(at, row, level, "");
    }
    if (starts.misread(at, stop)) {
      quoteProse(at, c, lastLineOf(stop, row, level));
      return Last.CLOSED;
    }
    int hash = stop < end ? mending.skipBlanks(stop) : end;
    if (hash < end && hash == stop + 1 && !mending.gap(hash + 1)) {
      mending.ambiguous(
          hash,
          end,
          "YAML cuts the text here, at ` #`: put it in quotes, or write `# ` before a comment",
          new Fix(
              "Put the text in quotes",
              mending.quoteFix(at, end).edits(),
              false));
    }
    return Last.PLAIN;
  }

  private void quoteProse(int at, char first, int end) {
    Fix fix = mending.quote(at, end);
    if (first == '!' || first == '&') {
      String what = first == '!' ? "a tag" : "an anchor";
      mending.ambiguous(
          at, end, "YAML takes the first word for " + what + ": put the text in quotes", fix);
    } else {
      mending.syntax(at, end, "YAML cannot read this text as it stands: put it in quotes", fix);
    }
  }

  /** Prose may go on over deeper lines; it is quoted to its end. */
  private int lastLineOf(int end, Row row, Level level) {
    int stop = end;
    int last = row.number();
    while (stop >= mending.row(last).end() && last + 1 < mending.text.lineCount()) {
      Row next = mending.row(last + 1);
      if (mending.empty(next) || next.indent() <= level.indent || !isText(next)) {
        break;
      }
      last++;
      stop = mending.beforeComment(next.content(), next.end());
    }
    number = last;
    return stop;
  }

  /** True for a closed list or mapping: not prose, and for the reader of the tree to judge. */
  private boolean wholeFlow(int at, Level level) {
    int end = quotes.balanced(at, level.indent);
    if (end < 0) {
      return false;
    }
    int lineEnd = mending.row(mending.text.lineAt(end)).end();
    int next = mending.skipBlanks(end);
    return next >= lineEnd || mending.draft.at(next) == '#';
  }
}
