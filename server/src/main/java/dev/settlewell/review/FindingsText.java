package dev.settlewell.review;

import dev.settlewell.finding.Fact;
import dev.settlewell.finding.Finding;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Related;
import java.util.List;

/**
 * Findings for people: where, how grave, its name; the value with a mark under it; the sentence;
 * the figures in rows; the other places that take part.
 */
public final class FindingsText {
  private static final String INDENT = "  ";

  private final Review review;
  private final Locations locations;
  private final Style style;
  private final StringBuilder out = new StringBuilder();

  private FindingsText(Review review, Style style) {
    this.review = review;
    this.locations = review.locations();
    this.style = style;
  }

  /**
   * @param accepted whether the findings that a sheet accepts are shown too
   */
  public static String render(Review review, boolean accepted, Style style) {
    FindingsText text = new FindingsText(review, style);
    for (Reviewed sheet : review.sheets()) {
      (accepted ? sheet.findings() : sheet.open()).forEach(f -> text.finding(sheet, f));
    }
    text.out.append(Summary.of(review).sentence()).append('\n');
    return text.out.toString();
  }

  private void finding(Reviewed sheet, Finding finding) {
    head(finding);
    locations
        .text(finding.place())
        .map(text -> Quotation.of(text, finding.place().span()))
        .filter(quotation -> !quotation.line().isBlank())
        .ifPresent(quotation -> quote(quotation, finding));
    line(INDENT + Terminal.line(finding.message()));
    facts(finding.facts());
    finding.related().forEach(this::related);
    sheet.remedies().getOrDefault(finding, List.of()).forEach(this::remedy);
    finding.acceptance().ifPresent(a -> line(INDENT + "accepted: " + Terminal.line(a.because())));
    out.append('\n');
  }

  private void head(Finding finding) {
    String severity = finding.isAccepted() ? "accepted" : finding.severity().label();
    line(
        Terminal.line(locations.pointer(finding.place()))
            + " "
            + style.severity(finding.severity(), severity)
            + " "
            + style.bold(finding.name()));
  }

  private void quote(Quotation quotation, Finding finding) {
    line(INDENT + INDENT + quotation.line());
    line(INDENT + INDENT + style.severity(finding.severity(), quotation.marks()));
  }

  private void facts(List<Fact> facts) {
    int widest = facts.stream().mapToInt(fact -> Terminal.width(fact.label())).max().orElse(0);
    for (Fact fact : facts) {
      String label = Terminal.padded(Terminal.line(fact.label()), widest);
      line(INDENT + INDENT + style.faint(label) + INDENT + Terminal.line(fact.text()));
    }
  }

  private void related(Related related) {
    String value = Terminal.line(locations.written(related.place()).lines().findFirst().orElse(""));
    boolean tells = !value.isBlank() && Terminal.width(value) <= 40;
    line(
        INDENT
            + style.faint(Terminal.line(locations.pointer(related.place())))
            + " "
            + Terminal.line(related.message())
            + (tells ? ": " + value : ""));
  }

  private void remedy(Fix fix) {
    line(INDENT + "mend: " + Terminal.line(fix.title()));
  }

  private void line(String text) {
    out.append(text.stripTrailing()).append('\n');
  }
}
