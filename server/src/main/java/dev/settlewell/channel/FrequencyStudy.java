package dev.settlewell.channel;

import dev.settlewell.circuit.Aliasing;
import dev.settlewell.circuit.Averaging;
import dev.settlewell.circuit.FrequencyResponse;
import dev.settlewell.circuit.Lines;
import dev.settlewell.circuit.Sampler;
import dev.settlewell.sheet.Part;
import dev.settlewell.unit.Toleranced;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/** The response of a channel's path, where interferers land, and what the wanted band loses. */
final class FrequencyStudy {
  private final ChannelModel model;
  private final ScanTiming timing;
  private final List<Figure> figures = new ArrayList<>();
  private final List<Alias> aliases = new ArrayList<>();
  private final List<Line> lines;
  private final double pinFarads;
  private final Sampler sampler;
  private double droop;

  /**
   * @param timing null where no scan samples the channel
   */
  FrequencyStudy(ChannelModel model, ScanTiming timing) {
    this.model = model;
    this.timing = timing;
    this.lines = Line.of(model.part(), model.linked());
    Part adc = model.converterPart();
    this.pinFarads = nominal(adc, "pin-capacitance", 0);
    // An unknown sampler loads nothing: a tiny one, which no frequency of interest feels.
    this.sampler =
        new Sampler(nominal(adc, "switch-resistance", 0), nominal(adc, "hold-capacitor", 1e-18));
  }

  private static double nominal(Part part, String key, double otherwise) {
    return part.quantity(key).stated().map(Toleranced::value).orElse(otherwise);
  }

  List<Figure> figures() {
    return figures;
  }

  List<Alias> aliases() {
    return aliases;
  }

  /** Share of the amplitude at the band's edge that is lost. */
  double droop() {
    return droop;
  }

  Sampler sampler() {
    return sampler;
  }

  double pinFarads() {
    return pinFarads;
  }

  AcPath path(double x, double[] p) {
    return AcPath.of(model, x, p, pinFarads, sampler);
  }

  void run() {
    AcPath nominal = path(middle(), model.forward().nominal());
    if (!Double.isFinite(nominal.ohms())) {
      return;
    }
    response(nominal);
    rates();
    band();
    if (timing != null && timing.rateInputs().complete()) {
      for (Line line : lines) {
        aliases.add(alias(line));
      }
    }
  }

  private double middle() {
    return model.measures().low() + model.measures().width() / 2;
  }

  private void response(AcPath path) {
    OptionalDouble corner = FrequencyResponse.corner(path.ohms(), path.chain(), path.sampler());
    String formula = "|H(f)| = |H(0)| / sqrt 2, whole path to the hold capacitor";
    if (corner.isEmpty()) {
      figures.add(Figure.unlimited("corner-frequency", "Hz"));
      figures.add(Figure.unlimited("noise-bandwidth", "Hz"));
      return;
    }
    figures.add(Figure.of("corner-frequency", corner.getAsDouble(), "Hz", formula));
    double bandwidth = FrequencyResponse.noiseBandwidth(path.ohms(), path.chain(), path.sampler());
    if (Double.isFinite(bandwidth)) {
      figures.add(Figure.of("noise-bandwidth", bandwidth, "Hz", "integral of |H(f)|^2 / |H(0)|^2"));
    }
  }

  private void rates() {
    if (timing == null) {
      return;
    }
    if (!timing.rateInputs().complete()) {
      figures.add(timing.rateInputs().figure("result-rate", "Hz"));
      return;
    }
    double rate = timing.sampleRate(model.name(), timing.nominalPeriod()) / model.average();
    figures.add(
        Figure.of(
            "result-rate",
            rate,
            "Hz",
            "visits per second / average",
            Figure.Operand.of("visits", timing.visits(model.name()), "1"),
            Figure.Operand.of("period", timing.nominalPeriod(), "s"),
            Figure.Operand.of("average", model.average(), "1")));
    figures.add(
        Figure.of("result-rate-least", resultRate(timing.longestPeriod()), "Hz", "at the least"));
  }

  private double resultRate(double period) {
    return timing.sampleRate(model.name(), period) / model.average();
  }

  private OptionalDouble bandEdge() {
    return model
        .part()
        .part("band")
        .stated()
        .flatMap(b -> b.quantity("frequency").stated())
        .map(f -> OptionalDouble.of(Limits.high(f)))
        .orElse(OptionalDouble.empty());
  }

  private void band() {
    OptionalDouble edge = bandEdge();
    if (edge.isEmpty()) {
      return;
    }
    double hertz = edge.getAsDouble();
    figures.add(Figure.of("band", hertz, "Hz", "highest frequency of interest"));
    double[] p = slowest();
    double least = 1;
    for (double x : model.points()) {
      AcPath path = path(x, p);
      least =
          Math.min(
              least,
              FrequencyResponse.relativeGain(path.ohms(), path.chain(), path.sampler(), hertz));
    }
    double averaging = averaging(hertz, hertz);
    droop = Math.max(0, 1 - least * averaging);
    figures.add(
        Figure.of(
            "droop",
            droop,
            "1",
            "1 - |H(band)| / |H(0)| x averaging response, components at their high ends",
            Figure.Operand.of("band", hertz, "Hz"),
            Figure.Operand.of("path", least, "1"),
            Figure.Operand.of("averaging", averaging, "1")));
  }

