package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Alias;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import java.util.List;
import java.util.function.Consumer;

/** An interferer so near a multiple of the result rate that it reads as a constant. */
final class InterfererReadsAsOffset extends ChannelCheck {
  @Override
  public String name() {
    return "interferer-reads-as-offset";
  }

  @Override
  public Severity severity() {
    return Severity.WARNING;
  }

  @Override
  public String summary() {
    return "an interferer at a multiple of the result rate reads as a constant error";
  }

  @Override
  public List<String> covers() {
    return List.of("interferer-aliases-into-band");
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    new Interference(channel)
        .report(
            this,
            Alias::readsAsOffset,
            "folds to %s, where it reads as an offset that no later averaging takes out,",
            report);
  }
}
