package dev.settlewell.channel;

import dev.settlewell.circuit.Drive;
import dev.settlewell.circuit.Remedies;
import dev.settlewell.circuit.Visit;
import dev.settlewell.sheet.Either;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.unit.Dimension;
import dev.settlewell.unit.Toleranced;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** The settling of one channel in one scan, and the figures it gives. */
final class SettlingStudy {
  private static final List<String[]> NAMES =
      List.of(
          new String[] {"settling-error", "V"},
          new String[] {"settling-error-lsb", "LSB"},
          new String[] {"settling-error-measured", ""},
          new String[] {"required-acquisition", "s"},
          new String[] {"required-acquisition-cycles", "cycles"},
          new String[] {"time-constants", "1"},
          new String[] {"largest-source-resistance", "Ω"},
          new String[] {"smallest-reservoir", "F"},
          new String[] {"settling-error-neighbour-fault", "V"});

  private final ChannelModel model;
  private final ScanTiming timing;
  private final Map<String, ChannelModel> all;
  private final Map<String, PinRange> pins;
  private final List<String> othersLast;
  private final List<Figure> figures = new ArrayList<>();
  private final List<Place> typicalOnly = new ArrayList<>();
  private SettlingCircuit circuit;
  private SettlingCircuit.Question question;
  private SettlingCircuit.Worst worst;

  /**
   * @param pins pin ranges of every channel that could be computed
   * @param othersLast the channels other scans of the same converter end with
   */
  SettlingStudy(
      ChannelModel model,
      ScanTiming timing,
      Map<String, ChannelModel> all,
      Map<String, PinRange> pins,
      List<String> othersLast) {
    this.model = model;
    this.timing = timing;
    this.all = all;
    this.pins = pins;
    this.othersLast = othersLast;
  }

  List<Figure> figures() {
    return figures;
  }

  /** Lowest and highest settling error at a measured value, V; zero where it is not known. */
  double[] extremes(double x) {
    return worst == null ? new double[] {0, 0} : circuit.extremes(question, worst.point(), x);
  }

  /** Places of converter values that are typical only and that the worst case rests on. */
  List<Place> typicalOnly() {
    return typicalOnly;
  }

  void run() {
    sourceResistance();
    Inputs inputs = new Inputs();
    inputs.include(model.inputs());
    Part adc = model.converterPart();
    Slot.Stated<Toleranced> hold = inputs.need(adc.quantity("hold-capacitor"));
    Slot.Stated<Toleranced> switchOhms = inputs.need(adc.quantity("switch-resistance"));
    Slot.Stated<Toleranced> pin = inputs.optional(adc.quantity("pin-capacitance"));
    boolean once = timing.visits(model.name()) == 1;
    inputs.include(once ? timing.inputs() : timing.allInputs());
    Optional<List<StartRange>> starts = inputs.complete() ? starts(adc, inputs) : Optional.empty();
    if (!inputs.complete() || starts.isEmpty()) {
      for (String[] name : NAMES) {
        String unit = name[1].isEmpty() ? model.unit() : name[1];
        figures.add(inputs.figure(name[0], unit));
      }
      return;
    }
    circuit =
        new SettlingCircuit(
            model,
            Limits.of(switchOhms.value()),
            pin == null ? Limits.exact(0) : Limits.of(pin.value()),
            Limits.of(hold.value()));
    for (Slot.Stated<Toleranced> value : Arrays.asList(hold, switchOhms, pin)) {
      if (value != null && value.value().typicalOnly()) {
        typicalOnly.add(value.place());
      }
    }
    compute(starts.get());
  }

  /** It needs nothing of the converter: at DC neither the switch nor the capacitors count. */
  private void sourceResistance() {
    if (!model.complete()) {
      figures.add(model.inputs().figure("source-resistance", "Ω"));
      return;
    }
    Limits nothing = Limits.exact(0);
    double ohms = new SettlingCircuit(model, nothing, nothing, nothing).sourceResistance();
    figures.add(
        Double.isInfinite(ohms)
            ? Figure.none("source-resistance", "Ω", "no DC path holds the pin")
            : Figure.of(
                "source-resistance",
                ohms,
                "Ω",
                "DC Thevenin resistance at the pin, resistances at their high ends",
                resistances()));
  }

  private void compute(List<StartRange> starts) {
    double allowance = allowance();
    figures.add(
        Figure.of(
            "settle-within",
            allowance / model.lsb(),
            "LSB",
            "what the sheet allows; half an LSB is common practice"));
    boolean known = timing.acquisitions().containsKey(model.name());
    question = question(starts, timing.clock().high());
    double longest = longest();
    if (known) {
      worst = worstOverClock(starts);
      errors(worst, allowance);
    } else {
      figures.add(timing.acquisitionInputs().figure("settling-error", "V"));
      worst = circuit.worst(question.with(longest));
    }
    amplifierLoad();
    required(allowance, longest);
    timeConstants(known);
    remedies(allowance, known);
    neighbourFault(known);
    if (!known) {
      worst = null;
    }
  }

