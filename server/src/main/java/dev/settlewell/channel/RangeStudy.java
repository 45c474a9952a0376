package dev.settlewell.channel;

import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.unit.Range;
import dev.settlewell.unit.Toleranced;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** What the pin, the amplifiers and the clamp diodes see over the measured range and in a fault. */
final class RangeStudy {
  /** A pin clamps this far beyond its rails where the sheet does not say; common practice. */
  private static final double USUAL_CLAMP = 0.3;

  private final ChannelModel model;
  private final PinRange pin;
  private final List<Figure> figures = new ArrayList<>();
  private final List<OutputRange> outputs = new ArrayList<>();

  RangeStudy(ChannelModel model, PinRange pin) {
    this.model = model;
    this.pin = pin;
  }

  List<Figure> figures() {
    return figures;
  }

  List<OutputRange> outputs() {
    return outputs;
  }

  void run() {
    span();
    pin();
    codes();
    amplifiers();
    faults();
    overload();
    curve();
  }

  private void span() {
    ForwardModel forward = model.forward();
    Converter adc = forward.converter();
    double[] p = forward.nominal();
    figures.add(Figure.of("span-low", adc.spanLow(p), "V", "voltage of code 0"));
    figures.add(Figure.of("span-high", adc.spanHigh(p), "V", "reference"));
    double leastHigh = Double.POSITIVE_INFINITY;
    double mostLow = Double.NEGATIVE_INFINITY;
    double x = model.measures().high();
    for (double ambient : model.ambients()) {
      leastHigh =
          Math.min(leastHigh, Corner.extreme(model.spreads(), p, x, ambient, false, adc::spanHigh));
      mostLow =
          Math.max(mostLow, Corner.extreme(model.spreads(), p, x, ambient, true, adc::spanLow));
    }
    figures.add(Figure.of("span-least-low", mostLow, "V", "code 0 at its highest"));
    figures.add(Figure.of("span-least-high", leastHigh, "V", "reference at its least"));
  }

  private void pin() {
    String formula = "pin voltage over the measured range, every tolerance at its worse end";
    figures.add(Figure.of("pin-nominal-low", pin.nominalLow(), "V", "nominal"));
    figures.add(Figure.of("pin-nominal-high", pin.nominalHigh(), "V", "nominal"));
    figures.add(Figure.of("pin-low", pin.worstLow(), "V", formula));
    figures.add(Figure.of("pin-high", pin.worstHigh(), "V", formula));
    figures.add(
        Figure.of(
            "pin-share-worst-high", worstShare(true), "1", "pin / reference, both moved together"));
    figures.add(
        Figure.of(
            "pin-share-worst-low", worstShare(false), "1", "pin / reference, both moved together"));
    double span = model.span();
    figures.add(
        Figure.of(
            "range-used",
            (pin.nominalHigh() - pin.nominalLow()) / span,
            "1",
            "(pin-nominal-high - pin-nominal-low) / span",
            Figure.Operand.of("pin-nominal-high", pin.nominalHigh(), "V"),
            Figure.Operand.of("pin-nominal-low", pin.nominalLow(), "V"),
            Figure.Operand.of("span", span, "V")));
  }

  /** The share of the span the pin reaches: a ratiometric sensor's moves with its reference. */
  private double worstShare(boolean high) {
    ForwardModel forward = model.forward();
    double worst = high ? Double.NEGATIVE_INFINITY : Double.POSITIVE_INFINITY;
    for (double[] from : PinRange.knownCorners(model)) {
      for (double x : model.points()) {
        for (double ambient : model.ambients()) {
          double share =
              Corner.extreme(
                  model.spreads(),
                  from,
                  x,
                  ambient,
                  high,
                  p ->
                      (forward.volts(x, p) - forward.converter().spanLow(p))
                          / (forward.converter().spanHigh(p) - forward.converter().spanLow(p)));
          worst = high ? Math.max(worst, share) : Math.min(worst, share);
        }
      }
    }
    return worst;
  }

  private void codes() {
    ForwardModel forward = model.forward();
    double[] p = forward.nominal();
    double low = forward.volts(model.measures().low(), p);
    double high = forward.volts(model.measures().high(), p);
    figures.add(
        Figure.of("code-low", forward.converter().read(low, p), "1", "code at the low end")
            .at(model.measures().low()));
    figures.add(
        Figure.of("code-high", forward.converter().read(high, p), "1", "code at the high end")
            .at(model.measures().high()));
  }

  private void amplifiers() {
    for (int i = 0; i < model.forward().stages().size(); i++) {
      if (model.forward().stages().get(i) instanceof ActiveStage active) {
        outputs.add(output(active, i));
      }
    }
  }

