package dev.settlewell.circuit;

/**
 * The converter's input during acquisition: a switch to the hold capacitor.
 *
 * @param switchOhms resistance of the closed switch in Ω, 0 or more
 * @param holdFarads hold capacitance in F, more than 0
 */
public record Sampler(double switchOhms, double holdFarads) {
  public Sampler {
    Values.requireFinite("switch resistance", switchOhms);
    Values.requirePositive("hold capacitance", holdFarads);
  }
}