  /** Passive paths are worst at the fastest clock; behind an amplifier that rings, look at both. */
  private SettlingCircuit.Worst worstOverClock(List<StartRange> starts) {
    SettlingCircuit.Worst found = circuit.worst(question);
    boolean mayRing =
        model.lastActive().map(a -> a.drive() instanceof Drive.ClosedLoop).orElse(false);
    if (mayRing) {
      SettlingCircuit.Question slow = question(starts, timing.clock().low());
      SettlingCircuit.Worst other = circuit.at(slow, found.point(), 1, null);
      if (other.magnitude() > found.magnitude()) {
        question = slow;
        return other;
      }
    }
    return found;
  }

  private SettlingCircuit.Question question(List<StartRange> starts, double clock) {
    double period = timing.rate() == null ? timing.scanTime(clock) : timing.shortestPeriod();
    List<Visit> visits = timing.visits(model.name(), clock, period);
    return new SettlingCircuit.Question(visits, period, starts);
  }

  /** The longest acquisition there could be: the period without this channel's conversions. */
  private double longest() {
    double period = question.period();
    double conversions = timing.conversion(timing.clock().high()) * question.visits().size();
    double left = period - conversions - timing.overhead();
    return timing.rate() == null ? Math.max(left, 1) : Math.max(left, 0);
  }

  private double allowance() {
    Slot.Stated<Toleranced> stated =
        model.part().quantity("settle-within") instanceof Slot.Stated<Toleranced> s ? s : null;
    if (stated == null) {
      return 0.5 * model.lsb();
    }
    Toleranced value = stated.value();
    return switch (value.unit().dimension()) {
      case LSB -> value.value() * model.lsb();
      case RATIO -> value.value() * model.span();
      default -> value.value();
    };
  }

  private void errors(SettlingCircuit.Worst found, double allowance) {
    double measured = Math.abs(found.error() / model.slope(found.x()));
    String formula = "held voltage at the end of acquisition - open-circuit voltage";
    Figure.Operand[] operands = {
      Figure.Operand.of("start of the hold capacitor", found.start(), "V"),
      Figure.Operand.of("hold capacitor", found.point()[found.point().length - 2], "F"),
      new Figure.Operand(
          "acquisition",
          question.visits().get(0).acquisition(),
          "s",
          Optional.of(model.part().either("acquisition").place()))
    };
    figures.add(Figure.of("settling-error", found.error(), "V", formula, operands).at(found.x()));
    figures.add(
        Figure.of(
                "settling-error-lsb",
                found.magnitude() / model.lsb(),
                "LSB",
                "|settling-error| / lsb",
                Figure.Operand.of("settling-error", found.error(), "V"),
                Figure.Operand.of("lsb", model.lsb(), "V"))
            .at(found.x()));
    figures.add(
        Figure.of(
                "settling-error-measured",
                measured,
                model.unit(),
                "|settling-error| / slope of the pin's voltage",
                Figure.Operand.of("settling-error", found.error(), "V"))
            .at(found.x()));
    figures.add(Figure.of("worst-start", found.start(), "V", "where the worst case starts"));
  }

  private void required(double allowance, double longest) {
    OptionalDouble settled = circuit.required(question, allowance, longest, worst);
    if (settled.isEmpty()) {
      String why = "no acquisition within the period suffices";
      figures.add(Figure.none("required-acquisition", "s", why));
      figures.add(Figure.none("required-acquisition-cycles", "cycles", why));
      return;
    }
    double seconds = Math.max(settled.getAsDouble() + timing.overhead(), minimum());
    double cycles = ScanTiming.cycles(seconds, timing.clock().high());
    figures.add(
        Figure.of(
            "required-acquisition",
            seconds,
            "s",
            "last time the settling error crosses the allowance, + acquisition-overhead;"
                + " at least minimum-acquisition",
            Figure.Operand.of("settle-within", allowance, "V"),
            Figure.Operand.of("acquisition-overhead", timing.overhead(), "s")));
    figures.add(
        Figure.of(
            "required-acquisition-cycles",
            cycles,
            "cycles",
            "required-acquisition x fastest clock, rounded up",
            Figure.Operand.of("required-acquisition", seconds, "s"),
            Figure.Operand.of("fastest clock", timing.clock().high(), "Hz")));
    for (double count : timing.offered()) {
      if (count >= cycles) {
        figures.add(
            Figure.of(
                "next-acquisition-cycles", count, "cycles", "next offered count that suffices"));
        break;
      }
    }
  }

