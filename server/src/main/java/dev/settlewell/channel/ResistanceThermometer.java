package dev.settlewell.channel;

import dev.settlewell.sensor.Curve;
import dev.settlewell.sensor.PlatinumResistor;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.unit.Deviation;
import dev.settlewell.unit.Tolerance;
import dev.settlewell.unit.Toleranced;
import java.util.List;
import java.util.Optional;

/**
 * A platinum resistance thermometer to IEC 60751, driven by a current or by a pull-up of the path.
 *
 * @param leads parameter: resistance of the leads that the measurement sees
 * @param mismatch parameter: what three-wire compensation leaves
 * @param excitation parameter; -1 where the path's pull-up drives it
 */
record ResistanceThermometer(
    Curve ratio,
    int r0,
    int leads,
    int mismatch,
    int excitation,
    int accuracy,
    int tolerance,
    double dissipation)
    implements SensorModel {

  static SensorModel bind(Part sensor, Bench bench) {
    int r0 = bench.optional("rtd-r0", sensor.quantity("r0"), 100);
    int wires = sensor.number("wires").orElse(2.0).intValue();
    int leads = wires == 2 ? leads(sensor, bench) : bench.parameters.add(0);
    int mismatch = wires == 3 ? mismatch(sensor, bench) : bench.parameters.add(0);
    Slot.Stated<Toleranced> current = bench.inputs.optional(sensor.quantity("excitation"));
    int excitation = current == null ? -1 : bench.parameters.add("excitation", current);
    int accuracy =
        bench.measuredError("sensor-accuracy", sensor.deviation("accuracy"), bench.measures());
    int tolerance = tolerance(sensor, bench);
    double dissipation =
        sensor.quantity("dissipation-constant").stated().map(Toleranced::value).orElse(Double.NaN);
    return new ResistanceThermometer(
        PlatinumResistor.of(1), r0, leads, mismatch, excitation, accuracy, tolerance, dissipation);
  }

  /** Two leads in series; the sheet states one. */
  private static int leads(Part sensor, Bench bench) {
    return bench.optional("lead-resistance", sensor.quantity("lead-resistance"), 0);
  }

  private static int mismatch(Part sensor, Bench bench) {
    int index = bench.parameters.add(0);
    Slot.Stated<Deviation> stated = bench.inputs.optional(sensor.deviation("lead-mismatch"));
    if (stated == null) {
      return index;
    }
    double lead = sensor.quantity("lead-resistance").stated().map(Toleranced::value).orElse(0.0);
    double limit = 0;
    for (Tolerance t : stated.value().tolerances()) {
      limit += Math.max(t.minus(), t.plus()) * (t.isShare() ? lead : 1);
    }
    bench.parameters.add(
        Spread.of(
            "lead-mismatch",
            index,
            Extent.constant(limit),
            stated.value().basis(),
            List.of(stated.place())));
    return index;
  }

  private static int tolerance(Part sensor, Bench bench) {
    int index = bench.parameters.add(0);
    Slot.Stated<String> stated = bench.inputs.optional(sensor.text("class"));
    if (stated != null) {
      PlatinumResistor.ToleranceClass limits =
          PlatinumResistor.ToleranceClass.valueOf(stated.value());
      Extent extent =
          (x, ambient) -> {
            double limit = PlatinumResistor.tolerance(limits, x);
            return Double.isNaN(limit) ? 0 : limit;
          };
      List<Place> places = List.of(stated.place());
      bench.parameters.add(Spread.of("sensor-class", index, extent, Optional.empty(), places));
    }
    return index;
  }

  private double ohms(double x, double[] p) {
    double element = p[r0] * new ExtendedCurve(ratio).ohmsAt(x + p[accuracy] + p[tolerance]);
    return element + 2 * p[leads] + p[mismatch];
  }

  @Override
  public Port port(double x, double[] p) {
    double ohms = ohms(x, p);
    return excitation < 0 ? Port.voltage(0, ohms) : Port.voltage(p[excitation] * ohms, ohms);
  }

  @Override
  public List<Integer> resistances() {
    return List.of(r0, leads);
  }

  @Override
  public boolean resistanceVaries() {
    return true;
  }

  @Override
  public double low() {
    return ratio.low();
  }

  @Override
  public double high() {
    return ratio.high();
  }

  /**
   * Opened, its current source drives the node as far as it can: the code is that of a high node.
   */
  @Override
  public Optional<Port> open(double[] p) {
    return Optional.of(excitation < 0 ? Port.current(0, 0) : Port.current(p[excitation], 0));
  }

  @Override
  public Optional<Port> shorted(double[] p) {
    return Optional.of(Port.voltage(0, 0));
  }

  @Override
  public double dissipationConstant() {
    return dissipation;
  }

  @Override
  public double excitationCurrent(double[] p) {
    return excitation < 0 ? Double.NaN : p[excitation];
  }
}
