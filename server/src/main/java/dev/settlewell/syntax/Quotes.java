package dev.settlewell.syntax;

import dev.settlewell.syntax.Mending.Row;
import dev.settlewell.text.Span;

/** Finds where a quoted text ends, and closes one that was left open. */
final class Quotes {
  private final Mending mending;

  Quotes(Mending mending) {
    this.mending = mending;
  }

  /** Behind the closing quote on the same line; -1 where there is none. */
  int endOnLine(int open, int lineEnd) {
    char quote = mending.draft.at(open);
    int at = open + 1;
    while (at < lineEnd) {
      char c = mending.draft.at(at);
      if (c == '\\' && quote == '"') {
        at++;
      } else if (c == quote) {
        if (quote == '\'' && at + 1 < lineEnd && mending.draft.at(at + 1) == '\'') {
          at++;
        } else {
          return at + 1;
        }
      }
      at++;
    }
    return -1;
  }

  /**
   * Behind the quoted text that opens here. It may go on over lines indented deeper than {@code
   * base}, as YAML demands; one that is not closed before a line that is not is closed at the end
   * of its first line.
   *
   * @param closers how many brackets are open around it: those at the line's end are not its text
   */
  int end(int open, int base, int closers) {
    Row row = mending.row(mending.text.lineAt(open));
    int end = closed(open, row.number(), base);
    if (end < 0) {
      return close(open, row, closers);
    }
    mending.verbatim.add(new Span(open, end));
    mending.wholes.add(new Span(open, end));
    return end;
  }

  /** Behind the closing quote on this or a deeper line; -1 where there is none. */
  int closed(int open, int line, int base) {
    int end = endOnLine(open, mending.row(line).end());
    return end >= 0 ? end : endBelow(open, line, base);
  }

  private int endBelow(int open, int number, int base) {
    int last = number;
    while (true) {
      int next = last + 1;
      while (next < mending.text.lineCount()
          && mending.row(next).content() >= mending.row(next).end()) {
        next++;
      }
      if (next >= mending.text.lineCount() || mending.row(next).indent() <= base) {
        break;
      }
      last = next;
    }
    return last == number ? -1 : endOnLine(open, mending.row(last).end());
  }

  private int close(int open, Row row, int closers) {
    int end = row.end();
    int left = closers;
    while (left > 0 && end > open + 1 && closer(mending.draft.at(end - 1))) {
      end = mending.trimmed(open + 1, end - 1);
      left--;
    }
    String quote = String.valueOf(mending.draft.at(open));
    String message = "this quote is not closed: write " + quote + " where its text ends";
    mending.syntax(
        open, end, message, mending.guess("Close the quote", mending.edit(end, end, quote)));
    if (quote.equals("\"") && endsInEscape(open, end)) {
      mending.breakOff(open, end);
    } else {
      mending.draft.insert(end, quote);
      mending.verbatim.add(new Span(open, end));
    }
    return end;
  }

  private boolean endsInEscape(int open, int end) {
    int slashes = 0;
    while (end - 1 - slashes > open && mending.draft.at(end - 1 - slashes) == '\\') {
      slashes++;
    }
    return slashes % 2 == 1;
  }

  /** Behind the bracket that closes this one; -1 where none does, on lines deeper than the base. */
  int balanced(int open, int base) {
    int depth = 0;
    int line = mending.text.lineAt(open);
    int at = open;
    while (line >= 0) {
      int end = mending.row(line).end();
      while (at < end && !mending.comment(at)) {
        char c = mending.draft.at(at);
        boolean quote = (c == '"' || c == '\'') && (mending.gap(at - 1) || opens(at - 1));
        depth += c == '[' || c == '{' ? 1 : closer(c) ? -1 : 0;
        if (depth == 0) {
          return at + 1;
        }
        int behind = quote ? closed(at, line, base) : -1;
        if (behind > end) {
          line = mending.text.lineAt(behind);
          end = mending.row(line).end();
        }
        at = Math.max(at + 1, behind);
      }
      line = mending.nextContent(line);
      Row row = line < 0 ? null : mending.row(line);
      if (row == null || row.indent() <= base && !closer(mending.draft.at(row.content()))) {
        return -1;
      }
      at = row.content();
    }
    return -1;
  }

  private boolean opens(int offset) {
    return "[{,".indexOf(mending.draft.at(offset)) >= 0;
  }

  static boolean closer(char c) {
    return c == ']' || c == '}';
  }
}
