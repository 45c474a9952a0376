package dev.settlewell.circuit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The regimes of a reservoir, closed-form limits, invariances, degenerate and extreme values. */
class SettlingTest {
  /** 12 bits in LSB: an offset of this is a full-scale step. */
  private static final double FULL_SCALE = 4096;

  private static final Sampler SAMPLER = new Sampler(1e3, 10e-12);

  private static Ladder reservoir(double ohms, double farads) {
    return new Ladder(new Drive.Resistive(ohms), List.of(new Rung.Capacitor(farads)));
  }

  private static double residual(
      Ladder ladder, Sampler sampler, double acquisition, double period) {
    return Settling.residuals(ladder, sampler, List.of(new Visit(0, acquisition)), period)[0][0];
  }

  /**
   * None, in between, or a reservoir: 10 kΩ, switch 1 kΩ, 10 pF, 1 µs, 12 bit, full-scale step. The
   * figures were computed with the exact solution of the two-capacitor circuit in SciPy.
   */
  @ParameterizedTest
  @CsvSource({
    "0,      1e-3, 0.46, 0.005",
    "10e-12, 1e-3, 16.4, 0.05",
    "47e-12, 1e-3, 129,  0.5",
    "100e-12,1e-3, 153,  0.5",
    "1e-9,   1e-3, 36.8, 0.05",
    "10e-9,  1e-3, 4.05, 0.005",
    "82e-9,  1e-3, 0.71, 0.005",
    "1e-6,   1e-3, 0.43, 0.005",
    "82e-9,  1e-4, 4.34, 0.005",
    "1e-6,   1e-4, 4.11, 0.005"
  })
  void threeRegimesOfAnExternalCapacitor(
      double farads, double period, double lsb, double tolerance) {
    assertThat(FULL_SCALE * residual(reservoir(10e3, farads), SAMPLER, 1e-6, period))
        .isCloseTo(lsb, within(tolerance));
  }

  /** Uneven visits, 2 µs each, half a full-scale step. SciPy: 2.01 and 3.61 LSB, not 2.02 each. */
  @Test
  void unevenVisitsLeaveUnequalErrors() {
    double step = FULL_SCALE / 2;
    List<Visit> visits = List.of(new Visit(0, 2e-6), new Visit(22e-6, 2e-6));
    double[] errors =
        Settling.errors(
            reservoir(10e3, 10e-9), SAMPLER, visits, 1002e-6, new double[] {step, step});
    assertThat(errors[0]).isCloseTo(2.01, within(0.005));
    assertThat(errors[1]).isCloseTo(3.61, within(0.005));
    assertThat(step * residual(reservoir(10e3, 10e-9), SAMPLER, 2e-6, 501e-6))
        .isCloseTo(2.02, within(0.005));
  }

  /**
   * A potentiometer's source resistance is largest in the middle of its travel. SciPy, 0.215 in the
   * middle, 0.257 at 2/3.
   */
  @Test
  void wiperIsWorstInsideItsTravel() {
    double[] errors = IntStream.rangeClosed(0, 300).mapToDouble(i -> wiper(i / 300.0)).toArray();
    int worst = IntStream.rangeClosed(0, 300).reduce(0, (a, b) -> errors[b] > errors[a] ? b : a);
    assertThat(errors[150]).isCloseTo(0.215, within(0.0005));
    assertThat(errors[worst]).isCloseTo(0.257, within(0.0005));
    assertThat(worst / 300.0).isCloseTo(2 / 3.0, within(0.01));
    // At the end of travel some resistance is left, and the reservoir only shares its charge.
    assertThat(wiper(1 - 1e-3)).isCloseTo(0.04, within(0.005));
    assertThat(wiper(0)).isZero();
  }

  /** Error in LSB of a 40 kΩ wiper with 1 µF, 1000 visits a second from ground, 0.2 µs each. */
  private static double wiper(double travel) {
    Ladder ladder = reservoir(40e3 * travel * (1 - travel), 1e-6);
    return FULL_SCALE * travel * residual(ladder, SAMPLER, 0.2e-6, 1e-3);
  }

