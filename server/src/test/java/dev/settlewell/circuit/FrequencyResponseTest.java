package dev.settlewell.circuit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.apache.commons.math3.complex.Complex;
import org.apache.commons.math3.complex.ComplexField;
import org.apache.commons.math3.linear.Array2DRowFieldMatrix;
import org.apache.commons.math3.linear.ArrayFieldVector;
import org.apache.commons.math3.linear.FieldLUDecomposition;
import org.apache.commons.math3.util.FastMath;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;

class FrequencyResponseTest {
  private static final double R = 1e3;
  private static final double C = 1e-9;
  private static final double POLE = 1 / (2 * FastMath.PI * R * C);

  /**
   * Two equal RC sections that load each other, |1/((jx)^2 + 3jx + 1)| at x = 1, are 9.54 dB down;
   * with a buffer between them 6.02 dB (exact).
   */
  @Test
  void sectionsLoadEachOther() {
    List<Element> loaded =
        List.of(
            new Rung.Series(R), new Rung.Capacitor(C), new Rung.Series(R), new Rung.Capacitor(C));
    List<Element> buffered = new ArrayList<>(loaded);
    buffered.add(2, new Amplifier(1, Double.POSITIVE_INFINITY, 0));
    assertThat(decibel(FrequencyResponse.gain(0, loaded, POLE))).isCloseTo(-9.54, within(0.005));
    assertThat(decibel(FrequencyResponse.gain(0, buffered, POLE))).isCloseTo(-6.02, within(0.005));
  }

  @Test
  void samplerIsOneMoreSection() {
    Complex atHold =
        FrequencyResponse.transfer(R, List.of(new Rung.Capacitor(C)), new Sampler(R, C), POLE);
    assertThat(decibel(atHold.abs())).isCloseTo(-9.54, within(0.005));
    assertThat(FrequencyResponse.gains(R, List.of(), new Sampler(0, C), new double[] {0, POLE}))
        .containsExactly(new double[] {1, FastMath.sqrt(0.5)}, within(1e-12));
  }

  @Test
  void gainIsAbsoluteAndRelativeGainIsAgainstDc() {
    List<Element> divider =
        List.of(new Rung.Series(9e3), new Rung.Parallel(1e3), new Rung.Capacitor(C));
    double corner = FrequencyResponse.corner(0, divider).orElseThrow();
    assertThat(corner).isCloseTo(1 / (2 * FastMath.PI * 900 * C), within(1e-6 * corner));
    assertThat(FrequencyResponse.gain(0, divider, 0)).isCloseTo(0.1, within(1e-15));
    assertThat(FrequencyResponse.relativeGain(0, divider, 0)).isEqualTo(1);
    assertThat(FrequencyResponse.relativeGain(0, divider, corner))
        .isCloseTo(FastMath.sqrt(0.5), within(1e-12));
  }

  @Test
  void pathsWithoutCornerOrWithoutSignal() {
    List<Element> resistive = List.of(new Rung.Series(10), new Rung.Parallel(90));
    assertThat(FrequencyResponse.corner(0, resistive)).isEmpty();
    assertThat(FrequencyResponse.noiseBandwidth(0, resistive)).isInfinite();
    // A capacitor across an ideal source does nothing, even with a resistor behind it.
    List<Element> idle = List.of(new Rung.Capacitor(C), new Rung.Series(R));
    assertThat(FrequencyResponse.corner(0, idle)).isEmpty();
    assertThat(FrequencyResponse.noiseBandwidth(0, idle)).isInfinite();
    List<Element> shorted =
        List.of(new Rung.Series(R), new Rung.Parallel(0), new Rung.Capacitor(C));
    assertThat(FrequencyResponse.gain(0, shorted, 1e3)).isZero();
    assertThat(FrequencyResponse.corner(0, shorted)).isEmpty();
    assertThat(FrequencyResponse.noiseBandwidth(0, shorted)).isZero();
    List<Element> shunted = List.of(new Rung.Parallel(R), new Rung.Capacitor(C));
    assertThat(FrequencyResponse.gain(Double.POSITIVE_INFINITY, shunted, 1e3)).isZero();
  }

