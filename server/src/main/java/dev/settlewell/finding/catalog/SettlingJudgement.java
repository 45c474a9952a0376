package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Figure;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.unit.PreferredValues;
import dev.settlewell.unit.PreferredValues.Series;
import java.util.List;
import java.util.Optional;

/** What is wrong with the settling of a channel, and which of three things mends it. */
final class SettlingJudgement {
  /** The usual allowance, half an LSB, where a sheet states none. */
  private static final double USUAL_ALLOWANCE = 0.5;

  /** The share of what is needed that settling may take before readings count as wrong. */
  private static final double SHARE_OF_NEEDS = 0.25;

  /** What would make the readings right, the easiest first. */
  enum Mend {
    LONGER_ACQUISITION,
    LARGER_RESERVOIR,
    NEITHER
  }

  private final ChannelView channel;

  SettlingJudgement(ChannelView channel) {
    this.channel = channel;
  }

  double error() {
    return channel.magnitude("settling-error-lsb");
  }

  double allowance() {
    return channel.value("settle-within").orElse(USUAL_ALLOWANCE);
  }

  boolean exceeds() {
    return error() > allowance();
  }

  Mend mend() {
    if (acquisitionMends()) {
      return Mend.LONGER_ACQUISITION;
    }
    return channel.number("smallest-reservoir") > 0 ? Mend.LARGER_RESERVOIR : Mend.NEITHER;
  }

  private boolean acquisitionMends() {
    if (channel.value("required-acquisition").isEmpty()) {
      return false;
    }
    double available = channel.value("acquisition-available").orElse(Double.POSITIVE_INFINITY);
    if (!offersCycles()) {
      return channel.number("required-acquisition") <= available;
    }
    double cycle = channel.number("acquisition") / channel.number("acquisition-cycles");
    return channel.number("next-acquisition-cycles") * cycle <= available;
  }

  boolean offersCycles() {
    return channel.converter().map(part -> part.has("acquisition-cycles")).orElse(false);
  }

  /** An error where it takes more than a quarter of what is needed, or nothing says what is. */
  Severity severity() {
    double measured = channel.magnitude("settling-error-measured");
    boolean small =
        channel.needs().isPresent() && measured <= SHARE_OF_NEEDS * channel.needs().getAsDouble();
    return small ? Severity.WARNING : Severity.ERROR;
  }

  /** A finding with what all three have in common. */
  FindingBuilder begin(Check check, Place place) {
    FindingBuilder finding =
        FindingBuilder.of(check, place, channel.name())
            .severity(severity())
            .have(have())
            .fact("unsettled", unsettled())
            .fact("allowed", Words.lsb(allowance()));
    for (Figure.Operand operand : operands()) {
      finding.related(
          operand.place(), operand.name() + " " + Words.of(operand.value(), operand.unit()));
    }
    channel
        .converter()
        .filter(part -> part.has("hold-capacitor"))
        .ifPresent(
            part -> finding.related(part.slot("hold-capacitor").place(), "the hold capacitor"));
    return finding;
  }

  /** The resistances that feed the pin, the largest first. */
  private List<Figure.Operand> operands() {
    return channel.figure("source-resistance").map(Figure::operands).orElse(List.of());
  }

  String have() {
    String cycles =
        channel.value("acquisition-cycles").isPresent()
            ? " = " + Words.count(channel.number("acquisition-cycles")) + " cycles"
            : "";
    return Words.of(channel.number("acquisition"), "s") + cycles;
  }

  private String unsettled() {
    double measured = channel.magnitude("settling-error-measured");
    String inUnit = Double.isNaN(measured) ? "" : " = " + Words.of(measured, channel.unit());
    return Words.lsb(error()) + inUnit;
  }

  /** {@code 5.81 µs: 47 cycles, next offered 48}. */
  String needed() {
    String time = Words.of(channel.number("required-acquisition"), "s");
    if (channel.value("required-acquisition-cycles").isEmpty()) {
      return time;
    }
    String cycles =
        time + ": " + Words.count(channel.number("required-acquisition-cycles")) + " cycles";
    return channel.value("next-acquisition-cycles").isPresent()
        ? cycles + ", next offered " + Words.count(channel.number("next-acquisition-cycles"))
        : cycles;
  }

  /** {@code at most 12.3 kΩ (12 kΩ of E24)}; empty where no source resistance helps either. */
  Optional<String> sourceResistance() {
    double largest = channel.number("largest-source-resistance");
    if (!(largest > 0) || Double.isInfinite(largest)) {
      return Optional.empty();
    }
    double preferred = PreferredValues.nextLower(Series.E24, largest);
    return Optional.of(Words.of(largest, "Ω") + " (" + Words.part(preferred, "Ω") + " of E24)");
  }

  /** The capacitor nearest the pin, which is the channel's reservoir. */
  Optional<Slot<?>> reservoir() {
    Optional<ChannelView.Stage> stage = channel.lastStage("capacitor");
    return stage.map(ChannelView.Stage::part).map(part -> part.slot("value"));
  }

  /** The only series resistor of the path, the one whose value a computed one may replace. */
  Optional<Part> onlyResistor() {
    List<Part> resistors =
        channel.stages().stream()
            .map(ChannelView.Stage::part)
            .filter(part -> part.kind().equals("resistor"))
            .toList();
    boolean dividers = channel.lastStage("divider").isPresent();
    return resistors.size() == 1 && !dividers ? Optional.of(resistors.get(0)) : Optional.empty();
  }
}
