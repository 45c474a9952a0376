package dev.settlewell.circuit;

/** What an amplifier's limited slew rate costs when the hold capacitor kicks its output. */
public final class Slewing {
  private Slewing() {}

  /**
   * The step that reaches an amplifier's output when the hold capacitor is connected, per volt by
   * which it starts away from the pin: an upper bound.
   *
   * <p>At first the pin's capacitance shares its charge with the hold capacitor, C_hold / (C_pin +
   * C_hold); the rest divides between the resistances on the way and the amplifier's output
   * resistance R_o, R_o / (R_o + R), for the loop has not answered yet. Capacitors on the way only
   * lower it; they are left out, and so are the resistors to fixed potentials.
   *
   * @param outputOhms open-loop output resistance R_o in Ω
   * @param rungs from the amplifier's output to the pin
   * @return between 0 and 1
   */
  public static double outputStep(double outputOhms, Iterable<Rung> rungs, Sampler sampler) {
    double series = 0;
    double pinFarads = 0;
    for (Rung rung : rungs) {
      if (rung instanceof Rung.Series resistor && resistor.ohms() > 0) {
        series += resistor.ohms();
        pinFarads = 0;
      } else if (rung instanceof Rung.Capacitor capacitor) {
        pinFarads += capacitor.farads();
      }
    }
    // With a capacitor at the pin the switch only delays the sharing; without, it divides too.
    if (pinFarads == 0) {
      series += sampler.switchOhms();
    }
    double shared = sampler.holdFarads() / (sampler.holdFarads() + pinFarads);
    return outputOhms == 0 ? 0 : shared * outputOhms / (outputOhms + series);
  }

  /**
   * Time that a slew-limited step costs beyond linear settling.
   *
   * <p>A one-pole loop of bandwidth f_cl answers a step ΔV with a slope of at most 2 π f_cl ΔV. As
   * long as that exceeds the slew rate SR, i.e. until only SR/(2 π f_cl) is left, the output moves
   * at SR; from there on it settles linearly: t = (ΔV - SR/(2 π f_cl)) / SR.
   *
   * @param step ΔV at the amplifier's output in V, of either sign
   * @param slewRate SR in V/s, more than 0; infinity where there is no limit
   * @param hertz closed-loop bandwidth f_cl in Hz, more than 0
   * @return in s, 0 where the step stays linear
   */
  public static double time(double step, double slewRate, double hertz) {
    if (!(slewRate > 0) || !(hertz > 0)) {
      throw new IllegalArgumentException("slew rate and bandwidth must be more than 0");
    }
    double linear = slewRate / (2 * Math.PI * hertz);
    return Math.abs(step) <= linear ? 0 : (Math.abs(step) - linear) / slewRate;
  }
}
