package dev.settlewell.channel;

import dev.settlewell.sensor.Curve;
import dev.settlewell.sensor.Thermistor;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.unit.Toleranced;
import java.util.List;
import java.util.Optional;

/**
 * A thermistor between the node and ground, or between a supply and the node.
 *
 * @param r25 parameter: resistance at 25 °C
 * @param beta parameter; -1 where Steinhart-Hart coefficients give the curve, which {@code r25}
 *     then scales
 */
record ThermistorSensor(
    int r25, int beta, double r25Nominal, Curve domain, int from, int accuracy, double dissipation)
    implements SensorModel {

  static SensorModel bind(Part sensor, Bench bench) {
    Slot.Stated<List<Slot<Double>>> coefficients =
        bench.inputs.optional(sensor.list("steinhart-hart", Double.class));
    Slot.Stated<String> supply = bench.inputs.optional(sensor.text("from"));
    int from = supply == null ? -1 : bench.supply(supply.value());
    int accuracy =
        bench.measuredError("sensor-accuracy", sensor.deviation("accuracy"), bench.measures());
    double dissipation =
        sensor.quantity("dissipation-constant").stated().map(Toleranced::value).orElse(Double.NaN);
    return coefficients == null
        ? byBeta(sensor, bench, from, accuracy, dissipation)
        : bySteinhartHart(sensor, coefficients.value(), bench, from, accuracy, dissipation);
  }

  private static SensorModel byBeta(
      Part sensor, Bench bench, int from, int accuracy, double dissipation) {
    int r25 = bench.need("thermistor-r25", sensor.quantity("r25"));
    Slot.Stated<Part> beta = bench.inputs.need(sensor.part("beta"));
    int b = beta == null ? -1 : bench.need("thermistor-beta", beta.value().quantity("value"));
    if (r25 < 0 || b < 0) {
      return null;
    }
    double[] p = bench.parameters.nominals();
    return new ThermistorSensor(
        r25, b, p[r25], Thermistor.beta(p[r25], p[b]), from, accuracy, dissipation);
  }

  private static SensorModel bySteinhartHart(
      Part sensor,
      List<Slot<Double>> items,
      Bench bench,
      int from,
      int accuracy,
      double dissipation) {
    double[] abc = new double[3];
    for (int i = 0; i < 3; i++) {
      Slot.Stated<Double> item = i < items.size() ? bench.inputs.optional(items.get(i)) : null;
      if (item == null) {
        bench.inputs.spoil();
        return null;
      }
      abc[i] = item.value();
    }
    if (!(abc[1] > 0 && abc[2] >= 0)) {
      // Such a curve does not fall with temperature everywhere: the text's own finding says so.
      bench.inputs.spoil();
      return null;
    }
    Curve curve = Thermistor.steinhartHart(abc[0], abc[1], abc[2]);
    int r25 = bench.optional("thermistor-r25", sensor.quantity("r25"), curve.at(25));
    double nominal = bench.parameters.nominals()[r25];
    return new ThermistorSensor(r25, -1, nominal, curve, from, accuracy, dissipation);
  }

  private double ohms(double x, double[] p) {
    double celsius = x + p[accuracy];
    return beta >= 0
        ? new ExtendedCurve(Thermistor.beta(p[r25], p[beta])).ohmsAt(celsius)
        : new ExtendedCurve(domain).ohmsAt(celsius) * p[r25] / r25Nominal;
  }

  @Override
  public Port port(double x, double[] p) {
    return Port.voltage(from < 0 ? 0 : p[from], ohms(x, p));
  }

  @Override
  public List<Integer> resistances() {
    return List.of(r25);
  }

  @Override
  public boolean resistanceVaries() {
    return true;
  }

  @Override
  public double low() {
    return domain.low();
  }

  @Override
  public double high() {
    return domain.high();
  }

  @Override
  public Optional<Port> shorted(double[] p) {
    return Optional.of(Port.voltage(from < 0 ? 0 : p[from], 0));
  }

  @Override
  public double dissipationConstant() {
    return dissipation;
  }
}
