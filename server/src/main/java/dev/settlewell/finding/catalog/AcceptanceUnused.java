package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import java.util.function.Consumer;

/**
 * An acceptance that nothing needs any more. It stands here for its name and page; it is raised
 * where acceptances meet the findings of all other checks.
 */
final class AcceptanceUnused implements Check {
  @Override
  public String name() {
    return "acceptance-unused";
  }

  @Override
  public Severity severity() {
    return Severity.INFORMATION;
  }

  @Override
  public String summary() {
    return "an acceptance with nothing to accept";
  }

  @Override
  public void run(Analysis analysis, Consumer<Finding> report) {
    // Raised once all other findings are known.
  }
}
