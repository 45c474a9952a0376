package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.text.Fix;
import dev.settlewell.unit.Engineering;
import java.math.RoundingMode;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;

/** The hold capacitor does not settle in the acquisition, and a longer one that exists mends it. */
final class AcquisitionTooShort extends ChannelCheck {
  @Override
  public String name() {
    return "acquisition-too-short";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "the hold capacitor has not settled when the acquisition ends; a longer one mends it";
  }

  @Override
  public List<String> covers() {
    return List.of("acquisition-marginal");
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    SettlingJudgement settling = new SettlingJudgement(channel);
    if (!settling.exceeds() || settling.mend() != SettlingJudgement.Mend.LONGER_ACQUISITION) {
      return;
    }
    String have = Words.of(channel.number("acquisition"), "s");
    String message =
        "acquisition %s leaves %s unsettled; needs %s"
            .formatted(have, Words.lsb(settling.error()), settling.needed());
    double margin = channel.number("acquisition") - channel.number("required-acquisition");
    report.accept(
        settling
            .begin(this, channel.place("acquisition"))
            .message(message)
            .need(settling.needed())
            .margin(Words.of(margin, "s"))
            .candidate(longer(channel, settling))
            .build());
  }

  private static Optional<Fix> longer(ChannelView channel, SettlingJudgement settling) {
    String value =
        settling.offersCycles()
            ? Words.count(channel.number("next-acquisition-cycles")) + " cycles"
            : Engineering.rounded(
                channel.number("required-acquisition"), 3, RoundingMode.CEILING, "s");
    return Rewriting.fix(
        channel.text(), channel.part().slot("acquisition"), value, "Acquire for " + value);
  }
}
