package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Severity;
import dev.settlewell.text.Problem;

/** A key the format does not know, with the nearest one it does. */
final class UnknownKey extends TextCheck {
  UnknownKey() {
    super(Problem.Kind.UNKNOWN_KEY);
  }

  @Override
  public String name() {
    return "unknown-key";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "a key that the format does not have at this place";
  }
}
