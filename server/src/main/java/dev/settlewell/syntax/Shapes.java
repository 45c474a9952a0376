package dev.settlewell.syntax;

import dev.settlewell.syntax.Mending.Row;

/** What a line, or what stands on it, is by its look. */
final class Shapes {
  private final Mending mending;
  private final Quotes quotes;

  Shapes(Mending mending, Quotes quotes) {
    this.mending = mending;
    this.quotes = quotes;
  }

  boolean isItem(int at) {
    return mending.draft.at(at) == '-' && mending.gap(at + 1);
  }

  boolean isText(Row row) {
    int at = row.content();
    return !isItem(at)
        && !tightItem(at, row.end())
        && colon(at, row.end()) < 0
        && mending.tightColon(at, row.end()) < 0;
  }

  /** {@code -resistor: 1 kΩ}: a dash that lacks its blank. */
  boolean tightItem(int at, int end) {
    char next = mending.draft.at(at + 1);
    return mending.draft.at(at) == '-' && next >= 'a' && next <= 'z' && colon(at, end) >= 0;
  }

  /** The colon of the key that stands here; -1 where none does. */
  int colon(int at, int end) {
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

  boolean hasKey(int at, int end) {
    return colon(at, end) >= 0 || mending.tightColon(at, end) >= 0;
  }

  int keyEnd(Row row) {
    int colon = colon(row.content(), row.end());
    return colon >= 0 ? colon : mending.beforeComment(row.content(), row.end());
  }

  boolean word(int at, int end) {
    for (int i = at; i < end; i++) {
      if (!Mending.wordChar(mending.draft.at(i))) {
        return false;
      }
    }
    return end > at;
  }

  boolean opens(int at) {
    return "[{\"'".indexOf(mending.draft.at(at)) >= 0;
  }

  boolean blockHeader(int at, int end) {
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

  /** True for a line whose first character begins nothing, before a key or a dash. */
  boolean stray(Row row, int base) {
    int at = row.content();
    char c = mending.draft.at(at);
    int next = mending.skipBlanks(at + 1);
    boolean begins = isItem(next) || wordKey(next, row.end());
    if (!begins || "[]{}\"',%@`|>&*!".indexOf(c) < 0) {
      return false;
    }
    boolean bracket = c == '[' || c == '{';
    boolean quote = c == '"' || c == '\'';
    return !(bracket && quotes.balanced(at, base) >= 0)
        && !(quote && quotes.closed(at, row.number(), base) >= 0);
  }

  boolean wordKey(int at, int end) {
    int colon = colon(at, end);
    return colon > at && word(at, colon);
  }

  /** True where the rest of a line is nothing but marks that belong to no word. */
  boolean onlyMarks(int at, int end) {
    for (int i = at; i < end; i++) {
      if ("[]{}\"'`,:@%*&!|>".indexOf(mending.draft.at(i)) < 0) {
        return false;
      }
    }
    return at < end;
  }
}
