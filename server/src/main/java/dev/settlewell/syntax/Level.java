package dev.settlewell.syntax;

import dev.settlewell.text.Edit;
import dev.settlewell.text.Span;
import java.util.ArrayList;
import java.util.List;

/** A block mapping or block list that is open while a {@link BlockScan} walks through a text. */
final class Level {
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

  /** How the entry read last on a level ended, which decides what may stand deeper below it. */
  enum Last {
    /** {@code key:} or {@code -} alone: a deeper block may follow. */
    OPEN,
    /** A plain text: deeper lines without a colon go on with it. */
    PLAIN,
    /** Anything else: nothing deeper may follow. */
    CLOSED
  }

  /** A wrong indentation; lines that follow it in the same column belong to the same report. */
  static final class Mend {
    final Span span;
    final String message;
    final List<Edit> edits = new ArrayList<>();

    Mend(Span span, String message) {
      this.span = span;
      this.message = message;
    }
  }
}
