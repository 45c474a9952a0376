package dev.settlewell.unit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.fail;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Whatever stands in a sheet, reading it answers and never fails. */
class AnyTextTest {
  private static final int CASES = 100_000;

  private static final List<String> FORMS =
      List.of(
          "quantity component deviation need range output count plain fraction ratio".split(" "));
  private static final List<String> KEYS =
      List.of(
          ("any ohm farad volt level hertz time lsb point drift difference positive metre bar")
              .split(" "));

  /** Pieces of values, of slips and of nothing at all. */
  private static final List<String> PIECES =
      List.of(
          ("4.7 100 1e-9 4,7 10'000 0x1F 1/2 .5 5. 010 1e999 0 ± +- +/- + - /- / ( ) (k=2) k = n kΩ"
                  + " K m V % ppm/K °C µF of ref reading full scale to at box rms peak-to-peak"
                  + " worst-case max DC Vpp 4k7 R47 J M bar , @ < ~ .. – # \u00A0 \u2212"
                  + " \uD83D\uDE00 \uD83D \uDE00 \u0000 \u2028 ı İ é 漢 E e _ ' \"")
              .split(" "));

  @Test
  void neverThrowsAndMarksOnlyWhatIsThere() {
    for (int seed = 0; seed < CASES; seed++) {
      Random random = new Random(seed);
      String form = FORMS.get(random.nextInt(FORMS.size()));
      String key = KEYS.get(random.nextInt(KEYS.size()));
      String text = text(random);
      try {
        check(text, Keys.read(form, text, Keys.expected(key)));
      } catch (RuntimeException | AssertionError failure) {
        fail("seed " + seed + ", " + form + " at " + key + ": [" + text + "]", failure);
      }
    }
  }

  private static String text(Random random) {
    StringBuilder text = new StringBuilder();
    int pieces = random.nextInt(9);
    for (int i = 0; i < pieces; i++) {
      text.append(PIECES.get(random.nextInt(PIECES.size())));
      if (random.nextInt(3) == 0) {
        text.append(' ');
      }
    }
    return text.toString();
  }

  private static void check(String text, Reading<?> reading) {
    if (reading.value().isEmpty() && reading.flaws().isEmpty()) {
      throw new AssertionError("neither a value nor a flaw");
    }
    int end = 0;
    for (Flaw flaw : reading.flaws()) {
      if (reading.value().isPresent() && flaw.safe() && flaw.from() < end) {
        throw new AssertionError("two edits that overlap: " + reading.flaws());
      }
      end = flaw.to();
      boolean inside = 0 <= flaw.from() && flaw.from() <= flaw.to() && flaw.to() <= text.length();
      if (!inside || flaw.message().isBlank() || flaw.safe() && flaw.spellings().isEmpty()) {
        throw new AssertionError("a flaw that does not hold: " + flaw);
      }
    }
  }

  /** A value beside slips is the value of the mended text: that is what makes a fix safe. */
  @Test
  void safeSpellingsKeepTheValue() {
    int mended = 0;
    for (int seed = 0; seed < CASES / 2; seed++) {
      Random random = new Random(seed);
      String form = FORMS.get(random.nextInt(FORMS.size()));
      Expected expected = Keys.expected(KEYS.get(random.nextInt(KEYS.size())));
      String text = text(random);
      Reading<?> reading = Keys.read(form, text, expected);
      boolean safe = reading.flaws().stream().allMatch(Flaw::safe);
      if (reading.value().isEmpty() || reading.flaws().isEmpty() || !safe) {
        continue;
      }
      String whole = mended(text, reading.flaws());
      Reading<?> again = Keys.read(form, whole, expected);
      if (!again.flaws().isEmpty() || !bare(again).equals(bare(reading))) {
        fail("seed %d: [%s] -> [%s]: %s, then %s", seed, text, whole, reading, again);
      }
      mended++;
    }
    assertThat(mended).isGreaterThan(100);
  }

  private static String mended(String text, List<Flaw> flaws) {
    StringBuilder mended = new StringBuilder(text);
    for (int i = flaws.size() - 1; i >= 0; i--) {
      Flaw flaw = flaws.get(i);
      mended.replace(flaw.from(), flaw.to(), flaw.spellings().get(0));
    }
    return mended.toString();
  }

  private static String bare(Reading<?> reading) {
    return reading.value().map(Object::toString).orElse("").replaceAll("written=[^,]*", "written");
  }

  @Test
  void tokensCoverTheTextInItsOrder() {
    for (int seed = 0; seed < CASES / 10; seed++) {
      String text = text(new Random(seed));
      for (Form form : Form.values()) {
        int end = 0;
        for (ValueTokens.Piece piece : ValueTokens.of(form, text)) {
          boolean forward = end <= piece.from() && piece.from() < piece.to();
          if (!forward || !Lexer.plain(text.substring(end, piece.from())).isBlank()) {
            fail("seed %d: [%s] at %s", seed, text, piece);
          }
          end = piece.to();
        }
        if (!Lexer.plain(text.substring(end)).isBlank()) {
          fail("seed %d: [%s] ends at %d", seed, text, end);
        }
      }
    }
  }

  @Test
  void longTextsAreAnswered() {
    for (String piece : List.of("1", "1,", "k", "±1 %", "1 000 ", "/", "(", "é", "9.")) {
      for (int length : List.of(900, 100_000)) {
        String text = piece.repeat(length / piece.length());
        for (String form : FORMS) {
          check(text, Keys.read(form, text, Keys.expected("any")));
        }
      }
    }
  }
}
