package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import java.util.function.Consumer;

/**
 * An acceptance whose last day is over. It stands here for its name and page; it is raised where
 * acceptances meet the findings of all other checks, with the severity of the finding it held back.
 */
final class AcceptanceExpired implements Check {
  @Override
  public String name() {
    return "acceptance-expired";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "an acceptance whose last day is over";
  }

  @Override
  public void run(Analysis analysis, Consumer<Finding> report) {
    // Raised once all other findings are known.
  }
}
