package dev.settlewell.circuit;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/** One steady state: a worst case takes some sixty of them at every keystroke. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class SettlingBenchmark {
  private static final Sampler SAMPLER = new Sampler(1e3, 10e-12);
  private static final List<Visit> VISITS = List.of(new Visit(0, 2e-6), new Visit(22e-6, 2e-6));

  /** Sections of resistor and capacitor between the source and the pin. */
  @Param({"1", "2", "4"})
  public int sections;

  private Ladder passive;
  private Ladder amplified;

  @Setup
  public void build() {
    List<Rung> rungs = new ArrayList<>();
    for (int i = 0; i < sections; i++) {
      rungs.add(new Rung.Series(100 * (i + 1)));
      rungs.add(new Rung.Capacitor(10e-9 / (i + 1)));
    }
    passive = new Ladder(new Drive.Resistive(1e3), rungs);
    amplified = new Ladder(new Drive.ClosedLoop(100, 1e6), rungs);
  }

  @Benchmark
  public double[][] passiveSteadyState() {
    return Settling.residuals(passive, SAMPLER, VISITS, 1e-3);
  }

  @Benchmark
  public double[][] amplifiedSteadyState() {
    return Settling.residuals(amplified, SAMPLER, VISITS, 1e-3);
  }

  @Benchmark
  public OptionalDouble requiredAcquisition() {
    return Settling.requiredAcquisition(
        passive, SAMPLER, List.of(VISITS.get(0)), 1e-3, new double[] {1}, 1 / 8192.0, 0.9e-3);
  }
}
