package dev.settlewell.channel;

import dev.settlewell.circuit.Drive;
import dev.settlewell.circuit.Element;
import dev.settlewell.circuit.FrequencyResponse;
import dev.settlewell.circuit.Ladder;
import dev.settlewell.circuit.Rung;
import dev.settlewell.circuit.SampledLadder;
import dev.settlewell.circuit.Sampler;
import dev.settlewell.circuit.Settling;
import dev.settlewell.circuit.Slewing;
import dev.settlewell.circuit.Visit;
import dev.settlewell.circuit.WorstCase;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * The circuit that settles with the hold capacitor, over the box of its tolerances.
 *
 * <p>Path and switch resistances stand at their high ends, where a slower circuit is the worse one.
 * Capacitors are searched inside their tolerances, for the worst one may lie there; so is the
 * measured quantity where the source's resistance depends on it.
 *
 * <p>A point of the search is: each capacitor of the path, the pin's capacitance, the hold
 * capacitor, and the measured quantity.
 */
final class SettlingCircuit {
  private static final int EVALUATIONS = 60;

  /** Behind an amplifier one steady state costs ten times as much, and the box matters less. */
  private static final int EVALUATIONS_BEHIND_AMPLIFIER = 20;

  private final ChannelModel model;
  private final int evaluations;
  private final double switchOhms;
  private final Limits pin;
  private final Limits hold;
  private final List<StageModel.Passive> stages;
  private final List<Integer> capacitors;
  private final double[] highResistances;
  private final boolean varies;
  private final double[] low;
  private final double[] high;
  private final boolean[] corner;

  /**
   * Circuits by their point: both clocks, the need and the neighbour's fault ask about the same.
   */
  private final Map<List<Double>, SampledLadder> solved = new HashMap<>();

  SettlingCircuit(ChannelModel model, Limits switchOhms, Limits pin, Limits hold) {
    this.model = model;
    this.evaluations = model.lastActive().isPresent() ? EVALUATIONS_BEHIND_AMPLIFIER : EVALUATIONS;
    this.switchOhms = switchOhms.high();
    this.pin = pin;
    this.hold = hold;
    this.stages = model.settlingStages();
    this.capacitors = stages.stream().flatMap(s -> s.capacitances().stream()).toList();
    this.highResistances = highResistances();
    this.varies = model.forward().sensor().resistanceVaries() && model.lastActive().isEmpty();
    int n = capacitors.size();
    this.low = new double[n + 3];
    this.high = new double[n + 3];
    this.corner = new boolean[n + 3];
    for (int i = 0; i < n; i++) {
      Limits limits = limits(capacitors.get(i));
      low[i] = limits.low();
      high[i] = limits.high();
    }
    low[n] = pin.low();
    high[n] = pin.high();
    low[n + 1] = hold.low();
    high[n + 1] = hold.high();
    corner[n + 1] = true;
    // Where the circuit does not depend on x, both ends are looked at in every evaluation.
    low[n + 2] = model.measures().low();
    high[n + 2] = varies ? model.measures().high() : model.measures().low();
  }

  /** A point of the search and the largest error there, signed, V. */
  record Worst(double[] point, double error, double x, double start) {
    double magnitude() {
      return Math.abs(error);
    }
  }

  /** What is asked: when, at which clock, from where. */
  record Question(List<Visit> visits, double period, List<StartRange> starts) {
    Question with(double acquisition) {
      return new Question(
          visits.stream().map(v -> new Visit(v.start(), acquisition)).toList(), period, starts);
    }
  }

  Worst worst(Question question) {
    WorstCase.Result found =
        WorstCase.maximise(
            point -> at(question, point, 1, null).magnitude(), low, high, corner, evaluations);
    return at(question, found.point(), 1, null);
  }

  /** Held against the box: the acquisition from which on the allowance is kept everywhere. */
  OptionalDouble required(Question question, double allowance, double longest, Worst first) {
    Worst worst = first;
    double found = 0;
    for (int round = 0; round < 5; round++) {
      OptionalDouble next = requiredAt(question, allowance, longest, worst);
      if (next.isEmpty()) {
        return next;
      }
      found = Math.max(found, next.getAsDouble());
      Worst there = worst(question.with(found));
      if (there.magnitude() <= allowance * (1 + 1e-9)) {
        return OptionalDouble.of(found);
      }
      worst = there;
    }
    return OptionalDouble.of(found);
  }

