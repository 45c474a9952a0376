package dev.settlewell.circuit;

import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import org.apache.commons.math3.util.FastMath;

/**
 * Random noise of a sampled signal path, as root mean square (RMS) values.
 *
 * <p>Sampling folds all noise above half the rate back into the band: what stands on the hold
 * capacitor as a whole is what each conversion sees, so every RMS value here is over all
 * frequencies. Temperatures in kelvin, densities in V/sqrt(Hz) (one-sided).
 */
public final class Noise {
  /** J/K, exact since 2019: SI Brochure, 9th edition, table 1. */
  public static final double BOLTZMANN = 1.380649e-23;

  /** Peak to peak over RMS of Gaussian noise, left at most 0.1 % of the time; common practice. */
  private static final double CREST = 6.6;

  /** Mean square of an error that is anywhere within one LSB, in LSB^2. */
  private static final double UNIFORM = 1.0 / 12;

  private Noise() {}

  /** Thermal noise that a switch leaves on a capacitor, in V: {@code sqrt(kT/C)}. */
  public static double holdCapacitor(double kelvin, double farads) {
    return Math.sqrt(BOLTZMANN * kelvin / farads);
  }

  /** Thermal noise density of a resistance (Johnson 1928, Nyquist 1928): {@code sqrt(4kTR)}. */
  public static double johnsonDensity(double kelvin, double ohms) {
    return Math.sqrt(4 * BOLTZMANN * kelvin * ohms);
  }

  /**
   * RMS value at the hold capacitor, in V, of a flat noise density in series with the source:
   * {@code e sqrt(integral |H|^2 df)}. Infinite where the path has no pole.
   */
  public static double shaped(
      double density, double sourceOhms, List<? extends Element> chain, Sampler sampler) {
    double atDc = FrequencyResponse.transfer(sourceOhms, chain, sampler, 0).abs();
    if (density == 0 || atDc == 0) {
      return 0;
    }
    return density * atDc * Math.sqrt(FrequencyResponse.noiseBandwidth(sourceOhms, chain, sampler));
  }

  /**
   * RMS value at the hold capacitor, in V, of an amplifier's own noise: its density times the noise
   * gain, through its pole and all that follows.
   *
   * @param density at the amplifier's input, V/sqrt(Hz)
   * @param noiseGain {@code 1 + |gain|} when inverting, else the gain
   */
  public static double amplifier(
      double density,
      double noiseGain,
      Amplifier amplifier,
      List<? extends Element> behind,
      Sampler sampler) {
    List<Element> chain = new ArrayList<>(behind);
    chain.add(0, new Amplifier(noiseGain, amplifier.poleHertz(), amplifier.outputOhms()));
    return shaped(density, 0, chain, sampler);
  }

  /**
   * Thermal noise of a path's resistances at its hold capacitor, in V: the square root of the
   * integral of {@code 4kT Re(Z)} over frequency, Z being what the hold capacitor's node shows
   * (Nyquist 1928). What a section before a buffer shows passes the buffer and all that follows.
   *
   * <p>For a passive path behind a switch with resistance this is {@code sqrt(kT/C_hold)}, whatever
   * the network (equipartition). A last section without any resistance is the limit of a vanishing
   * one: its capacitors in parallel. An amplifier's own noise is {@link #amplifier}. Infinite where
   * nothing limits the noise of an earlier section.
   */
  public static double thermalAtHold(
      double kelvin, double sourceOhms, List<? extends Element> chain, Sampler sampler) {
    List<Element> whole = FrequencyResponse.acquiring(chain, sampler);
    double driveOhms = sourceOhms;
    int from = 0;
    double ohmHertz = 0;
    for (int i = 0; i < whole.size(); i++) {
      if (!(whole.get(i) instanceof Rung)) {
        ohmHertz += passedOn(sourceOhms, whole, i);
        driveOhms = Spectrum.drivingOhms(whole.get(i));
        from = i + 1;
      }
    }
    List<Element> last = whole.subList(from, whole.size());
    ohmHertz +=
        Spectrum.of(driveOhms, last).hasPoles()
            ? passedOn(sourceOhms, whole, whole.size())
            : 1 / (4 * totalFarads(last));
    return Math.sqrt(4 * BOLTZMANN * kelvin * ohmHertz);
  }

  /** The integral of Re(Z) before the element {@code at}, times the power gain from there on. */
  private static double passedOn(double sourceOhms, List<Element> whole, int at) {
    List<Element> before = whole.subList(0, at);
    List<Element> behind = whole.subList(at, whole.size());
    DoubleUnaryOperator density =
        hertz -> {
          double gain = FrequencyResponse.gain(0, behind, hertz);
          double ohms = Thevenin.of(sourceOhms, before, hertz).impedance().getReal();
          return ohms * gain * gain;
        };
    Spectrum spectrum = Spectrum.of(sourceOhms, whole);
    if (!spectrum.hasPoles()) {
      return density.applyAsDouble(0) == 0 ? 0 : Double.POSITIVE_INFINITY;
    }
    double inside = density.applyAsDouble(spectrum.low()) + density.applyAsDouble(spectrum.high());
    double beyond = density.applyAsDouble(1e9 * spectrum.high());
    if (inside == 0) {
      return 0;
    }
    return beyond < 1e-9 * inside ? spectrum.integral(density) : Double.POSITIVE_INFINITY;
  }

