package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Severity;
import dev.settlewell.text.Problem;

/** A used sheet outside the workspace, which is never read. */
final class UseOutsideWorkspace extends TextCheck {
  UseOutsideWorkspace() {
    super(Problem.Kind.USE_OUTSIDE_WORKSPACE);
  }

  @Override
  public String name() {
    return "use-outside-workspace";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "a used sheet outside the workspace";
  }
}
