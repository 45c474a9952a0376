package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Severity;
import dev.settlewell.text.Problem;

/** A required key that is not there. */
final class MissingKey extends TextCheck {
  MissingKey() {
    super(Problem.Kind.MISSING_KEY);
  }

  @Override
  public String name() {
    return "missing-key";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "a key that is required is not there";
  }
}
