package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Part;
import dev.settlewell.text.Fix;
import dev.settlewell.unit.PreferredValues;
import dev.settlewell.unit.PreferredValues.Series;
import java.util.Optional;
import java.util.function.Consumer;

/** The path takes away part of what the channel wants to see. */
final class FilterDroop extends ChannelCheck {
  private static final double ALLOWED = 0.01;
  private static final double SHARE_OF_NEEDS = 0.1;

  @Override
  public String name() {
    return "filter-droop";
  }

  @Override
  public Severity severity() {
    return Severity.WARNING;
  }

  @Override
  public String summary() {
    return "path and averaging take away part of the signal at the edge of the wanted band";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    double droop = channel.number("droop");
    double amplitude = amplitude(channel);
    double allowed = SHARE_OF_NEEDS * channel.needs().orElse(Double.POSITIVE_INFINITY);
    boolean tooMuch = droop * amplitude > allowed;
    if (!(droop > ALLOWED) && !tooMuch) {
      return;
    }
    double share = tooMuch ? Math.min(ALLOWED, allowed / amplitude) : ALLOWED;
    String lost =
        Double.isNaN(amplitude)
            ? ""
            : ", " + Words.of(droop * amplitude, channel.unit()) + " of what moves there";
    report.accept(
        FindingBuilder.of(this, channel, "band")
            .message(
                ("%s of the signal is lost at the band's edge of %s%s; the corner of the"
                        + " path lies at %s, a first-order one would have to be at %s")
                    .formatted(
                        Words.share(droop),
                        Words.of(channel.number("band"), "Hz"),
                        lost,
                        Words.of(channel.number("corner-frequency"), "Hz"),
                        Words.of(corner(channel, share), "Hz")))
            .candidate(smallerCapacitor(channel, share))
            .need(tooMuch ? "at most " + Words.of(allowed, channel.unit()) : Words.share(ALLOWED))
            .have(Words.share(droop))
            .related(channel.stated("average"), "the average takes its part")
            .related(channel.lastStage("capacitor").map(s -> s.part().place()), "the capacitor")
            .build());
  }

  /** Where a first-order low-pass loses the given share at the band's edge. */
  private static double corner(ChannelView channel, double share) {
    double gain = 1 - share;
    return channel.number("band") / Math.sqrt(1 / (gain * gain) - 1);
  }

  private static Optional<Fix> smallerCapacitor(ChannelView channel, double share) {
    Optional<Part> capacitor = channel.lastStage("capacitor").map(ChannelView.Stage::part);
    double present =
        capacitor
            .flatMap(part -> part.quantity("value").stated())
            .map(quantity -> quantity.value())
            .orElse(Double.NaN);
    // The slowest corner within the tolerances is the one that has to come up.
    double slowest = corner(channel, channel.number("droop"));
    double needed = present * slowest / corner(channel, share);
    if (!(0 < needed && needed < present)) {
      return Optional.empty();
    }
    String value = Words.part(PreferredValues.nextLower(Series.E6, needed), "F");
    return Rewriting.fix(
        channel.text(),
        capacitor.get().slot("value"),
        value,
        "Raise the corner with " + value + " at the pin");
  }

  private static double amplitude(ChannelView channel) {
    Optional<Part> band = channel.part().part("band").stated();
    return band.flatMap(part -> part.quantity("amplitude").stated())
        .map(quantity -> quantity.value())
        .orElse(Double.NaN);
  }
}
