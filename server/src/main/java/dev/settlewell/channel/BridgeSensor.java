package dev.settlewell.channel;

import dev.settlewell.sensor.Bridge;
import dev.settlewell.sheet.Part;
import dev.settlewell.unit.Range;
import java.util.List;
import java.util.Optional;

/** A resistive bridge: its output is a share of its excitation, full at the end of its span. */
record BridgeSensor(Range spans, int sensitivity, int excitation, int resistance, int accuracy)
    implements SensorModel {

  static SensorModel bind(Part sensor, Bench bench) {
    int sensitivity = bench.need("bridge-sensitivity", sensor.quantity("sensitivity"));
    int excitation = bench.supply(sensor.text("excitation"));
    int resistance = bench.optional("source-resistance", sensor.quantity("resistance"), 0);
    Range spans = Transducer.spans(sensor, bench);
    int accuracy = bench.measuredError("sensor-accuracy", sensor.deviation("accuracy"), spans);
    return sensitivity < 0 || excitation < 0
        ? null
        : new BridgeSensor(spans, sensitivity, excitation, resistance, accuracy);
  }

  @Override
  public Port port(double x, double[] p) {
    // A span through zero is that of a cell that is pulled and pushed: balanced at zero.
    double balanced = spans.low() < 0 && spans.high() > 0 ? 0 : spans.low();
    double fraction = (x + p[accuracy] - balanced) / (spans.high() - balanced);
    return Port.voltage(Bridge.output(p[sensitivity], p[excitation], fraction), p[resistance]);
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
