package dev.settlewell.circuit;

/**
 * One passive element of a ladder, seen from its present node.
 *
 * <p>Values must not be negative and not NaN: the constructors throw {@link
 * IllegalArgumentException} otherwise.
 */
public sealed interface Rung extends Element {

  /**
   * A resistor in series: begins a new node. 0 Ω keeps the node.
   *
   * @param ohms finite, 0 or more
   */
  record Series(double ohms) implements Rung {
    public Series {
      Values.requireFinite("series resistance", ohms);
    }
  }

  /**
   * A resistor from this node to a fixed potential: pull-up, pull-down, shunt, lower half of a
   * divider.
   *
   * @param ohms 0 or more; infinity is no resistor at all
   */
  record Parallel(double ohms) implements Rung {
    public Parallel {
      Values.requireNotNegative("parallel resistance", ohms);
    }
  }

  /**
   * A capacitor from this node to ground.
   *
   * @param farads finite, 0 or more
   */
  record Capacitor(double farads) implements Rung {
    public Capacitor {
      Values.requireFinite("capacitance", farads);
    }
  }
}
