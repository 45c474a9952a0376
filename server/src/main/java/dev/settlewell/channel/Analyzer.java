package dev.settlewell.channel;

import dev.settlewell.sheet.Linked;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.text.Place;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Supplier;

/** Computes every figure of a sheet: a pure function of the linked sheet. */
public final class Analyzer {
  private final Linked linked;
  private final Map<String, ScanTiming> timings = new LinkedHashMap<>();

  private Analyzer(Linked linked) {
    this.linked = linked;
  }

  public static Analysis analyze(Linked linked) {
    return new Analyzer(linked).run();
  }

  private Analysis run() {
    for (Named<Part> scan : linked.sheet().scans().values()) {
      converterOf(scan)
          .ifPresent(
              converter -> timings.put(scan.name(), ScanTiming.bind(linked, scan, converter)));
    }
    Map<String, ScanFigures> scans = new LinkedHashMap<>();
    for (Named<Part> scan : linked.sheet().scans().values()) {
      ScanTiming timing = timings.get(scan.name());
      if (timing != null) {
        scans.put(scan.name(), scan(scan, timing));
      }
    }
    return new Analysis(linked, converters(), scans, unscanned(scans));
  }

  private Map<String, ConverterFigures> converters() {
    Map<String, ConverterFigures> converters = new LinkedHashMap<>();
    for (Named<Part> converter : linked.converters().values()) {
      converter
          .value()
          .stated()
          .ifPresent(
              part ->
                  converters.put(
                      converter.name(),
                      new ConverterFigures(
                          converter,
                          new Figures(
                              TimingFigures.ofConverter(part, scansOf(converter.name()))))));
    }
    return converters;
  }

  private List<ScanTiming> scansOf(String converter) {
    return timings.values().stream().filter(t -> t.converter().name().equals(converter)).toList();
  }

  private Optional<Named<Part>> converterOf(Named<Part> scan) {
    return scan.value()
        .stated()
        .flatMap(part -> part.text("converter").stated())
        .flatMap(name -> Optional.ofNullable(linked.converters().get(name)))
        .filter(converter -> converter.value().isStated());
  }

  private ScanFigures scan(Named<Part> scan, ScanTiming timing) {
    List<ScanTiming> others =
        scansOf(timing.converter().name()).stream().filter(t -> t != timing).toList();
    Map<String, ChannelModel> models = new LinkedHashMap<>();
    timing.order().forEach(name -> model(name, timing.converter(), models));
    List<String> othersLast = new ArrayList<>();
    for (ScanTiming other : others) {
      if (!other.order().isEmpty()) {
        String last = other.order().get(other.order().size() - 1);
        model(last, timing.converter(), models);
        othersLast.add(last);
      }
    }
    Map<String, PinRange> pins = new LinkedHashMap<>();
    models.forEach(
        (name, model) -> {
          if (model.complete()) {
            pins.put(name, PinRange.of(model));
          }
        });
    Map<String, ChannelFigures> channels = new LinkedHashMap<>();
    for (String name : timing.order()) {
      ChannelModel model = models.get(name);
      if (model != null && !channels.containsKey(name)) {
        channels.put(
            name,
            new ChannelAnalysis(model, timing, pins.get(name))
                .run(() -> new SettlingStudy(model, timing, models, pins, othersLast)));
      }
    }
    return new ScanFigures(scan, new Figures(TimingFigures.ofScan(timing, others)), channels);
  }

  private void model(String name, Named<Part> converter, Map<String, ChannelModel> into) {
    Named<Part> channel = linked.sheet().channels().get(name);
    if (channel != null && !into.containsKey(name)) {
      ChannelModel model = ChannelModel.bind(linked, channel, Optional.of(converter));
      if (model != null) {
        into.put(name, model);
      }
    }
  }

