package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.text.Fix;
import dev.settlewell.unit.Engineering;
import java.math.RoundingMode;
import java.util.Optional;
import java.util.function.Consumer;

/** Results come too seldom for the highest frequency of interest. */
final class BandAboveHalfRate extends ChannelCheck {
  @Override
  public String name() {
    return "band-above-half-rate";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "results come no more than twice as often as the wanted band moves";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    double band = channel.number("band");
    double rate = channel.number("result-rate-least");
    if (!(rate > 0 && rate <= 2 * band)) {
      return;
    }
    double factor = 2 * band / rate;
    double scanRate = channel.scanRate();
    if (!Double.isFinite(factor * scanRate)) {
      return;
    }
    String above = Words.of(factor * scanRate, "Hz");
    report.accept(
        FindingBuilder.of(this, channel, "band")
            .message(
                "results come at %s, and a band of %s needs more than %s: scan at more than %s%s"
                    .formatted(
                        Words.of(rate, "Hz"),
                        Words.of(band, "Hz"),
                        Words.of(2 * band, "Hz"),
                        above,
                        channel.has("average") ? ", or average fewer" : ""))
            .need("more than " + Words.of(2 * band, "Hz"))
            .have(Words.of(rate, "Hz"))
            .margin(Words.of(rate - 2 * band, "Hz"))
            .related(channel.scan().map(scan -> scan.slot("rate").place()), "the scan's rate")
            .related(channel.stated("average"), "results a mean")
            .candidate(faster(channel, 1.05 * factor * scanRate))
            .build());
  }

  private static Optional<Fix> faster(ChannelView channel, double rate) {
    String value = Engineering.rounded(rate, 2, RoundingMode.CEILING, "Hz");
    return channel
        .scan()
        .flatMap(
            scan -> Rewriting.fix(channel.text(), scan.slot("rate"), value, "Scan at " + value));
  }
}
