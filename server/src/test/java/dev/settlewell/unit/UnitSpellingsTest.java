package dev.settlewell.unit;

import static org.assertj.core.api.Assertions.assertThat;

import java.text.Normalizer;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;
import org.junit.jupiter.params.provider.CsvSource;

/** Spellings of units and codes against what standards and the trade say of them. */
class UnitSpellingsTest {

  /** IEC 60062: the letter takes the place of the decimal point. */
  @ParameterizedTest
  @CsvFileSource(resources = "rkm-codes.csv", numLinesToSkip = 2)
  void letterDigitCodes(String code, double value, String unit) {
    String key = unit.startsWith("ohm") ? "ohm" : "farad";
    Reading<Toleranced> reading = Values.component(code, Keys.expected(key));
    assertThat(reading.flaws()).isEmpty();
    assertThat(reading.value().orElseThrow().value()).isEqualTo(value);
  }

  /** Every spelling of the table is either taken for exactly its meaning or refused. */
  @ParameterizedTest
  @CsvFileSource(resources = "unit-spellings.csv", numLinesToSkip = 2, emptyValue = "")
  void spellingsOfTheUnifiedCodeAndTheTrade(String spellings, String verdict, String note) {
    if (verdict.equals("unicode")) {
      return; // The facts of Unicode are checked below, character by character.
    }
    for (String spelling : spellings.split(" ", -1)) {
      Reading<Toleranced> reading = Values.quantity("5 " + spelling, allOfTheTable());
      double expected = meaning(spelling);
      if (Double.isNaN(expected)) {
        assertThat(reading.flaws()).as(spelling + ": " + note).isNotEmpty();
      } else {
        assertThat(reading.value().orElseThrow().value()).as(spelling).isEqualTo(expected);
      }
    }
  }

  private static Expected allOfTheTable() {
    return Expected.of(
        Dimension.VOLTAGE,
        Dimension.CURRENT,
        Dimension.RESISTANCE,
        Dimension.FREQUENCY,
        Dimension.TEMPERATURE,
        Dimension.RATIO,
        Dimension.DECIBEL);
  }

  /** Five of each unit, coherent; NaN where the spelling is not one of the format. */
  private static double meaning(String spelling) {
    return switch (spelling) {
      case "V", "Ohm", "dB", "Hz", "Cel", "S/s", "Sa/s", "sps" -> 5;
      case "mV" -> 5e-3;
      case "uV" -> 5e-6;
      case "pA" -> 5e-12;
      case "%" -> 0.05;
      case "ksps", "kSps", "kSPS" -> 5e3;
      case "Msps", "MSPS" -> 5e6;
      default -> Double.NaN;
    };
  }

  /** Unicode Character Database: canonical equivalents (NFC) are the same unit. */
  @ParameterizedTest
  @CsvSource({"\u2126, Ω", "\u212A, K"})
  void canonicalEquivalentsAreTheSameUnit(String written, String canonical) {
    assertThat(Normalizer.normalize(written, Normalizer.Form.NFC)).isEqualTo(canonical);
    assertThat(UnitTable.canonical(written)).isEqualTo(canonical);
    assertThat(
            UnitTable.read("m" + written)
                .orElseThrow()
                .comparableWith(UnitTable.read(canonical).orElseThrow()))
        .isTrue();
  }

  /** Unicode Character Database: compatibility equivalents, which NFC leaves apart. */
  @ParameterizedTest
  @CsvSource({"\u00B5, \u03BC", "\u2103, °C"})
  void compatibilityEquivalentsAreTheSameUnit(String one, String other) {
    assertThat(Normalizer.normalize(one, Normalizer.Form.NFKC)).isEqualTo(other);
    String unit = one.equals("\u00B5") ? "V" : "";
    assertThat(UnitTable.canonical(one + unit)).isEqualTo(UnitTable.canonical(other + unit));
  }

  @ParameterizedTest
  @CsvSource({
    "kohm, kΩ",
    "MOhm, MΩ",
    "uF, µF",
    "degC, °C",
    "ppm/degC, ppm/°C",
    "nV/rtHz, nV/√Hz",
    "V/us, V/µs",
    "kSPS, kSPS",
    "rpm, rpm",
    "%RH, %RH"
  })
  void canonical(String written, String canonical) {
    assertThat(UnitTable.canonical(written)).isEqualTo(canonical);
    assertThat(UnitTable.canonical(canonical)).isEqualTo(canonical);
  }

  /** A prefix that a unit cannot bear makes no unit. */
  @ParameterizedTest
  @CsvSource({
    "m°C", "k%", "mLSB", "kcycles", "mdB", "kbits", "mSPS", "µS/s", "KHz", "cm", "hPa", "TΩ", "kkΩ",
    "mmm", "V/A", "V/V/V"
  })
  void noUnit(String written) {
    assertThat(UnitTable.read(written)).isEmpty();
  }
}
