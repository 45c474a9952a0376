package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.text.Place;
import dev.settlewell.text.Related;
import dev.settlewell.text.SourceText;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.eclipse.lsp4j.Diagnostic;
import org.eclipse.lsp4j.DiagnosticCodeDescription;
import org.eclipse.lsp4j.DiagnosticRelatedInformation;
import org.eclipse.lsp4j.DiagnosticSeverity;
import org.eclipse.lsp4j.DiagnosticTag;
import org.eclipse.lsp4j.Location;

/** Findings as the client is told of them: only what it said it can take. */
final class DiagnosticMapper {
  static final String SOURCE = "settlewell";
  private static final Set<String> UNNECESSARY = Set.of("unused-name", "acceptance-unused");

  private final View view;
  private final Checked checked;
  private final Ranges ranges;

  DiagnosticMapper(View view, Checked checked) {
    this.view = view;
    this.checked = checked;
    this.ranges = new Ranges(view.abilities().encoding());
  }

  /** Accepted findings are known and meant: nothing is said of them. */
  List<Diagnostic> all() {
    return checked.findings().stream()
        .filter(finding -> !finding.isAccepted() && finding.severity() != Severity.OFF)
        .map(this::one)
        .toList();
  }

  Diagnostic one(Finding finding) {
    Abilities can = view.abilities();
    boolean here = finding.place().sheet().equals(checked.text().name());
    Place place = here ? finding.place() : checked.text().place(0, 0);
    Diagnostic diagnostic =
        new Diagnostic(ranges.of(checked.text(), place.span()), message(finding));
    diagnostic.setSeverity(severity(finding.severity()));
    diagnostic.setSource(SOURCE);
    diagnostic.setCode(finding.name());
    if (can.codeDescription() && !view.settings().documentation().isEmpty()) {
      String base = view.settings().documentation().replaceAll("/+$", "");
      diagnostic.setCodeDescription(new DiagnosticCodeDescription(base + "/" + finding.name()));
    }
    if (can.diagnosticData()) {
      diagnostic.setData(
          Map.of(
              "finding", finding.name(), "subject", finding.subject(), "about", finding.about()));
    }
    if (can.diagnosticTags() && UNNECESSARY.contains(finding.name())) {
      diagnostic.setTags(List.of(DiagnosticTag.Unnecessary));
    }
    if (can.relatedInformation()) {
      diagnostic.setRelatedInformation(related(finding, here));
    }
    return diagnostic;
  }

  private List<DiagnosticRelatedInformation> related(Finding finding, boolean here) {
    List<Related> all = new ArrayList<>(finding.related());
    if (!here) {
      all.add(0, new Related(finding.place(), "here"));
    }
    List<DiagnosticRelatedInformation> mapped = new ArrayList<>();
    for (Related related : all) {
      location(related.place())
          .ifPresent(at -> mapped.add(new DiagnosticRelatedInformation(at, related.message())));
    }
    return mapped.isEmpty() ? null : mapped;
  }

  /** Empty where the place is in a file whose text this sheet did not read. */
  private Optional<Location> location(Place place) {
    Optional<SourceText> text = checked.text(place.sheet());
    return text.map(t -> new Location(view.uri(place.sheet()), ranges.of(t, place.span())));
  }

  private static String message(Finding finding) {
    return finding.message();
  }

  static DiagnosticSeverity severity(Severity severity) {
    return switch (severity) {
      case ERROR -> DiagnosticSeverity.Error;
      case WARNING -> DiagnosticSeverity.Warning;
      case INFORMATION -> DiagnosticSeverity.Information;
      case HINT, OFF -> DiagnosticSeverity.Hint;
    };
  }
}
