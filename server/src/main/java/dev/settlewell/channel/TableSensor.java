package dev.settlewell.channel;

import dev.settlewell.sensor.PiecewiseLinear;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.unit.Dimension;
import dev.settlewell.unit.Toleranced;
import java.util.List;
import java.util.Optional;

/**
 * A sensor given by points, interpolated: a voltage, a current, or a resistance to ground (or from
 * a supply).
 */
record TableSensor(
    PiecewiseLinear curve,
    Dimension output,
    int resistance,
    int from,
    int scale,
    double scaleNominal,
    int accuracy)
    implements SensorModel {

  static SensorModel bind(Part sensor, Bench bench) {
    Slot.Stated<List<Slot<Part>>> points = bench.inputs.need(sensor.list("points", Part.class));
    int resistance = bench.optional("source-resistance", sensor.quantity("resistance"), 0);
    Slot.Stated<String> supply = bench.inputs.optional(sensor.text("from"));
    int from = supply == null ? -1 : bench.supply(supply.value());
    Slot.Stated<String> proportional = bench.inputs.optional(sensor.text("proportional-to"));
    int scale = proportional == null ? -1 : bench.supply(proportional.value());
    int accuracy =
        bench.measuredError("sensor-accuracy", sensor.deviation("accuracy"), bench.measures());
    if (points == null) {
      return null;
    }
    int n = points.value().size();
    double[] x = new double[n];
    double[] y = new double[n];
    Dimension output = null;
    for (int i = 0; i < n; i++) {
      Slot.Stated<Part> point = bench.inputs.need(points.value().get(i));
      Slot.Stated<Toleranced> measured =
          point == null ? null : bench.inputs.need(point.value().quantity("measured"));
      Slot.Stated<Toleranced> given =
          point == null ? null : bench.inputs.need(point.value().quantity("output"));
      if (measured == null || given == null) {
        return null;
      }
      x[i] = measured.value().value();
      y[i] = given.value().value();
      output = given.value().unit().dimension();
    }
    if (n < 2 || !strictlyMonotone(x) || !strictlyMonotone(y)) {
      // The text's own finding says so.
      bench.inputs.spoil();
      return null;
    }
    double nominal = scale < 0 ? 1 : bench.parameters.nominals()[scale];
    return new TableSensor(
        new PiecewiseLinear(x, y), output, resistance, from, scale, nominal, accuracy);
  }

  private static boolean strictlyMonotone(double[] values) {
    double direction = Math.signum(values[values.length - 1] - values[0]);
    for (int i = 1; i < values.length; i++) {
      if (!((values[i] - values[i - 1]) * direction > 0)) {
        return false;
      }
    }
    return true;
  }

  @Override
  public Port port(double x, double[] p) {
    double y = new ExtendedCurve(curve).at(x + p[accuracy]);
    double scaled = scale < 0 ? y : y * p[scale] / scaleNominal;
    return switch (output) {
      case CURRENT -> Port.current(scaled, 0);
      case RESISTANCE -> Port.voltage(from < 0 ? 0 : p[from], Math.max(0, y));
      default -> Port.voltage(scaled, p[resistance]);
    };
  }

  @Override
  public List<Integer> resistances() {
    return List.of(resistance);
  }

  @Override
  public boolean resistanceVaries() {
    return output == Dimension.RESISTANCE;
  }

  @Override
  public double low() {
    return curve.low();
  }

  @Override
  public double high() {
    return curve.high();
  }

  @Override
  public Optional<Port> shorted(double[] p) {
    return output == Dimension.CURRENT
        ? Optional.empty()
        : Optional.of(Port.voltage(from < 0 ? 0 : p[from], 0));
  }

  @Override
  public boolean drivesCurrent() {
    return output == Dimension.CURRENT;
  }
}
