package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Severity;
import dev.settlewell.text.Problem;

/** A bare number where a unit belongs. */
final class MissingUnit extends TextCheck {
  MissingUnit() {
    super(Problem.Kind.MISSING_UNIT);
  }

  @Override
  public String name() {
    return "missing-unit";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "a bare number where a unit belongs";
  }
}