  /** Resistors and capacitors of the path at their high ends: the lowest corner. */
  private double[] slowest() {
    double[] p = model.forward().nominal().clone();
    List<Integer> indices = new ArrayList<>(model.forward().sensor().resistances());
    for (StageModel stage : model.forward().stages()) {
      if (stage instanceof StageModel.Passive passive) {
        indices.addAll(passive.resistances());
        indices.addAll(passive.capacitances());
      }
    }
    for (Spread spread : model.spreads()) {
      if (indices.contains(spread.parameter())) {
        ChannelModel.move(p, spread, true, model.measures().high(), model.ambients().get(0));
      }
    }
    return p;
  }

  private Alias alias(Line line) {
    Limits f = line.frequency();
    Aliasing.Landing landing =
        Aliasing.landing(
            f.low(),
            f.high(),
            resultRate(timing.longestPeriod()),
            resultRate(timing.shortestPeriod()));
    double averaging = averaging(f.low(), f.high()) * coherent(f.nominal());
    double gain = 0;
    double volts = 0;
    double measured = 0;
    for (double x : model.points()) {
      double path = pathGain(x, f);
      gain = Math.max(gain, path * averaging);
      volts = Math.max(volts, line.amplitude() * path * averaging);
      measured = Math.max(measured, line.amplitude() * path * averaging / Math.abs(model.slope(x)));
    }
    double rate = resultRate(timing.nominalPeriod());
    OptionalDouble edge = bandEdge();
    return new Alias(
        line.interferer(),
        line.harmonic(),
        f.nominal(),
        f.low(),
        f.high(),
        landing.low(),
        landing.high(),
        gain,
        volts,
        volts / model.lsb(),
        measured,
        edge.isPresent() && landing.reaches(edge.getAsDouble()),
        Aliasing.readsAsOffset(f.nominal(), rate),
        f.high() > resultRate(timing.longestPeriod()) / 2,
        line.place());
  }

  /** Largest gain of the path over the line's tolerance. */
  private double pathGain(double x, Limits f) {
    AcPath path = path(x, model.forward().nominal());
    return FrequencyResponse.worstGain(
        path.ohms(), path.chain(), path.sampler(), f.low(), f.high());
  }

  private double coherent(double hertz) {
    return timing.jitter() > 0 ? Lines.coherentShare(hertz, timing.jitter()) : 1;
  }

  /** Worst averaging gain over a span of frequencies and the tolerance of the rate. */
  private double averaging(double low, double high) {
    int count = model.average();
    if (count == 1 || timing == null || !timing.rateInputs().complete()) {
      return 1;
    }
    int visits = timing.visits(model.name());
    double slow = timing.sampleRate(model.name(), timing.longestPeriod());
    double fast = timing.sampleRate(model.name(), timing.shortestPeriod());
    if (visits == 1) {
      return Averaging.worstEvenGain(low, high, slow, fast, count);
    }
    return timing.complete() && count % visits == 0
        ? Averaging.worstGain(
            low,
            high,
            1 / timing.longestPeriod(),
            1 / timing.shortestPeriod(),
            phases(),
            count / visits)
        : 1;
  }

  /** When the channel is sampled, as shares of the scan's period. */
  private double[] phases() {
    double period = timing.nominalPeriod();
    double[] instants = timing.instants(model.name(), timing.clock().nominal(), period);
    return Arrays.stream(instants).map(t -> t / period).toArray();
  }

  /** The interferers' parts of the budget at x, in the measured unit: one row an interferer. */
  List<Contribution> rows(double x) {
    Map<String, List<Lines.Landed>> landed = new LinkedHashMap<>();
    Map<String, Line> first = new LinkedHashMap<>();
    double slope = Math.abs(model.slope(x));
    for (int i = 0; i < aliases.size(); i++) {
      Alias alias = aliases.get(i);
      Line line = lines.get(i);
      double averaging =
          averaging(line.frequency().low(), line.frequency().high())
              * coherent(line.frequency().nominal());
      double amplitude = line.amplitude() * pathGain(x, line.frequency()) * averaging / slope;
      double where = Aliasing.landing(alias.frequency(), resultRate(timing.nominalPeriod()));
      landed
          .computeIfAbsent(line.interferer(), n -> new ArrayList<>())
          .add(new Lines.Landed(where, amplitude));
      first.putIfAbsent(line.interferer(), line);
    }
    double same =
        timing == null || aliases.isEmpty() ? 0 : resultRate(timing.nominalPeriod()) * 1e-6;
    List<Contribution> rows = new ArrayList<>();
    landed.forEach(
        (name, list) ->
            rows.add(
                Contribution.lines(
                    "interferer-" + name,
                    Lines.limit(list),
                    Lines.rms(list, same),
                    List.of(first.get(name).place()))));
    return rows;
  }

  /** What jitter makes of the lines: noise at the converter, V rms. */
  double jitterNoise(double x) {
    if (timing == null || timing.jitter() == 0) {
      return 0;
    }
    double squares = 0;
    for (Line line : lines) {
      double volts = line.amplitude() * pathGain(x, line.frequency());
      double noise = Lines.jitterNoise(line.frequency().nominal(), volts, timing.jitter());
      squares += noise * noise;
    }
    return Math.sqrt(squares);
  }
}
