package dev.settlewell.review;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Findings;
import dev.settlewell.finding.Severity;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;

/**
 * A report in numbers.
 *
 * @param bySeverity findings that are not accepted
 * @param unjudged channels of which not everything could be computed, accepted or not
 * @param faults things this program failed to work out
 */
public record Summary(
    int sheets,
    Map<Severity, Integer> bySeverity,
    int accepted,
    int unjudged,
    int faults,
    int unreadable) {
  /** The finding that says that figures lack an input. */
  static final String NOT_COMPUTED = "not-computed";

  public Summary {
    bySeverity = Map.copyOf(bySeverity);
  }

  public static Summary of(Review review) {
    List<Finding> all = review.sheets().stream().flatMap(s -> s.findings().stream()).toList();
    Map<Severity, Integer> counts = new EnumMap<>(Severity.class);
    for (Finding finding : all) {
      if (!finding.isAccepted()) {
        counts.merge(finding.severity(), 1, Integer::sum);
      }
    }
    return new Summary(
        review.sheets().size(),
        counts,
        (int) all.stream().filter(Finding::isAccepted).count(),
        (int) all.stream().filter(f -> f.name().equals(NOT_COMPUTED)).count(),
        (int) all.stream().filter(f -> f.name().equals(Findings.INTERNAL_FAULT)).count(),
        review.failures().size());
  }

  public int count(Severity severity) {
    return bySeverity.getOrDefault(severity, 0);
  }

  /** How many findings are at least as grave. */
  public int atLeast(Severity severity) {
    return bySeverity.entrySet().stream()
        .filter(entry -> entry.getKey().atLeast(severity))
        .mapToInt(Map.Entry::getValue)
        .sum();
  }

  /** {@code 1 error, 2 hints in 3 sheets; 1 accepted; 2 channels not fully judged}. */
  public String sentence() {
    StringBuilder sentence = new StringBuilder();
    add(sentence, count(Severity.ERROR), "error", "errors");
    add(sentence, count(Severity.WARNING), "warning", "warnings");
    add(sentence, count(Severity.INFORMATION), "information", "information");
    add(sentence, count(Severity.HINT), "hint", "hints");
    if (sentence.isEmpty()) {
      sentence.append("no findings");
    }
    sentence.append(" in ").append(counted(sheets, "sheet", "sheets"));
    if (accepted > 0) {
      sentence.append("; ").append(accepted).append(" accepted");
    }
    if (unjudged > 0) {
      sentence.append("; ").append(counted(unjudged, "channel", "channels"));
      sentence.append(" not fully judged");
    }
    if (unreadable > 0) {
      sentence.append("; ").append(counted(unreadable, "file", "files")).append(" not read");
    }
    return sentence.toString();
  }

  private static void add(StringBuilder sentence, int count, String one, String many) {
    if (count > 0) {
      sentence.append(sentence.isEmpty() ? "" : ", ").append(counted(count, one, many));
    }
  }

  private static String counted(int count, String one, String many) {
    return count + " " + (count == 1 ? one : many);
  }
}
