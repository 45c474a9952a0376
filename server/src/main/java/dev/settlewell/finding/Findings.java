package dev.settlewell.finding;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.finding.catalog.Catalog;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Sheet;
import dev.settlewell.text.Place;
import dev.settlewell.text.Span;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;

/**
 * The findings of a sheet: every check of the catalogue run on its own, covered ones left out,
 * severities and acceptances of the sheet applied, in the order of the text.
 */
public final class Findings {
  /** Not of the catalogue: a fault of this program, which nobody can accept or switch off. */
  public static final String INTERNAL_FAULT = "internal-fault";

  private static final Comparator<Finding> ORDER =
      Comparator.comparing((Finding f) -> f.place().sheet())
          .thenComparing(f -> f.place().start())
          .thenComparing(f -> f.place().end())
          .thenComparing(Finding::name)
          .thenComparing(Finding::subject)
          .thenComparing(Finding::about)
          .thenComparing(Finding::message);

  private Findings() {}

  /**
   * @return the findings, accepted ones among them (marked); those with severity {@code OFF} left
   *     out. A check that fails gives one finding named {@code internal-fault}, and the others go
   *     on.
   */
  public static List<Finding> of(Analysis analysis) {
    return of(analysis, Catalog.CHECKS);
  }

  static List<Finding> of(Analysis analysis, List<Check> checks) {
    Sheet sheet = analysis.linked().sheet();
    List<Finding> raised = new ArrayList<>();
    for (Check check : checks) {
      raised.addAll(isolated(check, analysis));
    }
    raised.addAll(faultsOfFigures(analysis));
    List<Finding> uncovered = new Covers(checks).uncovered(raised);
    List<Finding> own = onceEach(uncovered).stream().map(f -> atHome(f, sheet)).toList();
    List<Finding> judged = new Acceptances(analysis.linked()).apply(own, raised);
    Severities severities = Severities.of(sheet);
    return judged.stream()
        .map(severities::apply)
        .filter(f -> f.severity() != Severity.OFF)
        .distinct()
        .sorted(ORDER)
        .toList();
  }

  /**
   * Of a channel's finding that several scans raise at one place, the gravest; of equals the first.
   */
  private static List<Finding> onceEach(List<Finding> findings) {
    Map<List<Object>, Finding> gravest = new LinkedHashMap<>();
    for (Finding finding : findings) {
      boolean ofAText = finding.subject().isEmpty();
      gravest.merge(
          List.of(
              finding.name(),
              finding.subject(),
              finding.about(),
              finding.place(),
              ofAText ? finding.message() : ""),
          finding,
          (one, other) -> other.severity().compareTo(one.severity()) < 0 ? other : one);
    }
    return List.copyOf(gravest.values());
  }

  private static List<Finding> isolated(Check check, Analysis analysis) {
    List<Finding> findings = new ArrayList<>();
    try {
      check.run(analysis, findings::add);
    } catch (RuntimeException | StackOverflowError fault) {
      Place place = startOf(analysis.linked().sheet());
      findings.add(internalFault(place, "", "the check " + check.name(), describe(fault)));
    }
    return findings;
  }

  private static List<Finding> faultsOfFigures(Analysis analysis) {
    return analysis.channels().stream()
        .filter(c -> !c.faults().isEmpty())
        .map(Findings::faultOfFigures)
        .toList();
  }

  private static Finding faultOfFigures(ChannelFigures c) {
    String name = c.channel().name();
    return internalFault(
        c.channel().place(), name, "the figures of " + name, String.join("; ", c.faults()));
  }

  private static Finding internalFault(Place place, String subject, String what, String why) {
    String message =
        what
            + " could not be worked out: "
            + why
            + ". This is a fault of the tool, not of the sheet, and everything else was checked;"
            + " please report it with this message and the sheet";
    return new Finding(
        INTERNAL_FAULT, Severity.WARNING, place, subject, message, List.of(), List.of());
  }

  private static String describe(Throwable fault) {
    StackTraceElement[] trace = fault.getStackTrace();
    String at =
        trace.length == 0 ? "" : " at " + trace[0].getFileName() + ":" + trace[0].getLineNumber();
    String what = fault.getMessage() == null ? "" : " (" + fault.getMessage() + ")";
    return fault.getClass().getSimpleName() + what + at;
  }

  private static Place startOf(Sheet sheet) {
    return sheet.text().place(sheet.text().line(0));
  }

  /**
   * A finding is told in the sheet that was asked about: where the value at fault stands in a used
   * sheet, the subject's name is marked and the value becomes a related place.
   */
  private static Finding atHome(Finding finding, Sheet sheet) {
    if (finding.place().sheet().equals(sheet.path())) {
      return finding;
    }
    Place home =
        Stream.of(sheet.channels(), sheet.scans(), sheet.converters())
            .map(named -> named.get(finding.subject()))
            .filter(named -> named != null)
            .map(Named::place)
            .findFirst()
            .orElseGet(() -> new Place(sheet.path(), Span.at(0)));
    return finding.movedTo(home, "the value stands here");
  }
}
