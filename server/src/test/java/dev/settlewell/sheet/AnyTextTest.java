package dev.settlewell.sheet;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.text.Fix;
import dev.settlewell.text.Problem;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Whatever the text: there is a sheet, its problems lie inside it, and nothing throws. */
class AnyTextTest {
  private static final String SEED = System.getProperty("seed", "20261201");
  private static final String[] PIECES = {
    ":",
    "-",
    "{",
    "}",
    "[",
    "]",
    ",",
    "#",
    "'",
    "\"",
    "\n",
    "  ",
    "\t",
    "&a",
    "*a",
    "!x",
    "|",
    ">",
    "0",
    "±",
    "µ",
    "Ω",
    "\u2028",
    "\uD83D\uDE00",
    "\uD83D",
    "~",
    "null",
    "1e999",
    "NaN",
    "k=2",
    " to ",
    " of ",
    "%",
    "\u0000",
    "? ",
    "---\n",
    "<<: *a\n"
  };

  @Test
  void a_sheet_comes_of_every_mutilated_text() {
    String whole = Bound.resource("press.channels.yaml");
    Random random = new Random(Long.parseLong(SEED));
    for (int round = 0; round < 120; round++) {
      String text = mutilated(whole, random);
      try {
        check(text);
      } catch (RuntimeException | Error e) {
        throw new AssertionError("seed " + SEED + ", round " + round + ":\n" + text, e);
      }
    }
  }

  private static String mutilated(String whole, Random random) {
    // A third of the sheet at a time: small texts fail in more ways a second than large ones.
    int from = random.nextInt(whole.length() / 2);
    int to = from + random.nextInt(whole.length() - from);
    StringBuilder text =
        new StringBuilder(random.nextBoolean() ? whole : whole.substring(from, to));
    for (int change = random.nextInt(8); change >= 0; change--) {
      int at = random.nextInt(text.length() + 1);
      if (random.nextBoolean()) {
        text.insert(at, PIECES[random.nextInt(PIECES.length)]);
      } else {
        text.delete(at, Math.min(text.length(), at + random.nextInt(12)));
      }
    }
    return text.toString();
  }

  private static void check(String text) {
    Sheet sheet = Bound.sheet(text);
    Linked linked =
        Link.link(sheet, List.of(), true, List.of(), Bound.VOCABULARY, LocalDate.of(2026, 12, 1));
    List<Problem> problems = new ArrayList<>(sheet.problems());
    problems.addAll(linked.problems());
    for (Problem problem : problems) {
      assertThat(problem.place().end()).as(problem.message()).isLessThanOrEqualTo(text.length());
      assertThat(problem.message()).isNotBlank();
      for (Fix fix : problem.fixes()) {
        fix.edits()
            .forEach(edit -> assertThat(edit.place().end()).isLessThanOrEqualTo(text.length()));
      }
    }
  }
}
