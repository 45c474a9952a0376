package dev.settlewell.channel;

import dev.settlewell.sensor.Potentiometer;
import dev.settlewell.sheet.Part;
import dev.settlewell.unit.Range;
import java.util.List;
import java.util.Optional;

/** A potentiometer across a supply: the wiper's resistance is largest at mid travel. */
record PotentiometerSensor(Range spans, int resistance, int across, int accuracy)
    implements SensorModel {

  static SensorModel bind(Part sensor, Bench bench) {
    int resistance = bench.need("potentiometer-resistance", sensor.quantity("resistance"));
    int across = bench.supply(sensor.text("across"));
    Range spans = Transducer.spans(sensor, bench);
    int accuracy = bench.measuredError("sensor-accuracy", sensor.deviation("accuracy"), spans);
    return resistance < 0 || across < 0
        ? null
        : new PotentiometerSensor(spans, resistance, across, accuracy);
  }

  @Override
  public Port port(double x, double[] p) {
    double fraction = (x + p[accuracy] - spans.low()) / spans.width();
    // Beyond an end stop there is no wiper; errors ask a little beyond, and see its end.
    double travel = Math.max(0, Math.min(1, fraction));
    return Port.voltage(fraction * p[across], Potentiometer.wiperResistance(p[resistance], travel));
  }

  @Override
  public List<Integer> resistances() {
    return List.of(resistance);
  }

  @Override
  public boolean resistanceVaries() {
    return true;
  }

  @Override
  public double low() {
    return spans.low();
  }

  @Override
  public double high() {
    return spans.high();
  }

  /** The usual short: the wiper to its grounded end. */
  @Override
  public Optional<Port> shorted(double[] p) {
    return Optional.of(Port.voltage(0, 0));
  }
}
