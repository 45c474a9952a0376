package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Part;
import dev.settlewell.text.Fix;
import dev.settlewell.unit.PreferredValues;
import dev.settlewell.unit.PreferredValues.Series;
import java.util.Optional;
import java.util.function.Consumer;

/** How far a channel's voltage at the pin leaves the span of its converter, at one of its ends. */
final class SpanExcess {
  private static final double SAME = 1e-9;

  private final ChannelView channel;
  private final boolean above;

  SpanExcess(ChannelView channel, boolean above) {
    this.channel = channel;
    this.above = above;
  }

  /**
   * An error where the nominal voltage leaves the nominal span, a warning where the worst does; pin
   * and reference are moved together there, for what feeds both cancels.
   */
  void report(Check check, Consumer<Finding> report) {
    String end = above ? "high" : "low";
    double nominal = channel.number("pin-nominal-" + end);
    double span = channel.number("span-" + end);
    double share = channel.number("pin-share-worst-" + end);
    double full = channel.number("full-scale");
    double halfLsb = channel.number("lsb") / full / 2;
    if (beyond((nominal - span) / full, SAME)) {
      report.accept(finding(check, Severity.ERROR, nominal, span, ""));
    } else if (beyond(above ? share - 1 : share, halfLsb)) {
      double worst = span + (above ? share - 1 : share) * full;
      report.accept(finding(check, Severity.WARNING, worst, span, " with all tolerances"));
    }
  }

  /**
   * A range that ends exactly where the span does is meant to, so its last bit is no excess; with
   * tolerances half an LSB is none, for it reads as the same code.
   */
  private boolean beyond(double shareOutside, double tolerated) {
    return above ? shareOutside > tolerated : shareOutside < -tolerated;
  }

  private Finding finding(
      Check check, Severity severity, double voltage, double limit, String tolerances) {
    double excess = Math.abs(voltage - limit);
    String message =
        "the pin %s %s%s, the span %s at %s: %s %s; %s"
            .formatted(
                above ? "reaches" : "falls to",
                volts(voltage),
                tolerances,
                above ? "ends" : "starts",
                volts(limit),
                volts(excess),
                above ? "read as full scale" : "read as code 0",
                mend(voltage, limit));
    return FindingBuilder.of(check, channel, "measures")
        .severity(severity)
        .message(message)
        .need((above ? "at most " : "at least ") + volts(limit))
        .have(volts(voltage))
        .margin(volts(above ? limit - voltage : voltage - limit))
        .related(
            channel.converter().map(part -> part.slot("reference").place()),
            "the reference of the span")
        .candidate(above && limit > 0 ? smaller(fitting(limit / voltage)) : Optional.empty())
        .build();
  }

  private String mend(double voltage, double limit) {
    return above && limit > 0
        ? "at most " + Words.share(limit / voltage) + " of the signal fit"
        : "raise the level of the path, or narrow what is measured";
  }

  /** What is left of the signal where its worst fits too. */
  private double fitting(double nominal) {
    double worst = channel.number("pin-share-worst-high");
    return worst > 1 ? Math.min(nominal, 1 / worst) : nominal;
  }

  private Optional<Fix> smaller(double factor) {
    Optional<Part> shunt = channel.lastStage("shunt").map(ChannelView.Stage::part);
    if (shunt.isPresent()) {
      return replace(shunt.get(), "value", nominal(shunt.get(), "value") * factor, "shunt");
    }
    Optional<Part> divider = channel.lastStage("divider").map(ChannelView.Stage::part);
    if (divider.isPresent()) {
      double upper = nominal(divider.get(), "upper");
      double lower = nominal(divider.get(), "lower");
      double ratio = factor * lower / (upper + lower);
      return replace(divider.get(), "lower", upper * ratio / (1 - ratio), "divider's lower part");
    }
    return Optional.empty();
  }

  private static double nominal(Part part, String key) {
    return part.quantity(key).stated().map(quantity -> quantity.value()).orElse(Double.NaN);
  }

  private Optional<Fix> replace(Part part, String key, double value, String what) {
    if (!(value > 0)) {
      return Optional.empty();
    }
    String preferred = Words.part(PreferredValues.nextLower(Series.E24, value), "Ω");
    return Rewriting.fix(
        channel.text(), part.slot(key), preferred, "Make the " + what + " " + preferred);
  }

  private static String volts(double value) {
    return Words.of(value, "V");
  }
}
