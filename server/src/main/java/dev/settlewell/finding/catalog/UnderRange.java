package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import java.util.List;
import java.util.function.Consumer;

/** The measured range leaves the converter's span at its lower end. */
final class UnderRange extends ChannelCheck {
  @Override
  public String name() {
    return "under-range";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "the voltage at the pin goes below the converter's span";
  }

  @Override
  public List<String> covers() {
    return List.of("amplifier-clips", "sensor-fault-hidden");
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    new SpanExcess(channel, false).report(this, report);
  }
}
