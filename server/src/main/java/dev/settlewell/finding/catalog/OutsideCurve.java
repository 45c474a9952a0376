package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.unit.Range;
import java.util.Optional;
import java.util.function.Consumer;

/** What is measured leaves the domain of the sensor's curve. */
final class OutsideCurve extends ChannelCheck {
  @Override
  public String name() {
    return "outside-curve";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "the measured range leaves the range in which the sensor's curve is known";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    Optional<Range> measures = channel.measures();
    double low = channel.value("curve-low").orElse(Double.NEGATIVE_INFINITY);
    double high = channel.value("curve-high").orElse(Double.POSITIVE_INFINITY);
    if (measures.isEmpty() || (measures.get().low() >= low && measures.get().high() <= high)) {
      return;
    }
    String unit = channel.unit();
    report.accept(
        FindingBuilder.of(this, channel, "measures")
            .message(
                ("%s are to be measured, and the curve of the sensor is known from %s only;"
                        + " keep inside, or use a sensor that reaches further")
                    .formatted(
                        Words.range(measures.get().low(), measures.get().high(), unit),
                        Words.range(low, high, unit)))
            .need("within " + Words.range(low, high, unit))
            .have(Words.range(measures.get().low(), measures.get().high(), unit))
            .related(channel.sensor().map(sensor -> sensor.keyPlace()), "the sensor")
            .build());
  }
}
