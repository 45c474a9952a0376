package dev.settlewell.channel;

import dev.settlewell.circuit.Element;
import dev.settlewell.circuit.Rung;
import dev.settlewell.sheet.Part;
import java.util.List;

/** A capacitor from the node to ground: nothing at DC. */
record CapacitorStage(int capacitor) implements StageModel.Passive {

  static StageModel bind(Part stage, Bench bench) {
    int capacitor = bench.need(bench.parameters.numbered("capacitor"), stage.quantity("value"));
    return capacitor < 0 ? null : new CapacitorStage(capacitor);
  }

  @Override
  public Port after(Port before, double[] p) {
    return before;
  }

  @Override
  public Port before(Port load, double[] p) {
    return load;
  }

  @Override
  public void elements(double[] p, List<Element> into) {
    into.add(new Rung.Capacitor(p[capacitor]));
  }

  @Override
  public List<Integer> capacitances() {
    return List.of(capacitor);
  }

  @Override
  public String kind() {
    return "capacitor";
  }
}
