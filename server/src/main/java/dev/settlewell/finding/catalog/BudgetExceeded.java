package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import java.util.function.Consumer;

/** The expanded uncertainty at 95 % is larger than the channel needs. */
final class BudgetExceeded extends ChannelCheck {
  @Override
  public String name() {
    return "budget-exceeded";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "the expanded uncertainty is larger than what is needed";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    channel
        .budget()
        .filter(budget -> !budget.worstCase())
        .map(budget -> new BudgetExcess(channel, budget))
        .filter(BudgetExcess::exceeds)
        .ifPresent(excess -> report.accept(excess.finding(this, "an expanded uncertainty")));
  }
}
