package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Severity;
import dev.settlewell.text.Problem;

/** A used sheet that is not there. */
final class UseNotFound extends TextCheck {
  UseNotFound() {
    super(Problem.Kind.USE_NOT_FOUND);
  }

  @Override
  public String name() {
    return "use-not-found";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "a used sheet that is not there";
  }
}
