package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Alias;
import dev.settlewell.circuit.Averaging;
import dev.settlewell.sheet.Part;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.unit.Engineering;
import dev.settlewell.unit.PreferredValues;
import dev.settlewell.unit.PreferredValues.Series;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;

/** Three things that make one line of an interferer small: a corner, a mean, another rate. */
final class InterferenceRemedies {
  private static final int LARGEST_MEAN = 256;

  private final ChannelView channel;
  private final Alias line;

  /** How much smaller the line has to become. */
  private final double share;

  InterferenceRemedies(ChannelView channel, Alias line) {
    this.channel = channel;
    this.line = line;
    this.share = channel.noticeable() / line.amplitudeMeasured();
  }

  /** {@code a corner of at most 26.1 Hz in front of the pin, a mean of 8, or a scan at 95.5 Hz}. */
  String told() {
    List<String> ways = new ArrayList<>();
    if (corner() > 0) {
      ways.add("a corner of at most " + Words.of(corner(), "Hz") + " in front of the pin");
    }
    mean().ifPresent(count -> ways.add("a mean of " + count));
    if (rate() > 0) {
      ways.add("a scan at " + Words.of(rate(), "Hz"));
    }
    return ways.isEmpty()
        ? "only keeping it out of the cable or the supply is left"
        : String.join(" or ", ways);
  }

  List<Fix> fixes() {
    List<Fix> fixes = new ArrayList<>();
    mean().ifPresent(count -> average(count).ifPresent(fixes::add));
    largerCapacitor().ifPresent(fixes::add);
    if (rate() > 0) {
      String value = Engineering.rounded(rate(), 3, RoundingMode.HALF_UP, "Hz");
      channel
          .scan()
          .flatMap(s -> Rewriting.fix(channel.text(), s.slot("rate"), value, "Scan at " + value))
          .ifPresent(fixes::add);
    }
    return fixes;
  }

  /**
   * The corner of a first-order filter in place of the present one: {@code |H| = 1/sqrt(1 +
   * (f/f_c)^2)} at the line's lower end, as much smaller as it has to be.
   */
  private double corner() {
    double present = channel.number("corner-frequency");
    double now = Double.isNaN(present) ? 1 : 1 / StrictMath.hypot(1, line.low() / present);
    double wanted = now * share;
    return line.low() / Math.sqrt(1 / (wanted * wanted) - 1);
  }

  private Optional<Fix> largerCapacitor() {
    Optional<Part> capacitor = channel.lastStage("capacitor").map(ChannelView.Stage::part);
    double present =
        capacitor
            .flatMap(part -> part.quantity("value").stated())
            .map(quantity -> quantity.value())
            .orElse(Double.NaN);
    double needed = present * channel.number("corner-frequency") / corner();
    if (!(needed > present)) {
      return Optional.empty();
    }
    String value = Words.part(PreferredValues.nextHigher(Series.E6, needed), "F");
    return Rewriting.fix(
        channel.text(),
        capacitor.get().slot("value"),
        value,
        "Lower the corner with " + value + " at the pin");
  }

  /**
   * The smallest mean that takes the line out, at the rate of the visits; empty where none does.
   */
  private OptionalInt mean() {
    double slowest = channel.number("result-rate-least") * channel.average();
    // The rate's tolerance is the same on both sides of its nominal value, and small.
    double fastest = channel.sampleRate() * channel.sampleRate() / slowest;
    if (!(slowest > 0) || channel.figures().visits() != 1) {
      return OptionalInt.empty();
    }
    double before =
        Averaging.worstEvenGain(line.low(), line.high(), slowest, fastest, channel.average());
    double band = channel.value("band").orElse(0);
    int mostForBand = band > 0 ? (int) (slowest / (2 * band)) : LARGEST_MEAN;
    return Averaging.countFor(
        before * share,
        line.low(),
        line.high(),
        slowest,
        fastest,
        Math.min(LARGEST_MEAN, mostForBand));
  }

  private Optional<Fix> average(int count) {
    String value = String.valueOf(count);
    Optional<Edit> edit =
        channel.has("average")
            ? Rewriting.nominal(channel.text(), channel.part().slot("average"), value)
            : Rewriting.lineBelow(
                channel.text(), channel.part().slot("measures"), "average", value);
    return edit.map(e -> new Fix("Average " + value + " conversions", List.of(e), false));
  }

  /** The scan rate nearest the present one at which the line lands at half the result rate. */
  private double rate() {
    double results = channel.number("result-rate");
    double turns = StrictMath.floor(line.frequency() / results);
    double below = line.frequency() / (turns + 0.5);
    double scale = channel.scanRate() / results;
    return below > 2 * channel.value("band").orElse(0) ? below * scale : Double.NaN;
  }
}
