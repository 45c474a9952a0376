package dev.settlewell.channel;

import dev.settlewell.sheet.Linked;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.unit.Dimension;
import dev.settlewell.unit.Range;
import dev.settlewell.unit.Toleranced;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeSet;
import java.util.stream.Stream;

/**
 * One channel with everything the sheet says of it, ready to compute with.
 *
 * @param measures the measured range as far as the sensor's curve reaches
 * @param inputs what the forward model lacks; where it is not complete, {@code forward} is null
 * @param ambients the temperatures the budget is made at, °C, rising
 * @param spreads every reason why a reading may be wrong
 */
record ChannelModel(
    Linked linked,
    Named<Part> channel,
    Part part,
    Optional<Named<Part>> converter,
    Range measures,
    Inputs inputs,
    ForwardModel forward,
    List<Spread> spreads,
    List<Parameters.Known> known,
    List<Parameters.Stated> stated,
    List<Double> ambients,
    List<Place> typicalOnly) {

  static final double ROOM = 25;

  /** Of an LSB: a pin that moves by less over the whole range does not see what is measured. */
  private static final double BLIND = 1e-6;

  /** Null where the channel itself could not be read: nothing can be said of it. */
  static ChannelModel bind(Linked linked, Named<Part> channel, Optional<Named<Part>> converter) {
    Part part = channel.value().stated().orElse(null);
    if (part == null || !part.range("measures").isStated()) {
      return null;
    }
    Range measures = part.range("measures").stated().orElseThrow();
    Part top = linked.sheet().top();
    double statedAt = top.quantity("stated-at").stated().map(Toleranced::value).orElse(ROOM);
    Bench bench = new Bench(linked, part, measures, statedAt);
    ForwardModel forward = forward(part, converter, bench);
    return new ChannelModel(
        linked,
        channel,
        part,
        converter,
        forward == null ? measures : asFarAsKnown(measures, forward.sensor()),
        bench.inputs,
        bench.inputs.complete() ? forward : null,
        bench.parameters.spreads(),
        bench.parameters.known(),
        bench.parameters.stated(),
        ambients(part, top),
        bench.parameters.typicalOnly());
  }

  /**
   * What is measured as far as the sensor's curve reaches; the whole curve where the two do not
   * meet. That the range leaves the curve is a finding of its own; every other figure is computed
   * where there is something to compute with.
   */
  private static Range asFarAsKnown(Range measures, SensorModel sensor) {
    double low = Math.max(measures.low(), sensor.low());
    double high = Math.min(measures.high(), sensor.high());
    return low < high
        ? new Range(low, high, measures.unit())
        : new Range(sensor.low(), sensor.high(), measures.unit());
  }

  private static ForwardModel forward(Part part, Optional<Named<Part>> converter, Bench bench) {
    Slot.Stated<Part> sensorPart = bench.inputs.need(part.part("sensor"));
    SensorModel sensor = sensorPart == null ? null : Sensors.bind(sensorPart.value(), bench);
    List<StageModel> stages = stages(part, bench);
    Part converterPart = converter.flatMap(c -> c.value().stated()).orElse(null);
    if (converterPart == null) {
      bench.inputs.spoil();
      return null;
    }
    Converter adc = Converter.bind(converterPart, bench);
    int settling = bench.parameters.add(0);
    int pickup = bench.parameters.add(0);
    if (sensor == null || adc == null || !bench.inputs.complete()) {
      return null;
    }
    ForwardModel model =
        new ForwardModel(sensor, stages, adc, settling, pickup, bench.parameters.nominals());
    if (isBlind(model, bench.measures())) {
      lacksDrive(part, sensorPart.value(), sensor, bench);
    }
    return model;
  }

  /** Whether the pin's voltage does not follow from what is measured: open, or always the same. */
  private static boolean isBlind(ForwardModel model, Range measures) {
    double[] p = model.nominal();
    double low = model.volts(measures.low(), p);
    double middle = model.volts(measures.low() + measures.width() / 2, p);
    double high = model.volts(measures.high(), p);
    double moves = Math.max(Math.abs(middle - low), Math.abs(high - middle));
    return !(Double.isFinite(moves) && moves > BLIND * model.converter().lsb(p));
  }

  /** A current needs a shunt, a resistance something that drives a current through it. */
  private static void lacksDrive(Part part, Part sensorPart, SensorModel sensor, Bench bench) {
    String path = part.list("path", Part.class).pointer();
    if (sensor.drivesCurrent()) {
      bench.inputs.lacks(path + "/shunt", sensorPart.keyPlace());
    } else if (sensor.resistanceVaries()) {
      bench.inputs.lacks(path + "/pull-up", sensorPart.keyPlace());
    } else {
      bench.inputs.spoil();
    }
  }

  private static List<StageModel> stages(Part part, Bench bench) {
    List<StageModel> stages = new ArrayList<>();
    Slot.Stated<List<Slot<Part>>> path = bench.inputs.optional(part.list("path", Part.class));
    if (path == null) {
      return stages;
    }
    for (Slot<Part> item : path.value()) {
      Slot.Stated<Part> stage = bench.inputs.need(item);
      StageModel model = stage == null ? null : Stages.bind(stage.value(), bench);
      if (model != null) {
        stages.add(model);
      }
    }
    return stages;
  }

  /** The low end, 25 °C where it lies inside, and the high end. */
  private static List<Double> ambients(Part part, Part top) {
    Optional<Range> ambient = part.range("ambient").stated();
    if (ambient.isEmpty()) {
      ambient = top.range("ambient").stated();
    }
    if (ambient.isEmpty()) {
      return List.of(ROOM);
    }
    Range range = ambient.get();
    TreeSet<Double> points = new TreeSet<>(List.of(range.low(), range.high()));
    if (range.contains(ROOM)) {
      points.add(ROOM);
    }
    return List.copyOf(points);
  }

  String name() {
    return channel.name();
  }

  /** The measured unit, without prefix. */
  String unit() {
    return measures.unit().symbol();
  }

  boolean complete() {
    return forward != null;
  }

  Part converterPart() {
    return converter.orElseThrow().value().stated().orElseThrow();
  }

  double converterCodes() {
    return forward.converter().codes();
  }

  double lsb() {
    return forward.converter().lsb(forward.nominal());
  }

  double span() {
    double[] p = forward.nominal();
    return forward.converter().spanHigh(p) - forward.converter().spanLow(p);
  }

  /** Volts per measured unit at x, nominal. */
  double slope(double x) {
    return forward.slope(x, measures.width() * 1e-5);
  }

  /** Whether the code is a straight line of the measured quantity, to a hundredth of an LSB. */
  boolean isStraight() {
    double[] p = forward.nominal();
    double low = forward.volts(measures.low(), p);
    double high = forward.volts(measures.high(), p);
    for (int i = 1; i < 8; i++) {
      double chord = low + (high - low) * i / 8;
      double volts = forward.volts(measures.low() + measures.width() * i / 8, p);
      if (Math.abs(volts - chord) > 0.01 * lsb()) {
        return false;
      }
    }
    return true;
  }

  /** Points of the measured range worth looking at: its ends, and between where curves bend. */
  double[] points() {
    int steps = isStraight() && !forward.sensor().resistanceVaries() ? 2 : 4;
    double[] points = new double[steps + 1];
    for (int i = 0; i <= steps; i++) {
      points[i] = measures.low() + measures.width() * i / steps;
    }
    points[steps] = measures.high();
    return points;
  }

  /** The parameters with one spread moved to one of its ends. */
  static void move(double[] p, Spread spread, boolean up, double x, double ambient) {
    Extent extent = up ? spread.plus() : spread.minus();
    p[spread.parameter()] += (up ? 1 : -1) * extent.at(x, ambient);
  }

  /** What {@code needs} allows at x, in the measured unit; empty where it is not stated. */
  OptionalDouble needs(double x) {
    return part.need("needs")
        .stated()
        .map(
            need ->
                OptionalDouble.of(
                    need.tolerances().stream()
                        .mapToDouble(
                            t -> {
                              double size = Math.min(t.minus(), t.plus());
                              boolean share =
                                  t.isShare() && measures.unit().dimension() != Dimension.RATIO;
                              if (!share) {
                                return size;
                              }
                              return switch (t.of()) {
                                case READING -> size * Math.abs(x);
                                case FULL_SCALE ->
                                    size
                                        * Math.max(
                                            Math.abs(measures.low()), Math.abs(measures.high()));
                                case SPAN, UNSAID -> size * measures.width();
                              };
                            })
                        .sum()))
        .orElse(OptionalDouble.empty());
  }

  boolean judgesWorstCase() {
    return part.need("needs").stated().map(n -> n.worstCase()).orElse(false);
  }

  /** Stages from the last amplifier or filter on: what settles with the hold capacitor. */
  List<StageModel.Passive> settlingStages() {
    List<StageModel.Passive> passive = new ArrayList<>();
    for (StageModel stage : forward.stages()) {
      if (stage instanceof StageModel.Passive p) {
        passive.add(p);
      } else {
        passive.clear();
      }
    }
    return passive;
  }

  Optional<ActiveStage> lastActive() {
    return forward.stages().stream()
        .flatMap(s -> s instanceof ActiveStage a ? Stream.of(a) : Stream.empty())
        .reduce((first, second) -> second);
  }

  /** The average count; 1 where none is stated. */
  int average() {
    return part.number("average").orElse(1.0).intValue();
  }

  /** Parameters by index of the spread that moves them, grouped. */
  Map<Integer, List<Spread>> spreadsByParameter() {
    return spreads.stream().collect(java.util.stream.Collectors.groupingBy(Spread::parameter));
  }
}
