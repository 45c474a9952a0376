package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Severity;
import dev.settlewell.text.Problem;

/** The version of the format. */
final class FormatVersion extends TextCheck {
  FormatVersion() {
    super(Problem.Kind.FORMAT_VERSION);
  }

  @Override
  public String name() {
    return "format-version";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "the version of the format is missing or not one this tool reads";
  }
}
