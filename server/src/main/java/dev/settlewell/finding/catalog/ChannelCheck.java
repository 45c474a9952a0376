package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Fact;
import dev.settlewell.finding.Finding;
import dev.settlewell.sheet.Named;
import java.util.function.Consumer;

/** A check that looks at one channel at a time, once in each scan that samples it. */
abstract class ChannelCheck implements Check {
  @Override
  public final void run(Analysis analysis, Consumer<Finding> report) {
    for (ChannelView channel : ChannelView.all(analysis)) {
      boolean inSeveral = analysis.of(channel.name()).size() > 1;
      String scan = channel.namedScan().map(Named::name).orElse("");
      check(
          channel,
          inSeveral ? finding -> report.accept(finding.with(new Fact("scan", scan))) : report);
    }
  }

  abstract void check(ChannelView channel, Consumer<Finding> report);
}
