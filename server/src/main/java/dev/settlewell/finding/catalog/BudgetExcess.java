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
    return budget.needs().isPresent() && budget.judged() > budget.needs().getAsDouble();
  }

  Finding finding(Check check, String what) {
    String unit = budget.unit();
    double needs = budget.needs().orElseThrow();
    List<BudgetRow> largest = largest();
    BudgetRow first = largest.get(0);
    String message =
        "%s of ±%s exceeds the ±%s needed, at %s and %s; the largest row is %s with ±%s"
            .formatted(
                what,
                of(budget.judged()),
                of(needs),
                Words.of(budget.at(), unit),
                Words.of(budget.ambient(), "°C"),
                first.name(),
                of(first.limit()));
    FindingBuilder finding =
        FindingBuilder.of(check, channel, "needs")
            .message(message)
            .need("±" + of(needs))
            .have("±" + of(budget.judged()))
            .margin(of(needs - budget.judged()));
    for (BudgetRow row : largest) {
      finding.fact(
          row.name(),
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

  private String of(double value) {
    return Words.of(value, budget.unit());
  }
}
