package dev.settlewell.channel;

import dev.settlewell.circuit.Element;
import dev.settlewell.circuit.Rung;
import dev.settlewell.sheet.Part;
import java.util.List;

/**
 * A resistor from the node to a fixed potential: pull-up, pull-down, shunt.
 *
 * @param to parameter of the supply; -1 for ground
 */
record ParallelStage(String kind, int resistor, int to) implements StageModel.Passive {

  static StageModel pullUp(Part stage, Bench bench) {
    int resistor = bench.need(bench.parameters.numbered("pull-up"), stage.quantity("resistor"));
    int to = bench.supply(stage.text("to"));
    return resistor < 0 || to < 0 ? null : new ParallelStage("pull-up", resistor, to);
  }

  /** A pull-down and a shunt are the same circuit; their names say what they are for. */
  static StageModel toGround(Part stage, Bench bench) {
    int resistor = bench.need(bench.parameters.numbered(stage.kind()), stage.quantity("value"));
    return resistor < 0 ? null : new ParallelStage(stage.kind(), resistor, -1);
  }

  @Override
  public Port after(Port before, double[] p) {
    return before.parallel(p[resistor], to < 0 ? 0 : p[to]);
  }

  @Override
  public Port before(Port load, double[] p) {
    return load.parallel(p[resistor], to < 0 ? 0 : p[to]);
  }

  @Override
  public void elements(double[] p, List<Element> into) {
    into.add(new Rung.Parallel(p[resistor]));
  }

  @Override
  public List<Integer> resistances() {
    return List.of(resistor);
  }
}
