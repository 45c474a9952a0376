package dev.settlewell.review;

import dev.settlewell.channel.Figure;
import dev.settlewell.finding.Finding;
import java.util.List;
import java.util.Optional;

/** What changed between two revisions, for a terminal or as Markdown for a pull request. */
public final class ComparisonText {
  private static final int NAME_COLUMNS = 30;

  private final boolean markdown;
  private final Style style;
  private final StringBuilder out = new StringBuilder();

  private ComparisonText(boolean markdown, Style style) {
    this.markdown = markdown;
    this.style = style;
  }

  public static String plain(Comparison comparison, Style style) {
    return new ComparisonText(false, style).render(comparison);
  }

  /** Lists and headings only: they read well wherever Markdown is shown. */
  public static String markdown(Comparison comparison) {
    return new ComparisonText(true, Style.PLAIN).render(comparison);
  }

  private String render(Comparison comparison) {
    comparison.sheets().forEach(this::sheet);
    int changed = comparison.sheets().size();
    line(
        changed == 0
            ? "no figure and no finding changed"
            : changed
                + (changed == 1 ? " sheet" : " sheets")
                + " changed, "
                + comparison.unchanged()
                + " not");
    return out.toString();
  }

  private void sheet(Comparison.SheetChange change) {
    String path = Terminal.line(change.pair().path());
    line(markdown ? "### `" + path + "`" : style.bold(path));
    if (change.pair().before().isEmpty()) {
      line("this sheet is new");
    } else if (change.pair().after().isEmpty()) {
      line("this sheet is gone");
    }
    blank();
    findings("new finding", change.come(), change.pair().after());
    findings("no longer found", change.gone(), change.pair().before());
    String owner = "";
    for (Comparison.FigureChange figure : change.figures()) {
      if (!figure.owner().equals(owner)) {
        blankIf(markdown && !owner.isEmpty());
        owner = figure.owner();
        line(markdown ? "**" + owner + "**" : style.bold(owner));
        blankIf(markdown);
      }
      figure(figure);
    }
    blankIf(!change.figures().isEmpty());
  }

  private void findings(String heading, List<Finding> findings, Optional<Reviewed> sheet) {
    for (Finding finding : findings) {
      String at = sheet.map(s -> new Locations(List.of(s)).pointer(finding.place())).orElse("");
      String what = heading + ": " + finding.severity().label() + " ";
      String message = Terminal.line(finding.message());
      line(
          markdown
              ? "- " + what + "`" + finding.name() + "` (" + at + "): " + escaped(message)
              : style.severity(finding.severity(), what)
                  + style.bold(finding.name())
                  + " ("
                  + Terminal.line(at)
                  + ")\n    "
                  + message);
    }
    blankIf(!findings.isEmpty());
  }

  private void figure(Comparison.FigureChange change) {
    String before = words(change.before());
    String after = words(change.after());
    line(
        markdown
            ? "- `" + change.name() + "`: " + escaped(before) + " → " + escaped(after)
            : "  " + Terminal.padded(change.name(), NAME_COLUMNS) + " " + before + " -> " + after);
  }

  private static String words(Optional<Figure> figure) {
    return Terminal.line(figure.map(FigureWords::state).orElse("not there"));
  }

  /** What Markdown would take for its own signs. */
  private static String escaped(String text) {
    return text.replaceAll("([\\\\`*_\\[\\]<>#|])", "\\\\$1");
  }

  private void blankIf(boolean wanted) {
    if (wanted) {
      out.append('\n');
    }
  }

  private void blank() {
    blankIf(markdown);
  }

  private void line(String text) {
    out.append(text.stripTrailing()).append('\n');
  }
}
