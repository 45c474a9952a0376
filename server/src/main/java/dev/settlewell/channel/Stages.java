package dev.settlewell.channel;

import dev.settlewell.sheet.Part;
import java.util.Map;
import java.util.Set;
import java.util.function.BiFunction;

/** The kinds of stage, by the schema's names. */
final class Stages {
  private static final Map<String, BiFunction<Part, Bench, StageModel>> KINDS =
      Map.of(
          "resistor", ResistorStage::bind,
          "capacitor", CapacitorStage::bind,
          "divider", DividerStage::bind,
          "pull-up", ParallelStage::pullUp,
          "pull-down", ParallelStage::toGround,
          "shunt", ParallelStage::toGround,
          "amplifier", ActiveStage::amplifier,
          "filter", ActiveStage::filter);

  private Stages() {}

  static Set<String> kinds() {
    return KINDS.keySet();
  }

  /** Null with a note on the bench where something it needs is missing or wrong. */
  static StageModel bind(Part stage, Bench bench) {
    BiFunction<Part, Bench, StageModel> kind = KINDS.get(stage.kind());
    if (kind == null) {
      // Read, not computed yet: a path with it cannot be judged.
      bench.inputs.spoil();
      return null;
    }
    return kind.apply(stage, bench);
  }
}
