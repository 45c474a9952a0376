package dev.settlewell.assist;

import dev.settlewell.channel.Analysis;
import dev.settlewell.finding.Finding;
import dev.settlewell.sheet.Linked;
import dev.settlewell.sheet.Sheet;
import dev.settlewell.syntax.SyntaxTree;
import dev.settlewell.text.SourceText;
import java.util.List;
import java.util.Optional;

/**
 * One sheet, read, computed and judged: the one thing every feature of an editor looks at.
 *
 * @param findings in the order of the text, accepted ones among them
 */
public record Checked(Analysis analysis, List<Finding> findings) {
  public Checked {
    findings = List.copyOf(findings);
  }

  public Linked linked() {
    return analysis.linked();
  }

  public Sheet sheet() {
    return linked().sheet();
  }

  public SourceText text() {
    return sheet().text();
  }

  public SyntaxTree tree() {
    return sheet().tree();
  }

  /** The text of this sheet, of one that it uses, or of a source of its firmware. */
  public Optional<SourceText> text(String name) {
    return linked().text(name);
  }
}