  /** Handbook table of noise bandwidth over the -3 dB corner, see the file. */
  @ParameterizedTest
  @CsvFileSource(
      resources = "/dev/settlewell/circuit/noise-bandwidth-factors.csv",
      numLinesToSkip = 3)
  void noiseBandwidths(int order, double butterworth, double againstTotal, double againstPole) {
    if (order <= LowPass.LARGEST_ORDER) {
      List<Element> filter = List.of(new ActiveFilter(-3, LowPass.butterworth(order, 70), 0));
      assertThat(FrequencyResponse.noiseBandwidth(5, filter) / 70)
          .isCloseTo(butterworth, within(6e-7));
      assertThat(FrequencyResponse.corner(5, filter).orElseThrow()).isCloseTo(70, within(1e-8));
    }
    List<Element> cascade = new ArrayList<>();
    for (int k = 0; k < order; k++) {
      cascade.add(new Amplifier(2, 1e4, 0));
    }
    double bandwidth = FrequencyResponse.noiseBandwidth(0, cascade);
    assertThat(bandwidth / 1e4).isCloseTo(againstPole, within(6e-7));
    double corner = FrequencyResponse.corner(0, cascade).orElseThrow();
    assertThat(bandwidth / corner).isCloseTo(againstTotal, within(6e-7));
  }

  /**
   * Two poles, buffered: the noise bandwidth is pi/2 x f1 f2/(f1 + f2) (partial fractions), however
   * far apart the poles lie.
   */
  @Test
  void noiseBandwidthOfPolesFarApart() {
    for (double apart = 1; apart < 1e13; apart *= 10) {
      List<Element> chain = List.of(new Amplifier(1, 0.1, 0), new Amplifier(1, 0.1 * apart, 0));
      double exact = FastMath.PI / 2 * 0.1 * apart / (1 + apart);
      assertThat(FrequencyResponse.noiseBandwidth(0, chain))
          .isCloseTo(exact, within(1e-10 * exact));
    }
  }

  /**
   * An amplifier into a capacitor: with x = f/f_cl and q = 2 pi f_cl R_o C the response is 1/((1 +
   * jx) (1 + ...)) = 1/(1 + jx + (jx)^2 q), whose noise bandwidth is pi/2 f_cl for every q
   * (integral of a second-order low-pass without a zero: pi/2 f_0 Q with f_0 = f_cl/sqrt q, Q =
   * sqrt q).
   */
  @Test
  void outputImpedanceOfAnAmplifierRings() {
    for (double q : new double[] {1e-6, 0.1, 1, 30, 3000}) {
      double farads = q / (2 * FastMath.PI * 1e6 * 100);
      List<Element> chain = List.of(new Amplifier(1, 1e6, 100), new Rung.Capacitor(farads));
      double f = 1e6 / FastMath.sqrt(q);
      assertThat(FrequencyResponse.gain(0, chain, f)).isCloseTo(FastMath.sqrt(q), within(1e-9 * q));
      assertThat(FrequencyResponse.gain(0, chain, 0)).isEqualTo(1);
      double exact = FastMath.PI / 2 * 1e6;
      assertThat(FrequencyResponse.noiseBandwidth(0, chain)).isCloseTo(exact, within(1e-9 * exact));
    }
  }

  /** Second order with Q = 5: its peak Q/sqrt(1 - 1/(4 Q^2)) lies at f_0 sqrt(1 - 1/(2 Q^2)). */
  @Test
  void worstGainOverALinesTolerance() {
    double q = 25;
    List<Element> ringing =
        List.of(new Amplifier(1, 1e6, 100), new Rung.Capacitor(q / (2 * FastMath.PI * 1e6 * 100)));
    Sampler nothing = new Sampler(0, 1e-30);
    double peak = 5 / FastMath.sqrt(1 - 1 / (4 * q));
    for (double low : new double[] {0, 1e4, 1e5, 1.8e5}) {
      assertThat(FrequencyResponse.worstGain(0, ringing, nothing, low, 2.5e5))
          .isCloseTo(peak, within(1e-9));
    }
    double before = FrequencyResponse.gain(0, ringing, nothing, 1.5e5);
    assertThat(FrequencyResponse.worstGain(0, ringing, nothing, 50, 1.5e5))
        .isCloseTo(before, within(1e-12));
    List<Element> passive = List.of(new Rung.Series(R));
    assertThat(FrequencyResponse.worstGain(0, passive, new Sampler(0, C), POLE, 2 * POLE))
        .isCloseTo(FastMath.sqrt(0.5), within(1e-12));
  }

  /** By hand: 100 ohms, then 1 kOhm to ground beside a capacitor of 1 kOhm at this frequency. */
  @Test
  void impedancesFromBothSides() {
    List<Rung> ladder =
        List.of(new Rung.Series(100), new Rung.Parallel(1e3), new Rung.Capacitor(C));
    Sampler nothing = new Sampler(0, 1e-30);
    assertThat(FrequencyResponse.loadOhms(ladder, nothing, POLE))
        .isCloseTo(FastMath.hypot(600, 500), within(1e-9));
    assertThat(FrequencyResponse.loadOhms(ladder, nothing, 0)).isCloseTo(1100, within(1e-9));
    assertThat(FrequencyResponse.loadOhms(List.of(), new Sampler(1e3, C), 0)).isInfinite();
    assertThat(FrequencyResponse.loadOhms(List.of(new Rung.Parallel(0)), nothing, 5)).isZero();
    Complex back = FrequencyResponse.outputImpedance(900, ladder, POLE);
    assertThat(back.subtract(new Complex(0.4, -0.2).multiply(1e3)).abs()).isLessThan(1e-9);
    assertThat(
            FrequencyResponse.outputImpedance(Double.POSITIVE_INFINITY, List.of(), 0).isInfinite())
        .isTrue();
  }

