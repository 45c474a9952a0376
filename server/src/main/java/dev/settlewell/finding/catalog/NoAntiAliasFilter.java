package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Figure;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import java.util.Optional;
import java.util.function.Consumer;

/** Nothing in front of the converter keeps fast disturbances out, and nothing is said of them. */
final class NoAntiAliasFilter extends ChannelCheck {
  @Override
  public String name() {
    return "no-anti-alias-filter";
  }

  @Override
  public Severity severity() {
    return Severity.INFORMATION;
  }

  @Override
  public String summary() {
    return "nothing keeps disturbances above half the scan rate out of the readings";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    double half = channel.sampleRate() / 2;
    double corner = corner(channel);
    boolean said = !channel.part().slot("interferers").isMissing();
    boolean averaged = channel.has("average") || channel.has("oversampling");
    if (!(corner >= half) || said || averaged) {
      return;
    }
    String where =
        Double.isInfinite(corner)
            ? "the path has no pole"
            : "the path's corner lies at " + Words.of(corner, "Hz");
    report.accept(
        FindingBuilder.of(this, channel.keyPlace("path"), channel.name())
            .message(
                ("%s, above half the scan rate of %s: whatever disturbs the sensor folds"
                        + " into the readings; filter below it, average, or say `interferers: []`"
                        + " where there are none")
                    .formatted(where, Words.of(half, "Hz")))
            .need("a corner below " + Words.of(half, "Hz"))
            .have(Double.isInfinite(corner) ? "none" : Words.of(corner, "Hz"))
            .build());
  }

  /** NaN where it is not known, infinite where the path lets everything through. */
  private static double corner(ChannelView channel) {
    Optional<Figure> figure = channel.figure("corner-frequency");
    boolean open = figure.map(f -> f.state() instanceof Figure.State.Unlimited).orElse(false);
    return open ? Double.POSITIVE_INFINITY : channel.number("corner-frequency");
  }
}
