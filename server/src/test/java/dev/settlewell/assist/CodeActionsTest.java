package dev.settlewell.assist;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.assist.CodeActions.Action;
import dev.settlewell.assist.CodeActions.Sort;
import dev.settlewell.finding.Finding;
import dev.settlewell.text.Span;
import java.util.List;
import org.junit.jupiter.api.Test;

class CodeActionsTest {

  private static List<Action> actions(Sample sample) {
    return CodeActions.at(
        sample.checked(), Sample.VOCABULARY, Span.at(sample.offset()), Sample::findings);
  }

  private static String apply(Sample sample, String title) {
    Action action =
        actions(sample).stream().filter(a -> a.title().contains(title)).findFirst().orElseThrow();
    return Sample.apply(sample.checked().text(), action.edits());
  }

  private static List<String> names(String text) {
    return Sample.findings(text).stream().filter(f -> !f.isAccepted()).map(Finding::name).toList();
  }

  @Test
  void aMissingUnitIsFilledIn() {
    Sample sample = Sample.board("clock: 8 MHz", "clock: 8‸");
    assertThat(names(sample.checked().text().content())).contains("missing-unit");
    assertThat(names(apply(sample, "MHz"))).doesNotContain("missing-unit");
  }

  @Test
  void theNearestNameIsOffered() {
    Sample sample = Sample.board("converter: adc", "converter: adv‸");
    assertThat(apply(sample, "adc")).contains("converter: adc\n");
  }

  /** 25 is not offered by the converter; the fix is proven by a fresh analysis. */
  @Test
  void aComputedValueIsOfferedWhereItHelps() {
    Sample sample = Sample.board("acquisition: 24 cycles", "acquisition: 25 cy‸cles");
    Action action =
        actions(sample).stream()
            .filter(
                a -> a.finding().map(f -> f.name().equals("acquisition-not-offered")).orElse(false))
            .findFirst()
            .orElseThrow();
    String mended = Sample.apply(sample.checked().text(), action.edits());
    assertThat(names(mended)).doesNotContain("acquisition-not-offered");
  }

  @Test
  void anAcceptanceWaitsForItsReason() {
    Sample sample = Sample.board("acquisition: 24 cycles", "acquisition: 2‸5 cycles");
    String text = apply(sample, "Accept acquisition-not-offered");
    assertThat(text)
        .contains("\n    accept:\n      - finding: acquisition-not-offered\n        because: ");
    String reasoned = text.replace("because: ", "because: measured on the bench");
    assertThat(names(reasoned)).doesNotContain("acquisition-not-offered", "syntax", "unknown-key");
  }

  @Test
  void aSecondAcceptanceJoinsTheFirst() {
    Sample sample =
        Sample.board(
            "acquisition: 24 cycles",
            "acquisition: 2‸5 cycles\n    accept:\n      - finding: filter-droop\n"
                + "        because: slow enough");
    String text = apply(sample, "Accept acquisition-not-offered");
    assertThat(text).containsOnlyOnce("accept:").contains("- finding: acquisition-not-offered");
    String reasoned = text.replace("because: \n", "because: measured\n");
    assertThat(names(reasoned)).doesNotContain("acquisition-not-offered", "syntax");
  }

  @Test
  void fixAllChangesSpellingsOnly() {
    Sample sample = Sample.of("‸" + Sample.BOARD.replace("clock: 8 MHz", "clock: 8 mhz"));
    for (Action action : actions(sample)) {
      if (action.sort() == Sort.FIX_ALL) {
        assertThat(action.edits()).allMatch(edit -> !edit.replacement().isBlank());
      }
    }
    Sample wrong =
        Sample.of("‸" + Sample.BOARD.replace("acquisition: 24 cycles", "acquisition: 25 cycles"));
    assertThat(actions(wrong)).noneMatch(action -> action.sort() == Sort.FIX_ALL);
  }

  @Test
  void aToleranceMovesIntoDefaults() {
    Sample sample = Sample.board("4.7 kΩ ±1 %", "4.7 k‸Ω ±1 %");
    String text = apply(sample, "into defaults");
    assertThat(text).contains("defaults:\n  resistor: ±1 %\n\nsupplies:");
    assertThat(text).contains("- resistor: 4.7 kΩ\n");
    Sample there =
        Sample.of(
            Sample.BOARD
                .replace("4.7 kΩ ±1 %", "4.7 k‸Ω ±1 %")
                .replace("supplies:", "defaults:\n  resistor: ±5 %\n\nsupplies:"));
    assertThat(actions(there)).noneMatch(action -> action.title().contains("defaults"));
  }

  @Test
  void nothingIsOfferedWhereNothingIsWrong() {
    assertThat(actions(Sample.board("bits: 12", "bi‸ts: 12"))).isEmpty();
  }
}