  /** Random ladders against nodal analysis by a general-purpose LU solver. */
  @Test
  void agreesWithNodalAnalysis() {
    for (int seed = 0; seed < 200; seed++) {
      Random random = new Random(seed);
      List<Rung> ladder = randomLadder(random);
      double source = logUniform(random, 1, 1e6);
      double hertz = logUniform(random, 1e-2, 1e8);
      Complex nodal = nodal(source, ladder, hertz);
      Complex carried = FrequencyResponse.transfer(source, ladder, hertz);
      assertThat(carried.subtract(nodal).abs()).as("seed %d", seed).isLessThan(1e-10 * nodal.abs());
    }
  }

  /** The corner is where half the power is left, and nowhere before. */
  @Test
  void cornerIsHalfPower() {
    for (int seed = 0; seed < 200; seed++) {
      Random random = new Random(seed);
      List<Element> chain = new ArrayList<>(randomLadder(random));
      if (random.nextBoolean()) {
        chain.add(
            new ActiveFilter(
                2, LowPass.chebyshev(1 + random.nextInt(8), logUniform(random, 1, 1e5), 1), 50));
        chain.addAll(randomLadder(random));
      }
      double corner = FrequencyResponse.corner(1e3, chain).orElseThrow();
      double half = FastMath.sqrt(0.5);
      assertThat(FrequencyResponse.relativeGain(1e3, chain, corner))
          .as("seed %d", seed)
          .isCloseTo(half, within(1e-9));
      for (double f = corner / 1.01; f > corner * 1e-4; f /= 1.01) {
        assertThat(FrequencyResponse.relativeGain(1e3, chain, f))
            .as("seed %d", seed)
            .isGreaterThan(half);
      }
    }
  }

  static List<Rung> randomLadder(Random random) {
    List<Rung> ladder = new ArrayList<>();
    int sections = 1 + random.nextInt(5);
    for (int i = 0; i < sections; i++) {
      ladder.add(new Rung.Series(random.nextInt(6) == 0 ? 0 : logUniform(random, 1, 1e6)));
      if (random.nextInt(3) == 0) {
        ladder.add(new Rung.Parallel(logUniform(random, 1e2, 1e7)));
      }
      ladder.add(new Rung.Capacitor(logUniform(random, 1e-12, 1e-5)));
    }
    return ladder;
  }

  static double logUniform(Random random, double low, double high) {
    return low * FastMath.pow(high / low, random.nextDouble());
  }

  /** Kirchhoff's current law at every node, the source as a current through its conductance. */
  private static Complex nodal(double source, List<Rung> ladder, double hertz) {
    int nodes = 1;
    for (Rung rung : ladder) {
      nodes += rung instanceof Rung.Series series && series.ohms() > 0 ? 1 : 0;
    }
    Complex[][] y = new Complex[nodes][nodes];
    for (Complex[] row : y) {
      Arrays.fill(row, Complex.ZERO);
    }
    y[0][0] = new Complex(1 / source);
    int at = 0;
    for (Rung rung : ladder) {
      if (rung instanceof Rung.Series series && series.ohms() > 0) {
        double g = 1 / series.ohms();
        y[at][at] = y[at][at].add(g);
        y[at + 1][at + 1] = y[at + 1][at + 1].add(g);
        y[at][at + 1] = y[at][at + 1].subtract(g);
        y[at + 1][at] = y[at + 1][at].subtract(g);
        at++;
      } else if (rung instanceof Rung.Parallel parallel) {
        y[at][at] = y[at][at].add(1 / parallel.ohms());
      } else if (rung instanceof Rung.Capacitor capacitor) {
        y[at][at] = y[at][at].add(new Complex(0, 2 * FastMath.PI * hertz * capacitor.farads()));
      }
    }
    Complex[] current = new Complex[nodes];
    Arrays.fill(current, Complex.ZERO);
    current[0] = new Complex(1 / source);
    return new FieldLUDecomposition<>(new Array2DRowFieldMatrix<>(ComplexField.getInstance(), y))
        .getSolver()
        .solve(new ArrayFieldVector<>(ComplexField.getInstance(), current))
        .getEntry(nodes - 1);
  }

  private static double decibel(double gain) {
    return 20 * FastMath.log10(gain);
  }
}
