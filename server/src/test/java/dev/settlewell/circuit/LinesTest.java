package dev.settlewell.circuit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Random;
import org.apache.commons.math3.util.FastMath;
import org.junit.jupiter.api.Test;

class LinesTest {
  /** JCGM 100:2008 H.1: arcsine limits of 0.5 have the standard uncertainty 0.35. */
  @Test
  void sineRule() {
    assertThat(Lines.rms(0.5)).isCloseTo(0.35, within(0.005));
    assertThat(Lines.rms(-3)).isEqualTo(3 / Math.sqrt(2));
  }

  /** 50 Hz and 150 Hz at 20 results a second both land at 10 Hz; 100 Hz lands at 0. */
  @Test
  void lockedLinesAddInAmplitude() {
    List<Lines.Landed> lines =
        List.of(
            new Lines.Landed(Aliasing.landing(50, 20), 3),
            new Lines.Landed(Aliasing.landing(100, 20), 5),
            new Lines.Landed(Aliasing.landing(150, 20), 1));
    assertThat(Lines.rms(lines, 1e-9)).isCloseTo(Math.sqrt((16 + 25) / 2.0), within(1e-12));
    assertThat(Lines.rms(lines, 100)).isCloseTo(9 / Math.sqrt(2), within(1e-12));
    assertThat(Lines.rms(List.of(), 1)).isZero();
    assertThat(Lines.limit(lines)).isEqualTo(9);
  }

  /** A sine sampled at jittered instants: what stays a line, and what becomes noise. */
  @Test
  void jitterTurnsALineIntoNoise() {
    for (double radians : new double[] {0.05, 0.5, 1, 2}) {
      double hertz = 1000;
      double sigma = radians / (2 * FastMath.PI * hertz);
      Random random = new Random(9);
      double line = 0;
      double power = 0;
      int count = 200_000;
      for (int i = 0; i < count; i++) {
        double instant = i * 0.000123456;
        double sample =
            2 * FastMath.cos(2 * FastMath.PI * hertz * (instant + sigma * random.nextGaussian()));
        line += 2 * sample * FastMath.cos(2 * FastMath.PI * hertz * instant) / count;
        power += sample * sample / count;
      }
      assertThat(2 * Lines.coherentShare(hertz, sigma)).isCloseTo(line, within(0.02));
      double noise = Math.sqrt(Math.max(0, power - line * line / 2));
      assertThat(Lines.jitterNoise(hertz, 2, sigma)).isCloseTo(noise, within(0.02));
    }
    double small = Noise.jitter(Noise.sineSlope(50, 2), 1e-7);
    assertThat(Lines.jitterNoise(50, 2, 1e-7)).isCloseTo(small, within(1e-9 * small));
  }
}
