package dev.settlewell.finding;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.finding.catalog.Catalog;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.SourceText;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

/** A computed value is offered only where the changed sheet shows that it helps. */
class RemediesTest {
  private static final SourceText TEXT =
      SourceText.of("t.channels.yaml", "acquisition: 6 cycles\n");
  private static final Fix LONGER =
      new Fix("Acquire for 12 cycles", List.of(new Edit(TEXT.place(13, 21), "12 cycles")), false);

  private static Finding finding(String name, Severity severity, Fix... candidates) {
    return new Finding(
        name,
        severity,
        TEXT.place(13, 21),
        "level",
        "",
        "said",
        List.of(),
        List.of(),
        List.of(),
        List.of(candidates),
        Optional.empty());
  }

  private static List<Fix> offered(Finding finding, List<Finding> before, Finding... after) {
    List<String> analysed = new ArrayList<>();
    List<Fix> offered =
        Remedies.offered(
            TEXT,
            finding,
            before,
            changed -> {
              analysed.add(changed);
              return List.of(after);
            });
    assertThat(analysed).allMatch("acquisition: 12 cycles\n"::equals);
    return offered;
  }

  @Test
  void whatRemovesTheFindingIsOffered() {
    Finding tooShort = finding("acquisition-too-short", Severity.WARNING, LONGER);
    assertThat(offered(tooShort, List.of(tooShort))).containsExactly(LONGER);
  }

  @Test
  void whatLeavesItIsNot() {
    Finding tooShort = finding("acquisition-too-short", Severity.WARNING, LONGER);
    assertThat(
            offered(tooShort, List.of(tooShort), finding("acquisition-too-short", Severity.HINT)))
        .isEmpty();
  }

  @Test
  void whatRaisesOneAsGraveIsNot() {
    Finding tooShort = finding("acquisition-too-short", Severity.WARNING, LONGER);
    assertThat(
            offered(tooShort, List.of(tooShort), finding("scan-overruns-period", Severity.ERROR)))
        .isEmpty();
    assertThat(offered(tooShort, List.of(tooShort), finding("filter-droop", Severity.WARNING)))
        .isEmpty();
  }

  @Test
  void aLesserFindingOrOneThatWasThereDoesNotCount() {
    Finding tooShort = finding("acquisition-too-short", Severity.WARNING, LONGER);
    Finding old = finding("over-range", Severity.ERROR);
    assertThat(
            offered(
                tooShort,
                List.of(tooShort, old),
                old,
                finding("acquisition-marginal", Severity.HINT)))
        .containsExactly(LONGER);
  }

  @Test
  void aPlainFixNeedsNoProof() {
    Finding plain = finding("unknown-key", Severity.ERROR).withFixes(List.of(LONGER));
    List<Fix> offered =
        Remedies.offered(
            TEXT,
            plain,
            List.of(plain),
            changed -> {
              throw new AssertionError("nothing to prove");
            });
    assertThat(offered).containsExactly(LONGER);
  }

  /** On the pages' own sheets: each offer removes its finding, and no computed value is safe. */
  @Test
  void whatIsOfferedHelpsOnEveryPage() {
    List<String> mended = new ArrayList<>();
    for (Check check : Catalog.CHECKS) {
      String sheet =
          Pages.of(check.name()).orElseThrow().sheet("A sheet that has it").orElseThrow();
      Judged judged = Judged.sheet(sheet);
      for (Finding finding : judged.findings()) {
        if (finding.candidates().isEmpty() || !finding.name().equals(check.name())) {
          continue;
        }
        List<Fix> offered =
            Remedies.offered(
                judged.text(),
                finding,
                judged.findings(),
                changed -> Judged.sheet(changed).findings());
        for (Fix fix : offered) {
          assertThat(fix.safe()).as(fix.title()).isFalse();
          assertThat(Judged.sheet(fix.applyTo(judged.text())).names())
              .as(fix.title())
              .doesNotContain(finding.name(), "syntax");
          mended.add(check.name());
        }
      }
    }
    assertThat(mended)
        .contains(
            "acquisition-too-short",
            "reservoir-too-small",
            "acquisition-not-offered",
            "scan-overruns-period",
            "clock-outside-limits",
            "band-above-half-rate",
            "interferer-reads-as-offset",
            "interferer-aliases-into-band",
            "filter-droop",
            "over-range",
            "pin-overstressed",
            "accumulator-overflows");
  }
}
