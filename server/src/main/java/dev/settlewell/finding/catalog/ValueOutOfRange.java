package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Severity;
import dev.settlewell.text.Problem;

/** A value outside what its key takes. */
final class ValueOutOfRange extends TextCheck {
  ValueOutOfRange() {
    super(Problem.Kind.VALUE_OUT_OF_RANGE);
  }

  @Override
  public String name() {
    return "value-out-of-range";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "a value that cannot be";
  }
}
