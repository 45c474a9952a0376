package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import java.util.List;
import java.util.function.Consumer;

/** A channel that stands several times in an order, at unequal distances. */
final class UnevenSampling extends ChannelCheck {
  private static final double EVEN = 0.01;
  private static final double SLOW_BAND = 0.1;

  @Override
  public String name() {
    return "uneven-sampling";
  }

  @Override
  public Severity severity() {
    return Severity.WARNING;
  }

  @Override
  public String summary() {
    return "a channel is sampled at unequal distances in time";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    double off = channel.magnitude("spacing-unevenness");
    if (!(off > EVEN)) {
      return;
    }
    double rate = channel.sampleRate();
    double band = channel.number("band");
    boolean fast = band > SLOW_BAND * rate;
    String message =
        ("the %d visits a scan are spaced up to %s off their mean%s; spread them evenly"
                + " over the period, or sample the channel in a scan of its own")
            .formatted(
                channel.figures().visits(),
                Words.share(off),
                fast
                    ? ", and the band of %s is more than a tenth of the rate of %s"
                        .formatted(Words.of(band, "Hz"), Words.of(rate, "Hz"))
                    : "");
    report.accept(
        FindingBuilder.of(this, secondVisit(channel), channel.name())
            .severity(fast ? Severity.WARNING : Severity.INFORMATION)
            .message(message)
            .need("within " + Words.share(EVEN))
            .have(Words.share(off))
            .related(channel.stated("band"), "the band")
            .build());
  }

  /** Where the order names the channel for the second time. */
  private static Place secondVisit(ChannelView channel) {
    List<Place> visits =
        channel.scan().stream()
            .flatMap(scan -> scan.list("order", String.class).stated().stream())
            .flatMap(List::stream)
            .filter(item -> item.stated().filter(channel.name()::equals).isPresent())
            .map(Slot::place)
            .toList();
    return visits.size() > 1 ? visits.get(1) : channel.figures().channel().place();
  }
}