  /** Below the amplifier's own output resistance the one-pole model no longer holds. */
  private void amplifierLoad() {
    ActiveStage active = model.lastActive().orElse(null);
    if (active == null || !(active.drive() instanceof Drive.ClosedLoop loop)) {
      return;
    }
    figures.add(
        Figure.of(
            "amplifier-load",
            circuit.load(loop, worst.point()),
            "Ω",
            "|impedance| behind the last amplifier at its closed-loop bandwidth",
            Figure.Operand.of("closed-loop bandwidth", loop.hertz(), "Hz"),
            new Figure.Operand(
                "output-resistance",
                loop.outputOhms(),
                "Ω",
                Optional.of(active.traits().place()))));
  }

  /** What a data sheet demands whatever the source: {@code minimum-acquisition}. */
  private double minimum() {
    return model
        .part()
        .quantity("minimum-acquisition")
        .stated()
        .map(
            least ->
                least.unit().dimension() == Dimension.CYCLES
                    ? least.value() / timing.clock().high()
                    : least.value())
        .orElse(0.0);
  }

  private void timeConstants(boolean known) {
    boolean reservoir = circuit.hasReservoir() || circuit.pin().high() > 0;
    if (!known) {
      figures.add(timing.acquisitionInputs().figure("time-constants", "1"));
    } else if (circuit.hasReservoir()) {
      figures.add(
          Figure.none("time-constants", "1", "a reservoir at the pin: there is no single one"));
    } else {
      double ohms = circuit.sourceResistance();
      double hold = circuit.hold().high();
      double tau = (ohms + circuit.switchOhms()) * hold + ohms * circuit.pin().high();
      figures.add(
          Figure.of(
              "time-constants",
              question.visits().get(0).acquisition() / tau,
              "1",
              reservoir
                  ? "acquisition / ((R_source + R_switch) C_hold + R_source C_pin)"
                  : "acquisition / ((R_source + R_switch) C_hold)",
              Figure.Operand.of("R_source", ohms, "Ω"),
              Figure.Operand.of("R_switch", circuit.switchOhms(), "Ω"),
              Figure.Operand.of("C_hold", hold, "F")));
    }
  }

  private void remedies(double allowance, boolean known) {
    if (!known) {
      figures.add(timing.acquisitionInputs().figure("largest-source-resistance", "Ω"));
      figures.add(timing.acquisitionInputs().figure("smallest-reservoir", "F"));
      return;
    }
    figures.add(largestSourceResistance(allowance));
    figures.add(smallestReservoir(allowance));
    if (circuit.hasReservoir()) {
      figures.add(
          Figure.of("reservoir", circuit.reservoir().nominal(), "F", "capacitor nearest the pin"));
    }
  }

  private Figure largestSourceResistance(double allowance) {
    double present = circuit.ladder(worst.point(), 1, null).dcResistance();
    if (present == 0 || Double.isInfinite(present)) {
      return Figure.none(
          "largest-source-resistance", "Ω", "there is no source resistance to scale");
    }
    OptionalDouble factor =
        Remedies.largest(
            k -> circuit.at(question, worst.point(), k, null).magnitude(), allowance, 1e-4, 1e4);
    if (factor.isEmpty()) {
      return Figure.none(
          "largest-source-resistance", "Ω", "no source resistance settles in this acquisition");
    }
    if (factor.getAsDouble() >= 1e4) {
      return Figure.unlimited("largest-source-resistance", "Ω");
    }
    return Figure.of(
        "largest-source-resistance",
        factor.getAsDouble() * present,
        "Ω",
        "all resistance from the sensor to the pin scaled until the allowance is just kept",
        Figure.Operand.of("source-resistance", present, "Ω"),
        Figure.Operand.of("factor", factor.getAsDouble(), "1"));
  }

  /** The resistors that make up the source resistance, the largest first, with their places. */
  private Figure.Operand[] resistances() {
    List<Integer> indices = new ArrayList<>(model.forward().sensor().resistances());
    model.settlingStages().forEach(stage -> indices.addAll(stage.resistances()));
    double[] p = model.forward().nominal();
    return model.stated().stream()
        .filter(value -> indices.contains(value.parameter()))
        .sorted(Comparator.comparingDouble((Parameters.Stated s) -> p[s.parameter()]).reversed())
        .map(s -> new Figure.Operand(s.row(), p[s.parameter()], "Ω", Optional.of(s.place())))
        .toArray(Figure.Operand[]::new);
  }

