package dev.settlewell.syntax;

import dev.settlewell.syntax.Mending.Row;
import dev.settlewell.text.Span;
import java.util.ArrayDeque;
import java.util.Deque;

/**
 * Walks through one {@code [list]} or {@code {mapping}} and mends what would cost the whole file.
 */
final class FlowScan {
  private final Mending mending;
  private final Quotes quotes;
  private final int base;
  private final Deque<Open> open = new ArrayDeque<>();
  private int at;
  private int lineEnd;
  private int number;

  /** Behind the last character that belongs to the collection. */
  private int last;

  /** A bracket that is open, and how far its present item has come. */
  private static final class Open {
    final char bracket;
    final int offset;
    String key = "";
    boolean keySeen;

    /** Nothing of the present key or value has been read yet. */
    boolean fresh = true;

    /** It has, and it can go on: a plain text may, over lines too. */
    boolean plain;

    int valueStart;

    Open(char bracket, int offset) {
      this.bracket = bracket;
      this.offset = offset;
    }

    char closer() {
      return bracket == '[' ? ']' : '}';
    }

    void nextItem() {
      key = "";
      keySeen = false;
      fresh = true;
    }
  }

  /**
   * @param base a line indented no deeper than this ends the collection, closed or not
   */
  FlowScan(Mending mending, Quotes quotes, int base) {
    this.mending = mending;
    this.quotes = quotes;
    this.base = base;
  }

  /** Behind the collection that opens here. */
  int end(int start) {
    int end = scan(start);
    mending.wholes.add(new Span(start, Math.max(start, end)));
    return end;
  }

  private int scan(int start) {
    Row row = mending.row(mending.text.lineAt(start));
    number = row.number();
    lineEnd = row.end();
    at = start;
    do {
      if (at >= lineEnd && !nextLine()) {
        closeAll();
        return last;
      }
      if (open.size() > TreeBuilder.MAX_DEPTH) {
        return tooDeep(start);
      }
      step();
    } while (!open.isEmpty());
    return at;
  }

  private boolean nextLine() {
    int next = mending.nextContent(number);
    if (next < 0) {
      return false;
    }
    Row row = mending.row(next);
    char first = mending.draft.at(row.content());
    boolean outside = row.indent() <= base && !Quotes.closer(first);
    if (outside || keyOfBlock(row)) {
      return false;
    }
    number = next;
    at = row.content();
    lineEnd = row.end();
    return true;
  }

  /** A line that begins with a key where none may stand: the bracket was left open above it. */
  private boolean keyOfBlock(Row row) {
    int colon = row.content();
    while (Mending.wordChar(mending.draft.at(colon))) {
      colon++;
    }
    boolean key = colon > row.content() && mending.draft.at(colon) == ':' && mending.gap(colon + 1);
    return key && !open.isEmpty() && (!open.peek().fresh || open.peek().keySeen);
  }

  private void step() {
    char c = mending.draft.at(at);
    if (mending.blank(at)) {
      at++;
    } else if (c == '#') {
      at = lineEnd;
    } else if (c == '[' || c == '{') {
      if (!open.isEmpty()) {
        begin(false);
      }
      open.push(new Open(c, at));
      advance(at + 1);
    } else if (Quotes.closer(c)) {
      close(c);
    } else if (c == ',') {
      comma();
    } else if (c == ':' && separates(at)) {
      colon();
    } else {
      scalar(c);
    }
  }

  private void advance(int to) {
    at = to;
    last = to;
  }

  private void comma() {
    Open top = open.peek();
    if (top.fresh && !top.keySeen) {
      mending.syntax(
          at,
          at + 1,
          "nothing stands before this comma: remove it, or write what is missing",
          mending.guess("Remove the comma", mending.edit(at, at + 1, "")));
      mending.draft.overwrite(at, ' ');
    }
    top.nextItem();
    advance(at + 1);
  }

  private boolean separates(int offset) {
    return offset + 1 >= lineEnd
        || mending.gap(offset + 1)
        || ",[]{}".indexOf(mending.draft.at(offset + 1)) >= 0;
  }

  private void close(char c) {
    Open top = open.pop();
    if (c != top.closer() && !open.isEmpty() && open.peek().closer() == c) {
      notClosed(top, String.valueOf(top.closer()));
      top = open.pop();
    }
    if (c != top.closer()) {
      String right = String.valueOf(top.closer());
      mending.syntax(
          at,
          at + 1,
          "`" + top.bracket + "` is closed by `" + right + "`, not by `" + c + "`",
          mending.guess("Write `" + right + "`", mending.edit(at, at + 1, right)));
      mending.draft.overwrite(at, top.closer());
    }
    advance(at + 1);
  }

  private void notClosed(Open inner, String closers) {
    mending.syntax(
        inner.offset,
        inner.offset + 1,
        "`" + inner.bracket + "` is not closed: write `" + closers + "` where it ends",
        mending.guess("Write `" + closers + "`", mending.edit(last, last, closers)));
    mending.draft.insert(last, closers);
  }

  private void colon() {
    Open top = open.peek();
    if (!top.keySeen) {
      top.keySeen = true;
      top.fresh = true;
      top.valueStart = mending.skipBlanks(at + 1);
      advance(at + 1);
      return;
    }
    int end = itemEnd(at + 1);
    mending.syntax(
        top.valueStart,
        end,
        "a second colon in one value: put the value in quotes, or a comma before the next key");
    mending.breakOff(top.valueStart, end);
    advance(end);
  }

