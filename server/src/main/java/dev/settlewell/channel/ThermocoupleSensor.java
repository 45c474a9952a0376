package dev.settlewell.channel;

import dev.settlewell.sensor.Curve;
import dev.settlewell.sensor.Thermocouple;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.unit.Deviation;
import dev.settlewell.unit.Range;
import java.util.List;
import java.util.Optional;

/**
 * A thermocouple by its ITS-90 reference function. Firmware measures the cold junction and adds its
 * emf before it inverts, so only the error of that measurement remains.
 *
 * @param junction parameter: true temperature of the cold junction, °C
 */
record ThermocoupleSensor(
    Thermocouple.Type type, Curve curve, int junction, int accuracy, int tolerance)
    implements SensorModel {

  static SensorModel bind(Part sensor, Bench bench) {
    Slot.Stated<String> type = bench.inputs.need(sensor.text("type"));
    Slot.Stated<Part> cold = bench.inputs.need(sensor.part("cold-junction"));
    if (type == null || cold == null) {
      return null;
    }
    int junction = junction(cold.value(), bench);
    int accuracy =
        bench.measuredError("sensor-accuracy", sensor.deviation("accuracy"), bench.measures());
    Thermocouple.Type letter = Thermocouple.Type.valueOf(type.value());
    int tolerance = tolerance(sensor, letter, bench);
    return new ThermocoupleSensor(letter, Thermocouple.of(letter), junction, accuracy, tolerance);
  }

  private static int junction(Part cold, Bench bench) {
    Slot.Stated<Range> range = bench.inputs.need(cold.range("range"));
    Slot.Stated<Deviation> accuracy = bench.inputs.need(cold.deviation("accuracy"));
    if (range == null || accuracy == null) {
      return bench.parameters.add(25);
    }
    double middle = (range.value().low() + range.value().high()) / 2;
    int index = bench.parameters.add(middle);
    double limit =
        accuracy.value().tolerances().stream()
            .mapToDouble(t -> Math.max(t.minus(), t.plus()))
            .sum();
    bench.parameters.add(
        Spread.of(
            "cold-junction",
            index,
            Extent.constant(limit),
            accuracy.value().basis(),
            List.of(accuracy.place())));
    bench.parameters.known(index, range.value().low(), range.value().high());
    return index;
  }

  private static int tolerance(Part sensor, Thermocouple.Type type, Bench bench) {
    int index = bench.parameters.add(0);
    Slot.Stated<String> stated = bench.inputs.optional(sensor.text("class"));
    if (stated != null) {
      int number = Integer.parseInt(stated.value());
      Extent extent =
          (x, ambient) -> {
            double limit = Thermocouple.toleranceLimit(type, number, x);
            return Double.isNaN(limit) ? 0 : limit;
          };
      List<Place> places = List.of(stated.place());
      bench.parameters.add(Spread.of("sensor-class", index, extent, Optional.empty(), places));
    }
    return index;
  }

  @Override
  public Port port(double x, double[] p) {
    double hot = new ExtendedCurve(curve).at(x + p[accuracy] + p[tolerance]);
    return Port.voltage(hot - Thermocouple.emf(type, p[junction]), 0);
  }

  @Override
  public double low() {
    return curve.low();
  }

  @Override
  public double high() {
    return curve.high();
  }

  /**
   * Shorted on the way it is a thermocouple where the short is: no code tells that, whatever the
   * path, so it is not asked for.
   */
  @Override
  public Optional<Port> shorted(double[] p) {
    return Optional.empty();
  }
}
