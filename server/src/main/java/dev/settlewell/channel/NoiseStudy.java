package dev.settlewell.channel;

import dev.settlewell.circuit.ActiveFilter;
import dev.settlewell.circuit.Amplifier;
import dev.settlewell.circuit.Element;
import dev.settlewell.circuit.Noise;
import dev.settlewell.circuit.Rung;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.uncertainty.Distribution;
import dev.settlewell.unit.Dimension;
import dev.settlewell.unit.Toleranced;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The noise of one conversion, what averaging leaves of it, and of quantization beside it. */
final class NoiseStudy {
  private static final double ZERO_CELSIUS = 273.15;

  private final ChannelModel model;
  private final ScanTiming timing;
  private final FrequencyStudy frequency;
  private final List<Figure> figures = new ArrayList<>();
  private final List<Place> places = new ArrayList<>();
  private double flicker;
  private double sigma;

  NoiseStudy(ChannelModel model, ScanTiming timing, FrequencyStudy frequency) {
    this.model = model;
    this.timing = timing;
    this.frequency = frequency;
  }

  List<Figure> figures() {
    return figures;
  }

  void run() {
    double kelvin = model.ambients().get(model.ambients().size() - 1) + ZERO_CELSIUS;
    Part adc = model.converterPart();
    Optional<Toleranced> hold = adc.quantity("hold-capacitor").stated();
    double thermal = 0;
    if (hold.isPresent()) {
      thermal = Noise.holdCapacitor(kelvin, Limits.low(hold.get()));
      figures.add(
          Figure.of(
              "hold-capacitor-noise",
              thermal,
              "V",
              "sqrt(k T / C_hold)",
              Figure.Operand.of("T", kelvin, "K"),
              Figure.Operand.of("C_hold", Limits.low(hold.get()), "F")));
    }
    double network = network(kelvin, thermal);
    double converter = converterNoise(adc);
    double amplifiers = amplifiers();
    double jitter = frequency.jitterNoise(model.measures().high());
    // A converter's stated noise holds that of its own hold capacitor.
    double own = Double.isNaN(converter) ? thermal : converter;
    double white =
        Math.sqrt(own * own + network * network + amplifiers * amplifiers + jitter * jitter);
    sigma = white / model.lsb();
    report(white);
  }

  /**
   * Thermal noise of the resistors before an amplifier, beyond that of the hold capacitor, V rms.
   * Of a passive path nothing is left: k T / C_hold is all of it.
   */
  private double network(double kelvin, double hold) {
    if (model.lastActive().isEmpty()) {
      return 0;
    }
    AcPath path = frequency.path(model.measures().high(), model.forward().nominal());
    if (!Double.isFinite(path.ohms())) {
      return 0;
    }
    double all = Noise.thermalAtHold(kelvin, path.ohms(), path.chain(), path.sampler());
    return Double.isFinite(all) ? Math.sqrt(Math.max(0, all * all - hold * hold)) : 0;
  }

  private void report(double white) {
    double total = Math.sqrt(white * white + flicker * flicker);
    int count = model.average();
    double averaged = Math.sqrt(white * white / count + flicker * flicker);
    figures.add(
        Figure.of(
            "noise",
            total,
            "V",
            "root of the sum of squares: converter or hold capacitor, amplifiers, flicker,"
                + " jitter"));
    figures.add(
        Figure.of(
            "noise-lsb",
            total / model.lsb(),
            "LSB",
            "noise / lsb",
            Figure.Operand.of("noise", total, "V"),
            Figure.Operand.of("lsb", model.lsb(), "V")));
    double worst = 0;
    double at = model.measures().high();
    for (double x : model.points()) {
      double measured = averaged / Math.abs(model.slope(x));
      if (measured > worst) {
        worst = measured;
        at = x;
      }
    }
    figures.add(
        Figure.of(
                "noise-measured",
                worst,
                model.unit(),
                "noise / sqrt(average) / slope of the pin's voltage; flicker is not averaged",
                Figure.Operand.of("average", count, "1"))
            .at(at));
    double rest = Math.sqrt((sigma * sigma + 1.0 / 12) / count);
    figures.add(
        Figure.of(
            "averaging-rest",
            rest,
            "LSB",
            "sqrt((sigma^2 + 1/12) / average)",
            Figure.Operand.of("sigma", sigma, "LSB")));
    figures.add(
        Figure.of(
            "averaging-bias",
            Noise.quantizerBias(sigma),
            "LSB",
            "largest bias of the mean of a quantized value with noise sigma",
            Figure.Operand.of("sigma", sigma, "LSB")));
    double afterQuantizing =
        Math.sqrt(
            Noise.averagedQuantization(sigma, count) * Noise.averagedQuantization(sigma, count)
                + flicker * flicker / (model.lsb() * model.lsb()));
    figures.add(
        Figure.of(
            "effective-bits",
            Noise.effectiveBits(model.converterCodes(), afterQuantizing),
            "1",
            "log2(span / (sqrt 12 x rms of noise and quantization after averaging))",
            Figure.Operand.of("rms", afterQuantizing, "LSB")));
  }

