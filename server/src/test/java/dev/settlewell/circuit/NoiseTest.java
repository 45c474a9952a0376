package dev.settlewell.circuit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Random;
import org.apache.commons.math3.util.FastMath;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class NoiseTest {
  /** Handbook value, printed for k = 1.38e-23: 64.3 uV; 64.36 with the exact k. */
  @Test
  void holdCapacitorOfOnePicofarad() {
    assertThat(Noise.holdCapacitor(300, 1e-12)).isCloseTo(64.36e-6, within(0.005e-6));
  }

  /** Handbook value for 100 kOhm over 1 MHz: 40.69 uV; 40.70 with the exact k. */
  @Test
  void johnsonNoiseOfAHundredKilohm() {
    assertThat(Noise.johnsonDensity(300, 100e3) * 1e3).isCloseTo(40.70e-6, within(0.005e-6));
  }

  /** Analog Devices MT-047 (from memory): 1 kOhm has 4 nV/sqrt(Hz) at 25 degrees. */
  @Test
  void johnsonDensityOfAKilohm() {
    assertThat(Noise.johnsonDensity(298.15, 1e3)).isCloseTo(4.06e-9, within(0.005e-9));
  }

  /** One pole: the density times sqrt(pi/2 f_c), handbook. */
  @Test
  void whiteNoiseThroughOnePole() {
    double rms =
        Noise.shaped(10e-9, 1e3, List.of(new Amplifier(5, 1e9, 0)), new Sampler(1e3, 1e-9));
    double corner = 1 / (2 * FastMath.PI * 1e-6);
    assertThat(rms).isCloseTo(5 * 10e-9 * Math.sqrt(FastMath.PI / 2 * corner), within(2e-4 * rms));
    assertThat(Noise.shaped(0, 0, List.of(), new Sampler(0, 1e-12))).isZero();
    assertThat(Noise.shaped(1e-9, 0, List.of(), new Sampler(0, 1e-12))).isInfinite();
  }

  /** Inverting by 9: the noise gain is 10; one pole, pi/2 of its corner wide (handbook). */
  @Test
  void amplifierNoiseIsShapedByItsPole() {
    Amplifier inverting = new Amplifier(-9, 100e3, 0);
    double rms = Noise.amplifier(12e-9, 10, inverting, List.of(), new Sampler(1, 1e-15));
    double expected = 120e-9 * Math.sqrt(FastMath.PI / 2 * 100e3);
    assertThat(rms).isCloseTo(expected, within(1e-6 * expected));
    List<Element> halved = List.of(new Rung.Series(1e3), new Rung.Parallel(1e3));
    assertThat(Noise.amplifier(12e-9, 10, inverting, halved, new Sampler(1, 1e-15)))
        .isCloseTo(expected / 2, within(1e-6 * expected));
  }

  /** Equipartition: whatever the network, the hold capacitor keeps kT/2. */
  @Test
  void thermalNoiseOfAnyLadderIsThatOfItsHoldCapacitor() {
    for (int seed = 0; seed < 200; seed++) {
      Random random = new Random(seed);
      double source = random.nextInt(5) == 0 ? 0 : FrequencyResponseTest.logUniform(random, 1, 1e6);
      Sampler sampler =
          new Sampler(
              FrequencyResponseTest.logUniform(random, 10, 1e4),
              FrequencyResponseTest.logUniform(random, 1e-12, 1e-10));
      double expected = Noise.holdCapacitor(330, sampler.holdFarads());
      assertThat(
              Noise.thermalAtHold(330, source, FrequencyResponseTest.randomLadder(random), sampler))
          .as("seed %d", seed)
          .isCloseTo(expected, within(1e-8 * expected));
    }
  }

  @Test
  void thermalNoiseAtTheEdgesOfTheModel() {
    Sampler sampler = new Sampler(0, 8e-12);
    Rung pin = new Rung.Capacitor(2e-12);
    double together = Noise.holdCapacitor(300, 10e-12);
    assertThat(Noise.thermalAtHold(300, 1e3, List.of(pin), sampler))
        .isCloseTo(together, within(1e-9 * together));
    assertThat(Noise.thermalAtHold(300, 0, List.of(pin), sampler)).isEqualTo(together);
    assertThat(
            Noise.thermalAtHold(
                300, Double.POSITIVE_INFINITY, List.of(new Rung.Parallel(250), pin), sampler))
        .isCloseTo(together, within(1e-9 * together));
  }

  /**
   * An RC section before an amplifier of gain 20: kT/C of that section, 20 times larger, beside
   * kT/C of the hold capacitor (equipartition in both sections; their noise is independent).
   */
  @Test
  void thermalNoiseBeforeAnAmplifierIsAmplified() {
    List<Element> chain =
        List.of(
            new Rung.Series(5e3),
            new Rung.Capacitor(1e-9),
            new Amplifier(20, 1e12, 0),
            new Rung.Series(100));
    double before = 20 * Noise.holdCapacitor(300, 1e-9);
    double held = Noise.holdCapacitor(300, 1e-11);
    double both = Math.sqrt(before * before + held * held);
    assertThat(Noise.thermalAtHold(300, 2e3, chain, new Sampler(0, 1e-11)))
        .isCloseTo(both, within(1e-3 * both));
    // Without a capacitor the amplifier's pole limits it: sqrt(4kTR pi/2 f) (handbook).
    List<Element> bare = List.of(new Rung.Series(5e3), new Amplifier(20, 1e4, 0));
    double limited = 20 * Noise.johnsonDensity(300, 7e3) * Math.sqrt(FastMath.PI / 2 * 1e4);
    assertThat(Noise.thermalAtHold(300, 2e3, bare, new Sampler(1, 1e-9)))
        .isCloseTo(FastMath.hypot(limited, Noise.holdCapacitor(300, 1e-9)), within(1e-3 * limited));
    List<Element> ideal = List.of(new Amplifier(20, Double.POSITIVE_INFINITY, 0));
    assertThat(Noise.thermalAtHold(300, 2e3, ideal, new Sampler(0, 1e-9))).isInfinite();
    assertThat(Noise.thermalAtHold(300, 0, ideal, new Sampler(0, 1e-11))).isEqualTo(held);
    List<Element> driven = List.of(new Amplifier(20, 1e6, 50));
    assertThat(Noise.thermalAtHold(300, 0, driven, new Sampler(0, 1e-11)))
        .isCloseTo(held, within(1e-8 * held));
  }

  /** Analog Devices MT-001: 6.02 N + 1.76 dB. */
  @ParameterizedTest
  @CsvSource({"8, 49.92", "10, 61.96", "12, 74.0", "14, 86.04", "16, 98.08"})
  void idealSignalToNoise(int bits, double decibel) {
    assertThat(Noise.idealSnr(bits)).isCloseTo(decibel, within(0.02));
    double lsb = 1 / FastMath.pow(2, bits);
    assertThat(Noise.effectiveBits(1, lsb / Math.sqrt(12))).isCloseTo(bits, within(1e-12));
  }

  /**
   * Glossary figures: 100 fs RMS leave 84 dB (13.7 bits) at 100 MHz, 64 dB (10.3 bits) at 1 GHz.
   */
  @ParameterizedTest
  @CsvSource({"100e6, 84, 13.7", "1e9, 64, 10.3"})
  void jitterOfASine(double hertz, double decibel, double bits) {
    double snr = Noise.jitterSnr(hertz, 100e-15);
    assertThat(snr).isCloseTo(decibel, within(0.5));
    assertThat((snr - 1.76) / 6.02).isCloseTo(bits, within(0.05));
    double rms = Noise.jitter(Noise.sineSlope(hertz, 1), 100e-15);
    assertThat(-20 * FastMath.log10(rms * Math.sqrt(2))).isCloseTo(snr, within(1e-9));
  }

  /**
   * Widrow and Kollar, Quantization Noise (2008; from memory): amplitude of the bias of an averaged
   * quantizer under Gaussian noise.
   */
  @ParameterizedTest
  @CsvSource({"0.25, 0.0927, 5e-5", "0.3, 0.0539, 5e-5", "0.4, 0.0135, 5e-5", "0.5, 0.00229, 5e-6"})
  void biasOfAnAveragedQuantizer(double sigma, double bias, double tolerance) {
    assertThat(Noise.quantizerBias(sigma)).isCloseTo(bias, within(tolerance));
  }

  /** Averaging 4^n samples gains n bits, with noise enough (vendor application notes). */
  @ParameterizedTest
  @CsvSource({"4, 1", "16, 2", "64, 3", "256, 4", "1024, 5"})
  void oversamplingGainsABitForEachFactorOfFour(int samples, int bits) {
    double one = Noise.averagedQuantization(1, 1);
    double many = Noise.averagedQuantization(1, samples);
    assertThat(FastMath.log(2, one / many)).isCloseTo(bits, within(1e-4));
  }

  @Test
  void averagedQuantizationAtItsLimits() {
    double uniform = Math.sqrt(1.0 / 12);
    assertThat(Noise.averagedQuantization(0, 1)).isCloseTo(uniform, within(1e-15));
    assertThat(Noise.averagedQuantization(0, 1000)).isCloseTo(uniform, within(1e-15));
    assertThat(Noise.averagedQuantization(0.37, 1))
        .isCloseTo(Math.sqrt(0.37 * 0.37 + 1.0 / 12), within(1e-15));
    // The two forms of the bias meet.
    double below = Noise.quantizerBias(FastMath.nextDown(0.08));
    assertThat(Noise.quantizerBias(0.08)).isCloseTo(below, within(1e-12));
  }

  /** Rounding done and averaged, inputs anywhere between two codes: 100,000 means a case. */
  @ParameterizedTest
  @CsvSource({
    "0, 16",
    "0.05, 16",
    "0.1, 16",
    "0.15, 4",
    "0.2, 1",
    "0.2, 16",
    "0.3, 16",
    "0.4, 16",
    "0.5, 16",
    "0.2, 100"
  })
  void averagedQuantizationAgainstSimulation(double sigma, int count) {
    Random random = new Random(2026);
    int means = 100_000;
    double squares = 0;
    for (int i = 0; i < means; i++) {
      double input = random.nextDouble();
      double sum = 0;
      for (int k = 0; k < count; k++) {
        sum += Math.rint(input + sigma * random.nextGaussian());
      }
      double error = sum / count - input;
      squares += error * error;
    }
    double simulated = Math.sqrt(squares / means);
    assertThat(Noise.averagedQuantization(sigma, count))
        .isCloseTo(simulated, within(0.008 * simulated));
  }

  /**
   * The usual approximation sqrt((sigma^2 + 1/12)/M + b^2/2), computed with SciPy for M = 16,
   * counts the common part twice: it lies above the exact value, by 2 % at most here.
   */
  @ParameterizedTest
  @CsvSource({"0.2, 0.135", "0.3, 0.111", "0.4, 0.124", "0.5, 0.144"})
  void averagedQuantizationAgainstTheUsualApproximation(double sigma, double published) {
    assertThat(Noise.averagedQuantization(sigma, 16))
        .isBetween(0.98 * published, published + 0.0005);
  }
}