  private Figure smallestReservoir(double allowance) {
    double lowShare =
        circuit.hasReservoir() ? circuit.reservoir().low() / circuit.reservoir().nominal() : 1;
    double highest = circuit.hold().high() * 1e7;
    OptionalDouble found =
        Remedies.smallest(
            farads -> circuit.at(question, worst.point(), 1, farads * lowShare).magnitude(),
            allowance,
            circuit.hold().high(),
            highest);
    if (found.isEmpty()) {
      return Figure.none(
          "smallest-reservoir", "F", "the source cannot recharge it within the period");
    }
    if (found.getAsDouble() <= circuit.hold().high()) {
      return Figure.unlimited("smallest-reservoir", "F");
    }
    return Figure.of(
        "smallest-reservoir",
        found.getAsDouble(),
        "F",
        "capacitor nearest the pin from which on its low end keeps the allowance",
        Figure.Operand.of("low end / nominal", lowShare, "1"));
  }

  /** The pin before it at either rail, as a fault would leave it. */
  private void neighbourFault(boolean known) {
    if (!known) {
      figures.add(timing.acquisitionInputs().figure("settling-error-neighbour-fault", "V"));
      return;
    }
    double[] p = model.forward().nominal();
    Optional<Toleranced> supply = supply();
    double top = supply.map(Limits::high).orElse(model.forward().converter().spanHigh(p));
    List<StartRange> rails =
        question.starts().stream()
            .map(s -> s.ownVoltage() ? s : new StartRange(0, top, false))
            .toList();
    SettlingCircuit.Question asked =
        new SettlingCircuit.Question(question.visits(), question.period(), rails);
    // The error is the start's distance times what the circuit leaves of it: the same point is
    // worst.
    SettlingCircuit.Worst found = circuit.at(asked, worst.point(), 1, null);
    figures.add(
        Figure.of(
                "settling-error-neighbour-fault",
                found.error(),
                "V",
                "settling error with the pin before it at either rail",
                Figure.Operand.of("upper rail", top, "V"))
            .at(found.x()));
  }

  private Optional<Toleranced> supply() {
    return model
        .converterPart()
        .text("supply")
        .stated()
        .flatMap(name -> Optional.ofNullable(model.linked().supplies().get(name)))
        .flatMap(s -> s.value().stated());
  }

  /** Where the hold capacitor starts each visit; empty where a neighbour is not known. */
  private Optional<List<StartRange>> starts(Part adc, Inputs inputs) {
    Slot.Stated<Either> stated = inputs.optional(adc.either("hold-starts-at"));
    List<String> before = timing.predecessors(model.name());
    List<StartRange> starts = new ArrayList<>();
    for (int i = 0; i < before.size(); i++) {
      boolean first = i == 0 && timing.order().get(0).equals(model.name());
      StartRange start =
          stated == null || stated.value().is("previous-channel")
              ? previous(before.get(i), first, inputs)
              : stated(stated.value(), inputs);
      if (start == null) {
        return Optional.empty();
      }
      starts.add(start);
    }
    return Optional.of(starts);
  }

  private StartRange stated(Either either, Inputs inputs) {
    double[] p = model.forward().nominal();
    if (either.is("unknown")) {
      return new StartRange(
          model.forward().converter().spanLow(p), model.forward().converter().spanHigh(p), false);
    }
    Toleranced value = either.quantity().orElse(null);
    if (value == null) {
      inputs.spoil();
      return null;
    }
    Limits limits = Limits.of(value);
    if (value.of().isEmpty()) {
      return new StartRange(limits.low(), limits.high(), false);
    }
    Optional<Toleranced> supply =
        Optional.ofNullable(model.linked().supplies().get(value.of().get()))
            .flatMap(s -> s.value().stated());
    if (supply.isEmpty()) {
      inputs.spoil();
      return null;
    }
    Limits of = Limits.of(supply.get());
    return new StartRange(limits.low() * of.low(), limits.high() * of.high(), false);
  }

  /**
   * The channel before. Where a channel follows itself inside an order, it starts at its own
   * voltage; alone in its order, it may have stood anywhere in its range a period ago.
   */
  private StartRange previous(String name, boolean firstOfOrder, Inputs inputs) {
    boolean alone = timing.order().size() == 1;
    StartRange start =
        name.equals(model.name()) && !alone ? StartRange.own() : rangeOf(name, inputs);
    if (start == null || !firstOfOrder) {
      return start;
    }
    for (String other : othersLast) {
      StartRange range = rangeOf(other, inputs);
      if (range == null) {
        return null;
      }
      start = start.and(range);
    }
    return start;
  }

  private StartRange rangeOf(String name, Inputs inputs) {
    PinRange pin = pins.get(name);
    if (pin == null) {
      ChannelModel other = all.get(name);
      if (other == null) {
        inputs.spoil();
      } else {
        inputs.include(other.inputs());
        if (other.inputs().complete()) {
          inputs.spoil();
        }
      }
      return null;
    }
    return new StartRange(pin.nominalLow(), pin.nominalHigh(), false);
  }
}
