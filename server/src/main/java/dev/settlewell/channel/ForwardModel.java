package dev.settlewell.channel;

import dev.settlewell.sensor.SelfHeating;
import java.util.List;

/**
 * The one model of a channel: measured quantity to pin voltage to code, and back to the value that
 * ideal firmware (nominal parameters) would report.
 *
 * @param settling parameter: volts by which the hold capacitor misses the pin's voltage
 * @param pickup parameter: volts at the hold capacitor from outside (interferers, noise)
 */
record ForwardModel(
    SensorModel sensor,
    List<StageModel> stages,
    Converter converter,
    int settling,
    int pickup,
    double[] nominal) {

  /** The source seen at the pin, leakage included. */
  Port pin(double x, double[] p) {
    return through(sensor.port(x, p), p);
  }

  /** The pin with another source in the sensor's place. */
  Port through(Port source, double[] p) {
    Port port = source;
    for (StageModel stage : stages) {
      port = stage.after(port, p);
    }
    return port.injected(p[converter.leakage()]);
  }

  double volts(double x, double[] p) {
    return pin(x, p).volts();
  }

  double code(double x, double[] p) {
    return converter.code(volts(x, p) + p[settling] + p[pickup], p);
  }

  /** What the firmware reports for x. */
  double reported(double x, double[] p) {
    return inverse(converter.volts(code(x, p), nominal), x);
  }

  double error(double x, double[] p) {
    return reported(x, p) - x;
  }

  /** How much the sensor's own current warms it at x, K; 0 where the sheet does not say. */
  double selfHeating(double x) {
    double perKelvin = sensor.dissipationConstant();
    if (Double.isNaN(perKelvin)) {
      return 0;
    }
    Port own = sensor.port(x, nominal);
    double driven = sensor.excitationCurrent(nominal);
    double amperes = Double.isNaN(driven) ? loopCurrent(own) : driven;
    return SelfHeating.rise(amperes * amperes * own.ohms(), perKelvin);
  }

  /** The current the path draws through the sensor. */
  private double loopCurrent(Port own) {
    Port load = Port.current(0, 0);
    for (int i = stages.size() - 1; i >= 0; i--) {
      load = stages.get(i).before(load, nominal);
    }
    return (load.v() - own.volts() * load.d()) / (own.ohms() * load.d() + load.r());
  }

  /** Slope of the nominal pin voltage, volts per measured unit. */
  double slope(double x, double step) {
    return (volts(x + step, nominal) - volts(x - step, nominal)) / (2 * step);
  }

  /**
   * The x whose nominal pin voltage is {@code volts}: the secant method from a point near it. The
   * nominal model is smooth and monotone between the points of a table, so few steps suffice.
   */
  double inverse(double volts, double near) {
    double a = near;
    double fa = volts(a, nominal) - volts;
    if (fa == 0) {
      return a;
    }
    double step = Math.max(1e-6, Math.abs(near) * 1e-6);
    double b = near + step;
    double fb = volts(b, nominal) - volts;
    for (int i = 0; i < 60 && fb != 0 && fb != fa; i++) {
      double next = b - fb * (b - a) / (fb - fa);
      a = b;
      fa = fb;
      b = next;
      fb = volts(b, nominal) - volts;
      if (Math.abs(b - a) <= 1e-14 * Math.max(Math.abs(b), Math.abs(a))) {
        break;
      }
    }
    return b;
  }
}
