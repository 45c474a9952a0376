package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Severity;
import dev.settlewell.text.Problem;

/** A spelling that may mean two things, or none. */
final class NotOneValue extends TextCheck {
  NotOneValue() {
    super(Problem.Kind.NOT_ONE_VALUE);
  }

  @Override
  public String name() {
    return "not-one-value";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "a spelling that cannot be read as exactly one value";
  }
}
