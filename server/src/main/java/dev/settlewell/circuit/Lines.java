package dev.settlewell.circuit;

import java.util.Comparator;
import java.util.List;
import org.apache.commons.math3.util.FastMath;

/** What the lines of an interferer add up to in the results: pure sines, whatever they are in. */
public final class Lines {
  private Lines() {}

  /**
   * A sine as the results show it.
   *
   * @param landing its frequency after sampling, in hertz
   * @param amplitude its peak, in any one unit
   */
  public record Landed(double landing, double amplitude) {}

  /**
   * RMS value of a sine, {@code A / sqrt 2}: its standard uncertainty, its phase being anything.
   */
  public static double rms(double amplitude) {
    return Math.abs(amplitude) / Math.sqrt(2);
  }

  /**
   * RMS value of the lines of one interferer. Those that land on the same frequency keep their
   * phase to each other: their amplitudes add (worst phase), then {@code / sqrt 2}. Those that land
   * apart add in power.
   *
   * @param sameWithin how near two landings count as the same, in hertz
   */
  public static double rms(List<Landed> lines, double sameWithin) {
    double squares = 0;
    double locked = 0;
    double last = Double.NEGATIVE_INFINITY;
    for (Landed line : sorted(lines)) {
      if (line.landing() - last > sameWithin) {
        squares += locked * locked / 2;
        locked = 0;
      }
      locked += Math.abs(line.amplitude());
      last = line.landing();
    }
    return Math.sqrt(squares + locked * locked / 2);
  }

  private static List<Landed> sorted(List<Landed> lines) {
    return lines.stream().sorted(Comparator.comparingDouble(Landed::landing)).toList();
  }

  /** The largest value the lines can reach together: the sum of their amplitudes. */
  public static double limit(List<Landed> lines) {
    return lines.stream().mapToDouble(line -> Math.abs(line.amplitude())).sum();
  }

  /**
   * Share of a sine's amplitude that stays a line when the instants of sampling jitter: {@code
   * exp(-(2 pi f sigma)^2 / 2)}, the characteristic function of Gaussian jitter.
   */
  public static double coherentShare(double hertz, double sigmaSeconds) {
    double radians = 2 * FastMath.PI * hertz * sigmaSeconds;
    return FastMath.exp(-radians * radians / 2);
  }

  /**
   * RMS noise that jitter makes of a sine: {@code A / sqrt 2 sqrt(1 - exp(-(2 pi f sigma)^2))}. For
   * small jitter this is slope times jitter; from 2 pi f sigma = 1 on most of the line has become
   * noise, which averaging divides by the square root of the count.
   */
  public static double jitterNoise(double hertz, double amplitude, double sigmaSeconds) {
    double radians = 2 * FastMath.PI * hertz * sigmaSeconds;
    return rms(amplitude) * Math.sqrt(-FastMath.expm1(-radians * radians));
  }
}
