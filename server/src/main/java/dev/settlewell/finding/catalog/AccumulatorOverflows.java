package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import java.util.function.Consumer;

/** The sum of a mean does not fit the variable it is summed in. */
final class AccumulatorOverflows extends ChannelCheck {
  @Override
  public String name() {
    return "accumulator-overflows";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "the sum of the codes of one mean does not fit its accumulator";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    double needed = channel.number("accumulator-bits");
    double stated =
        channel
            .part()
            .quantity("accumulator")
            .stated()
            .map(quantity -> quantity.value())
            .orElse(Double.NaN);
    if (!(needed > stated)) {
      return;
    }
    double average = channel.part().number("average").orElse(1.0);
    double fit = Math.floor(average / StrictMath.pow(2, needed - stated));
    report.accept(
        FindingBuilder.of(this, channel, "accumulator")
            .message(
                ("the sum of %s full-scale codes takes %s bits, the accumulator has %s; a"
                        + " mean of about %s would fit")
                    .formatted(
                        Words.count(average),
                        Words.count(needed),
                        Words.count(stated),
                        Words.count(Math.max(fit, 1))))
            .need(Words.count(needed) + " bits")
            .have(Words.count(stated) + " bits")
            .margin(Words.count(stated - needed) + " bits")
            .related(channel.stated("average"), "codes in a sum")
            .candidate(
                Rewriting.fix(
                    channel.text(),
                    channel.part().slot("accumulator"),
                    Words.count(needed) + " bits",
                    "Widen the accumulator to " + Words.count(needed) + " bits"))
            .build());
  }
}