  /** A clock of ±5 %: SciPy, slow 0.18, nominal 0.30, fast 0.48 LSB. */
  @ParameterizedTest
  @CsvSource({"0.95, 0.18", "1, 0.30", "1.05, 0.48"})
  void fastestClockIsWorst(double clock, double lsb) {
    Ladder ladder = new Ladder(new Drive.Resistive(10e3), List.of());
    assertThat(FULL_SCALE * residual(ladder, SAMPLER, 1.046e-6 / clock, 1e-3))
        .isCloseTo(lsb, within(0.005));
  }

  /** 47 to 220 pF: SciPy, ends 129 and 116, inside 154 LSB. */
  @Test
  void worstCapacitanceLiesInsideItsTolerance() {
    WorstCase.Result worst =
        WorstCase.maximise(
            point -> FULL_SCALE * residual(reservoir(10e3, point[0]), SAMPLER, 1e-6, 1e-3),
            new double[] {47e-12},
            new double[] {220e-12},
            new boolean[] {false},
            20);
    assertThat(FULL_SCALE * residual(reservoir(10e3, 47e-12), SAMPLER, 1e-6, 1e-3))
        .isCloseTo(129, within(0.5));
    assertThat(FULL_SCALE * residual(reservoir(10e3, 220e-12), SAMPLER, 1e-6, 1e-3))
        .isCloseTo(116, within(0.5));
    assertThat(worst.value()).isCloseTo(154, within(0.5));
    assertThat(worst.point()[0]).isBetween(75e-12, 100e-12);
  }

  /** Large reservoir: C_hold/C / (1 - e^(-T/RC)), the sum of a geometric series. */
  @ParameterizedTest
  @ValueSource(doubles = {0.1, 0.5, 1, 3, 20})
  void largeReservoirSharesAndRecovers(double timeConstants) {
    double ohms = 1e3;
    double farads = 1e-3;
    double expected = SAMPLER.holdFarads() / farads / (1 - Math.exp(-timeConstants));
    double actual = residual(reservoir(ohms, farads), SAMPLER, 1e-6, timeConstants * ohms * farads);
    assertThat(actual).isCloseTo(expected, within(1e-4 * expected));
  }

  /** Slow recharge: (V - V_start) C_hold f R with f the visits per second, repeats counted. */
  @Test
  void slowRechargeIsMeanCurrentTimesResistance() {
    double ohms = 10e3;
    double period = 1e-3;
    List<Visit> visits = List.of(new Visit(0, 1e-6), new Visit(1e-4, 1e-6), new Visit(5e-4, 1e-6));
    double expected = SAMPLER.holdFarads() * 3 / period * ohms;
    double[] errors =
        Settling.errors(reservoir(ohms, 1e-3), SAMPLER, visits, period, new double[] {-1, -1, -1});
    for (double error : errors) {
      assertThat(-error).isCloseTo(expected, within(2e-3 * expected));
    }
  }

  /** Without any capacitor in the ladder: t = R C ln 2^(N+1); and no memory of other visits. */
  @Test
  void bareSourceIsASinglePole() {
    Ladder ladder =
        new Ladder(
            new Drive.Resistive(20e3),
            List.of(new Rung.Series(5e3), new Rung.Parallel(25e3), new Rung.Series(2e3)));
    double constant = (12.5e3 + 2e3 + 1e3) * 10e-12;
    List<Visit> visits = List.of(new Visit(0, 1e-7), new Visit(1e-4, 1e-7));
    double required =
        Settling.requiredAcquisition(
                ladder, SAMPLER, visits, 2e-4, new double[] {1, -1}, 1 / 8192.0, 1e-4)
            .orElseThrow();
    assertThat(required).isCloseTo(constant * Math.log(8192), within(1e-9 * constant));
    double[][] residuals = Settling.residuals(ladder, SAMPLER, visits, 2e-4);
    assertThat(residuals[0][1]).isZero();
    assertThat(residuals[1][1]).isCloseTo(Math.exp(-1e-7 / constant), within(1e-14));
  }