  private OptionalDouble requiredAt(
      Question question, double allowance, double longest, Worst worst) {
    double slew = slewTime(question, worst.point(), worst.x());
    OptionalDouble linear =
        Settling.requiredAcquisition(
            ladder(worst.point(), 1, null),
            sampler(worst.point()),
            question.visits(),
            question.period(),
            offsets(question, worst),
            allowance,
            longest - slew);
    return linear.isPresent() ? OptionalDouble.of(linear.getAsDouble() + slew) : linear;
  }

  private double[] offsets(Question question, Worst worst) {
    double own = model.forward().volts(worst.x(), model.forward().nominal());
    boolean fromAbove = worst.start() > own;
    return question.starts().stream()
        .mapToDouble(s -> s.ownVoltage() ? 0 : (fromAbove ? s.high() : s.low()) - own)
        .toArray();
  }

  /**
   * The largest error at one point.
   *
   * @param scale factor on every resistance from the sensor to the pin
   * @param reservoir value of the capacitor nearest the pin, in place of the sheet's; null: as is
   */
  Worst at(Question question, double[] point, double scale, Double reservoir) {
    double[][] residuals = residuals(question, point, scale, reservoir);
    double[] ends =
        varies
            ? new double[] {point[point.length - 1]}
            : new double[] {model.measures().low(), model.measures().high()};
    Worst worst = null;
    for (double x : ends) {
      for (double[] row : residuals) {
        for (boolean upward : new boolean[] {false, true}) {
          double[] sum = extreme(row, question.starts(), x, upward);
          if (worst == null || Math.abs(sum[0]) > worst.magnitude()) {
            worst = new Worst(point, sum[0], x, sum[1]);
          }
        }
      }
    }
    return worst;
  }

  /** Lowest and highest error at a measured value, the circuit otherwise as at a worst point. */
  double[] extremes(Question question, double[] point, double x) {
    double[] there = point.clone();
    there[there.length - 1] = x;
    double lowest = 0;
    double highest = 0;
    for (double[] row : residuals(question, there, 1, null)) {
      lowest = Math.min(lowest, extreme(row, question.starts(), x, false)[0]);
      highest = Math.max(highest, extreme(row, question.starts(), x, true)[0]);
    }
    return new double[] {lowest, highest};
  }

  /** Error, and the start voltage that gives it. */
  private double[] extreme(double[] row, List<StartRange> starts, double x, boolean upward) {
    double own = model.forward().volts(x, model.forward().nominal());
    double sum = 0;
    double start = own;
    for (int j = 0; j < row.length; j++) {
      StartRange range = starts.get(j);
      if (range.ownVoltage()) {
        continue;
      }
      double fromLow = row[j] * (range.low() - own);
      double fromHigh = row[j] * (range.high() - own);
      boolean high = upward == fromHigh > fromLow;
      sum += high ? fromHigh : fromLow;
      start = high ? range.high() : range.low();
    }
    return new double[] {sum, start};
  }

  private double[][] residuals(Question question, double[] point, double scale, Double reservoir) {
    double x = varies ? point[point.length - 1] : model.measures().low();
    double slew = slewTime(question, point, x);
    List<Visit> visits = question.visits();
    if (slew > 0) {
      visits =
          visits.stream()
              .map(v -> new Visit(v.start() + slew, Math.max(0, v.acquisition() - slew)))
              .toList();
    }
    return sampled(point, scale, reservoir).residuals(visits, question.period());
  }

  private SampledLadder sampled(double[] point, double scale, Double reservoir) {
    if (scale != 1 || reservoir != null) {
      return new SampledLadder(ladder(point, scale, reservoir), sampler(point));
    }
    double[] key = point.clone();
    if (!varies) {
      key[key.length - 1] = 0;
    }
    return solved.computeIfAbsent(
        Arrays.stream(key).boxed().toList(),
        k -> new SampledLadder(ladder(point, 1, null), sampler(point)));
  }

