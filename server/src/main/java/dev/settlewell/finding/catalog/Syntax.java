package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Severity;
import dev.settlewell.text.Problem;

/** What YAML cannot read. */
final class Syntax extends TextCheck {
  Syntax() {
    super(Problem.Kind.SYNTAX);
  }

  @Override
  public String name() {
    return "syntax";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "the text is not YAML as a sheet writes it, so a part of it cannot be read";
  }
}
