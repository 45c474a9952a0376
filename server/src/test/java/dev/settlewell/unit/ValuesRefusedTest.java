package dev.settlewell.unit;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.text.Problem;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvFileSource;

/** What the grammar refuses, where it marks the text, and what it says to write. */
class ValuesRefusedTest {

  @ParameterizedTest(name = "{0} {1}: {2}")
  @CsvFileSource(
      resources = "refused.psv",
      delimiter = '|',
      quoteCharacter = '\u0000',
      emptyValue = "",
      ignoreLeadingAndTrailingWhitespace = false)
  void refused(
      String form, String key, String raw, String marked, String mended, String kind, String safe) {
    String text = raw == null ? "" : raw;
    Expected expected = Keys.expected(key);
    List<Flaw> flaws = Keys.read(form, text, expected).flaws();
    assertThat(flaws).hasSize(1);
    Flaw flaw = flaws.get(0);
    assertThat(text.substring(flaw.from(), flaw.to())).isEqualTo(marked == null ? "" : marked);
    assertThat(flaw.kind()).isEqualTo(Problem.Kind.valueOf(kind));
    assertThat(flaw.safe()).isEqualTo(safe.equals("safe"));
    if (mended.equals("-")) {
      assertThat(flaw.spellings()).isEmpty();
      return;
    }
    assertThat(mended(text, flaw)).isEqualTo(mended);
    assertThat(flaw.message()).contains("write ").contains(mended);
    if (!mended.startsWith("{")) {
      assertThat(Keys.read(form, mended, expected).flaws()).isEmpty();
    }
  }

  private static String mended(String text, Flaw flaw) {
    String with = text.substring(0, flaw.from()) + flaw.spellings().get(0);
    return (with + text.substring(flaw.to())).trim();
  }

  @Test
  void messageIsOnePlainSentence() {
    Flaw flaw = Values.quantity("4,7 kΩ", Keys.expected("ohm")).flaws().get(0);
    assertThat(flaw.message()).isEqualTo("write 4.7 kΩ: a decimal point, not a comma");
  }

  @Test
  void everySpellingThatMayBeMeantIsOffered() {
    assertThat(Values.quantity("10,000 Ω", Keys.expected("ohm")).flaws().get(0).spellings())
        .containsExactly("10000", "10.000");
    assertThat(Values.quantity("5", Keys.expected("time")).flaws().get(0).spellings())
        .containsExactly("5 µs", "5 ms", "5 ns", "5 s");
    assertThat(Values.quantity("5", Keys.expected("metre")).flaws().get(0).spellings())
        .startsWith("5 m");
  }

  @Test
  void twoSlipsAreBothSaidAndTheMessageMendsBoth() {
    Reading<Toleranced> reading = Values.quantity("4,7 KΩ", Keys.expected("ohm"));
    assertThat(reading.flaws()).hasSize(2);
    assertThat(reading.flaws())
        .allSatisfy(flaw -> assertThat(flaw.message()).startsWith("write 4.7 kΩ: "));
    assertThat(reading.value().orElseThrow().value()).isEqualTo(4700);
  }

  @Test
  void whatIsNotCertainHasNoValue() {
    assertThat(Values.quantity("10,000 Ω", Keys.expected("ohm")).value()).isEmpty();
    assertThat(Values.quantity("5 mhz", Keys.expected("hertz")).value()).isEmpty();
  }

  @Test
  void milliohmIsReadAndAskedBackButNotAtAShuntOrWithTheSign() {
    Expected ohm = Keys.expected("ohm");
    assertThat(Values.quantity("5 mohm", ohm).value().orElseThrow().value()).isEqualTo(0.005);
    assertThat(Values.quantity("5 mohm", ohm).flaws().get(0).spellings())
        .containsExactly("5 mΩ", "5 MΩ");
    Expected shunt = new Expected(ohm.dimensions(), ohm.measured(), false, true, true);
    assertThat(Values.quantity("5 mohm", shunt).flaws()).isEmpty();
    assertThat(Values.quantity("5 mΩ", ohm).flaws()).isEmpty();
    assertThat(Values.quantity("500 mohm", ohm).flaws()).isEmpty();
  }
}
