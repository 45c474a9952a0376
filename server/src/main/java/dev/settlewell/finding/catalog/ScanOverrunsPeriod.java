package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.ScanFigures;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Part;
import dev.settlewell.text.Fix;
import dev.settlewell.unit.Engineering;
import java.math.RoundingMode;
import java.util.Optional;
import java.util.function.Consumer;

/** A scan that is not over when the next one should begin. */
final class ScanOverrunsPeriod implements Check {
  @Override
  public String name() {
    return "scan-overruns-period";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "a scan takes longer than its period";
  }

  @Override
  public void run(Analysis analysis, Consumer<Finding> report) {
    for (ScanFigures scan : analysis.scans().values()) {
      scan.scan().value().stated().ifPresent(part -> check(analysis, scan, part, report));
    }
  }

  /** A scan that runs without a pause takes the time it takes. */
  static boolean overruns(ScanFigures scan) {
    boolean continuous =
        scan.scan()
            .value()
            .stated()
            .flatMap(part -> part.either("rate").stated())
            .map(rate -> rate.is("continuous"))
            .orElse(false);
    return !continuous && time(scan) > period(scan);
  }

  private static double time(ScanFigures scan) {
    return scan.figures().value("scan-time").orElse(Double.NaN);
  }

  private static double period(ScanFigures scan) {
    return scan.figures().value("scan-period").orElse(Double.NaN);
  }

  private void check(Analysis analysis, ScanFigures scan, Part part, Consumer<Finding> report) {
    if (!overruns(scan)) {
      return;
    }
    double time = time(scan);
    String rate = Engineering.rounded(1 / time, 2, RoundingMode.FLOOR, "Hz");
    report.accept(
        FindingBuilder.of(this, part.slot("rate").place(), scan.scan().name())
            .message(
                ("the scan takes %s at the slowest clock, its period is %s; %s is the"
                        + " highest rate that fits")
                    .formatted(Words.of(time, "s"), Words.of(period(scan), "s"), rate))
            .need("at most " + Words.of(period(scan), "s"))
            .have(Words.of(time, "s"))
            .margin(Words.of(period(scan) - time, "s"))
            .related(part.slot("order").place(), "the order that is gone through")
            .candidate(slower(analysis, part, rate))
            .build());
  }

  private static Optional<Fix> slower(Analysis analysis, Part scan, String rate) {
    return Rewriting.fix(
        analysis.linked().sheet().text(), scan.slot("rate"), rate, "Scan at " + rate);
  }
}
