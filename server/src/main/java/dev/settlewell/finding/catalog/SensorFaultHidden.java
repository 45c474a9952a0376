package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Figure;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Part;
import dev.settlewell.text.Place;
import java.util.Optional;
import java.util.function.Consumer;

/** A broken sensor gives a code that a whole one may give too. */
final class SensorFaultHidden extends ChannelCheck {
  @Override
  public String name() {
    return "sensor-fault-hidden";
  }

  @Override
  public Severity severity() {
    return Severity.WARNING;
  }

  @Override
  public String summary() {
    return "an open or shorted sensor reads like a value that can be";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    check(channel, "open", report);
    check(channel, "short", report);
    check(channel, "loop-low", report);
    check(channel, "loop-high", report);
  }

  private static String what(String fault) {
    return switch (fault) {
      case "open" -> "an open sensor";
      case "short" -> "a shorted sensor";
      case "loop-low" -> "a transmitter that reports its failure with 3.6 mA";
      default -> "a transmitter that reports its failure with 21 mA";
    };
  }

  private void check(ChannelView channel, String fault, Consumer<Finding> report) {
    double low = channel.number("code-limit-low");
    double high = channel.number("code-limit-high");
    Optional<Figure> code = channel.figure("code-" + fault);
    Optional<String> undetermined =
        code.map(Figure::state)
            .filter(Figure.State.None.class::isInstance)
            .map(state -> ((Figure.State.None) state).why());
    double value = channel.number("code-" + fault);
    boolean inside = low <= value && value <= high;
    if (!inside && undetermined.isEmpty()) {
      return;
    }
    String what = what(fault);
    String codes = Words.count(Math.floor(low)) + " to " + Words.count(Math.ceil(high));
    String message =
        inside
            ? ("%s reads as code %s, and what is measured gives codes %s: a fault cannot be"
                    + " told from a value; leave room beside the measured range, or let the node"
                    + " be pulled out of it")
                .formatted(what, Words.count(value), codes)
            : ("%s leaves the pin without a defined code (%s); a resistor that pulls the"
                    + " node out of the measured range makes the fault visible")
                .formatted(what, undetermined.get());
    FindingBuilder finding =
        FindingBuilder.of(this, place(channel), channel.name()).about(fault).message(message);
    if (!Double.isNaN(low)) {
      finding.need("outside codes " + codes);
    }
    report.accept(finding.have(inside ? "code " + Words.count(value) : "undetermined").build());
  }

  /** The kind of the sensor: the key that says what may break. */
  private static Place place(ChannelView channel) {
    return channel.sensor().map(Part::keyPlace).orElse(channel.place("sensor"));
  }
}
