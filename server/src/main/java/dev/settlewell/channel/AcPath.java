package dev.settlewell.channel;

import dev.settlewell.circuit.Element;
import dev.settlewell.circuit.Rung;
import dev.settlewell.circuit.Sampler;
import java.util.ArrayList;
import java.util.List;

/**
 * A channel's path for alternating signals, from a voltage in series with the sensor to the hold
 * capacitor.
 *
 * @param ohms of the source; of a current source and its shunt together
 */
record AcPath(double ohms, List<Element> chain, Sampler sampler) {

  /**
   * @param p parameters
   * @param pinFarads capacitance of the pin
   */
  static AcPath of(ChannelModel model, double x, double[] p, double pinFarads, Sampler sampler) {
    ForwardModel forward = model.forward();
    Port source = forward.sensor().port(x, p);
    List<Element> chain = new ArrayList<>();
    boolean folded = !forward.sensor().drivesCurrent();
    for (StageModel stage : forward.stages()) {
      if (!folded && stage instanceof ParallelStage) {
        source = stage.after(source, p);
        folded = true;
      } else {
        stage.elements(p, chain);
      }
    }
    if (pinFarads > 0) {
      chain.add(new Rung.Capacitor(pinFarads));
    }
    return new AcPath(source.ohms(), chain, sampler);
  }
}
