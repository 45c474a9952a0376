package dev.settlewell.circuit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class AliasingTest {
  @ParameterizedTest
  @CsvSource({
    // National Instruments help 370592AB-01
    "5e6, 6e6, 1e6",
    // Frequency Devices, Filter Design Guide
    "140, 100, 40",
    // Wheeler and Ganji, Introduction to Engineering Experimentation, ch. 5
    "10, 5, 0",
    // National Instruments, paper on aliasing (from memory)
    "25, 100, 25",
    "70, 100, 30",
    "160, 100, 40",
    "510, 100, 10"
  })
  void landsWherePublished(double hertz, double rate, double landing) {
    assertThat(Aliasing.landing(hertz, rate)).isEqualTo(landing);
  }

  /** Tektronix FAQ: 100 kS/s over 8 channels is 12.5 kS/s each, which aliases above 6.25 kHz. */
  @Test
  void eachChannelHasItsShareOfTheRate() {
    double rate = 100e3 / 8;
    assertThat(Aliasing.landing(6.25e3, rate)).isEqualTo(6.25e3);
    assertThat(Aliasing.landing(6.26e3, rate)).isCloseTo(6.24e3, within(1e-9));
  }

  @Test
  void spanFoldsAtHalfTheRateAndAtItsMultiples() {
    assertThat(Aliasing.landing(48, 52, 100, 100)).isEqualTo(new Aliasing.Landing(48, 50));
    assertThat(Aliasing.landing(99, 102, 100, 100)).isEqualTo(new Aliasing.Landing(0, 2));
    assertThat(Aliasing.landing(342e3, 418e3, 6.25, 6.25))
        .isEqualTo(new Aliasing.Landing(0, 3.125));
    assertThat(Aliasing.landing(0, 1, 100, 100)).isEqualTo(new Aliasing.Landing(0, 1));
    // Fixed line, rate from 98 to 99: 49.25 folds only at the rate 98.5, between the ends.
    assertThat(Aliasing.landing(49.25, 49.25, 98, 99).high()).isEqualTo(49.25);
  }

  /** Dense sampling of the box never leaves the span and reaches near its ends. */
  @Test
  void spanAgainstSampling() {
    for (int seed = 0; seed < 400; seed++) {
      Random random = new Random(seed);
      double lowRate = 10 * (1 + random.nextDouble());
      double highRate = lowRate * (1 + (random.nextBoolean() ? 0 : 0.1 * random.nextDouble()));
      double lowHertz = 90 * random.nextDouble();
      double highHertz = lowHertz + (random.nextBoolean() ? 0 : 12 * random.nextDouble());
      Aliasing.Landing span = Aliasing.landing(lowHertz, highHertz, lowRate, highRate);
      double low = Double.MAX_VALUE;
      double high = 0;
      for (int i = 0; i <= 200; i++) {
        for (int k = 0; k <= 200; k++) {
          double hertz = lowHertz + (highHertz - lowHertz) * i / 200;
          double rate = lowRate + (highRate - lowRate) * k / 200;
          double landing = Aliasing.landing(hertz, rate);
          low = Math.min(low, landing);
          high = Math.max(high, landing);
        }
      }
      assertThat(low).as("seed %d", seed).isGreaterThanOrEqualTo(span.low() - 1e-9);
      assertThat(high).as("seed %d", seed).isLessThanOrEqualTo(span.high() + 1e-9);
      assertThat(low).as("seed %d", seed).isCloseTo(span.low(), within(0.15));
      assertThat(high).as("seed %d", seed).isCloseTo(span.high(), within(0.15));
    }
  }

  @Test
  void standingLines() {
    assertThat(Aliasing.readsAsOffset(50, 10)).isTrue();
    assertThat(Aliasing.readsAsOffset(50.09, 10)).isTrue();
    assertThat(Aliasing.readsAsOffset(50.11, 10)).isFalse();
    // A slow line near zero is no alias: it is in the signal.
    assertThat(Aliasing.readsAsOffset(0.05, 10)).isFalse();
    assertThat(Aliasing.readsAsOffset(380e3 + 3, 6.25)).isFalse();
  }

  /** 50 Hz at 10.2 results a second lands at 1 Hz; the rates that keep 2 Hz clear, by hand. */
  @Test
  void nearestRatesThatKeepTheBandClear() {
    List<Aliasing.Line> mains = List.of(new Aliasing.Line(50, 50));
    Aliasing.Rates rates = Aliasing.ratesClearOf(mains, 10.2, 0, 2, 5, 20).orElseThrow();
    // 5 r = 50 - 2 ... 50 + 2 and 4 r = 48 ... 52 are taken: 10.4 to 12 is free.
    assertThat(rates.low()).isCloseTo(10.4, within(1e-12));
    assertThat(rates.high()).isCloseTo(12, within(1e-12));
  }

  @Test
  void noRatesClearOfALineInTheBandOrOfAWideOne() {
    assertThat(Aliasing.ratesClearOf(List.of(new Aliasing.Line(1, 3)), 10, 0, 2, 5, 20)).isEmpty();
    List<Aliasing.Line> charger = List.of(new Aliasing.Line(342e3, 418e3));
    assertThat(Aliasing.ratesClearOf(charger, 6.25, 0, 0.4, 3, 12)).isEmpty();
    assertThat(Aliasing.ratesClearOf(List.of(), 10, 0.01, 2, 5, 20)).isPresent();
  }

  /** Inside the answer nothing lands in the band, and no rate nearer to the present one is free. */
  @Test
  void ratesClearOfLinesAgainstStepping() {
    for (int seed = 0; seed < 150; seed++) {
      Random random = new Random(seed);
      double tolerance = 0.01 * random.nextDouble();
      double width = 0.01 * random.nextDouble();
      List<Aliasing.Line> lines =
          IntStream.of(1, 2, 3)
              .mapToObj(h -> new Aliasing.Line(h * 50 * (1 - width), h * 50 * (1 + width)))
              .toList();
      double band = 3 * random.nextDouble();
      double rate = 8 + 30 * random.nextDouble();
      double lowest = rate / 1.5;
      double highest = rate * 1.5;
      Optional<Aliasing.Rates> found =
          Aliasing.ratesClearOf(lines, rate, tolerance, band, lowest, highest);
      double nearest = Double.POSITIVE_INFINITY;
      for (int i = 0; i <= 1500; i++) {
        double tried = lowest + (highest - lowest) * i / 1500;
        boolean free =
            tried * (1 - tolerance) > 2 * band
                && lines.stream().noneMatch(line -> lands(line, tried, tolerance, band));
        boolean inside =
            found.isPresent() && found.get().low() < tried && tried < found.get().high();
        assertThat(!inside || free).as("seed %d rate %s", seed, tried).isTrue();
        nearest = free ? Math.min(nearest, Math.abs(tried - rate)) : nearest;
      }
      if (found.isPresent()) {
        double distance =
            Math.max(0, Math.max(found.get().low() - rate, rate - found.get().high()));
        assertThat(nearest).as("seed %d", seed).isGreaterThanOrEqualTo(distance - 1e-9);
      } else {
        assertThat(nearest).as("seed %d", seed).isInfinite();
      }
    }
  }

  private static boolean lands(Aliasing.Line line, double rate, double tolerance, double band) {
    return Aliasing.landing(line.low(), line.high(), rate * (1 - tolerance), rate * (1 + tolerance))
        .reaches(band);
  }
}
