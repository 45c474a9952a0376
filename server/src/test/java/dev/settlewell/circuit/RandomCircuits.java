package dev.settlewell.circuit;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;

/** Seeded random circuits with the values that front ends of converters have. */
final class RandomCircuits {
  /** A ladder sampled by a scan. */
  record Sampled(Ladder ladder, Sampler sampler, List<Visit> visits, double period) {}

  private final Random random;

  RandomCircuits(long seed) {
    // Spread: the first numbers of neighbouring seeds are nearly equal.
    random = new Random(seed * 0x9E3779B97F4A7C15L);
  }

  /** A ladder of one to four sections, visited one to three times a period. */
  Sampled passive() {
    double source = random.nextInt(8) == 0 ? 0 : logarithmic(1, 1e6);
    return sampled(new Drive.Resistive(source), 1e3);
  }

  /** The same behind an amplifier. */
  Sampled amplified() {
    return sampled(new Drive.ClosedLoop(logarithmic(10, 1e3), logarithmic(1e4, 1e6)), 30);
  }

  private Sampled sampled(Drive drive, double longestPeriod) {
    List<Rung> rungs = new ArrayList<>();
    double slowest = 0;
    double ohms = drive instanceof Drive.Resistive resistive ? resistive.ohms() : 100;
    int sections = 1 + random.nextInt(4);
    for (int i = 0; i < sections; i++) {
      Rung.Series series = new Rung.Series(random.nextInt(6) == 0 ? 0 : logarithmic(10, 1e5));
      rungs.add(series);
      ohms += series.ohms();
      if (random.nextInt(3) == 0) {
        rungs.add(new Rung.Parallel(logarithmic(1e3, 1e6)));
      }
      if (random.nextInt(4) > 0) {
        Rung.Capacitor capacitor = new Rung.Capacitor(logarithmic(1e-12, 1e-7));
        rungs.add(capacitor);
        slowest += ohms * capacitor.farads();
      }
    }
    Sampler sampler = new Sampler(logarithmic(50, 5e3), logarithmic(1e-12, 5e-11));
    slowest += (ohms + sampler.switchOhms()) * sampler.holdFarads();
    double period = slowest * logarithmic(0.1, longestPeriod);
    return new Sampled(new Ladder(drive, rungs), sampler, visits(period), period);
  }

  private List<Visit> visits(double period) {
    List<Visit> visits = new ArrayList<>();
    int count = 1 + random.nextInt(3);
    double start = random.nextDouble() * period / 10;
    for (int i = 0; i < count; i++) {
      double spacing = period * (0.1 + 0.8 * random.nextDouble()) / count;
      visits.add(new Visit(start, spacing * logarithmic(1e-3, 1)));
      start += spacing;
    }
    return visits;
  }

  double logarithmic(double low, double high) {
    return low * Math.pow(high / low, random.nextDouble());
  }

  double uniform(double low, double high) {
    return low + (high - low) * random.nextDouble();
  }

  int below(int bound) {
    return random.nextInt(bound);
  }
}