  /** Seen from the outside, only products of resistance and capacitance matter. */
  @ParameterizedTest
  @ValueSource(doubles = {1e-3, 0.2, 7, 1e4})
  void scalingLeavesErrorsUnchanged(double k) {
    for (long seed = 1; seed <= 20; seed++) {
      RandomCircuits.Sampled circuit = new RandomCircuits(seed).passive();
      double[][] expected =
          Settling.residuals(
              circuit.ladder(), circuit.sampler(), circuit.visits(), circuit.period());
      Sampler slower =
          new Sampler(circuit.sampler().switchOhms() * k, circuit.sampler().holdFarads());
      List<Visit> longer =
          circuit.visits().stream()
              .map(visit -> new Visit(visit.start() * k, visit.acquisition() * k))
              .toList();
      close(
          seed,
          Settling.residuals(
              circuit.ladder().scaledResistances(k), slower, longer, circuit.period() * k),
          expected);
      Sampler smaller = new Sampler(slower.switchOhms(), slower.holdFarads() / k);
      close(
          seed,
          Settling.residuals(
              capacitancesDivided(circuit.ladder().scaledResistances(k), k),
              smaller,
              circuit.visits(),
              circuit.period()),
          expected);
    }
  }

  private static Ladder capacitancesDivided(Ladder ladder, double k) {
    List<Rung> rungs =
        ladder.rungs().stream()
            .map(
                rung ->
                    rung instanceof Rung.Capacitor capacitor
                        ? new Rung.Capacitor(capacitor.farads() / k)
                        : rung)
            .toList();
    return new Ladder(ladder.drive(), rungs);
  }

  private static void close(long seed, double[][] actual, double[][] expected) {
    for (int i = 0; i < expected.length; i++) {
      for (int j = 0; j < expected.length; j++) {
        assertThat(actual[i][j]).as("seed %d", seed).isCloseTo(expected[i][j], within(1e-10));
      }
    }
  }

  /** 0 Ω merges nodes: the same circuit written with and without them. */
  @Test
  void zeroOhmsMergeNodes() {
    Ladder plain = reservoir(10e3, 30e-12);
    Ladder merged =
        new Ladder(
            new Drive.Resistive(0),
            List.of(
                new Rung.Capacitor(1e-6),
                new Rung.Series(10e3),
                new Rung.Capacitor(10e-12),
                new Rung.Series(0),
                new Rung.Parallel(Double.POSITIVE_INFINITY),
                new Rung.Capacitor(20e-12)));
    assertThat(residual(merged, SAMPLER, 1e-6, 1e-4))
        .isCloseTo(residual(plain, SAMPLER, 1e-6, 1e-4), within(1e-14));
  }

  @Test
  void idealSourceHoldsThePinAtOnce() {
    Ladder ideal = new Ladder(new Drive.Resistive(0), List.of(new Rung.Capacitor(5e-12)));
    Sampler noSwitch = new Sampler(0, 10e-12);
    assertThat(residual(ideal, noSwitch, 1e-9, 1e-6)).isZero();
    assertThat(
            Settling.requiredAcquisition(
                ideal, noSwitch, List.of(new Visit(0, 1e-9)), 1e-6, new double[] {1}, 1e-9, 1e-7))
        .hasValue(0);
    assertThat(residual(ideal, SAMPLER, 20e-9, 1e-6)).isCloseTo(Math.exp(-2), within(1e-14));
    Ladder shorted = new Ladder(new Drive.Resistive(1e3), List.of(new Rung.Parallel(0)));
    assertThat(residual(shorted, noSwitch, 1e-9, 1e-6)).isZero();
  }

