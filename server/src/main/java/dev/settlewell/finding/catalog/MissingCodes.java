package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.unit.Deviation;
import dev.settlewell.unit.Dimension;
import java.util.Optional;
import java.util.function.Consumer;

/** A differential non-linearity that lets the converter skip codes. */
final class MissingCodes implements Check {
  private static final double SAME = 1e-9;

  @Override
  public String name() {
    return "missing-codes";
  }

  @Override
  public Severity severity() {
    return Severity.WARNING;
  }

  @Override
  public String summary() {
    return "the converter may skip codes";
  }

  @Override
  public void run(Analysis analysis, Consumer<Finding> report) {
    for (Named<Part> converter : analysis.linked().sheet().converters().values()) {
      converter.value().stated().ifPresent(part -> check(converter.name(), part, report));
    }
  }

  private void check(String converter, Part part, Consumer<Finding> report) {
    Optional<Deviation> stated = part.deviation("differential-nonlinearity").stated();
    double down =
        stated.stream()
            .flatMap(deviation -> deviation.tolerances().stream())
            .filter(tolerance -> tolerance.unit().dimension() == Dimension.LSB)
            .mapToDouble(tolerance -> tolerance.minus())
            .sum();
    boolean beyond = down > 1 + SAME;
    boolean exactly = Math.abs(down - 1) <= SAME;
    boolean promised = part.flag("no-missing-codes").orElse(false);
    if (!beyond && !(exactly && !promised)) {
      return;
    }
    String message =
        beyond
            ? ("a differential non-linearity of -%s takes more than a whole code away:"
                    + " codes may be missing, and steps be twice as large")
                .formatted(Words.lsb(down))
            : "a differential non-linearity of -1 LSB leaves codes of no width; say"
                + " `no-missing-codes: true` where the data sheet promises that there are none";
    report.accept(
        FindingBuilder.of(this, part.slot("differential-nonlinearity").place(), converter)
            .severity(beyond ? Severity.WARNING : Severity.INFORMATION)
            .message(message)
            .need("above -1 LSB")
            .have("-" + Words.lsb(down))
            .build());
  }
}
