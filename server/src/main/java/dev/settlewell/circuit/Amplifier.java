package dev.settlewell.circuit;

/**
 * An amplifier in a signal path: it loads nothing before it, has one pole, and drives what follows
 * through its closed-loop output impedance.
 *
 * <p>Gain {@code A / (1 + j f/f_cl)}; output impedance R_o in parallel with L = R_o/(2 pi f_cl), as
 * in {@link Drive.ClosedLoop}: the loop holds the output at DC and lets go of it towards f_cl.
 *
 * @param gain at DC, negative when inverting, finite
 * @param poleHertz f_cl, more than 0; infinity is an ideal amplifier, without output impedance
 * @param outputOhms R_o, open-loop output resistance, 0 or more
 */
public record Amplifier(double gain, double poleHertz, double outputOhms) implements Element {
  public Amplifier {
    Values.requireFinite("magnitude of the gain", Math.abs(gain));
    Values.requireNotNegative("pole", poleHertz);
    if (poleHertz == 0) {
      throw new IllegalArgumentException("pole must be more than 0");
    }
    Values.requireFinite("output resistance", outputOhms);
  }
}
