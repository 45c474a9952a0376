package dev.settlewell.syntax;

import dev.settlewell.syntax.Mending.Row;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;

/**
 * The marks that a version control system leaves in a file where two revisions could not be merged.
 * The upper side is read; the lower one is left out.
 */
final class Conflicts {
  private static final int MARK_LENGTH = 7;

  private final Mending mending;

  Conflicts(Mending mending) {
    this.mending = mending;
  }

  void takeOut() {
    int number = 0;
    while (number < mending.text.lineCount()) {
      number = mark(number) == ' ' ? number + 1 : conflict(number);
    }
  }

  /**
   * @return the line behind the conflict
   */
  private int conflict(int first) {
    int upperEnd = -1;
    int middle = -1;
    if (mark(first) == '<') {
      for (int i = first + 1; i < mending.text.lineCount() && mark(i) != '<'; i++) {
        char mark = mark(i);
        if (mark == '|' && upperEnd < 0) {
          upperEnd = i;
        } else if (mark == '=' && middle < 0) {
          middle = i;
          upperEnd = upperEnd < 0 ? i : upperEnd;
        } else if (mark == '>' && middle >= 0) {
          whole(first, upperEnd, middle, i);
          return i + 1;
        }
      }
    }
    Row row = mending.row(first);
    mending.syntax(
        row.start(), row.end(), "a mark of a merge conflict was left here: remove the line");
    blank(first, first);
    return first + 1;
  }

  private void whole(int first, int upperEnd, int middle, int end) {
    Fix upper = fix("Keep the upper side", remove(first, first), remove(upperEnd, end));
    Fix lower = fix("Keep the lower side", remove(first, middle), remove(end, end));
    Row row = mending.row(first);
    mending.syntax(
        row.start(),
        row.end(),
        "a merge conflict is not resolved here: keep one side; the upper one is read",
        upper,
        lower);
    blank(first, first);
    blank(upperEnd, end);
  }

  private Fix fix(String title, Edit... edits) {
    return mending.guess(title, edits);
  }

  private Edit remove(int from, int to) {
    int end =
        to + 1 < mending.text.lineCount() ? mending.text.lineStart(to + 1) : mending.text.length();
    return mending.edit(mending.text.lineStart(from), end, "");
  }

  private void blank(int from, int to) {
    mending.draft.blank(mending.row(from).start(), mending.text.line(to).end());
  }

  /** Which mark a line begins with; a blank where it is none. */
  private char mark(int number) {
    Row row = mending.row(number);
    char c = mending.draft.at(row.start());
    if ("<|=>".indexOf(c) < 0 || row.content() != row.start()) {
      return ' ';
    }
    for (int i = 1; i < MARK_LENGTH; i++) {
      if (mending.draft.at(row.start() + i) != c) {
        return ' ';
      }
    }
    return mending.gap(row.start() + MARK_LENGTH) ? c : ' ';
  }
}
