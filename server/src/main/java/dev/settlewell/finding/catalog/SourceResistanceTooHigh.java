package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Figure;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.text.Place;
import dev.settlewell.unit.PreferredValues;
import dev.settlewell.unit.PreferredValues.Series;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;

/** The pin's leakage current drops a noticeable voltage across what feeds the pin. */
final class SourceResistanceTooHigh extends ChannelCheck {
  @Override
  public String name() {
    return "source-resistance-too-high";
  }

  @Override
  public Severity severity() {
    return Severity.WARNING;
  }

  @Override
  public String summary() {
    return "the pin's leakage through the source resistance takes too much of what is needed";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    double error = channel.magnitude("leakage-error-measured");
    double allowed = channel.noticeable();
    if (!(error > allowed)) {
      return;
    }
    double present = channel.number("source-resistance");
    double largest = present * allowed / error;
    String would =
        largest > 0
            ? Words.of(largest, "Ω")
                + " ("
                + Words.part(PreferredValues.nextLower(Series.E24, largest), "Ω")
                + " of E24)"
            : Words.share(allowed / error) + " of it";
    String have = largest > 0 ? Words.of(present, "Ω") : "the source resistance";
    String leaves =
        Words.of(error, channel.unit())
            + " ("
            + Words.lsb(channel.magnitude("leakage-error-lsb"))
            + ")";
    report.accept(
        FindingBuilder.of(this, place(channel), channel.name())
            .message(
                "the pin's leakage through %s makes an error of %s; at most %s keeps it within %s"
                    .formatted(have, leaves, would, Words.of(allowed, channel.unit())))
            .need("at most " + would)
            .have(have)
            .fact("error", leaves)
            .related(
                channel.converter().map(part -> part.slot("pin-leakage").place()),
                "the pin's leakage")
            .build());
  }

  /** The largest resistance that feeds the pin. */
  private static Place place(ChannelView channel) {
    List<Figure.Operand> operands =
        channel.figure("source-resistance").map(Figure::operands).orElse(List.of());
    Optional<Place> largest =
        operands.stream()
            .filter(operand -> operand.unit().equals("Ω") && operand.place().isPresent())
            .max(Comparator.comparingDouble(Figure.Operand::value))
            .flatMap(Figure.Operand::place);
    return largest.orElse(channel.keyPlace("path"));
  }
}
