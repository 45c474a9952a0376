package dev.settlewell.finding;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.channel.Analyzer;
import dev.settlewell.channel.SheetGenerator;
import dev.settlewell.channel.SheetGenerator.Scale;
import dev.settlewell.channel.TestSheets;
import dev.settlewell.sheet.Linked;
import dev.settlewell.text.Fix;
import java.util.List;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;

/**
 * Every remedy that is offered on a sheet made worse at random (shorter times, larger resistances,
 * other capacitors, wider tolerances) removes its finding, and brings none as grave that was not
 * there. The analysis of the changed text is made anew here, not the one the offer rests on.
 */
class OfferedRemediesTest {
  private static final List<Scale> DAMAGES =
      List.of(
          new Scale(1, 1, 0.05, 1),
          new Scale(8, 1, 1, 1),
          new Scale(1, 0.02, 1, 1),
          new Scale(1, 30, 1, 1),
          new Scale(3, 0.2, 0.3, 4));

  private static List<Finding> findings(String text) {
    return Findings.of(Analyzer.analyze(TestSheets.link(text)));
  }

  @Test
  void eachRemovesItsFindingAndBringsNoneAsGrave() {
    long offered =
        LongStream.range(0, Long.getLong("settlewell.seeds", 12))
            .map(seed -> DAMAGES.stream().mapToLong(damage -> check(seed, damage)).sum())
            .sum();
    // Else the property above would hold of nothing.
    assertThat(offered).isGreaterThan(20);
  }

  private static long check(long seed, Scale damage) {
    String text = SheetGenerator.of(seed).text(damage);
    Linked linked = TestSheets.link(text);
    List<Finding> before = Findings.of(Analyzer.analyze(linked));
    long offered = 0;
    for (Finding finding : before) {
      List<Fix> candidates =
          Remedies.offered(linked.sheet().text(), finding, before, OfferedRemediesTest::findings);
      for (Fix fix : candidates) {
        if (!finding.fixes().contains(fix)) {
          offered++;
          held(seed, text, finding, before, fix, fix.applyTo(linked.sheet().text()));
        }
      }
    }
    return offered;
  }

  private static void held(
      long seed, String text, Finding finding, List<Finding> before, Fix fix, String mended) {
    String shown =
        "seed %d, %s on %s: %s\n%s".formatted(seed, finding.name(), finding.subject(), fix, text);
    assertThat(mended).as(shown).isNotEqualTo(text);
    List<Finding> after = findings(mended);
    assertThat(after)
        .as(shown)
        .noneMatch(
            f ->
                f.name().equals(finding.name())
                    && f.subject().equals(finding.subject())
                    && f.about().equals(finding.about()));
    for (Finding f : after) {
      boolean grave = !f.isAccepted() && f.severity().atLeast(finding.severity());
      boolean known =
          before.stream()
              .anyMatch(b -> b.name().equals(f.name()) && b.subject().equals(f.subject()));
      assertThat(!grave || known || f.name().equals("acceptance-unused"))
          .as(shown + "\nnew: " + f.name() + " " + f.message())
          .isTrue();
    }
  }
}
