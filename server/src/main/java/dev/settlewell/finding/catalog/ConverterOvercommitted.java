package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.ConverterFigures;
import dev.settlewell.channel.ScanFigures;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Part;
import java.util.List;
import java.util.function.Consumer;

/** All scans of a converter together ask for more time than there is, or for nearly all. */
final class ConverterOvercommitted implements Check {
  private static final double BUSY = 0.8;

  @Override
  public String name() {
    return "converter-overcommitted";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "the scans of one converter together ask for more time than there is";
  }

  @Override
  public void run(Analysis analysis, Consumer<Finding> report) {
    for (ConverterFigures converter : analysis.converters().values()) {
      double use = converter.figures().value("utilisation").orElse(Double.NaN);
      List<ScanFigures> scans = scansOf(analysis, converter.converter().name());
      // A scan that overruns on its own has its own finding, and so has its converter.
      if (use > BUSY && scans.stream().noneMatch(ScanOverrunsPeriod::overruns)) {
        report.accept(finding(converter, use, scans));
      }
    }
  }

  private static List<ScanFigures> scansOf(Analysis analysis, String converter) {
    return analysis.scans().values().stream()
        .filter(
            scan ->
                scan.scan()
                    .value()
                    .stated()
                    .map(part -> part.text("converter").orElse("").equals(converter))
                    .orElse(false))
        .filter(scan -> !isContinuous(scan.scan().value().stated().get()))
        .toList();
  }

  private static boolean isContinuous(Part scan) {
    return scan.either("rate").stated().map(rate -> rate.is("continuous")).orElse(false);
  }

  private Finding finding(ConverterFigures converter, double use, List<ScanFigures> scans) {
    boolean tooMuch = use > 1;
    String message =
        tooMuch
            ? ("the scans ask for %s of the converter's time; their rates must come down to"
                    + " %s of what they are")
                .formatted(Words.share(use), Words.share(1 / use))
            : "the scans use %s of the converter's time; %s are left"
                .formatted(Words.share(use), Words.share(1 - use));
    FindingBuilder finding =
        FindingBuilder.of(this, converter.converter().place(), converter.converter().name())
            .severity(tooMuch ? Severity.ERROR : Severity.INFORMATION)
            .message(message)
            .need("at most " + Words.share(1))
            .have(Words.share(use))
            .margin(Words.share(1 - use));
    for (ScanFigures scan : scans) {
      double share = scan.figures().value("scan-utilisation").orElse(Double.NaN);
      finding.related(
          scan.scan().value().stated().get().slot("rate").place(),
          scan.scan().name() + (Double.isNaN(share) ? "" : " uses " + Words.share(share)));
    }
    return finding.build();
  }
}
