package dev.settlewell.circuit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.apache.commons.math3.util.FastMath;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class AveragingTest {
  /**
   * A mean over 20 ms keeps 1 % of mains that is off by 1 %, 0.1 % of mains off by 0.1 %: 40 dB and
   * 60 dB (common practice: the null of sin x / x has the slope 1).
   */
  @ParameterizedTest
  @CsvSource({"0.01, 40", "0.001, 60"})
  void mainsNullIsNarrow(double tolerance, double decibel) {
    double low = 50 * (1 - tolerance);
    double high = 50 * (1 + tolerance);
    double worst = Averaging.worstEvenGain(low, high, 50e3, 50e3, 1000);
    assertThat(-20 * FastMath.log10(worst)).isCloseTo(decibel, within(0.15));
  }

  /** The clock's tolerance counts like the line's: 1 % and 1 % leak twice as much as 1 % alone. */
  @Test
  void clockWidensTheLeak() {
    double line = Averaging.worstEvenGain(49.5, 50.5, 800, 800, 16);
    double both = Averaging.worstEvenGain(49.5, 50.5, 792, 808, 16);
    assertThat(both / line).isCloseTo(2, within(0.05));
  }

  /** A mean over one period has its first null there; half as many samples null the double. */
  @Test
  void nullsAndImages() {
    assertThat(Averaging.evenGain(50, 800, 16)).isLessThan(1e-15);
    assertThat(Averaging.evenGain(150, 800, 16)).isLessThan(1e-15);
    assertThat(Averaging.evenGain(850, 800, 16)).isLessThan(1e-15);
    assertThat(Averaging.evenGain(800, 800, 16)).isEqualTo(1);
    assertThat(Averaging.evenGain(800 * 1e6, 800, 16)).isEqualTo(1);
    assertThat(Averaging.evenGain(0, 800, 16)).isEqualTo(1);
    assertThat(Averaging.evenGain(800 + 1e-9, 800, 16)).isCloseTo(1, within(1e-12));
  }

  /**
   * The continuous rectangular window, sin x / x, is the limit of many samples: Analog Devices
   * MT-017: -3.92 dB at half the rate of windows, -2.42 dB at 0.8 of it.
   */
  @ParameterizedTest
  @CsvSource({"0.5, -3.92", "0.4, -2.42"})
  void manySamplesApproachTheContinuousWindow(double hertz, double decibel) {
    int count = 100_000;
    assertThat(20 * FastMath.log10(Averaging.evenGain(hertz, count, count)))
        .isCloseTo(decibel, within(0.005));
  }

  @Test
  void evenInstantsGiveTheEvenGain() {
    Random random = new Random(11);
    for (int trial = 0; trial < 300; trial++) {
      int count = 1 + random.nextInt(40);
      double rate = FastMath.pow(10, 4 * random.nextDouble());
      double hertz = rate * 5 * random.nextDouble();
      double[] instants = new double[count];
      for (int i = 0; i < count; i++) {
        instants[i] = 0.3 + i / rate;
      }
      assertThat(Averaging.gain(hertz, instants))
          .isCloseTo(Averaging.evenGain(hertz, rate, count), within(1e-9));
    }
  }

  /** Two visits a quarter period apart: |1 + exp(-j pi/2)|/2 = 1/sqrt 2. */
  @Test
  void unevenInstants() {
    assertThat(Averaging.gain(50, new double[] {1, 1.005}))
        .isCloseTo(FastMath.sqrt(0.5), within(1e-12));
    assertThat(Averaging.gain(50, new double[] {1, 1.01})).isLessThan(1e-12);
    assertThat(Averaging.gain(50, new double[] {7})).isEqualTo(1);
  }

  /** Dense stepping never finds more than the closed form, and comes close to it. */
  @Test
  void worstGainAgainstDenseStepping() {
    for (int seed = 0; seed < 400; seed++) {
      Random random = new Random(seed);
      int count = 1 + random.nextInt(24);
      double lowRate = 100 * (1 + random.nextDouble());
      double highRate = lowRate * (1 + (random.nextBoolean() ? 0 : 0.04 * random.nextDouble()));
      double lowHertz = 600 * random.nextDouble();
      double highHertz = lowHertz + 90 * random.nextDouble() * random.nextDouble();
      double worst = Averaging.worstEvenGain(lowHertz, highHertz, lowRate, highRate, count);
      double stepped = 0;
      for (int i = 0; i <= 60; i++) {
        double rate = lowRate + (highRate - lowRate) * i / 60;
        for (int k = 0; k <= 120; k++) {
          double hertz = lowHertz + (highHertz - lowHertz) * k / 120;
          stepped = Math.max(stepped, Averaging.evenGain(hertz, rate, count));
        }
      }
      assertThat(stepped).as("seed %d", seed).isLessThanOrEqualTo(worst + 1e-12);
      assertThat(stepped).as("seed %d", seed).isGreaterThan(worst - 0.03);
    }
  }

  /** 380 kHz +-10 % holds some 12,000 multiples of 6.25 Hz: one of them comes through whole. */
  @Test
  void wideSpanIsOneAtOnce() {
    assertThat(Averaging.worstEvenGain(342e3, 418e3, 6.25, 6.25, 16)).isEqualTo(1);
  }

  /** One period of 50 Hz at 800 samples a second takes 16; half of it does for its double. */
  @Test
  void smallestCountThatNulls() {
    assertThat(Averaging.countFor(1e-9, 50, 50, 800, 800, 64)).hasValue(16);
    assertThat(Averaging.countFor(1e-9, 100, 100, 800, 800, 64)).hasValue(8);
    // 20 ms of mains off by 1 % keep 1 %; a little less time keeps more.
    int count = Averaging.countFor(0.0103, 49.5, 50.5, 5e3, 5e3, 200).orElseThrow();
    assertThat(count).isBetween(99, 100);
    assertThat(Averaging.countFor(0.5, 799, 801, 800, 800, 64)).isEmpty();
    assertThat(Averaging.countFor(1e-9, 49.5, 50.5, 800, 800, 64)).isEmpty();
  }

  @Test
  void worstGainOfUnevenVisitsAgainstDenseStepping() {
    for (int seed = 0; seed < 200; seed++) {
      Random random = new Random(seed);
      double[] phases = {0, 0.9 * random.nextDouble()};
      int scans = 1 + random.nextInt(12);
      double lowRate = 100 * (1 + random.nextDouble());
      double highRate = lowRate * (1 + (random.nextBoolean() ? 0 : 0.03 * random.nextDouble()));
      double lowHertz = 500 * random.nextDouble();
      double highHertz = lowHertz + (random.nextBoolean() ? 0 : 200 * random.nextDouble());
      double worst = Averaging.worstGain(lowHertz, highHertz, lowRate, highRate, phases, scans);
      double[] shares = new double[2 * scans];
      for (int i = 0; i < scans; i++) {
        shares[2 * i] = i;
        shares[2 * i + 1] = i + phases[1];
      }
      double stepped = 0;
      double low = lowHertz / highRate;
      double high = highHertz / lowRate;
      for (int i = 0; i <= 4000; i++) {
        stepped = Math.max(stepped, Averaging.gain(low + (high - low) * i / 4000, shares));
      }
      assertThat(worst).as("seed %d", seed).isCloseTo(stepped, within(0.01));
    }
  }

  @Test
  void evenVisitsWithinAScanAreAHigherRate() {
    double[] phases = {0.1, 0.6};
    assertThat(Averaging.worstGain(49, 51, 400, 400, phases, 8))
        .isEqualTo(Averaging.worstEvenGain(49, 51, 800, 800, 16));
    // The scan rate itself is nulled by two visits half a scan apart, its double is not.
    assertThat(Averaging.worstGain(400, 400, 400, 400, phases, 8)).isLessThan(1e-12);
    assertThat(Averaging.worstGain(800, 800, 400, 400, phases, 8)).isEqualTo(1);
    assertThat(Averaging.worstGain(0, 1e6, 10, 10, new double[] {0, 0.3}, 8)).isEqualTo(1);
  }

  /** The recursion run on a cosine, and on white noise of known variance. */
  @Test
  void exponentialAverageAgainstItsRecursion() {
    double share = 0.125;
    Random random = new Random(5);
    double real = 0;
    double imaginary = 0;
    double noise = 0;
    double squares = 0;
    double w = 2 * FastMath.PI * 37 / 200;
    for (int n = 0; n < 400_000; n++) {
      real += share * (FastMath.cos(w * n) - real);
      imaginary += share * (FastMath.sin(w * n) - imaginary);
      noise += share * (random.nextGaussian() - noise);
      squares += noise * noise;
    }
    assertThat(Averaging.exponentialGain(37, 200, share))
        .isCloseTo(FastMath.hypot(real, imaginary), within(1e-9));
    assertThat(Averaging.exponentialGain(200, 200, share)).isEqualTo(1);
    assertThat(Averaging.exponentialNoise(share))
        .isCloseTo(Math.sqrt(squares / 400_000), within(0.003));
  }

  /** White noise averages by the square root, slow noise not at all; between them a simulation. */
  @Test
  void noiseThatRemembers() {
    assertThat(Averaging.noise(Double.POSITIVE_INFINITY, 100, 16)).isEqualTo(0.25);
    assertThat(Averaging.noise(1e-9, 100, 16)).isCloseTo(1, within(1e-6));
    // One pole at 10 Hz sampled at 100/s: a first-order autoregression with exp(-2 pi 10/100).
    double memory = FastMath.exp(-2 * FastMath.PI * 0.1);
    Random random = new Random(6);
    double value = random.nextGaussian();
    double squares = 0;
    for (int mean = 0; mean < 40_000; mean++) {
      double sum = 0;
      for (int i = 0; i < 16; i++) {
        sum += value;
        value = memory * value + Math.sqrt(1 - memory * memory) * random.nextGaussian();
      }
      squares += sum * sum / 256;
    }
    assertThat(Averaging.noise(10 * FastMath.PI / 2, 100, 16))
        .isCloseTo(Math.sqrt(squares / 40_000), within(0.006));
  }
}
