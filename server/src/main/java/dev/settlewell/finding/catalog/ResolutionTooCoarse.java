package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import java.util.function.Consumer;

/** A step of the reported value is larger than what must be visible. */
final class ResolutionTooCoarse extends ChannelCheck {
  @Override
  public String name() {
    return "resolution-too-coarse";
  }

  @Override
  public Severity severity() {
    return Severity.WARNING;
  }

  @Override
  public String summary() {
    return "one step of the reported value is larger than the resolution asked for";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    double step = channel.number("resolution-step");
    double wanted =
        channel
            .part()
            .quantity("resolution")
            .stated()
            .map(quantity -> quantity.value())
            .orElse(Double.NaN);
    if (!(step > wanted)) {
      return;
    }
    String unit = channel.unit();
    double bits = StrictMath.ceil(StrictMath.log(step / wanted) / StrictMath.log(2));
    report.accept(
        FindingBuilder.of(this, channel, "resolution")
            .message(
                ("one step of the reported value is %s, %s are asked for: %s times the"
                        + " gain, or %s more %s, would do")
                    .formatted(
                        Words.of(step, unit),
                        Words.of(wanted, unit),
                        Words.digits(step / wanted),
                        Words.count(bits),
                        bits == 1 ? "bit" : "bits"))
            .need("at most " + Words.of(wanted, unit))
            .have(Words.of(step, unit))
            .margin(Words.of(wanted - step, unit))
            .related(
                channel.converter().map(part -> part.slot("bits").place()), "the converter's bits")
            .build());
  }
}
