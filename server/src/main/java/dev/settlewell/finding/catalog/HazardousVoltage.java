package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.unit.Dimension;
import dev.settlewell.unit.Range;
import java.util.Optional;
import java.util.function.Consumer;

/** A voltage that hurts when it is touched: beyond what this tool can say anything about. */
final class HazardousVoltage extends ChannelCheck {
  /** Touch limits of dry places, as in IEC 62368-1 (ES1) and IEC 61010-1. */
  private static final double DRY_DC = 60;

  private static final double DRY_PEAK = 42.4;

  /** The lower limits of wet places. */
  private static final double WET_DC = 35;

  private static final double WET_PEAK = 22.6;

  @Override
  public String name() {
    return "hazardous-voltage";
  }

  @Override
  public Severity severity() {
    return Severity.WARNING;
  }

  @Override
  public String summary() {
    return "a voltage that is dangerous to touch stands at this input";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    Optional<Slot.Stated<Range>> worst = Optional.empty();
    for (Slot<Range> slot : voltages(channel)) {
      if (slot instanceof Slot.Stated<Range> stated
          && stated.value().unit().dimension() == Dimension.VOLTAGE
          && (worst.isEmpty() || magnitude(stated) > magnitude(worst.get()))) {
        worst = Optional.of(stated);
      }
    }
    worst.ifPresent(voltage -> judge(channel, voltage, report));
  }

  /**
   * What stands at the sensor's terminal: stated for a fault, as its output, or measured itself.
   */
  private static Iterable<Slot<Range>> voltages(ChannelView channel) {
    java.util.List<Slot<Range>> slots = new java.util.ArrayList<>();
    slots.add(channel.part().range("overload"));
    Optional<Part> sensor = channel.sensor().filter(part -> part.kind().equals("voltage"));
    sensor.ifPresent(
        part ->
            slots.add(
                part.has("output") ? part.range("output") : channel.part().range("measures")));
    return slots;
  }

  private static double magnitude(Slot.Stated<Range> voltage) {
    return Math.max(Math.abs(voltage.value().low()), Math.abs(voltage.value().high()));
  }

  private void judge(ChannelView channel, Slot.Stated<Range> voltage, Consumer<Finding> report) {
    boolean wet = channel.part().text("location").orElse("dry").equals("wet");
    boolean alternates = voltage.value().low() < 0 && voltage.value().high() > 0;
    double limit = alternates ? (wet ? WET_PEAK : DRY_PEAK) : (wet ? WET_DC : DRY_DC);
    double present = magnitude(voltage);
    if (!(present > limit)) {
      return;
    }
    String kind = alternates ? " peak" : " DC";
    report.accept(
        FindingBuilder.of(this, voltage.place(), channel.name())
            .message(
                ("%s stand at this input, above the touch limit of %s%s in %s places:"
                        + " insulation, creepage, clearance, fusing and isolation are outside this"
                        + " tool; local codes and licensed practice decide")
                    .formatted(
                        Words.of(present, "V"), Words.of(limit, "V"), kind, wet ? "wet" : "dry"))
            .need("at most " + Words.of(limit, "V") + kind)
            .have(Words.of(present, "V"))
            .build());
  }
}
