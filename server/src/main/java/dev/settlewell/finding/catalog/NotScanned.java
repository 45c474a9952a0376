package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Sheet;
import dev.settlewell.sheet.Slot;
import java.util.List;
import java.util.function.Consumer;

/** A channel that stands in no scan's order. */
final class NotScanned implements Check {
  @Override
  public String name() {
    return "not-scanned";
  }

  @Override
  public Severity severity() {
    return Severity.WARNING;
  }

  @Override
  public String summary() {
    return "a channel that no scan samples";
  }

  @Override
  public List<String> covers() {
    return List.of("not-computed");
  }

  @Override
  public void run(Analysis analysis, Consumer<Finding> report) {
    Sheet sheet = analysis.linked().sheet();
    if (!ordersAreClear(sheet)) {
      return;
    }
    for (ChannelFigures channel : analysis.unscanned().values()) {
      String name = channel.channel().name();
      if (standsInAnOrder(sheet, name)) {
        continue; // Its scan cannot be computed, for a reason that has a finding of its own.
      }
      String message =
          sheet.scans().isEmpty()
              ? name
                  + " is never sampled: the sheet has no scan; its settling, timing and"
                  + " interference cannot be judged"
              : name
                  + " is never sampled: it stands in no scan's order; add it there, or its"
                  + " settling, timing and interference cannot be judged";
      FindingBuilder finding =
          FindingBuilder.of(this, channel.channel().place(), name).message(message);
      for (Named<Part> scan : sheet.scans().values()) {
        scan.value()
            .stated()
            .ifPresent(
                part -> finding.related(part.slot("order").place(), "order of " + scan.name()));
      }
      report.accept(finding.build());
    }
  }

  /** A name in an order that cannot be read or found may well be meant for this very channel. */
  private static boolean ordersAreClear(Sheet sheet) {
    return sheet.scans().values().stream()
        .map(Named::value)
        .allMatch(slot -> slot.stated().map(scan -> isClear(scan, sheet)).orElse(false));
  }

  private static boolean standsInAnOrder(Sheet sheet, String channel) {
    return sheet.scans().values().stream()
        .flatMap(scan -> scan.value().stated().stream())
        .flatMap(scan -> scan.list("order", String.class).stated().stream())
        .flatMap(List::stream)
        .anyMatch(item -> item.stated().filter(channel::equals).isPresent());
  }

  private static boolean isClear(Part scan, Sheet sheet) {
    return scan.list("order", String.class).stated().orElse(List.of()).stream()
            .map(Slot::stated)
            .allMatch(item -> item.isPresent() && sheet.channels().containsKey(item.get()))
        && !scan.slot("order").isWrong();
  }
}
