package dev.settlewell.channel;

import dev.settlewell.circuit.Element;
import dev.settlewell.circuit.Rung;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.unit.Deviation;
import dev.settlewell.unit.Toleranced;
import java.util.List;

/**
 * Two resistors to ground. Where they track each other (one part), the ratio has the tolerance and
 * the resistors have none of their own.
 *
 * @param ratio parameter: relative error of the ratio
 */
record DividerStage(int upper, int lower, int ratio) implements StageModel.Passive {

  static StageModel bind(Part stage, Bench bench) {
    String row = bench.parameters.numbered("divider");
    Slot.Stated<Deviation> tracking = bench.inputs.optional(stage.deviation("tracking"));
    int ratio = bench.parameters.add(0);
    int upper;
    int lower;
    if (tracking == null) {
      upper = bench.need(row + "-upper", stage.quantity("upper"));
      lower = bench.need(row + "-lower", stage.quantity("lower"));
    } else {
      upper = nominal(stage.quantity("upper"), bench);
      lower = nominal(stage.quantity("lower"), bench);
      bench.error(row + "-ratio", ratio, stage.deviation("tracking"), unit -> 1, false);
    }
    return upper < 0 || lower < 0 ? null : new DividerStage(upper, lower, ratio);
  }

  private static int nominal(Slot<Toleranced> slot, Bench bench) {
    Slot.Stated<Toleranced> stated = bench.inputs.need(slot);
    return stated == null
        ? -1
        : bench.parameters.add(
            "divider", Toleranced.exact(stated.value().nominal()), List.of(stated.place()));
  }

  @Override
  public Port after(Port before, double[] p) {
    Port divided = before.series(p[upper]).parallel(p[lower], 0);
    return new Port(divided.v() * (1 + p[ratio]), divided.r(), divided.d());
  }

  @Override
  public Port before(Port load, double[] p) {
    return load.parallel(p[lower], 0).series(p[upper]);
  }

  @Override
  public void elements(double[] p, List<Element> into) {
    into.add(new Rung.Series(p[upper]));
    into.add(new Rung.Parallel(p[lower]));
  }

  @Override
  public List<Integer> resistances() {
    return List.of(upper, lower);
  }

  @Override
  public String kind() {
    return "divider";
  }
}
