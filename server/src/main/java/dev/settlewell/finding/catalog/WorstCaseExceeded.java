package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import java.util.function.Consumer;

/** The hard limit of the error is larger than the channel needs. */
final class WorstCaseExceeded extends ChannelCheck {
  @Override
  public String name() {
    return "worst-case-exceeded";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "the error with everything at its limit is larger than what is needed";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    channel
        .budget()
        .filter(budget -> budget.worstCase())
        .map(budget -> new BudgetExcess(channel, budget))
        .filter(BudgetExcess::exceeds)
        .ifPresent(excess -> report.accept(excess.finding(this, "a worst-case error")));
  }
}
