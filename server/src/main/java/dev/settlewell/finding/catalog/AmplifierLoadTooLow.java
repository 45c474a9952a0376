package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Figure;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import java.util.function.Consumer;

/**
 * An amplifier drives less impedance than its own: beyond the model, and often beyond stability.
 */
final class AmplifierLoadTooLow extends ChannelCheck {
  @Override
  public String name() {
    return "amplifier-load-too-low";
  }

  @Override
  public Severity severity() {
    return Severity.WARNING;
  }

  @Override
  public String summary() {
    return "an amplifier drives a load below its own output resistance at its bandwidth";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    double load = channel.number("amplifier-load");
    Figure.Operand own =
        channel.figure("amplifier-load").stream()
            .flatMap(figure -> figure.operands().stream())
            .filter(operand -> operand.name().equals("output-resistance"))
            .findFirst()
            .orElse(null);
    if (own == null || !(load < own.value())) {
      return;
    }
    String needed = Words.of(own.value(), own.unit());
    report.accept(
        FindingBuilder.of(this, own.place().orElseThrow(), channel.name())
            .message(
                "the amplifier drives %s at its closed-loop bandwidth, less than its own output resistance of %s: settling may be worse than computed, and the amplifier may ring; a resistor of at least %s between it and the capacitor keeps them apart"
                    .formatted(Words.of(load, "Ω"), needed, needed))
            .need("at least " + needed)
            .have(Words.of(load, "Ω"))
            .build());
  }
}