  /** V rms; NaN where it is not stated. */
  private double converterNoise(Part adc) {
    if (!(adc.quantity("noise") instanceof Slot.Stated<Toleranced> stated)) {
      return Double.NaN;
    }
    places.add(stated.place());
    double value = Limits.high(stated.value());
    return stated.value().unit().dimension() == Dimension.LSB ? value * model.lsb() : value;
  }

  /** White noise of all amplifiers at the hold capacitor, V rms; notes flicker on the way. */
  private double amplifiers() {
    List<StageModel> stages = model.forward().stages();
    double[] p = model.forward().nominal();
    double squares = 0;
    double flickerSquares = 0;
    for (int i = 0; i < stages.size(); i++) {
      if (!(stages.get(i) instanceof ActiveStage active)) {
        continue;
      }
      List<Element> behind = new ArrayList<>();
      stages.subList(i + 1, stages.size()).forEach(s -> s.elements(p, behind));
      if (frequency.pinFarads() > 0) {
        behind.add(new Rung.Capacitor(frequency.pinFarads()));
      }
      double gain = 1;
      for (StageModel s : stages.subList(i + 1, stages.size())) {
        gain *= s instanceof ActiveStage a ? Math.abs(p[a.gain()]) : 1;
      }
      double white = white(active, behind);
      if (Double.isFinite(white)) {
        squares += white * white;
      }
      double slow =
          Noise.flickerRms(active.traits().flicker()) * active.traits().noiseGain() * gain;
      flickerSquares += slow * slow;
      if (active.traits().noise() > 0) {
        places.addAll(active.traits().noisePlaces());
      }
    }
    flicker = Math.sqrt(flickerSquares);
    return Math.sqrt(squares);
  }

  private double white(ActiveStage active, List<Element> behind) {
    ActiveStage.Traits traits = active.traits();
    if (traits.noise() == 0) {
      return 0;
    }
    if (active.response().isPresent()) {
      List<Element> chain = new ArrayList<>(behind);
      chain.add(0, new ActiveFilter(traits.noiseGain(), active.response().get(), 0));
      return Noise.shaped(traits.noise(), 0, chain, frequency.sampler());
    }
    return Noise.amplifier(
        traits.noise(),
        traits.noiseGain(),
        new Amplifier(traits.noiseGain(), traits.pole(), traits.outputOhms()),
        behind,
        frequency.sampler());
  }

  /** Standard uncertainty of what quantization leaves after averaging, LSB. */
  double quantization() {
    int count = model.average();
    double both = Noise.averagedQuantization(sigma, count);
    return Math.sqrt(Math.max(0, both * both - sigma * sigma / count));
  }

  /** Rows of noise at x, in the measured unit. */
  List<Contribution> rows(double x) {
    List<Contribution> rows = new ArrayList<>();
    double slope = Math.abs(model.slope(x));
    int count = model.average();
    double white = sigma * model.lsb() / Math.sqrt(count) / slope;
    if (white > 0) {
      rows.add(Contribution.of("noise", new Distribution.Normal(white), true, places));
    }
    if (flicker > 0) {
      rows.add(
          Contribution.of(
              "flicker-noise", new Distribution.Normal(flicker / slope), false, places));
    }
    movement(rows);
    return rows;
  }

  /** What moves while the scan's start jitters; only where the sheet says how much moves. */
  private void movement(List<Contribution> rows) {
    if (timing == null || timing.jitter() == 0) {
      return;
    }
    double perSecond = 0;
    Place place = null;
    Optional<Part> band = model.part().part("band").stated();
    if (band.isPresent() && band.get().quantity("amplitude").isStated()) {
      double hertz = band.get().quantity("frequency").stated().map(Limits::high).orElse(0.0);
      double amplitude = band.get().quantity("amplitude").stated().map(Limits::high).orElse(0.0);
      perSecond = Noise.sineSlope(hertz, amplitude);
      place = band.get().quantity("amplitude").place();
    }
    Optional<Toleranced> fastest = model.part().quantity("fastest").stated();
    if (fastest.isPresent()) {
      perSecond = Limits.high(fastest.get());
      place = model.part().quantity("fastest").place();
    }
    if (perSecond > 0) {
      double u = Noise.jitter(perSecond, timing.jitter()) / Math.sqrt(model.average());
      rows.add(Contribution.of("jitter", new Distribution.Normal(u), false, List.of(place)));
    }
  }

  /** The band's loss where the sheet says how much moves there. */
  List<Contribution> droop() {
    Optional<Part> band = model.part().part("band").stated();
    if (band.isEmpty() || frequency.droop() == 0) {
      return List.of();
    }
    Slot<Toleranced> amplitude = band.get().quantity("amplitude");
    return amplitude
        .stated()
        .map(
            a ->
                List.of(
                    Contribution.of(
                        "droop",
                        new Distribution.Sine(Limits.high(a) * frequency.droop()),
                        false,
                        List.of(amplitude.place()))))
        .orElse(List.of());
  }
}
