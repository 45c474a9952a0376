package dev.settlewell.assist;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.assist.Completion.Proposal;
import dev.settlewell.text.Span;
import java.util.Random;
import org.junit.jupiter.api.Test;

/**
 * Every feature on sheets as they are while somebody types: cut, doubled, swapped, half written.
 */
class DamagedTextTest {
  private static final int ROUNDS = 150;
  private static final String[] SCRAPS = {
    ":",
    "- ",
    "\n",
    "  ",
    "\t",
    "{",
    "}",
    "[",
    "]",
    "\"",
    "'",
    "#",
    " # ",
    "|",
    ">",
    "&a",
    "*a",
    "±",
    "😀",
    "\r\n",
    "---\n",
    "<<: ",
    "? ",
    "4,7 k",
    "\uFEFF",
    "\u0000",
    "channels:\n",
    "x: y: z"
  };

  private static String damaged(Random random) {
    StringBuilder text = new StringBuilder(Sample.BOARD);
    for (int i = 1 + random.nextInt(3); i > 0; i--) {
      int at = random.nextInt(text.length());
      switch (random.nextInt(4)) {
        case 0 -> text.insert(at, SCRAPS[random.nextInt(SCRAPS.length)]);
        case 1 -> text.delete(at, Math.min(text.length(), at + 1 + random.nextInt(20)));
        case 2 -> text.setLength(Math.max(20, at));
        default -> text.insert(at, text.substring(at, Math.min(text.length(), at + 30)));
      }
    }
    return text.toString();
  }

  @Test
  void nothingThrowsAndEverythingStaysInsideTheText() {
    for (long seed = 1; seed <= ROUNDS; seed++) {
      Random random = new Random(seed);
      String text = damaged(random);
      try {
        all(Sample.check(text), random);
      } catch (RuntimeException | AssertionError fault) {
        throw new AssertionError("seed " + seed + ":\n" + text, fault);
      }
    }
  }

  private static void all(Checked checked, Random random) {
    int length = checked.text().length();
    Span whole = new Span(0, length);
    Symbols.of(checked, Sample.VOCABULARY);
    Folding.of(checked, Sample.VOCABULARY);
    Links.of(checked, Sample.VOCABULARY);
    Lenses.of(checked);
    InlayHints.of(checked, Sample.VOCABULARY, whole);
    CodeActions.fixAll(checked);
    int last = 0;
    for (Tokens.Token token : Tokens.of(checked, Sample.VOCABULARY)) {
      assertThat(token.span().start()).isGreaterThanOrEqualTo(last);
      last = token.span().end();
      assertThat(last).isLessThanOrEqualTo(length);
    }
    String formatted = Sample.apply(checked.text(), Formatting.of(checked, Sample.VOCABULARY));
    Checked again = Sample.check(formatted);
    assertThat(Sample.apply(again.text(), Formatting.of(again, Sample.VOCABULARY)))
        .isEqualTo(formatted);
    for (int i = 0; i < 20; i++) {
      at(checked, random.nextInt(length + 1));
    }
  }

  private static void at(Checked checked, int offset) {
    Hover.at(checked, Sample.VOCABULARY, offset);
    Navigation.nameAt(checked, Sample.VOCABULARY, offset);
    Selections.around(checked, Sample.VOCABULARY, offset);
    for (Proposal proposal : Completion.at(checked, Sample.VOCABULARY, offset)) {
      assertThat(proposal.span().end()).isLessThanOrEqualTo(checked.text().length());
    }
  }
}
