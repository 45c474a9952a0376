package dev.settlewell.channel;

import dev.settlewell.sheet.Linked;
import dev.settlewell.uncertainty.Coverage;
import dev.settlewell.uncertainty.Distribution;
import dev.settlewell.uncertainty.MonteCarlo;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/**
 * What a keystroke costs. Times differ from machine to machine: compare them as multiples of {@link
 * #reading}, which the same run measures.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Fork(1)
@Warmup(iterations = 5, time = 1)
@Measurement(iterations = 5, time = 1)
public class AnalysisBenchmark {
  private static final int TRIALS = 10_000;

  /** One channel, four components in its path, three interferers. */
  private static final String PASSIVE =
      """
      channel-sheet: 1
      ambient: -10 °C to 50 °C
      supplies:
        ref: 2.5 V ±0.1 % ±25 ppm/K
      converters:
        adc:
          bits: 12
          reference: ref
          clock: 8 MHz ±1 %
          conversion-cycles: 14
          hold-capacitor: {typical: 5 pF, max: 7 pF}
          switch-resistance: {max: 1.5 kΩ}
          pin-capacitance: 6 pF
          pin-leakage: ±80 nA
          offset-error: ±2 LSB
          gain-error: ±3 LSB
          integral-nonlinearity: ±1.5 LSB
          noise: 0.4 LSB
      scans:
        only: {converter: adc, rate: 100 Hz, order: [level]}
      interferers:
        mains: {frequency: 50 Hz ±1 %, amplitude: 5 mV}
        lamps: {frequency: 100 Hz ±1 %, amplitude: 2 mV}
        charger: {frequency: 380 kHz ±10 %, amplitude: 30 mV}
      channels:
        level:
          measures: 0 m to 6 m
          needs: ±0.03 m
          band: 0.4 Hz
          sensor:
            voltage: {output: 0.5 V to 2.4 V, accuracy: ±0.1 %, resistance: 100 Ω}
          path:
            - resistor: 1 kΩ ±1 %
            - capacitor: 100 nF ±10 %
            - resistor: 1 kΩ ±1 %
            - capacitor: 10 nF ±10 %
          acquisition: 24 cycles
          average: 16
          interferers: [mains, lamps, charger]
      """;

  private static final String AMPLIFIED =
      PASSIVE.replace(
          "      - resistor: 1 kΩ ±1 %\n      - capacitor: 10 nF ±10 %\n",
          """
                - amplifier: {gain: 1, gain-bandwidth: 1 MHz, output-resistance: 100 Ω, offset: ±1 mV}
                - resistor: 1 kΩ ±1 %
                - capacitor: 10 nF ±10 %
          """);

  private Linked passive;
  private Linked amplified;
  private List<Distribution> rows;

  @Setup
  public void build() {
    passive = TestSheets.link(PASSIVE);
    amplified = TestSheets.link(AMPLIFIED);
    rows = new ArrayList<>();
    for (int i = 1; i <= 15; i++) {
      rows.add(new Distribution.Rectangular(1.0 / i));
    }
    for (int i = 1; i <= 3; i++) {
      rows.add(new Distribution.Normal(0.3 / i));
      rows.add(new Distribution.Sine(0.2 / i));
    }
  }

  /** The floor: the text of the same sheet, read and bound. */
  @Benchmark
  public Linked reading() {
    return TestSheets.link(PASSIVE);
  }

  @Benchmark
  public Analysis analysis() {
    return Analyzer.analyze(passive);
  }

  @Benchmark
  public Analysis analysisBehindAnAmplifier() {
    return Analyzer.analyze(amplified);
  }

  @Benchmark
  public double expandedUncertainty() {
    return Coverage.expanded(rows, 0.95);
  }

  /** Ten thousand trials of a sum of as many rows. */
  @Benchmark
  public MonteCarlo.Result randomTrials() {
    return MonteCarlo.run(AnalysisBenchmark::sum, rows, 1, TRIALS, 0.95);
  }

  private static double sum(double[] inputs) {
    double sum = 0;
    for (double input : inputs) {
      sum += input;
    }
    return sum;
  }
}
