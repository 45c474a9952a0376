package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Severity;
import dev.settlewell.text.Problem;

/** A key or a name that stands twice. */
final class DuplicateName extends TextCheck {
  DuplicateName() {
    super(Problem.Kind.DUPLICATE_NAME);
  }

  @Override
  public String name() {
    return "duplicate-name";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "a key or a name that stands twice";
  }
}