  private static double totalFarads(List<Element> chain) {
    return chain.stream()
        .mapToDouble(e -> e instanceof Rung.Capacitor capacitor ? capacitor.farads() : 0)
        .sum();
  }

  /**
   * RMS value of the flicker noise whose peak-to-peak value from 0.1 Hz to 10 Hz is stated: a 6.6th
   * (common practice). Averaging over the usual times does not lower it.
   */
  public static double flickerRms(double peakToPeak) {
    return peakToPeak / CREST;
  }

  /** RMS error in V of sampling a slope at instants that jitter by {@code sigmaSeconds} RMS. */
  public static double jitter(double voltsPerSecond, double sigmaSeconds) {
    return Math.abs(voltsPerSecond) * sigmaSeconds;
  }

  /** RMS slope of a sine in V/s, {@code 2 pi f A / sqrt 2}, for {@link #jitter}. */
  public static double sineSlope(double hertz, double amplitude) {
    return 2 * FastMath.PI * hertz * Math.abs(amplitude) / Math.sqrt(2);
  }

  /**
   * Signal-to-noise ratio in dB that jitter leaves of a sine, {@code -20 log10(2 pi f sigma)}, for
   * small products; infinite without jitter.
   */
  public static double jitterSnr(double hertz, double sigmaSeconds) {
    return -20 * FastMath.log10(2 * FastMath.PI * hertz * sigmaSeconds);
  }

  /**
   * Signal-to-noise ratio in dB of an ideal converter and a full-scale sine, {@code 20 log10(2^N
   * sqrt(3/2))}: 6.02 N + 1.76 (Bennett 1948; Analog Devices MT-001).
   */
  public static double idealSnr(int bits) {
    return 20 * (bits * FastMath.log10(2) + FastMath.log10(1.5) / 2);
  }

  /**
   * Bits of the ideal converter whose quantization has the RMS value of all noise, quantization
   * included: {@code log2(span / (sqrt(12) rms))}.
   */
  public static double effectiveBits(double span, double rms) {
    return FastMath.log(2, span / (Math.sqrt(12) * rms));
  }

  /**
   * Standard uncertainty, in LSB, of the mean of {@code count} conversions of a constant input that
   * may lie anywhere between two codes, with Gaussian noise of {@code sigmaLsb} RMS before the
   * converter: {@code u^2 = (sigma^2 + 1/12)/M + B (1 - 1/M)}, B being the mean square of the
   * {@link #quantizerBias}.
   *
   * <p>The first term is the whole error of one conversion (noise and quantization, which are
   * uncorrelated over all inputs), of which B is common to all conversions of the mean. One
   * conversion gives {@code sqrt(sigma^2 + 1/12)}, no noise {@code sqrt(1/12)} however many are
   * averaged. Exact for every sigma. Source: Widrow and Kollar, Quantization Noise (2008), on
   * Gaussian dither.
   */
  public static double averagedQuantization(double sigmaLsb, int count) {
    double shared = meanSquareBias(sigmaLsb);
    return Math.sqrt((sigmaLsb * sigmaLsb + UNIFORM) / count + shared * (1 - 1.0 / count));
  }

  /**
   * What of quantization no averaging removes, in LSB: the amplitude of a sine that has the RMS
   * value of the bias over all inputs. From 0.25 LSB of noise on, the bias is that sine, with the
   * amplitude {@code exp(-2 pi^2 sigma^2)/pi}; with less noise its harmonics count.
   */
  public static double quantizerBias(double sigmaLsb) {
    return Math.sqrt(2 * meanSquareBias(sigmaLsb));
  }

  /**
   * Mean square over all inputs of the expected error of one conversion, in LSB^2: {@code sum over
   * k of exp(-4 pi^2 k^2 sigma^2) / (2 pi^2 k^2)}, the Fourier series of the error's sawtooth
   * smoothed by the noise. For little noise its equal by Poisson's summation, {@code 1/12 -
   * sigma/sqrt(pi) + sigma^2}, which leaves out exp(-1/(4 sigma^2)).
   */
  private static double meanSquareBias(double sigmaLsb) {
    if (sigmaLsb < 0.08) {
      return UNIFORM - sigmaLsb / FastMath.sqrt(FastMath.PI) + sigmaLsb * sigmaLsb;
    }
    double sum = 0;
    for (int k = 1; k <= 14; k++) {
      double turn = 2 * FastMath.PI * k;
      sum += 2 * FastMath.exp(-turn * turn * sigmaLsb * sigmaLsb) / (turn * turn);
    }
    return sum;
  }
}
