package dev.settlewell.review;

import dev.settlewell.channel.Analysis;
import dev.settlewell.finding.Finding;
import dev.settlewell.sheet.Sheet;
import dev.settlewell.text.Fix;
import dev.settlewell.text.SourceText;
import java.util.List;
import java.util.Map;

/**
 * One sheet, read, computed and judged.
 *
 * @param findings in the order of the text, accepted ones among them
 * @param remedies by finding: the ways to mend it that were shown to help; a finding that is not
 *     here has none, or nobody asked
 */
public record Reviewed(
    Analysis analysis, List<Finding> findings, Map<Finding, List<Fix>> remedies) {
  public Reviewed {
    findings = List.copyOf(findings);
    remedies = Map.copyOf(remedies);
  }

  public Reviewed(Analysis analysis, List<Finding> findings) {
    this(analysis, findings, Map.of());
  }

  /** As reports show it: relative to where the tool was started, with {@code /}. */
  public String path() {
    return sheet().path();
  }

  public Sheet sheet() {
    return analysis.linked().sheet();
  }

  public SourceText text() {
    return sheet().text();
  }

  /** Those that count: what the sheet accepts is known and meant. */
  public List<Finding> open() {
    return findings.stream().filter(finding -> !finding.isAccepted()).toList();
  }
}
