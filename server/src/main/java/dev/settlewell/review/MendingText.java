package dev.settlewell.review;

import dev.settlewell.finding.Finding;
import dev.settlewell.text.Fix;
import dev.settlewell.text.SourceText;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;

/** Tells what mending changed, or would change: each fix with the lines before and after it. */
public final class MendingText {
  private final Style style;
  private final boolean dryRun;
  private final StringBuilder out = new StringBuilder();
  private final Set<String> paths = new LinkedHashSet<>();
  private int fixes;

  /**
   * @param dryRun whether nothing was written
   */
  public MendingText(Style style, boolean dryRun) {
    this.style = style;
    this.dryRun = dryRun;
  }

  /**
   * @param sheet as it was before this fix
   */
  public void step(Reviewed sheet, Finding finding, Fix fix) {
    fixes++;
    paths.add(sheet.path());
    String at = new Locations(List.of(sheet)).pointer(finding.place());
    out.append(Terminal.line(at)).append(' ').append(style.bold(finding.name())).append(": ");
    out.append(Terminal.line(fix.title())).append('\n');
    SourceText before = sheet.text();
    lines(before, SourceText.of(before.name(), fix.applyTo(before)));
  }

  /** The lines that differ, those that both have at the top and at the end left out. */
  private void lines(SourceText before, SourceText after) {
    int top = 0;
    while (top < Math.min(before.lineCount(), after.lineCount())
        && line(before, top).equals(line(after, top))) {
      top++;
    }
    int end = 0;
    while (end < Math.min(before.lineCount(), after.lineCount()) - top
        && line(before, before.lineCount() - 1 - end)
            .equals(line(after, after.lineCount() - 1 - end))) {
      end++;
    }
    for (int i = top; i < before.lineCount() - end; i++) {
      out.append("  - ").append(Terminal.line(line(before, i))).append('\n');
    }
    for (int i = top; i < after.lineCount() - end; i++) {
      out.append(style.added("  + " + Terminal.line(line(after, i)))).append('\n');
    }
  }

  private static String line(SourceText text, int line) {
    return text.slice(text.line(line));
  }

  public String render() {
    String what =
        fixes == 0
            ? "nothing to mend"
            : fixes
                + (fixes == 1 ? " change in " : " changes in ")
                + paths.size()
                + (paths.size() == 1 ? " sheet" : " sheets")
                + (dryRun ? "; nothing was written" : "");
    return out + what + "\n";
  }
}
