package dev.settlewell.channel;

import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.unit.Dimension;
import dev.settlewell.unit.Toleranced;
import java.util.List;
import java.util.Optional;

/** A current source, perhaps with a resistance in parallel; its scale may follow a supply. */
record CurrentSensor(
    Transducer line, int resistance, int accuracy, int supply, double supplyNominal)
    implements SensorModel {

  static SensorModel bind(Part sensor, Bench bench) {
    Transducer line = Transducer.of(sensor, bench, Dimension.CURRENT);
    Slot.Stated<Toleranced> parallel = bench.inputs.optional(sensor.quantity("resistance"));
    int resistance = parallel == null ? -1 : bench.parameters.add("source-resistance", parallel);
    int accuracy =
        bench.measuredError(
            "sensor-accuracy", sensor.deviation("accuracy"), Transducer.spans(sensor, bench));
    Slot.Stated<String> proportional = bench.inputs.optional(sensor.text("proportional-to"));
    int supply = proportional == null ? -1 : bench.supply(proportional.value());
    double nominal = supply < 0 ? 1 : bench.parameters.nominals()[supply];
    return line == null ? null : new CurrentSensor(line, resistance, accuracy, supply, nominal);
  }

  @Override
  public Port port(double x, double[] p) {
    double scale = supply < 0 ? 1 : p[supply] / supplyNominal;
    return Port.current(
        line.output(x + p[accuracy]) * scale, resistance < 0 ? 0 : 1 / p[resistance]);
  }

  /**
   * NAMUR NE 43: a 4 to 20 mA transmitter measures from 3.8 mA to 20.5 mA and reports its own
   * failure at or below 3.6 mA or at or above 21 mA (common practice).
   */
  @Override
  public List<Double> failureCurrents() {
    boolean loop =
        Math.min(line.from(), line.to()) == 4e-3 && Math.max(line.from(), line.to()) == 20e-3;
    return loop ? List.of(3.6e-3, 21e-3) : List.of();
  }

  @Override
  public List<Integer> resistances() {
    return resistance < 0 ? List.of() : List.of(resistance);
  }

  /** A loop's wires may touch before the shunt: no current reaches it any more. */
  @Override
  public Optional<Port> shorted(double[] p) {
    return Optional.of(Port.current(0, 0));
  }

  @Override
  public boolean drivesCurrent() {
    return true;
  }
}
