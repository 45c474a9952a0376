package dev.settlewell.circuit;

/**
 * What drives a ladder: its incremental source impedance. The source's voltage is not part of it.
 */
public sealed interface Drive {

  /**
   * A source behind a resistance.
   *
   * @param ohms Thevenin resistance; 0 is an ideal voltage source, infinity an ideal current source
   *     (a {@link Rung.Parallel} must then give it a path)
   */
  record Resistive(double ohms) implements Drive {
    public Resistive {
      Values.requireNotNegative("source resistance", ohms);
    }
  }

  /**
   * An amplifier's closed-loop output impedance: R_o in parallel with L = R_o/(2 π f_cl), the usual
   * one-pole model (the loop gain of a dominant-pole amplifier falls as 1/f and holds the output up
   * to f_cl; common practice). No second pole and no current limit.
   *
   * @param outputOhms R_o, open-loop output resistance in Ω; 0 is an ideal voltage source
   * @param hertz f_cl = gain-bandwidth product / noise gain, more than 0; infinity is an ideal
   *     voltage source
   */
  record ClosedLoop(double outputOhms, double hertz) implements Drive {
    public ClosedLoop {
      Values.requireFinite("output resistance", outputOhms);
      if (!(hertz > 0)) {
        throw new IllegalArgumentException(
            "closed-loop bandwidth must be more than 0, not " + hertz);
      }
    }
  }
}
