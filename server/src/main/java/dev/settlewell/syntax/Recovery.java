package dev.settlewell.syntax;

import dev.settlewell.syntax.Mending.Row;
import dev.settlewell.text.Problem;
import dev.settlewell.text.Span;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Takes what the parser failed on out of the draft: at first a value or a line, and where it goes
 * on failing the block around it, so that a part of the sheet that cannot be read never costs the
 * rest.
 */
final class Recovery {
  /** How often the parser may fail below a line, by the depth of that line, before all goes. */
  private static final int[] PATIENCE = {12, 4, 2};

  private final Mending mending;
  private final Map<Integer, Integer> failures = new HashMap<>();

  Recovery(Mending mending) {
    this.mending = mending;
  }

  /**
   * @param offset where the parser failed
   * @return false where nothing is left to take out
   */
  boolean takeOut(int offset, String complaint) {
    int number = mending.text.lineAt(offset);
    while (number > 0 && isEmpty(number)) {
      number--;
    }
    if (isEmpty(number)) {
      return false;
    }
    Row row = mending.row(number);
    List<Row> ancestors = ancestors(row);
    for (Row ancestor : ancestors) {
      failures.merge(ancestor.number(), 1, Integer::sum);
    }
    for (int depth = 0; depth < ancestors.size(); depth++) {
      int patience = PATIENCE[Math.min(depth, PATIENCE.length - 1)];
      if (failures.get(ancestors.get(depth).number()) > patience) {
        takeOutBlock(ancestors.get(depth));
        return true;
      }
    }
    takeOutLine(row, complaint);
    return true;
  }

  /** The lines that this one stands below, outermost first. */
  private List<Row> ancestors(Row row) {
    List<Row> found = new ArrayList<>();
    int indent = row.indent();
    for (int n = row.number() - 1; n >= 0 && indent > 0; n--) {
      Row above = mending.row(n);
      if (!isEmpty(n) && above.indent() < indent) {
        found.add(0, above);
        indent = above.indent();
      }
    }
    return found;
  }

  private void takeOutBlock(Row above) {
    int first = mending.nextContent(above.number());
    int last = -1;
    for (int n = first;
        n >= 0 && mending.row(n).indent() > above.indent();
        n = mending.nextContent(n)) {
      last = n;
    }
    if (last < 0) {
      mending.draft.blank(above.start(), above.end());
      return;
    }
    mending.syntax(
        above.content(),
        above.end(),
        "what stands below this cannot be read as YAML; mend its first error, and the rest is"
            + " read");
    mending.breakOff(mending.row(first).content(), mending.row(last).end());
  }

  private void takeOutLine(Row row, String complaint) {
    int start = row.content();
    int end = Math.max(start, row.end());
    int colon = mending.slice(start, end).indexOf(": ");
    int value = mending.skipBlanks(start + colon + 1);
    boolean valueFails = colon > 0 && value < end && !mending.draft.isBlank(value, end);
    if (mending.problems.stream().noneMatch(problem -> onLine(problem, row))) {
      mending.syntax(valueFails ? value : start, end, Messages.of(complaint));
    }
    Optional<Span> whole = wholeOver(row);
    if (whole.isPresent()) {
      mending.wholes.remove(whole.get());
      mending.breakOff(whole.get().start(), whole.get().end());
    } else if (valueFails) {
      mending.breakOff(value, end);
    } else {
      mending.draft.blank(row.start(), end);
    }
  }

  /** The outermost list, mapping or quoted text that this line has a part of, but not all. */
  private Optional<Span> wholeOver(Row row) {
    return mending.wholes.stream()
        .filter(span -> span.start() <= row.end() && span.end() >= row.content())
        .filter(span -> span.start() < row.start() || span.end() > row.end())
        .max(Comparator.comparingInt(Span::length));
  }

  private static boolean onLine(Problem problem, Row row) {
    return problem.place().start() >= row.start() && problem.place().start() <= row.end();
  }

  private boolean isEmpty(int number) {
    Row row = mending.row(number);
    return mending.empty(row) || mending.draft.isBlank(row.start(), row.end());
  }
}
