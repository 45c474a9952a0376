package dev.settlewell.finding;

import dev.settlewell.text.Fix;
import dev.settlewell.text.SourceText;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;

/**
 * Which ways to mend a finding are offered.
 *
 * <p>A check puts computed values on its finding as candidates, without a promise: a formula for
 * one figure knows nothing of the others. Only when somebody asks for the ways to mend it (a quick
 * fix, the command line) is the changed sheet analysed afresh, and a candidate is offered only
 * where that shows that the finding is gone and that none of equal or higher severity has come. The
 * one who asks brings the analysis along, for reading used sheets is not this package's matter.
 */
public final class Remedies {
  private Remedies() {}

  /**
   * @param text the sheet the finding is about
   * @param finding one of {@code present}
   * @param present all findings of the sheet as it is
   * @param analyse the findings of the sheet with another text; everything it uses unchanged
   * @return the finding's plain fixes, then the candidates that were shown to help
   */
  public static List<Fix> offered(
      SourceText text,
      Finding finding,
      List<Finding> present,
      Function<String, List<Finding>> analyse) {
    List<Fix> offered = new ArrayList<>(finding.fixes());
    for (Fix candidate : finding.candidates()) {
      if (staysInside(candidate, text)
          && helps(finding, present, analyse.apply(candidate.applyTo(text)))) {
        offered.add(candidate);
      }
    }
    return offered;
  }

  private static boolean staysInside(Fix fix, SourceText text) {
    return !fix.edits().isEmpty()
        && fix.edits().stream().allMatch(edit -> edit.place().sheet().equals(text.name()));
  }

  /**
   * An acceptance that falls idle with the finding it held back is no reason against mending it.
   */
  private static boolean helps(Finding finding, List<Finding> before, List<Finding> after) {
    return after.stream().noneMatch(finding::sameAs)
        && after.stream()
            .filter(f -> !f.isAccepted() && f.severity().atLeast(finding.severity()))
            .filter(f -> !f.name().equals(Acceptances.UNUSED))
            .allMatch(f -> before.stream().anyMatch(f::sameAs));
  }
}