  private OutputRange output(ActiveStage active, int index) {
    double nominalLow = Double.POSITIVE_INFINITY;
    double nominalHigh = Double.NEGATIVE_INFINITY;
    double worstLow = Double.POSITIVE_INFINITY;
    double worstHigh = Double.NEGATIVE_INFINITY;
    for (double[] from : PinRange.knownCorners(model)) {
      for (double x : model.points()) {
        double v = outputAt(active, index, x, from);
        nominalLow = Math.min(nominalLow, v);
        nominalHigh = Math.max(nominalHigh, v);
        for (double ambient : model.ambients()) {
          worstLow = Math.min(worstLow, worst(active, index, x, ambient, from, false));
          worstHigh = Math.max(worstHigh, worst(active, index, x, ambient, from, true));
        }
      }
    }
    ActiveStage.Traits traits = active.traits();
    return new OutputRange(
        traits.place(),
        traits.swingPlace(),
        nominalLow,
        nominalHigh,
        worstLow,
        worstHigh,
        traits.swingLow(),
        traits.swingHigh());
  }

  private double worst(
      ActiveStage active, int index, double x, double ambient, double[] from, boolean upward) {
    return Corner.extreme(
        model.spreads(), from, x, ambient, upward, p -> outputAt(active, index, x, p));
  }

  private double outputAt(ActiveStage active, int index, double x, double[] p) {
    Port port = model.forward().sensor().port(x, p);
    for (StageModel stage : model.forward().stages().subList(0, index)) {
      port = stage.after(port, p);
    }
    return active.output(port, p);
  }

  private void faults() {
    double[] p = model.forward().nominal();
    SensorModel sensor = model.forward().sensor();
    fault("code-open", sensor.open(p), "code with the sensor's lead off");
    fault("code-short", sensor.shorted(p), "code with the sensor shorted");
    List<Double> failures = sensor.failureCurrents();
    if (!failures.isEmpty()) {
      loopFailure("code-loop-low", failures.get(0));
      loopFailure("code-loop-high", failures.get(1));
    }
  }

  private void loopFailure(String name, double amperes) {
    String formula = "code at the current with which a transmitter reports its failure (NE 43)";
    fault(name, Optional.of(Port.current(amperes, 0)), formula);
  }

  private void fault(String name, Optional<Port> source, String formula) {
    if (source.isEmpty()) {
      return;
    }
    double[] p = model.forward().nominal();
    double volts = model.forward().through(source.get(), p).volts();
    if (Double.isNaN(volts)) {
      figures.add(Figure.none(name, "1", "nothing holds the pin: the code is undetermined"));
    } else {
      figures.add(
          Figure.of(
              name,
              model.forward().converter().read(volts, p),
              "1",
              formula,
              Figure.Operand.of("pin", volts, "V")));
    }
  }

  private void overload() {
    Slot.Stated<Range> stated =
        model.part().range("overload") instanceof Slot.Stated<Range> s ? s : null;
    if (stated == null || model.lastActive().isPresent()) {
      return;
    }
    Part adc = model.converterPart();
    double clamp = adc.quantity("clamp-voltage").stated().map(Limits::low).orElse(USUAL_CLAMP);
    Optional<Toleranced> supply =
        adc.text("supply")
            .stated()
            .flatMap(name -> Optional.ofNullable(model.linked().supplies().get(name)))
            .flatMap(s -> s.value().stated());
    if (supply.isEmpty()) {
      Inputs inputs = new Inputs();
      inputs.need(adc.text("supply"));
      figures.add(inputs.figure("overload-current", "A"));
      return;
    }
    double rail = Limits.low(supply.get());
    double high = clampCurrent(stated.value().high(), rail + clamp, true);
    double low = clampCurrent(stated.value().low(), -clamp, false);
    overloadFigure("overload-current-high", high, rail + clamp, stated.place());
    overloadFigure("overload-current-low", low, -clamp, stated.place());
    overloadFigure(
        "overload-current",
        Math.max(high, low),
        high >= low ? rail + clamp : -clamp,
        stated.place());
  }

  private void overloadFigure(String name, double amperes, double level, Place place) {
    figures.add(
        Double.isInfinite(amperes)
            ? Figure.unlimited(name, "A")
            : Figure.of(
                name,
                amperes,
                "A",
                "(Thevenin voltage at the pin - clamp level) / Thevenin resistance, least values",
                new Figure.Operand("clamp level", level, "V", Optional.of(place))));
  }

  /** Current into a clamp diode, the least resistance counted. */
  private double clampCurrent(double terminal, double level, boolean above) {
    double[] nominal = model.forward().nominal();
    double worst = 0;
    for (double ambient : model.ambients()) {
      worst =
          Math.max(
              worst,
              Corner.extreme(
                  model.spreads(),
                  nominal,
                  model.measures().high(),
                  ambient,
                  true,
                  p -> {
                    Port port = Port.voltage(terminal, 0);
                    for (StageModel stage : model.forward().stages()) {
                      port = stage.after(port, p);
                    }
                    double excess = above ? port.volts() - level : level - port.volts();
                    return excess <= 0 ? 0 : excess / port.ohms();
                  }));
    }
    return worst;
  }

  private void curve() {
    SensorModel sensor = model.forward().sensor();
    if (Double.isFinite(sensor.low())) {
      figures.add(Figure.of("curve-low", sensor.low(), model.unit(), "low end of the curve"));
      figures.add(Figure.of("curve-high", sensor.high(), model.unit(), "high end of the curve"));
    }
  }
}
