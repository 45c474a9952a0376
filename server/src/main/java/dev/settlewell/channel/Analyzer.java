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

/** Computes every figure of a sheet: a pure function of the linked sheet. */
public final class Analyzer {
  private final Linked linked;
  private final Map<String, ScanTiming> timings = new LinkedHashMap<>();
  private final Map<String, String> faults = new LinkedHashMap<>();

  private Analyzer(Linked linked) {
    this.linked = linked;
  }

  public static Analysis analyze(Linked linked) {
    return new Analyzer(linked).run();
  }

  /**
   * The budgets of one channel by random trials (JCGM 101), one for each scan that samples it; far
   * too slow for a keystroke, so only on demand.
   */
  public static List<Simulation> simulate(Linked linked, String channel, long seed, int trials) {
    Analyzer analyzer = new Analyzer(linked);
    analyzer.bindTimings();
    List<Simulation> simulations = new ArrayList<>();
    for (ScanTiming timing : analyzer.timings.values()) {
      if (timing.order().contains(channel)) {
        Neighbours neighbours = analyzer.neighbours(timing);
        ChannelModel model = neighbours.models().get(channel);
        if (model != null && model.complete()) {
          simulations.add(
              new ChannelAnalysis(model, timing, neighbours.pins().get(channel))
                  .simulate(neighbours.settling(model, timing), seed, trials));
        }
      }
    }
    return simulations;
  }

  private void bindTimings() {
    for (Named<Part> scan : linked.sheet().scans().values()) {
      converterOf(scan)
          .ifPresent(
              converter -> timings.put(scan.name(), ScanTiming.bind(linked, scan, converter)));
    }
  }

  private Analysis run() {
    bindTimings();
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

  /** The channels a scan's settling depends on: its own, and those other scans end with. */
  private record Neighbours(
      Map<String, ChannelModel> models, Map<String, PinRange> pins, List<String> othersLast) {
    SettlingStudy settling(ChannelModel model, ScanTiming timing) {
      return new SettlingStudy(model, timing, models, pins, othersLast);
    }
  }

  private Neighbours neighbours(ScanTiming timing) {
    Map<String, ChannelModel> models = new LinkedHashMap<>();
    timing.order().forEach(name -> model(name, timing.converter(), models));
    List<String> othersLast = new ArrayList<>();
    for (ScanTiming other : others(timing)) {
      if (!other.order().isEmpty()) {
        String last = other.order().get(other.order().size() - 1);
        model(last, timing.converter(), models);
        othersLast.add(last);
      }
    }
    Map<String, PinRange> pins = new LinkedHashMap<>();
    for (ChannelModel model : List.copyOf(models.values())) {
      pin(model).ifPresent(pin -> pins.put(model.name(), pin));
    }
    models.keySet().removeAll(faults.keySet());
    return new Neighbours(models, pins, othersLast);
  }

  private List<ScanTiming> others(ScanTiming timing) {
    return scansOf(timing.converter().name()).stream().filter(t -> t != timing).toList();
  }

  private ScanFigures scan(Named<Part> scan, ScanTiming timing) {
    Neighbours neighbours = neighbours(timing);
    Map<String, ChannelFigures> channels = new LinkedHashMap<>();
    for (String name : timing.order()) {
      ChannelModel model = neighbours.models().get(name);
      if (model != null && !channels.containsKey(name)) {
        channels.put(
            name,
            new ChannelAnalysis(model, timing, neighbours.pins().get(name))
                .run(Optional.of(neighbours.settling(model, timing))));
      }
      if (faults.containsKey(name)) {
        Named<Part> channel = linked.sheet().channels().get(name);
        channels.put(name, faulty(channel, Optional.of(scan), Optional.of(timing.converter())));
      }
    }
    return new ScanFigures(
        scan, new Figures(TimingFigures.ofScan(timing, others(timing))), channels);
  }

  private void model(String name, Named<Part> converter, Map<String, ChannelModel> into) {
    Named<Part> channel = linked.sheet().channels().get(name);
    if (channel != null && !into.containsKey(name)) {
      ChannelModel model = bind(channel, Optional.of(converter));
      if (model != null) {
        into.put(name, model);
      }
    }
  }

  /** Null where the channel cannot be read, or where reading it is an internal fault. */
  private ChannelModel bind(Named<Part> channel, Optional<Named<Part>> converter) {
    try {
      return ChannelModel.bind(linked, channel, converter);
    } catch (RuntimeException e) {
      faults.put(channel.name(), "model: " + described(e));
      return null;
    }
  }

  /** Empty where the model is not complete, or where its range is an internal fault. */
  private Optional<PinRange> pin(ChannelModel model) {
    try {
      return model.complete() ? Optional.of(PinRange.of(model)) : Optional.empty();
    } catch (RuntimeException e) {
      faults.put(model.name(), "range: " + described(e));
      return Optional.empty();
    }
  }

  private static String described(RuntimeException e) {
    StackTraceElement[] trace = e.getStackTrace();
    return e + (trace.length > 0 ? " at " + trace[0] : "");
  }

  /** All there is to say of a channel whose model is an internal fault. */
  private ChannelFigures faulty(
      Named<Part> channel, Optional<Named<Part>> scan, Optional<Named<Part>> converter) {
    return new ChannelFigures(
        channel,
        scan,
        converter,
        0,
        Figures.EMPTY,
        List.of(),
        Optional.empty(),
        List.of(),
        List.of(),
        List.of(faults.get(channel.name())));
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
      ChannelModel model = bind(channel, only);
      PinRange pin = model == null ? null : pin(model).orElse(null);
      if (faults.containsKey(channel.name())) {
        unscanned.put(channel.name(), faulty(channel, Optional.empty(), only));
      } else if (model != null) {
        unscanned.put(channel.name(), new ChannelAnalysis(model, null, pin).run(Optional.empty()));
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
    private final List<Place> typicalOnly = new ArrayList<>();

    ChannelAnalysis(ChannelModel model, ScanTiming timing, PinRange pin) {
      this.model = model;
      this.timing = timing;
      this.pin = pin;
    }

    /** The budget alone, by random trials. */
    Simulation simulate(SettlingStudy settling, long seed, int trials) {
      settling.run();
      FrequencyStudy frequency = new FrequencyStudy(model, timing);
      frequency.run();
      NoiseStudy noise = new NoiseStudy(model, timing, frequency);
      noise.run();
      return new BudgetStudy(model, settling, frequency, noise)
          .simulate(timing.scan().name(), seed, trials);
    }

    ChannelFigures run(Optional<SettlingStudy> settlingStudy) {
      if (timing != null) {
        attempt("timing", () -> figures.addAll(TimingFigures.ofChannel(model, timing)));
      }
      model
          .needs(model.measures().high())
          .ifPresent(
              needs ->
                  figures.add(
                      Figure.of(
                          "needs", needs, model.unit(), "what the sheet asks for, at the top")));
      if (!model.complete()) {
        figures.add(model.inputs().figure("lsb", "V"));
        return figures(List.of(), Optional.empty(), List.of());
      }
      attempt("resolution", () -> figures.addAll(ResolutionStudy.figures(model)));
      SettlingStudy settling = settlingStudy.orElse(null);
      if (settling != null) {
        attempt("settling", settling::run);
        figures.addAll(settling.figures());
        typicalOnly.addAll(settling.typicalOnly());
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
      typicalOnly.addAll(model.typicalOnly());
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
        faults.add(study + ": " + described(e));
      }
    }
  }
}