  /** Something begins; where something stands before it already, the comma between is missing. */
  private void begin(boolean plain) {
    Open top = open.peek();
    if (!top.fresh) {
      mending.syntax(
          at,
          at + 1,
          "a comma is missing before this",
          mending.guess("Put a comma before it", mending.edit(last, last, ",")));
      mending.draft.insert(last, ",");
      top.nextItem();
    }
    top.fresh = false;
    top.plain = plain;
  }

  private void scalar(char c) {
    Open top = open.peek();
    boolean quote = c == '"' || c == '\'';
    if (!top.fresh && top.plain && !quote) {
      advance(plainEnd(at + 1));
      return;
    }
    begin(!quote);
    if (top.keySeen && mending.textKeys.contains(top.key)) {
      text(c);
    } else if (quote) {
      int start = at;
      int end = quotes.end(at, base, open.size());
      remember(top, start + 1, Math.max(start + 1, end - 1));
      number = mending.text.lineAt(end);
      lineEnd = mending.row(number).end();
      advance(end);
    } else if (c == '-' && mending.blank(at + 1)) {
      new Starts(mending).dash(at, plainEnd(at + 1));
      advance(plainEnd(at + 1));
    } else if (c == '!') {
      advance(new Starts(mending).tag(at));
      top.fresh = true;
    } else if (c == '&') {
      while (!separates(at)) {
        at++;
      }
      advance(Math.min(at + 1, lineEnd));
      top.fresh = true;
    } else if (Starts.cannotBegin(mending, at, plainEnd(at + 1))) {
      int end = plainEnd(at + 1);
      new Starts(mending).refuse(at, end);
      advance(end);
    } else {
      plain(top);
    }
  }

  private void plain(Open top) {
    int end = plainEnd(at);
    int colon = top.bracket == '{' && !top.keySeen ? mending.tightColon(at, end) : -1;
    if (colon < 0) {
      questionMark(at, end);
      remember(top, at, end);
      advance(Math.max(end, at + 1));
      return;
    }
    new Starts(mending).tightColon(at, colon, end);
    remember(top, at, colon);
    top.keySeen = true;
    top.fresh = true;
    top.valueStart = colon + 1;
    advance(colon + 1);
  }

  /** YAML 1.2 has question marks inside a plain text; the parser, which is of 1.1, has not. */
  private void questionMark(int start, int end) {
    if (mending.slice(start, end).indexOf('?') >= 0) {
      mending.quote(start, end);
    }
  }

  private void remember(Open top, int start, int end) {
    if (!top.keySeen) {
      top.key = mending.slice(start, end);
    }
  }

  /** Prose inside braces ends at a comma for YAML, though hardly ever for its writer. */
  private void text(char c) {
    int start = at;
    if (c == '"' || c == '\'') {
      int end = quotes.endOnLine(at, lineEnd);
      int next = end < 0 ? -1 : mending.skipBlanks(end);
      if (end < 0 || next >= lineEnd || ",]}".indexOf(mending.draft.at(next)) >= 0) {
        end = quotes.end(at, base, open.size());
        number = mending.text.lineAt(end);
        lineEnd = mending.row(number).end();
        advance(end);
        return;
      }
    }
    int end = textEnd();
    boolean cut = plainEnd(start) < end;
    if (cut || new Starts(mending).misread(start, end)) {
      mending.syntax(
          start,
          end,
          "YAML does not read this text to its end: put it in quotes",
          mending.quote(start, end));
    } else {
      questionMark(start, end);
    }
    advance(Math.max(end, start + 1));
  }

  /** To the bracket that closes the item, or to the comma before the next {@code key: }. */
  private int textEnd() {
    int end = at;
    int depth = 0;
    for (int i = at; i < lineEnd && !mending.comment(i); i++) {
      char c = mending.draft.at(i);
      if (c == '[' || c == '{') {
        depth++;
      } else if (Quotes.closer(c) && depth-- == 0) {
        break;
      } else if (c == ',' && depth == 0 && keyFollows(i + 1)) {
        break;
      }
      end = i + 1;
    }
    return mending.trimmed(at, end);
  }

  /** True where a comma ends the item: before a key, or at the line's end. */
  private boolean keyFollows(int from) {
    int i = mending.skipBlanks(from);
    int start = i;
    if (i >= lineEnd || mending.draft.at(i) == '#') {
      return true;
    }
    char c = mending.draft.at(i);
    if (c == '"' || c == '\'') {
      i = Math.max(i, quotes.endOnLine(i, lineEnd));
    }
    while (i < lineEnd && Mending.wordChar(mending.draft.at(i))) {
      i++;
    }
    return i > start && mending.draft.at(i) == ':' && separates(i);
  }

  private int plainEnd(int from) {
    int i = from;
    while (i < lineEnd
        && ",[]{}".indexOf(mending.draft.at(i)) < 0
        && !(mending.draft.at(i) == ':' && separates(i))
        && !mending.comment(i)) {
      i++;
    }
    return mending.trimmed(from, i);
  }

  private int itemEnd(int from) {
    int i = from;
    while (i < lineEnd && ",[]{}".indexOf(mending.draft.at(i)) < 0 && !mending.comment(i)) {
      i++;
    }
    return mending.trimmed(from, i);
  }

  private void closeAll() {
    Open inner = open.peek();
    StringBuilder closers = new StringBuilder();
    while (!open.isEmpty()) {
      closers.append(open.pop().closer());
    }
    notClosed(inner, closers.toString());
  }

  private int tooDeep(int start) {
    int end = lineEnd;
    while (nextLine()) {
      end = lineEnd;
    }
    mending.syntax(start, end, Messages.tooDeep());
    mending.breakOff(start, end);
    open.clear();
    return end;
  }
}
