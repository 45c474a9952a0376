package dev.settlewell.review;

import dev.settlewell.finding.Check;
import java.util.List;

/** Every finding there is, with its severity and one line on it. */
public final class CatalogText {
  private CatalogText() {}

  public static String render(List<Check> checks, Style style) {
    StringBuilder out = new StringBuilder();
    for (Check check : checks) {
      out.append(style.bold(check.name()))
          .append(" (")
          .append(style.severity(check.severity(), check.severity().label()))
          .append(")\n    ")
          .append(check.summary())
          .append('\n');
    }
    return out.toString();
  }
}