  /** Without switch resistance the charge is shared at once: the limit of a small resistance. */
  @ParameterizedTest
  @ValueSource(doubles = {0, 10e3})
  void switchWithoutResistanceIsALimit(double series) {
    for (Drive drive : List.of(new Drive.Resistive(10e3), new Drive.ClosedLoop(200, 1e6))) {
      Ladder ladder =
          new Ladder(
              drive,
              List.of(
                  new Rung.Capacitor(100e-12), new Rung.Series(series), new Rung.Capacitor(5e-12)));
      assertThat(residual(ladder, new Sampler(0, 10e-12), 3e-8, 1e-6))
          .isCloseTo(residual(ladder, new Sampler(1e-4, 10e-12), 3e-8, 1e-6), within(1e-6));
    }
  }

  /** A current source with a shunt is a voltage source behind that resistance. */
  @Test
  void currentSourceWithAShuntIsItsTheveninEquivalent() {
    Ladder norton =
        new Ladder(
            new Drive.Resistive(Double.POSITIVE_INFINITY),
            List.of(new Rung.Capacitor(47e-12), new Rung.Parallel(10e3)));
    assertThat(norton.dcResistance()).isEqualTo(10e3);
    assertThat(residual(norton, SAMPLER, 1e-6, 1e-3))
        .isCloseTo(residual(reservoir(10e3, 47e-12), SAMPLER, 1e-6, 1e-3), within(1e-14));
  }

  @Test
  void pinThatNothingHoldsKeepsTheWholeOffset() {
    Ladder floating =
        new Ladder(
            new Drive.Resistive(Double.POSITIVE_INFINITY), List.of(new Rung.Capacitor(1e-9)));
    assertThat(floating.dcResistance()).isInfinite();
    assertThat(residual(floating, SAMPLER, 1e-6, 1e-3)).isCloseTo(1, within(1e-12));
  }

  /** R_o parallel L at a bare output with an isolating resistor: the response in closed form. */
  @Test
  void amplifierWithOnlyTheHoldCapacitorIsASecondOrderCircuit() {
    double ohms = 100;
    double w = 2 * Math.PI * 1e6;
    double isolating = 900;
    double hold = 1e-9;
    Ladder ladder =
        new Ladder(new Drive.ClosedLoop(ohms, 1e6), List.of(new Rung.Series(isolating)));
    // Source impedance R + R_o s/(s + w); V_hold(s) for a unit start, partial fractions.
    double total = (isolating + ohms) * hold;
    double b = (1 + w * isolating * hold) / total;
    double c = w / total;
    double root = Math.sqrt(b * b / 4 - c);
    double p = b / 2 + root;
    double q = b / 2 - root;
    double t = 1.3e-6;
    // V(s) = (s (R+R_o) C + w R C) / ((R+R_o) C s^2 + (1 + w R C) s + w)
    double zero = w * isolating * hold / total;
    double expected = ((zero - p) * Math.exp(-p * t) - (zero - q) * Math.exp(-q * t)) / (q - p);
    assertThat(residual(ladder, new Sampler(0, hold), t, 1e-3)).isCloseTo(expected, within(1e-12));
  }

  @Test
  void vanishingAndHugeValuesGiveFiniteAnswers() {
    double[] capacitances = {0, 1e-15, 10e-12, 1};
    double[] resistances = {0, 1e-6, 1e3, 1e12};
    for (double c : capacitances) {
      for (double r : resistances) {
        for (double s : resistances) {
          for (Drive drive :
              List.of(new Drive.Resistive(r), new Drive.ClosedLoop(Math.min(r, 1e6), 1e6))) {
            finite(drive, c, s);
          }
        }
      }
    }
  }

  private static void finite(Drive drive, double farads, double series) {
    Ladder ladder =
        new Ladder(
            drive,
            List.of(
                new Rung.Capacitor(farads),
                new Rung.Series(series),
                new Rung.Parallel(1e12),
                new Rung.Capacitor(1e-15)));
    // Two visits without any rest between them, one without any length.
    List<Visit> visits = List.of(new Visit(0, 0.5), new Visit(0.5, 0), new Visit(0.6, 0.4));
    for (double hold : new double[] {1e-15, 1e-3}) {
      double[][] residuals = Settling.residuals(ladder, new Sampler(1e-3, hold), visits, 1);
      for (double[] row : residuals) {
        for (double residual : row) {
          assertThat(residual).as("%s, hold %s", ladder, hold).isFinite().isBetween(-1.5, 1 + 1e-6);
        }
      }
    }
  }

