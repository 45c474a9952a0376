package dev.settlewell.unit;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.RoundingMode;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Engineering notation: prefixes of powers of 1000 (SI Brochure, 9th edition, table 7). */
class EngineeringTest {

  @ParameterizedTest
  @CsvSource({
    "3e-6, s, 3.00 µs",
    "5.806e-6, s, 5.81 µs",
    "4700, Ω, 4.70 kΩ",
    "999.4, Ω, 999 Ω",
    "999.6, Ω, 1.00 kΩ",
    "0.02, A, 20.0 mA",
    "1e-13, F, 1.00e-13 F",
    "2e12, Hz, 2.00e12 Hz",
    "-0.0123, V, -12.3 mV",
    "0, V, 0 V",
    "4.7, LSB, 4.7 LSB",
    "0.2868, LSB, 0.287 LSB",
    "1023.4, LSB, 1023 LSB",
    "47, cycles, 47 cycles",
    "0.0155, 1, 1.55 %",
    "1e-4, 1/K, 100 ppm/K",
    "1e7, V/s, 10.0 V/µs",
    "8e-9, V/√Hz, 8.00 nV/√Hz",
    "5e-7, V/K, 500 nV/K",
    "0.008, W/K, 8.00 mW/K",
    "26.85, °C, 26.9 °C",
    "2000, g, 2.00 kg",
    "0.03, m, 30.0 mm",
    "2.5, bar, 2.5 bar",
    "1e-9, LSB, 1e-9 LSB",
  })
  void message(double value, String symbol, String text) {
    assertThat(Engineering.message(value, symbol)).isEqualTo(text);
  }

  @ParameterizedTest
  @CsvSource({
    "5.81e-6, s, 5.81 µs",
    "1e-7, F, 100 nF",
    "470000, Ω, 470 kΩ",
    "0.1, V, 100 mV",
    "0.001, 1, 0.1 %",
    "25e-6, 1/K, 25 ppm/K",
    "0.5, LSB, 0.5 LSB",
    "1e20, LSB, 1e20 LSB",
    "0, V, 0 V",
  })
  void exact(double value, String symbol, String text) {
    assertThat(Engineering.exact(value, symbol)).isEqualTo(text);
  }

  @Test
  void roundingStaysOnTheSafeSide() {
    assertThat(Engineering.rounded(5.8012e-6, 3, RoundingMode.CEILING, "s")).isEqualTo("5.81 µs");
    assertThat(Engineering.rounded(5.8098e-6, 3, RoundingMode.FLOOR, "s")).isEqualTo("5.8 µs");
    assertThat(Engineering.rounded(5.8098e-6, 3, RoundingMode.HALF_UP, "s")).isEqualTo("5.81 µs");
    assertThat(Engineering.rounded(6e-6, 3, RoundingMode.CEILING, "s")).isEqualTo("6 µs");
    assertThat(Engineering.rounded(999.9, 3, RoundingMode.CEILING, "Ω")).isEqualTo("1 kΩ");
  }

  @Test
  void noNumberIsStillAWord() {
    assertThat(Engineering.message(Double.POSITIVE_INFINITY, "Ω")).isEqualTo("unlimited");
    assertThat(Engineering.message(Double.NaN, "Ω")).isEqualTo("undefined");
  }

  @Test
  void theSameInEveryLocale() {
    Locale before = Locale.getDefault();
    try {
      for (String tag : new String[] {"de", "tr", "ar-EG", "hi-IN-u-nu-deva"}) {
        Locale.setDefault(Locale.forLanguageTag(tag));
        assertThat(Engineering.message(-4712.5, "Ω")).isEqualTo("-4.71 kΩ");
        assertThat(Engineering.exact(4712.5, "Ω")).isEqualTo("4.7125 kΩ");
        assertThat(Values.quantity("5 khz", Keys.expected("hertz")).flaws().get(0).spellings())
            .containsExactly("kHz");
      }
    } finally {
      Locale.setDefault(before);
    }
  }
}
