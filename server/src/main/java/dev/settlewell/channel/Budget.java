package dev.settlewell.channel;

import java.util.List;
import java.util.OptionalDouble;

/**
 * The error of a channel at its worst point, in the measured unit.
 *
 * @param at the point of the measured range
 * @param ambient °C
 * @param hardLimit largest error with every contribution at its limit
 * @param combined standard uncertainty
 * @param expanded at 95 %, the known offset included
 * @param coverageFactor (expanded - |offset|) / combined
 * @param offset known, one-signed part (settling, self-heating)
 * @param needs what the sheet asks for
 * @param worstCase whether {@code needs} judges the hard limit
 * @param typicalOnly names of the rows that rest on a typical figure
 * @param rows by falling share
 */
public record Budget(
    double at,
    double ambient,
    String unit,
    double hardLimit,
    double combined,
    double expanded,
    double coverageFactor,
    double offset,
    OptionalDouble needs,
    boolean worstCase,
    List<String> typicalOnly,
    List<BudgetRow> rows) {
  public Budget {
    typicalOnly = List.copyOf(typicalOnly);
    rows = List.copyOf(rows);
  }

  /** What {@code needs} is held against. */
  public double judged() {
    return worstCase ? hardLimit : expanded;
  }

  /** Negative where the need is not met. */
  public OptionalDouble margin() {
    return needs.isPresent()
        ? OptionalDouble.of(needs.getAsDouble() - judged())
        : OptionalDouble.empty();
  }
}
