package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Budget;
import dev.settlewell.channel.BudgetRow;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import java.util.function.Consumer;

/** A small share of the span is used, and what scales with an LSB counts. */
final class RangePoorlyUsed extends ChannelCheck {
  private static final double WELL_USED = 0.5;
  private static final double NOTICEABLE = 0.25;

  @Override
  public String name() {
    return "range-poorly-used";
  }

  @Override
  public Severity severity() {
    return Severity.INFORMATION;
  }

  @Override
  public String summary() {
    return "the signal uses little of the span, and that limits the reading";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    double used = channel.number("range-used");
    double share = channel.budget().map(RangePoorlyUsed::shareOfLsb).orElse(Double.NaN);
    if (!(used < WELL_USED && share > NOTICEABLE)) {
      return;
    }
    double reference = channel.number("full-scale") * used;
    report.accept(
        FindingBuilder.of(this, channel, "measures")
            .message(
                ("the signal uses %s of the span, and %s of the variance comes from errors"
                        + " that scale with it; up to %s times the gain, or a span down to %s, fit")
                    .formatted(
                        Words.share(used),
                        Words.share(share),
                        Words.digits(1 / used),
                        Words.of(reference, "V")))
            .need("at least " + Words.share(WELL_USED))
            .have(Words.share(used))
            .related(
                channel.converter().map(part -> part.slot("reference").place()), "the reference")
            .build());
  }

  private static double shareOfLsb(Budget budget) {
    return budget.rows().stream()
        .filter(BudgetRow::scalesWithLsb)
        .mapToDouble(BudgetRow::share)
        .sum();
  }
}
