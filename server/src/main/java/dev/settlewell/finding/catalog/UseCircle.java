package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Severity;
import dev.settlewell.text.Problem;

/** Sheets that use each other in a circle. */
final class UseCircle extends TextCheck {
  UseCircle() {
    super(Problem.Kind.USE_CIRCLE);
  }

  @Override
  public String name() {
    return "use-circle";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "sheets that use each other in a circle";
  }
}
