package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Figure;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.text.Fix;
import dev.settlewell.unit.PreferredValues;
import dev.settlewell.unit.PreferredValues.Series;
import dev.settlewell.unit.Range;
import java.util.Optional;
import java.util.function.Consumer;

/** A fault at the sensor's terminal drives too much current into the pin's clamp. */
final class PinOverstressed extends ChannelCheck {
  @Override
  public String name() {
    return "pin-overstressed";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "in a fault the pin's clamp carries more current than it may";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    double allowed =
        channel
            .converter()
            .flatMap(part -> part.quantity("clamp-current").stated())
            .map(quantity -> quantity.value())
            .orElse(Double.NaN);
    double high = current(channel, "overload-current-high");
    double low = current(channel, "overload-current-low");
    double worst = Math.max(high, low);
    if (!(worst > allowed)) {
      return;
    }
    double more = channel.number("source-resistance") * (worst / allowed - 1);
    String mend =
        Double.isFinite(more) && more > 0
            ? "; %s more in series with the pin (%s of E24) would limit it"
                .formatted(
                    Words.of(more, "Ω"),
                    Words.part(PreferredValues.nextHigher(Series.E24, more), "Ω"))
            : "; put a resistor in series with the pin";
    report.accept(
        FindingBuilder.of(this, channel, "overload")
            .message(
                "an overload to %s drives %s into the clamp of the pin, which may carry %s%s"
                    .formatted(
                        overload(channel, high >= low),
                        Double.isInfinite(worst)
                            ? "a current that nothing limits"
                            : Words.of(worst, "A"),
                        Words.of(allowed, "A"),
                        mend))
            .need("at most " + Words.of(allowed, "A"))
            .have(Words.of(worst, "A"))
            .margin(Words.of(allowed - worst, "A"))
            .related(
                channel.converter().map(converter -> converter.slot("clamp-current").place()),
                "what the clamp may carry")
            .candidate(larger(channel, more))
            .build());
  }

  /** Infinite where nothing limits it, 0 where nothing is known. */
  private static double current(ChannelView channel, String name) {
    boolean unlimited =
        channel
            .figure(name)
            .map(figure -> figure.state() instanceof Figure.State.Unlimited)
            .orElse(false);
    return unlimited ? Double.POSITIVE_INFINITY : Math.abs(channel.value(name).orElse(0));
  }

  private static String overload(ChannelView channel, boolean above) {
    Optional<Range> overload = channel.part().range("overload").stated();
    return overload
        .map(range -> Words.of(above ? range.high() : range.low(), "V"))
        .orElse("the stated voltage");
  }

  private static Optional<Fix> larger(ChannelView channel, double more) {
    Optional<ChannelView.Stage> resistor = channel.lastStage("resistor");
    double present =
        resistor
            .flatMap(stage -> stage.part().quantity("value").stated())
            .map(quantity -> quantity.value())
            .orElse(Double.NaN);
    if (!(present + more > 0) || Double.isInfinite(more)) {
      return Optional.empty();
    }
    String part = Words.part(PreferredValues.nextHigher(Series.E24, present + more), "Ω");
    return Rewriting.fix(
        channel.text(),
        resistor.get().part().slot("value"),
        part,
        "Raise the series resistor to " + part);
  }
}
