package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import java.util.function.Consumer;

/** The acquisition suffices, but little of it is left. */
final class AcquisitionMarginal extends ChannelCheck {
  private static final double MARGIN = 0.8;

  @Override
  public String name() {
    return "acquisition-marginal";
  }

  @Override
  public Severity severity() {
    return Severity.HINT;
  }

  @Override
  public String summary() {
    return "settling needs more than 80 % of the acquisition";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    SettlingJudgement settling = new SettlingJudgement(channel);
    double need = channel.number("required-acquisition");
    double have = channel.number("acquisition");
    if (settling.exceeds() || !(need > MARGIN * have)) {
      return;
    }
    String message =
        "settling needs %s of the %s acquired: %s are used"
            .formatted(Words.of(need, "s"), Words.of(have, "s"), Words.share(need / have));
    report.accept(
        FindingBuilder.of(this, channel, "acquisition")
            .message(message)
            .need(settling.needed())
            .have(settling.have())
            .margin(Words.of(have - need, "s"))
            .build());
  }
}