  @Test
  void equalTimeConstantsAreNoSpecialCase() {
    Ladder ladder =
        new Ladder(
            new Drive.Resistive(1e3),
            List.of(new Rung.Capacitor(1e-9), new Rung.Series(1e3), new Rung.Capacitor(1e-9)));
    Sampler equal = new Sampler(1e3, 1e-9);
    double[][] expected =
        new IntegratedLadder(ladder, equal).residuals(List.of(new Visit(0, 2e-6)), 5e-6);
    assertThat(residual(ladder, equal, 2e-6, 5e-6)).isCloseTo(expected[0][0], within(1e-11));
  }

  /** The last crossing: from it on every longer acquisition suffices, just before it one fails. */
  @Test
  void requiredAcquisitionIsTheLastCrossingEvenWhenTheErrorRings() {
    // 1 nF on the output of a slow amplifier: rings.
    Ladder ladder = new Ladder(new Drive.ClosedLoop(1e3, 100e3), List.of(new Rung.Capacitor(1e-9)));
    Sampler sampler = new Sampler(10, 1e-9);
    double allowance = 1e-3;
    double required = required(ladder, sampler, allowance, 1e-3);
    int crossings = 0;
    double previous = 1;
    for (int i = 1; i <= 4000; i++) {
      double t = i * required / 3000;
      double error = Math.abs(residual(ladder, sampler, t, 1e-2)) - allowance;
      crossings += previous > 0 != error > 0 ? 1 : 0;
      previous = error;
      if (t > required * (1 + 1e-9)) {
        assertThat(error).isNegative();
      }
    }
    assertThat(crossings).as("the error rings").isGreaterThan(3);
    assertThat(Math.abs(residual(ladder, sampler, required, 1e-2)))
        .isCloseTo(allowance, within(1e-9));
  }

  /** Random circuits: nothing on a fine grid after the answer exceeds the allowance. */
  @Test
  void nothingAfterTheRequiredAcquisitionExceedsTheAllowance() {
    for (long seed = 1; seed <= 40; seed++) {
      RandomCircuits random = new RandomCircuits(seed);
      RandomCircuits.Sampled circuit = seed % 4 == 0 ? random.amplified() : random.passive();
      double longest = circuit.period() * 0.9;
      double allowance = random.logarithmic(1e-5, 1e-1);
      List<Visit> visit = List.of(new Visit(0, longest));
      var required =
          Settling.requiredAcquisition(
              circuit.ladder(),
              circuit.sampler(),
              visit,
              circuit.period(),
              new double[] {-1},
              allowance,
              longest);
      double from = required.orElse(longest);
      if (required.isEmpty()) {
        assertThat(residual(circuit.ladder(), circuit.sampler(), longest, circuit.period()))
            .matches(error -> Math.abs(error) > allowance, "above the allowance, seed " + seed);
      } else if (from > 0) {
        assertThat(residual(circuit.ladder(), circuit.sampler(), from, circuit.period()))
            .as("seed %d", seed)
            .matches(e -> Math.abs(Math.abs(e) - allowance) < 1e-9 * allowance + 1e-13);
      }
      for (int i = 1; i <= 100 && required.isPresent(); i++) {
        double t = from * (1 + 1e-9) + (longest - from) * Math.pow(i / 100.0, 3);
        assertThat(
                Math.abs(
                    residual(
                        circuit.ladder(),
                        circuit.sampler(),
                        Math.min(t, longest),
                        circuit.period())))
            .as("seed %d at %s after %s", seed, t, from)
            .isLessThanOrEqualTo(allowance * (1 + 1e-9));
      }
    }
  }

