package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import java.util.function.Consumer;

/** A check that looks at one channel at a time. */
abstract class ChannelCheck implements Check {
  @Override
  public final void run(Analysis analysis, Consumer<Finding> report) {
    ChannelView.all(analysis).forEach(channel -> check(channel, report));
  }

  abstract void check(ChannelView channel, Consumer<Finding> report);
}
