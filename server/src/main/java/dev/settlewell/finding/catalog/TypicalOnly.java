package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.unit.Toleranced;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Consumer;
import java.util.stream.Stream;

/** A worst case that rests on a figure of which only the typical value is known. */
final class TypicalOnly implements Check {
  private static final List<String> OF_SETTLING =
      List.of("hold-capacitor", "switch-resistance", "pin-capacitance");

  @Override
  public String name() {
    return "typical-only";
  }

  @Override
  public Severity severity() {
    return Severity.INFORMATION;
  }

  @Override
  public String summary() {
    return "a worst case rests on a typical figure";
  }

  @Override
  public void run(Analysis analysis, Consumer<Finding> report) {
    Map<Place, Set<String>> restingOn = new LinkedHashMap<>();
    for (ChannelView channel : ChannelView.all(analysis)) {
      places(channel)
          .forEach(
              place ->
                  restingOn.computeIfAbsent(place, p -> new LinkedHashSet<>()).add(channel.name()));
    }
    restingOn.forEach((place, channels) -> report.accept(finding(analysis, place, channels)));
  }

  /** What the budget rests on, and what settling does where it was computed. */
  private static Stream<Place> places(ChannelView channel) {
    Stream<Place> ofSettling =
        channel.value("settling-error").isEmpty()
            ? Stream.empty()
            : channel.converter().stream()
                .flatMap(part -> OF_SETTLING.stream().map(part::quantity))
                .filter(slot -> slot.stated().map(Toleranced::typicalOnly).orElse(false))
                .map(Slot::place);
    return Stream.concat(channel.figures().typicalOnly().stream(), ofSettling).distinct();
  }

  private Finding finding(Analysis analysis, Place place, Set<String> channels) {
    String subject =
        converterAt(analysis.linked().sheet().converters().values(), place)
            .orElse(channels.iterator().next());
    return FindingBuilder.of(this, place, subject)
        .message(
            ("only a typical figure is stated and it counts as exact, so the worst case of"
                    + " %s is not one; state `max` (or `min`) too")
                .formatted(String.join(", ", channels)))
        .build();
  }

  private static Optional<String> converterAt(Collection<Named<Part>> converters, Place place) {
    return converters.stream()
        .filter(named -> named.value().place().sheet().equals(place.sheet()))
        .filter(named -> named.value().place().span().contains(place.span()))
        .map(Named::name)
        .findFirst();
  }
}