  private static double required(Ladder ladder, Sampler sampler, double allowance, double longest) {
    return Settling.requiredAcquisition(
            ladder,
            sampler,
            List.of(new Visit(0, 1e-9)),
            1e-2,
            new double[] {1},
            allowance,
            longest)
        .orElseThrow();
  }

  /** Less than no time is left, e.g. after slewing. */
  @Test
  void noAcquisitionSufficesWhereNoTimeIsLeft() {
    assertThat(
            Settling.requiredAcquisition(
                reservoir(1e3, 0),
                SAMPLER,
                List.of(new Visit(0, 1e-6)),
                1e-3,
                new double[] {0},
                1e-3,
                -1e-6))
        .isEmpty();
  }

  /** The charge a reservoir shares cannot be waited away before the next visit. */
  @Test
  void noAcquisitionSufficesWhereTheSourceDoesNotRecharge() {
    assertThat(
            Settling.requiredAcquisition(
                reservoir(1e6, 1e-6),
                SAMPLER,
                List.of(new Visit(0, 1e-6)),
                1e-3,
                new double[] {1},
                1 / 8192.0,
                1e-3))
        .isEmpty();
  }

  /** Bounds of the offsets: nothing between them does worse than the ends, both signs. */
  @Test
  void extremesBoundEveryOffsetBetweenTheBounds() {
    for (long seed = 1; seed <= 30; seed++) {
      RandomCircuits random = new RandomCircuits(seed);
      RandomCircuits.Sampled circuit = random.amplified();
      int count = circuit.visits().size();
      double[][] residuals =
          Settling.residuals(
              circuit.ladder(), circuit.sampler(), circuit.visits(), circuit.period());
      double[] low = new double[count];
      double[] high = new double[count];
      for (int j = 0; j < count; j++) {
        low[j] = random.uniform(-3, 1);
        high[j] = low[j] + random.uniform(0, 3);
      }
      List<Settling.Extremes> extremes = Settling.extremes(residuals, low, high);
      double[] reachedLow = new double[count];
      double[] reachedHigh = new double[count];
      Arrays.fill(reachedLow, Double.POSITIVE_INFINITY);
      Arrays.fill(reachedHigh, Double.NEGATIVE_INFINITY);
      for (int corner = 0; corner < 1 << count; corner++) {
        double[] offsets = new double[count];
        for (int j = 0; j < count; j++) {
          offsets[j] = (corner >> j & 1) == 0 ? low[j] : high[j];
        }
        double[] errors =
            Settling.errors(
                circuit.ladder(), circuit.sampler(), circuit.visits(), circuit.period(), offsets);
        for (int i = 0; i < count; i++) {
          reachedLow[i] = Math.min(reachedLow[i], errors[i]);
          reachedHigh[i] = Math.max(reachedHigh[i], errors[i]);
        }
      }
      for (int i = 0; i < count; i++) {
        assertThat(extremes.get(i).low())
            .as("seed %d", seed)
            .isCloseTo(reachedLow[i], within(1e-12));
        assertThat(extremes.get(i).high())
            .as("seed %d", seed)
            .isCloseTo(reachedHigh[i], within(1e-12));
      }
    }
  }

  /** With bounds of both signs the time is the longer of the two. */
  @Test
  void requiredAcquisitionOfBoundsIsThatOfTheWorseEnd() {
    Ladder ladder = reservoir(1e3, 1e-9);
    List<Visit> visit = List.of(new Visit(0, 1e-6));
    double both =
        Settling.requiredAcquisition(
                ladder, SAMPLER, visit, 1e-3, new double[] {-1}, new double[] {3}, 1e-3, 1e-4)
            .orElseThrow();
    double worse =
        Settling.requiredAcquisition(ladder, SAMPLER, visit, 1e-3, new double[] {3}, 1e-3, 1e-4)
            .orElseThrow();
    assertThat(both).isCloseTo(worse, within(1e-9 * worse));
  }
}
