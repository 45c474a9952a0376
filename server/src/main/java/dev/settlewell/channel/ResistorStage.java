package dev.settlewell.channel;

import dev.settlewell.circuit.Element;
import dev.settlewell.circuit.Rung;
import dev.settlewell.sheet.Part;
import java.util.List;

/** A resistor in series. */
record ResistorStage(int resistor) implements StageModel.Passive {

  static StageModel bind(Part stage, Bench bench) {
    int resistor = bench.need(bench.parameters.numbered("resistor"), stage.quantity("value"));
    return resistor < 0 ? null : new ResistorStage(resistor);
  }

  @Override
  public Port after(Port before, double[] p) {
    return before.series(p[resistor]);
  }

  @Override
  public Port before(Port load, double[] p) {
    return load.series(p[resistor]);
  }

  @Override
  public void elements(double[] p, List<Element> into) {
    into.add(new Rung.Series(p[resistor]));
  }

  @Override
  public List<Integer> resistances() {
    return List.of(resistor);
  }

  @Override
  public String kind() {
    return "resistor";
  }
}
