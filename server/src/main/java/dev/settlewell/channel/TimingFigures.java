package dev.settlewell.channel;

import dev.settlewell.sheet.Either;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.unit.Toleranced;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Figures of time: of a converter, of a scan, of a channel within a scan. */
final class TimingFigures {
  private TimingFigures() {}

  /** Of a converter: its clock's ends, and how busy all its scans together keep it. */
  static List<Figure> ofConverter(Part adc, List<ScanTiming> scans) {
    List<Figure> figures = new ArrayList<>();
    adc.quantity("clock")
        .stated()
        .ifPresent(
            clock -> {
              Limits limits = Limits.of(clock);
              Place place = adc.quantity("clock").place();
              figures.add(figure("clock-low", limits.low(), "Hz", "clock at its slowest", place));
              figures.add(figure("clock-high", limits.high(), "Hz", "clock at its fastest", place));
            });
    Inputs inputs = new Inputs();
    double busy = 0;
    for (ScanTiming scan : scans) {
      inputs.include(scan.allInputs());
      if (scan.complete() && scan.rate() != null) {
        busy += utilisation(scan);
      }
    }
    if (scans.isEmpty()) {
      return figures;
    }
    figures.add(
        inputs.complete()
            ? Figure.of(
                "utilisation",
                busy,
                "1",
                "sum over its scans of scan-time at the slowest clock / shortest period;"
                    + " a continuous scan takes what they leave")
            : inputs.figure("utilisation", "1"));
    return figures;
  }

  private static double utilisation(ScanTiming scan) {
    return scan.rate() == null ? 1 : scan.scanTime(scan.clock().low()) / scan.shortestPeriod();
  }

  /** Of a scan. */
  static List<Figure> ofScan(ScanTiming timing, List<ScanTiming> others) {
    List<Figure> figures = new ArrayList<>();
    if (!timing.complete()) {
      Inputs inputs = timing.allInputs();
      for (String name : List.of("scan-time", "conversion-time", "scan-period")) {
        figures.add(inputs.figure(name, "s"));
      }
      figures.add(inputs.figure("scan-utilisation", "1"));
      figures.add(inputs.figure("scan-rate", "Hz"));
      return figures;
    }
    double slow = timing.clock().low();
    figures.add(
        Figure.of(
            "conversion-time",
            timing.conversion(timing.clock().nominal()),
            "s",
            "conversion-cycles / clock",
            Figure.Operand.of("conversion-cycles", timing.conversionCycles(), "cycles"),
            Figure.Operand.of("clock", timing.clock().nominal(), "Hz")));
    figures.add(
        Figure.of(
            "scan-time",
            timing.scanTime(slow),
            "s",
            "sum of acquisitions and conversions at the slowest clock + gaps between them",
            Figure.Operand.of("slowest clock", slow, "Hz"),
            Figure.Operand.of("gap", timing.gap(), "s"),
            Figure.Operand.of("visits", timing.order().size(), "1")));
    figures.add(Figure.of("scan-period", timing.shortestPeriod(), "s", "1 / greatest rate"));
    figures.add(Figure.of("scan-period-longest", timing.longestPeriod(), "s", "1 / least rate"));
    figures.add(Figure.of("scan-rate", 1 / timing.nominalPeriod(), "Hz", "scans per second"));
    figures.add(
        Figure.of(
            "scan-utilisation",
            utilisation(timing),
            "1",
            "scan-time / shortest period",
            Figure.Operand.of("scan-time", timing.scanTime(slow), "s"),
            Figure.Operand.of("shortest period", timing.shortestPeriod(), "s")));
    if (!others.isEmpty() && others.stream().allMatch(ScanTiming::complete)) {
      double wait = others.stream().mapToDouble(o -> o.scanTime(o.clock().low())).sum();
      figures.add(
          Figure.of(
              "longest-wait", wait, "s", "all other scans of the converter happen to go first"));
    }
    return figures;
  }

