package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Budget;
import dev.settlewell.channel.BudgetRow;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import java.util.Comparator;
import java.util.List;

/** A budget that is larger than what the channel needs, and the rows it comes from. */
final class BudgetExcess {
  private static final int ROWS_TOLD = 3;

  private final ChannelView channel;
  private final Budget budget;

  BudgetExcess(ChannelView channel, Budget budget) {
    this.channel = channel;
    this.budget = budget;
  }

  boolean exceeds() {
    return !budget.rows().isEmpty()
        && budget.needs().isPresent()
        && budget.judged() > budget.needs().getAsDouble();
  }

  Finding finding(Check check, String what) {
    String unit = budget.unit();
    double needs = budget.needs().orElseThrow();
    List<BudgetRow> largest = largest();
    BudgetRow first = largest.get(0);
    String message =
        ("%s of ±%s exceeds the ±%s needed, at %s and %s; the largest row is %s with ±%s,"
                + " without it about ±%s would remain")
            .formatted(
                what,
                of(budget.judged()),
                of(needs),
                Words.of(budget.at(), unit),
                Words.of(budget.ambient(), "°C"),
                named(first),
                of(first.limit()),
                of(without(first)));
    FindingBuilder finding =
        FindingBuilder.of(check, channel, "needs")
            .message(message)
            .need("±" + of(needs))
            .have("±" + of(budget.judged()))
            .margin(of(needs - budget.judged()));
    for (BudgetRow row : largest) {
      finding.fact(
          named(row),
          "±%s, %s of the variance".formatted(of(row.limit()), Words.share(row.share())));
      row.places().stream().findFirst().ifPresent(place -> finding.related(place, row.name()));
    }
    return finding.build();
  }

  private List<BudgetRow> largest() {
    Comparator<BudgetRow> order =
        budget.worstCase()
            ? Comparator.comparingDouble(BudgetRow::limit).reversed()
            : Comparator.comparingDouble(BudgetRow::share).reversed();
    return budget.rows().stream().sorted(order).limit(ROWS_TOLD).toList();
  }

  /** What is left of the budget without one row. */
  private double without(BudgetRow row) {
    if (budget.worstCase()) {
      return Math.max(0, budget.hardLimit() - row.limit());
    }
    double combined = budget.combined() * Math.sqrt(Math.max(0, 1 - row.share()));
    return combined * budget.coverageFactor() + Math.abs(budget.offset());
  }

  /** A row that has a finding of its own says which: there it is mended. */
  private String named(BudgetRow row) {
    String finding =
        switch (row.name()) {
          case "leakage" ->
              channel.magnitude("leakage-error-measured") > channel.noticeable()
                  ? "source-resistance-too-high"
                  : "";
          case "settling", "settling-offset" -> settling();
          default -> "";
        };
    return finding.isEmpty() ? row.name() : row.name() + " (see " + finding + ")";
  }

  private String settling() {
    SettlingJudgement settling = new SettlingJudgement(channel);
    if (!settling.exceeds()) {
      return "";
    }
    return switch (settling.mend()) {
      case LONGER_ACQUISITION -> "acquisition-too-short";
      case LARGER_RESERVOIR -> "reservoir-too-small";
      case NEITHER -> "never-settles";
    };
  }

  private String of(double value) {
    return Words.of(value, budget.unit());
  }
}
