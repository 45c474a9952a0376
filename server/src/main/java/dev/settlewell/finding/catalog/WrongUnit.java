package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Severity;
import dev.settlewell.text.Problem;

/** A unit of another dimension, or none at all. */
final class WrongUnit extends TextCheck {
  WrongUnit() {
    super(Problem.Kind.WRONG_UNIT);
  }

  @Override
  public String name() {
    return "wrong-unit";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "a unit that the key cannot take, or a spelling that is no unit";
  }
}
