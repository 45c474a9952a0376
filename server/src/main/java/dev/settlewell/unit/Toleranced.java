package dev.settlewell.unit;

import java.util.Optional;
import java.util.OptionalDouble;

/**
 * A value with its errors: {@code 4.7 kΩ ±1 % ±100 ppm/K}, or its long form.
 *
 * @param nominal the value; of {@code {min, typical, max}} the typical, of {@code {max}} the max
 * @param min least value, coherent, where a long form limits it by a value (not a tolerance)
 * @param max greatest value, likewise
 * @param typicalOnly true for {@code {typical}} alone: taken as exact, and every worst case that
 *     rests on it says so
 * @param amplitude how an amplitude is meant where the text says ({@code rms}, {@code
 *     peak-to-peak}); the nominal is as written
 * @param of the name behind {@code 50 % of ref}
 */
public record Toleranced(
    Quantity nominal,
    OptionalDouble min,
    OptionalDouble max,
    boolean typicalOnly,
    Deviation deviation,
    Optional<Amplitude> amplitude,
    Optional<String> of) {

  /** How the amplitude of a sine is written. */
  public enum Amplitude {
    RMS,
    PEAK_TO_PEAK
  }

  public static Toleranced exact(Quantity quantity) {
    return new Toleranced(
        quantity,
        OptionalDouble.empty(),
        OptionalDouble.empty(),
        false,
        Deviation.NONE,
        Optional.empty(),
        Optional.empty());
  }

  public double value() {
    return nominal.value();
  }

  public Unit unit() {
    return nominal.unit();
  }

  public Toleranced with(Deviation other) {
    return new Toleranced(nominal, min, max, typicalOnly, other, amplitude, of);
  }

  /** The same value, {@code of} a name and with the meaning of its amplitude. */
  Toleranced with(Optional<String> of, Optional<Amplitude> amplitude) {
    return new Toleranced(nominal, min, max, typicalOnly, deviation, amplitude, of);
  }
}
