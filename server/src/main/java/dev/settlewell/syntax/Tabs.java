package dev.settlewell.syntax;

import dev.settlewell.syntax.Mending.Row;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Problem;
import java.util.ArrayList;
import java.util.List;

/**
 * Tabs before a line's content: YAML takes none there; they are read as the blanks they stand for.
 */
final class Tabs {
  private static final int USUAL_UNIT = 2;

  private final Mending mending;

  Tabs(Mending mending) {
    this.mending = mending;
  }

  /** One problem for all of them: they have one cause, and one fix mends them. */
  void mendIndentation() {
    List<Edit> edits = new ArrayList<>();
    Row first = null;
    int unit = 0;
    for (int number = 0; number < mending.text.lineCount(); number++) {
      Row row = mending.row(number);
      int tabs = tabs(row);
      if (tabs == 0 || mending.empty(row)) {
        continue;
      }
      first = first == null ? row : first;
      unit = unit == 0 ? unit() : unit;
      int indent = row.content() - row.start() - tabs + tabs * unit;
      edits.add(mending.edit(row.start(), row.content(), " ".repeat(indent)));
      mending.setIndent(row, indent);
    }
    if (first != null) {
      String lines = edits.size() == 1 ? "this line" : edits.size() + " lines from here on";
      mending.problems.add(
          new Problem(
              Problem.Kind.SYNTAX,
              mending.text.place(first.start(), first.content()),
              "a tab indents " + lines + ": YAML takes only blanks there",
              new Fix("Replace the tabs by blanks", edits, true)));
    }
  }

  private int tabs(Row row) {
    int tabs = 0;
    for (int i = row.start(); i < row.content(); i++) {
      tabs += mending.draft.at(i) == '\t' ? 1 : 0;
    }
    return tabs;
  }

  /** By how much the lines without tabs are indented at the least. */
  private int unit() {
    int unit = Integer.MAX_VALUE;
    for (int number = 0; number < mending.text.lineCount(); number++) {
      Row row = mending.row(number);
      if (row.indent() > 0 && !mending.empty(row) && tabs(row) == 0) {
        unit = Math.min(unit, row.indent());
      }
    }
    return unit == Integer.MAX_VALUE ? USUAL_UNIT : unit;
  }
}