  /** Time lost while the last amplifier slews, at the largest step the starts allow. */
  private double slewTime(Question question, double[] point, double x) {
    ActiveStage active = model.lastActive().orElse(null);
    if (active == null
        || Double.isNaN(active.traits().slewRate())
        || !(active.drive() instanceof Drive.ClosedLoop loop)) {
      return 0;
    }
    double[] nominal = model.forward().nominal();
    double step = 0;
    for (double end : new double[] {model.measures().low(), model.measures().high(), x}) {
      double own = model.forward().volts(end, nominal);
      for (StartRange s : question.starts()) {
        if (!s.ownVoltage()) {
          step = Math.max(step, Math.max(Math.abs(s.low() - own), Math.abs(s.high() - own)));
        }
      }
    }
    double reaching =
        step
            * Slewing.outputStep(loop.outputOhms(), ladder(point, 1, null).rungs(), sampler(point));
    return Slewing.time(reaching, active.traits().slewRate(), loop.hertz());
  }

  private Sampler sampler(double[] point) {
    return new Sampler(switchOhms, point[point.length - 2]);
  }

  Ladder ladder(double[] point, double scale, Double reservoir) {
    double[] p = highResistances.clone();
    for (int i = 0; i < capacitors.size(); i++) {
      p[capacitors.get(i)] = point[i];
    }
    if (reservoir != null && !capacitors.isEmpty()) {
      p[capacitors.get(capacitors.size() - 1)] = reservoir;
    }
    List<Element> elements = new ArrayList<>();
    stages.forEach(stage -> stage.elements(p, elements));
    List<Rung> rungs = new ArrayList<>();
    elements.forEach(e -> rungs.add((Rung) e));
    if (reservoir != null && capacitors.isEmpty()) {
      rungs.add(new Rung.Capacitor(reservoir));
    }
    double pinFarads = point[capacitors.size()];
    if (pinFarads > 0) {
      rungs.add(new Rung.Capacitor(pinFarads));
    }
    Ladder ladder = new Ladder(drive(point, p), rungs);
    return scale == 1 ? ladder : ladder.scaledResistances(scale);
  }

  private Drive drive(double[] point, double[] p) {
    if (model.lastActive().isPresent()) {
      return model.lastActive().get().drive();
    }
    double x = varies ? point[point.length - 1] : model.measures().low();
    return new Drive.Resistive(model.forward().sensor().port(x, p).ohms());
  }

  /** DC source resistance at the pin at its largest over the measured range. */
  double sourceResistance() {
    double most = 0;
    double[] point = low.clone();
    int last = point.length - 1;
    int steps = varies ? 32 : 0;
    for (int i = 0; i <= steps; i++) {
      point[last] =
          model.measures().low() + (steps == 0 ? 0 : model.measures().width() * i / steps);
      most = Math.max(most, ladder(point, 1, null).dcResistance());
    }
    return most;
  }

  /** What the last amplifier has to drive at its closed-loop bandwidth, Ω. */
  double load(Drive.ClosedLoop loop, double[] point) {
    return FrequencyResponse.loadOhms(ladder(point, 1, null).rungs(), sampler(point), loop.hertz());
  }

  boolean hasReservoir() {
    return !capacitors.isEmpty();
  }

  /** The capacitor nearest the pin. */
  Limits reservoir() {
    return limits(capacitors.get(capacitors.size() - 1));
  }

  Limits pin() {
    return pin;
  }

  Limits hold() {
    return hold;
  }

  double switchOhms() {
    return switchOhms;
  }

  private Limits limits(int parameter) {
    double nominal = model.forward().nominal()[parameter];
    double below = 0;
    double above = 0;
    for (Spread spread : model.spreads()) {
      if (spread.parameter() == parameter) {
        below += worstOverAmbient(spread.minus());
        above += worstOverAmbient(spread.plus());
      }
    }
    return new Limits(Math.max(nominal - below, nominal * 1e-3), nominal, nominal + above);
  }

  private double[] highResistances() {
    double[] p = model.forward().nominal().clone();
    List<Integer> indices = new ArrayList<>();
    stages.forEach(s -> indices.addAll(s.resistances()));
    indices.addAll(model.forward().sensor().resistances());
    for (Spread spread : model.spreads()) {
      if (indices.contains(spread.parameter())) {
        p[spread.parameter()] += worstOverAmbient(spread.plus());
      }
    }
    return p;
  }

  private double worstOverAmbient(Extent extent) {
    return model.ambients().stream()
        .mapToDouble(ambient -> extent.at(model.measures().high(), ambient))
        .max()
        .orElse(0);
  }
}
