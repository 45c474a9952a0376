package dev.settlewell.channel;

import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.unit.Dimension;
import java.util.List;
import java.util.Optional;

/** A voltage behind a resistance; its scale may follow a supply. */
record VoltageSensor(
    Transducer line, int resistance, int accuracy, int supply, double supplyNominal)
    implements SensorModel {

  static SensorModel bind(Part sensor, Bench bench) {
    Transducer line = Transducer.of(sensor, bench, Dimension.VOLTAGE);
    int resistance = bench.optional("source-resistance", sensor.quantity("resistance"), 0);
    int accuracy =
        bench.measuredError(
            "sensor-accuracy", sensor.deviation("accuracy"), Transducer.spans(sensor, bench));
    Slot.Stated<String> proportional = bench.inputs.optional(sensor.text("proportional-to"));
    int supply = proportional == null ? -1 : bench.supply(proportional.value());
    double nominal = supply < 0 ? 1 : bench.parameters.nominals()[supply];
    return line == null ? null : new VoltageSensor(line, resistance, accuracy, supply, nominal);
  }

  @Override
  public Port port(double x, double[] p) {
    double scale = supply < 0 ? 1 : p[supply] / supplyNominal;
    return Port.voltage(line.output(x + p[accuracy]) * scale, p[resistance]);
  }

  @Override
  public List<Integer> resistances() {
    return List.of(resistance);
  }

  @Override
  public Optional<Port> shorted(double[] p) {
    return Optional.of(Port.voltage(0, 0));
  }
}
