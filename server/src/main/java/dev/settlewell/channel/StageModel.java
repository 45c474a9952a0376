package dev.settlewell.channel;

import dev.settlewell.circuit.Element;
import java.util.List;

/** A stage of a path as the forward model and the circuit see it. */
sealed interface StageModel {

  /** What the node behind this stage looks like at DC. */
  Port after(Port before, double[] p);

  /** What the node before this stage is loaded with, given what loads the node behind it. */
  Port before(Port load, double[] p);

  /** Its part of the circuit, for the response. */
  void elements(double[] p, List<Element> into);

  /** The schema's kind, for messages. */
  String kind();

  /** Resistors, capacitors, dividers: what settles together with the hold capacitor. */
  non-sealed interface Passive extends StageModel {

    /** Parameters that are resistances. */
    default List<Integer> resistances() {
      return List.of();
    }

    /** Parameters that are capacitances. */
    default List<Integer> capacitances() {
      return List.of();
    }
  }

  /** What drives the next node by itself and hides what stands before it. */
  non-sealed interface Active extends StageModel {
    double output(Port before, double[] p);

    ActiveStage.Traits traits();
  }
}
