package dev.settlewell.syntax;

import dev.settlewell.syntax.Level.Last;
import dev.settlewell.syntax.Mending.Row;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Span;

/** Walks over the values of block mappings and lists, and mends what YAML would not read. */
final class BlockValues {
  private final Mending mending;
  private final Quotes quotes;
  private final Shapes shapes;
  private final Starts starts;
  private final BlockScan scan;

  BlockValues(Mending mending, Quotes quotes, Shapes shapes, BlockScan scan) {
    this.mending = mending;
    this.quotes = quotes;
    this.shapes = shapes;
    this.starts = new Starts(mending);
    this.scan = scan;
  }

  /**
   * Reads the value that stands at {@code from}, over as many lines as it goes.
   *
   * @param key the text of its key; empty for an item of a list
   */
  Last value(int from, Row row, Level level, String key) {
    int end = row.end();
    if (from < end && strayMarks(from, row, level)) {
      return Last.OPEN;
    }
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
      mending.line = mending.text.lineAt(close);
      garbage(close, mending.row(mending.line).end());
      return Last.CLOSED;
    }
    if (shapes.blockHeader(at, end)) {
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

  /**
   * Marks behind a colon or a dash that holds a block: the block is read as if they were not there.
   */
  private boolean strayMarks(int at, Row row, Level level) {
    int end = mending.beforeComment(at, row.end());
    int next = mending.nextContent(row.number());
    if (!shapes.onlyMarks(at, end) || shapes.blockHeader(at, row.end()) || next < 0) {
      return false;
    }
    Row below = mending.row(next);
    boolean item = shapes.isItem(below.content());
    boolean holds = below.indent() > level.indent || item && below.indent() == level.indent;
    char c = mending.draft.at(at);
    boolean flow = (c == '[' || c == '{') && quotes.balanced(at, level.indent) >= 0;
    boolean quote = (c == '"' || c == '\'') && quotes.closed(at, row.number(), level.indent) >= 0;
    if (!holds || flow || quote || !item && shapes.isText(below)) {
      return false;
    }
    String written = mending.slice(at, end);
    mending.syntax(
        at,
        end,
        "`" + written + "` does not belong here: remove it",
        mending.guess("Remove `" + written + "`", mending.edit(at, end, "")));
    mending.draft.blank(at, end);
    return true;
  }

  /** Behind the tags, which are told, and the anchors before a value. */
  private int behindProperties(int from, int end) {
    int at = from;
    while (at < end && (mending.draft.at(at) == '!' || mending.draft.at(at) == '&')) {
      int next = at;
      if (mending.draft.at(at) == '!') {
        next = starts.tag(at);
      } else {
        while (!mending.gap(next)) {
          next++;
        }
      }
      at = mending.skipBlanks(next);
    }
    return at;
  }

  /** {@code sensor: thermistor: …}: the inner key is read as if it stood on the next line. */
  private Last secondColon(int at, int end, Row row, Level level) {
    int colon = starts.secondColon(at, end);
    boolean key = shapes.word(at, colon) && Character.isLetter(mending.draft.at(at)) && !level.list;
    if (!key || scan.depth() > TreeBuilder.MAX_DEPTH) {
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
    scan.entryBelow(row, level, at);
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

  /** A block text goes on as deep as its first line, or as deep as its header says. */
  private void skipBlock(int at, Level level) {
    int indent = 0;
    for (int i = at + 1; i <= at + 2; i++) {
      char digit = mending.draft.at(i);
      indent = digit >= '1' && digit <= '9' ? level.indent + digit - '0' : indent;
    }
    int header = mending.text.line(mending.line).end();
    int last = mending.line;
    for (int next = mending.line + 1; next < mending.text.lineCount(); next++) {
      Row row = mending.row(next);
      if (row.content() < row.end()) {
        indent = indent == 0 ? Math.max(row.indent(), level.indent + 1) : indent;
        if (row.indent() < indent) {
          break;
        }
        last = next;
      }
    }
    mending.line = last;
    mending.verbatim.add(new Span(header, Math.max(header, mending.row(last).end())));
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
    if (shapes.blockHeader(at, end) || c == '*' && !Starts.cannotBegin(mending, at, end)) {
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
          new Fix("Put the text in quotes", mending.quoteFix(at, end).edits(), false));
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
      if (mending.empty(next) || next.indent() <= level.indent || !shapes.isText(next)) {
        break;
      }
      last++;
      stop = mending.beforeComment(next.content(), next.end());
    }
    mending.line = last;
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
