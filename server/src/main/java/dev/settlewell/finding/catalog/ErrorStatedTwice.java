package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Severity;
import dev.settlewell.text.Problem;

/** A total unadjusted error beside its parts. */
final class ErrorStatedTwice extends TextCheck {
  ErrorStatedTwice() {
    super(Problem.Kind.ERROR_STATED_TWICE);
  }

  @Override
  public String name() {
    return "error-stated-twice";
  }

  @Override
  public Severity severity() {
    return Severity.WARNING;
  }

  @Override
  public String summary() {
    return "a total error is stated beside its parts, which would count it twice";
  }
}