  /** Of a channel within a scan. */
  static List<Figure> ofChannel(ChannelModel model, ScanTiming timing) {
    List<Figure> figures = new ArrayList<>();
    String name = model.name();
    if (!timing.inputs().complete() || !timing.acquisitions().containsKey(name)) {
      Inputs inputs = new Inputs();
      inputs.include(timing.inputs());
      inputs.need(model.part().either("acquisition"));
      figures.add(inputs.figure("acquisition", "s"));
      return figures;
    }
    if (timing.acquisitions().get(name) instanceof ScanTiming.Acquisition.UntilTrigger
        && !timing.complete()) {
      figures.add(timing.allInputs().figure("acquisition", "s"));
      return figures;
    }
    acquisition(model, timing, figures);
    if (timing.acquisitionInputs().complete()) {
      double available = timing.available(name);
      if (Double.isFinite(available)) {
        figures.add(
            Figure.of(
                "acquisition-available",
                available,
                "s",
                "(shortest period - everything else at the slowest clock) / visits"));
      }
      spacing(model, timing, figures);
      skew(model, timing, figures);
    }
    return figures;
  }

  private static void acquisition(ChannelModel model, ScanTiming timing, List<Figure> figures) {
    double fast = timing.clock().high();
    Slot<Either> stated = model.part().either("acquisition");
    double seconds = timing.acquisition(model.name(), fast, timing.shortestPeriod());
    figures.add(
        Figure.of(
            "acquisition",
            seconds,
            "s",
            "cycles / fastest clock, or the time that is stated",
            new Figure.Operand("fastest clock", fast, "Hz", clockPlace(model))));
    if (timing.acquisitions().get(model.name()) instanceof ScanTiming.Acquisition.Cycles c) {
      figures.add(
          new Figure(
              "acquisition-cycles",
              new Figure.State.Value(c.count()),
              "cycles",
              OptionalDouble.empty(),
              "stated, or the next offered count not below the stated time at the fastest clock",
              List.of(
                  new Figure.Operand("acquisition", seconds, "s", Optional.of(stated.place())))));
    }
  }

  private static Optional<Place> clockPlace(ChannelModel model) {
    Slot<Toleranced> clock = model.converterPart().quantity("clock");
    return clock.isStated() ? Optional.of(clock.place()) : Optional.empty();
  }

  /** How far the spacing of a channel's samples is off its mean. */
  private static void spacing(ChannelModel model, ScanTiming timing, List<Figure> figures) {
    double period = timing.nominalPeriod();
    double[] at = timing.instants(model.name(), timing.clock().nominal(), period);
    double mean = period / at.length;
    double worst = 0;
    for (int i = 0; i < at.length; i++) {
      double next = i + 1 < at.length ? at[i + 1] : at[0] + period;
      worst = Math.max(worst, Math.abs(next - at[i] - mean) / mean);
    }
    figures.add(
        Figure.of(
            "spacing-unevenness",
            worst,
            "1",
            "largest |spacing - mean spacing| / mean spacing",
            Figure.Operand.of("mean spacing", mean, "s")));
  }

  private static void skew(ChannelModel model, ScanTiming timing, List<Figure> figures) {
    Optional<Part> within = model.part().part("within").stated();
    Optional<String> other = within.flatMap(w -> w.text("channel").stated());
    if (other.isEmpty() || timing.visits(other.get()) == 0) {
      return;
    }
    double slow = timing.clock().low();
    double period = timing.longestPeriod();
    double[] mine = timing.instants(model.name(), slow, period);
    double[] theirs = timing.instants(other.get(), slow, period);
    double worst = 0;
    for (double t : mine) {
      double nearest = Double.POSITIVE_INFINITY;
      for (double u : theirs) {
        nearest = Math.min(nearest, Math.abs(t - u));
      }
      worst = Math.max(worst, nearest);
    }
    figures.add(
        figure(
            "skew",
            worst,
            "s",
            "time between the ends of acquisition, at the slowest clock",
            within.get().text("channel").place()));
  }

  private static Figure figure(String name, double value, String unit, String formula, Place at) {
    return Figure.of(
        name, value, unit, formula, new Figure.Operand(name, value, unit, Optional.of(at)));
  }
}
