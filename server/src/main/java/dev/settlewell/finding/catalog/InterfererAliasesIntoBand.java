package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import java.util.function.Consumer;

/** An interferer that sampling folds into the wanted band, where no filter can take it out. */
final class InterfererAliasesIntoBand extends ChannelCheck {
  @Override
  public String name() {
    return "interferer-aliases-into-band";
  }

  @Override
  public Severity severity() {
    return Severity.WARNING;
  }

  @Override
  public String summary() {
    return "sampling folds an interferer into the wanted band";
  }

  @Override
  void check(ChannelView channel, Consumer<Finding> report) {
    new Interference(channel)
        .report(
            this,
            alias -> alias.aliased() && alias.inBand() && !alias.readsAsOffset(),
            "folds to %s, inside the wanted band,",
            report);
  }
}
