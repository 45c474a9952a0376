package dev.settlewell.syntax;

import dev.settlewell.syntax.Mending.Row;

/** The lines {@code ---} and {@code ...}, and directives: a sheet is one document. */
final class DocumentMarks {
  private final Mending mending;

  DocumentMarks(Mending mending) {
    this.mending = mending;
  }

  /**
   * {@code ---} before anything else opens the document; a second document is read into the first.
   */
  boolean takesWholeLine(Row row, boolean started) {
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
  Row behindStart(Row row, boolean started) {
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
}
