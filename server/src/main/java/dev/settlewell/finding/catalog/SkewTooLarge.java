package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Part;
import java.util.Optional;
import java.util.function.Consumer;

/** Two channels that belong together are sampled too far apart. */
final class SkewTooLarge extends ChannelCheck {
  @Override
  public String name() {
    return "skew-too-large";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "two channels that belong together are sampled too far apart";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    Optional<Part> within = channel.part().part("within").stated();
    double allowed =
        within
            .flatMap(part -> part.quantity("skew").stated())
            .map(q -> q.value())
            .orElse(Double.NaN);
    double skew = channel.magnitude("skew");
    if (!(skew > allowed)) {
      return;
    }
    String other = within.get().text("channel").orElse("the other channel");
    report.accept(
        FindingBuilder.of(this, within.get().slot("skew").place(), channel.name())
            .message(
                ("%s lie between the samples of %s and %s, %s are allowed; put them side by"
                        + " side in the order, or shorten what lies between")
                    .formatted(Words.of(skew, "s"), channel.name(), other, Words.of(allowed, "s")))
            .need("at most " + Words.of(allowed, "s"))
            .have(Words.of(skew, "s"))
            .margin(Words.of(allowed - skew, "s"))
            .related(channel.scan().map(scan -> scan.slot("order").place()), "the order")
            .build());
  }
}
