package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.ConverterFigures;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Part;
import dev.settlewell.unit.Engineering;
import dev.settlewell.unit.Range;
import java.math.RoundingMode;
import java.util.Optional;
import java.util.function.Consumer;

/** A converter clock that its tolerance, or its nominal value, takes out of its limits. */
final class ClockOutsideLimits implements Check {
  @Override
  public String name() {
    return "clock-outside-limits";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "the converter's clock, tolerance counted, leaves its limits";
  }

  @Override
  public void run(Analysis analysis, Consumer<Finding> report) {
    for (ConverterFigures converter : analysis.converters().values()) {
      boolean own =
          analysis.linked().sheet().converters().containsKey(converter.converter().name());
      Optional<Part> part = converter.converter().value().stated();
      if (own && part.isPresent() && part.get().has("clock-limits")) {
        check(analysis, converter, part.get(), report);
      }
    }
  }

  private void check(
      Analysis analysis, ConverterFigures converter, Part part, Consumer<Finding> report) {
    double low = converter.figures().value("clock-low").orElse(Double.NaN);
    double high = converter.figures().value("clock-high").orElse(Double.NaN);
    Range limits = part.range("clock-limits").stated().get();
    boolean tooSlow = low < limits.low();
    boolean tooFast = high > limits.high();
    if (!tooSlow && !tooFast) {
      return;
    }
    String message =
        tooFast
            ? "the clock reaches %s, its limit is %s".formatted(hz(high), hz(limits.high()))
            : "the clock falls to %s, its limit is %s".formatted(hz(low), hz(limits.low()));
    double nominal = part.quantity("clock").stated().get().value();
    double would = tooFast ? nominal * limits.high() / high : nominal * limits.low() / low;
    String value =
        Engineering.rounded(would, 3, tooFast ? RoundingMode.FLOOR : RoundingMode.CEILING, "Hz");
    String mend = tooFast ? " at most " : " at least ";
    report.accept(
        FindingBuilder.of(this, part.slot("clock").place(), converter.converter().name())
            .message(message + "; with this tolerance" + mend + value + " keeps inside")
            .need("within " + Words.range(limits.low(), limits.high(), "Hz"))
            .have(Words.range(low, high, "Hz"))
            .related(part.slot("clock-limits").place(), "the limits")
            .candidate(
                Rewriting.fix(
                    analysis.linked().sheet().text(),
                    part.slot("clock"),
                    value,
                    "Set the clock to " + value))
            .build());
  }

  private static String hz(double value) {
    return Words.of(value, "Hz");
  }
}
