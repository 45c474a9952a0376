package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Severity;
import dev.settlewell.text.Problem;

/** A mapping, list or word where another belongs. */
final class WrongKind extends TextCheck {
  WrongKind() {
    super(Problem.Kind.WRONG_KIND);
  }

  @Override
  public String name() {
    return "wrong-kind";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "a value of another kind stands here than the key takes";
  }
}
