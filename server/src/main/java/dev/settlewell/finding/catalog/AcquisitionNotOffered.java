package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Either;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.unit.Dimension;
import dev.settlewell.unit.Toleranced;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Consumer;

/** An acquisition in cycles that the converter cannot be set to. */
final class AcquisitionNotOffered extends ChannelCheck {
  private static final double SAME = 1e-9;

  @Override
  public String name() {
    return "acquisition-not-offered";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "an acquisition that is not among the cycles the converter offers";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    Optional<Toleranced> stated =
        channel.part().either("acquisition").stated().flatMap(Either::quantity);
    List<Double> offered =
        channel.converter().map(AcquisitionNotOffered::offered).orElse(List.of());
    if (stated.isEmpty()
        || stated.get().unit().dimension() != Dimension.CYCLES
        || offered.isEmpty()) {
      return;
    }
    double cycles = stated.get().value();
    if (offered.stream().anyMatch(o -> Math.abs(o - cycles) <= SAME * cycles)) {
      return;
    }
    OptionalDouble next = offered.stream().mapToDouble(o -> o).filter(o -> o > cycles).findFirst();
    String longer =
        next.isPresent()
            ? "the next longer one is " + Words.count(next.getAsDouble())
            : "the longest is " + Words.count(offered.get(offered.size() - 1));
    String value = Words.count(next.orElse(offered.get(offered.size() - 1))) + " cycles";
    Part converter = channel.converter().get();
    report.accept(
        FindingBuilder.of(this, channel, "acquisition")
            .message(
                "%s cycles are not offered by the converter; %s"
                    .formatted(Words.count(cycles), longer))
            .have(Words.count(cycles) + " cycles")
            .fact("offered", String.join(", ", offered.stream().map(Words::count).toList()))
            .related(converter.slot("acquisition-cycles").place(), "what the converter offers")
            .candidate(
                Rewriting.fix(
                    channel.text(),
                    channel.part().slot("acquisition"),
                    value,
                    "Acquire for " + value))
            .build());
  }

  private static List<Double> offered(Part converter) {
    Slot<List<Slot<Double>>> list = converter.list("acquisition-cycles", Double.class);
    return list.stated().orElse(List.of()).stream()
        .map(Slot::stated)
        .flatMap(Optional::stream)
        .toList();
  }
}