  /** What can be said of channels that no scan samples: they are judged by the only converter. */
  private Map<String, ChannelFigures> unscanned(Map<String, ScanFigures> scans) {
    Map<String, ChannelFigures> unscanned = new LinkedHashMap<>();
    Optional<Named<Part>> only =
        linked.converters().size() == 1
            ? linked.converters().values().stream().filter(c -> c.value().isStated()).findFirst()
            : Optional.empty();
    for (Named<Part> channel : linked.sheet().channels().values()) {
      boolean sampled =
          scans.values().stream().anyMatch(s -> s.channels().containsKey(channel.name()))
              || timings.values().stream().anyMatch(t -> t.order().contains(channel.name()));
      if (sampled) {
        continue;
      }
      ChannelModel model = ChannelModel.bind(linked, channel, only);
      if (model != null) {
        PinRange pin = model.complete() ? PinRange.of(model) : null;
        unscanned.put(channel.name(), new ChannelAnalysis(model, null, pin).run(() -> null));
      }
    }
    return unscanned;
  }

  /** The studies of one channel, each on its own: a fault in one costs only its figures. */
  private static final class ChannelAnalysis {
    private final ChannelModel model;
    private final ScanTiming timing;
    private final PinRange pin;
    private final List<Figure> figures = new ArrayList<>();
    private final List<String> faults = new ArrayList<>();

    ChannelAnalysis(ChannelModel model, ScanTiming timing, PinRange pin) {
      this.model = model;
      this.timing = timing;
      this.pin = pin;
    }

    ChannelFigures run(Supplier<SettlingStudy> settlingStudy) {
      if (timing != null) {
        attempt("timing", () -> figures.addAll(TimingFigures.ofChannel(model, timing)));
      }
      model
          .needs(model.measures().high())
          .ifPresent(
              needs ->
                  figures.add(
                      Figure.of("needs", needs, model.unit(), "what the sheet asks for, at the top")));
      if (!model.complete()) {
        figures.add(model.inputs().figure("lsb", "V"));
        return figures(List.of(), Optional.empty(), List.of());
      }
      attempt("resolution", () -> figures.addAll(ResolutionStudy.figures(model)));
      SettlingStudy settling = settlingStudy.get();
      if (settling != null) {
        attempt("settling", settling::run);
        figures.addAll(settling.figures());
      }
      FrequencyStudy frequency = new FrequencyStudy(model, timing);
      attempt("frequency response", frequency::run);
      figures.addAll(frequency.figures());
      RangeStudy range = new RangeStudy(model, pin);
      attempt("range", range::run);
      figures.addAll(range.figures());
      NoiseStudy noise = new NoiseStudy(model, timing, frequency);
      attempt("noise", noise::run);
      figures.addAll(noise.figures());
      Optional<Budget> budget = budget(settling, frequency, noise);
      attempt("firmware", () -> figures.addAll(FirmwareStudy.figures(model, budget)));
      return figures(frequency.aliases(), budget, range.outputs());
    }

    private Optional<Budget> budget(
        SettlingStudy settling, FrequencyStudy frequency, NoiseStudy noise) {
      List<Budget> made = new ArrayList<>();
      attempt(
          "error budget",
          () -> {
            BudgetStudy study = new BudgetStudy(model, settling, frequency, noise);
            Budget budget = study.run();
            made.add(budget);
            figures.addAll(study.leakage(budget));
          });
      return made.stream().findFirst();
    }

    private ChannelFigures figures(
        List<Alias> aliases, Optional<Budget> budget, List<OutputRange> outputs) {
      List<Place> typicalOnly = model.typicalOnly();
      return new ChannelFigures(
          model.channel(),
          Optional.ofNullable(timing).map(ScanTiming::scan),
          model.converter(),
          timing == null ? 0 : timing.visits(model.name()),
          new Figures(figures),
          aliases,
          budget,
          outputs,
          typicalOnly,
          faults);
    }

    /** A sheet must not be able to cause a fault; if one does, the other studies go on. */
    private void attempt(String study, Runnable task) {
      try {
        task.run();
      } catch (RuntimeException e) {
        StackTraceElement[] trace = e.getStackTrace();
        String where = trace.length > 0 ? " at " + trace[0] : "";
        faults.add(study + ": " + e + where);
      }
    }
  }
}
