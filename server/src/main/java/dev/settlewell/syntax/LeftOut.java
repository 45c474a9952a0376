package dev.settlewell.syntax;

import dev.settlewell.syntax.Mending.Row;
import dev.settlewell.text.Fix;

/** Lines that are left out of the draft, for nothing can be read from them. */
final class LeftOut {
  private final Mending mending;
  private final Shapes shapes;

  LeftOut(Mending mending, Shapes shapes) {
    this.mending = mending;
    this.shapes = shapes;
  }

  /** A line without a key, or with one that lacks its colon. */
  void noColon(Row row, Level level) {
    int at = row.content();
    int end = mending.beforeComment(at, row.end());
    int next = mending.nextContent(row.number());
    boolean holds = next >= 0 && mending.row(next).indent() > row.indent() && shapes.word(at, end);
    Fix fix = mending.guess("Put a colon after it", mending.edit(end, end, ":"));
    if (holds && row.indent() == level.indent) {
      mending.syntax(at, end, "a colon is missing: write `" + mending.slice(at, end) + ":`", fix);
      mending.draft.insert(end, ":");
      level.last = Level.Last.OPEN;
      return;
    }
    int equals = mending.slice(at, end).indexOf('=');
    int key = equals < 0 ? end : mending.trimmed(at, at + equals);
    if (equals > 0 && shapes.word(at, key)) {
      int value = mending.skipBlanks(at + equals + 1);
      mending.syntax(
          at,
          end,
          "a value stands behind a colon: write `" + mending.slice(at, key) + ": …`",
          mending.guess("Write a colon", mending.edit(key, Math.min(value, end), ": ")));
    } else if (shapes.word(at, end)) {
      String written = mending.slice(at, end);
      mending.syntax(at, end, "`" + written + "` has no colon: write `" + written + ": …`", fix);
    } else {
      mending.syntax(at, end, "this line has no key: write `KEY: VALUE`");
    }
    mending.draft.blank(at, row.end());
  }

  /** Leaves a line out with all that stands deeper below it. */
  void dropBlock(Row row, String message) {
    mending.syntax(row.content(), mending.beforeComment(row.content(), row.end()), message);
    mending.draft.blank(row.content(), row.end());
    int next;
    while ((next = mending.nextContent(mending.line)) >= 0
        && mending.row(next).indent() > row.indent()) {
      Row below = mending.row(next);
      mending.draft.blank(below.content(), below.end());
      mending.line = next;
    }
  }
}
