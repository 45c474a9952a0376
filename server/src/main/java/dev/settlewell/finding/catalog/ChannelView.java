package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.Budget;
import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.channel.Figure;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.text.SourceText;
import dev.settlewell.unit.Range;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** A channel as a check sees it: its figures, and what the sheet says of it. */
record ChannelView(Analysis analysis, ChannelFigures figures, Part part) {

  /** One stage of a path, and how findings and acceptances call it: {@code amplifier-2}. */
  record Stage(String label, Part part) {}

  /** Every channel whose mapping could be read, once for each scan that samples it. */
  static List<ChannelView> all(Analysis analysis) {
    return analysis.channels().stream()
        .filter(c -> c.channel().value().isStated())
        .map(c -> new ChannelView(analysis, c, c.channel().value().stated().get()))
        .toList();
  }

  String name() {
    return figures.channel().name();
  }

  SourceText text() {
    return analysis.linked().sheet().text();
  }

  OptionalDouble value(String figure) {
    return figures.figures().value(figure);
  }

  /** The figure's value, NaN where it has none: every comparison with it is false. */
  double number(String figure) {
    return value(figure).orElse(Double.NaN);
  }

  /** The figure's magnitude, NaN where it has none. */
  double magnitude(String figure) {
    return Math.abs(number(figure));
  }

  Optional<Figure> figure(String name) {
    return figures.figures().get(name);
  }

  /** Where the value of a key stands; the channel's name where it does not stand anywhere. */
  Place place(String key) {
    Slot<?> slot = part.slot(key);
    return slot.isMissing() ? figures.channel().place() : slot.place();
  }

  /** The key itself where it is stated, the channel's name where it is not: never a whole block. */
  Place keyPlace(String key) {
    return part.slot(key) instanceof Slot.Stated<?> stated
        ? stated.keyPlace()
        : figures.channel().place();
  }

  /** Where the value of a key stands; empty where it does not stand anywhere. */
  Optional<Place> stated(String key) {
    return has(key) ? Optional.of(place(key)) : Optional.empty();
  }

  boolean has(String key) {
    return part.has(key);
  }

  Optional<Part> converter() {
    return figures.converter().flatMap(named -> named.value().stated());
  }

  Optional<Part> scan() {
    return figures.scan().flatMap(named -> named.value().stated());
  }

  Optional<Named<Part>> namedScan() {
    return figures.scan();
  }

  /** Conversions that go into one result. */
  int average() {
    return part.number("average").orElse(1.0).intValue();
  }

  /** Visits of the channel per second, NaN where they are not known. */
  double sampleRate() {
    return number("result-rate") * average();
  }

  /** How often a second the whole order is gone through, NaN where it is not known. */
  double scanRate() {
    return sampleRate() / figures.visits();
  }

  Optional<Budget> budget() {
    return figures.budget();
  }

  Optional<Range> measures() {
    return part.range("measures").stated();
  }

  /** The measured unit as figures write it. */
  String unit() {
    return measures().map(range -> range.unit().symbol()).orElse("");
  }

  /** What the sheet asks for, in the measured unit; empty where it asks for nothing. */
  OptionalDouble needs() {
    OptionalDouble atWorst = budget().map(Budget::needs).orElse(OptionalDouble.empty());
    return atWorst.isPresent() ? atWorst : value("needs");
  }

  /**
   * The larger of half an LSB and a tenth of what is needed, in the measured unit: what one effect
   * may take before it is worth a finding. NaN where the LSB is not known.
   */
  double noticeable() {
    return Math.max(number("lsb-measured") / 2, needs().orElse(0) / 10);
  }

  List<Stage> stages() {
    if (!(part.list("path", Part.class) instanceof Slot.Stated<List<Slot<Part>>> path)) {
      return List.of();
    }
    List<Stage> stages = new ArrayList<>();
    for (Slot<Part> slot : path.value()) {
      slot.stated().ifPresent(stage -> stages.add(new Stage(label(stage, stages), stage)));
    }
    return stages;
  }

  private static String label(Part stage, List<Stage> before) {
    long same = before.stream().filter(s -> s.part().kind().equals(stage.kind())).count();
    return same == 0 ? stage.kind() : stage.kind() + "-" + (same + 1);
  }

  /** The last stage of a kind before the pin. */
  Optional<Stage> lastStage(String kind) {
    return stages().stream()
        .filter(stage -> stage.part().kind().equals(kind))
        .reduce((first, second) -> second);
  }

  Optional<Part> sensor() {
    return part.part("sensor").stated();
  }
}
