package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Severity;
import dev.settlewell.text.Problem;

/** Where YAML reads something else than the eye. */
final class AmbiguousText extends TextCheck {
  AmbiguousText() {
    super(Problem.Kind.AMBIGUOUS_TEXT);
  }

  @Override
  public String name() {
    return "ambiguous-text";
  }

  @Override
  public Severity severity() {
    return Severity.WARNING;
  }

  @Override
  public String summary() {
    return "YAML reads something else here than the eye";
  }
}
