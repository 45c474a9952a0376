package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Either;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Sheet;
import dev.settlewell.sheet.Slot;
import dev.settlewell.unit.Toleranced;
import java.util.Collection;
import java.util.HashSet;
import java.util.Map;
import java.util.Set;
import java.util.function.Consumer;

/** A supply, converter or interferer that nothing refers to. */
final class UnusedName implements Check {
  @Override
  public String name() {
    return "unused-name";
  }

  @Override
  public Severity severity() {
    return Severity.HINT;
  }

  @Override
  public String summary() {
    return "a supply, converter or interferer that nothing refers to";
  }

  /**
   * A sheet without channels is a description for others to use, and a broken piece of text may
   * hold the reference: neither is judged.
   */
  @Override
  public void run(Analysis analysis, Consumer<Finding> report) {
    Sheet sheet = analysis.linked().sheet();
    boolean broken =
        !sheet.problems().isEmpty()
            || !sheet.tree().problems().isEmpty()
            || !analysis.linked().problems().isEmpty();
    if (sheet.channels().isEmpty() || broken) {
      return;
    }
    Set<String> used = new HashSet<>();
    collect(sheet.top(), used);
    report(sheet.supplies().values(), "supply", used, report);
    report(sheet.converters().values(), "converter", used, report);
    report(sheet.interferers().values(), "interferer", used, report);
  }

  private void report(
      Collection<? extends Named<?>> all, String what, Set<String> used, Consumer<Finding> report) {
    for (Named<?> named : all) {
      if (!used.contains(named.name())) {
        report.accept(
            FindingBuilder.of(this, named.place(), "")
                .message("nothing refers to the %s `%s`".formatted(what, named.name()))
                .build());
      }
    }
  }

  /** Every word a value consists of, whatever it stands for: a name that occurs is in use. */
  private static void collect(Object value, Set<String> words) {
    if (value instanceof Slot<?> slot) {
      slot.stated().ifPresent(stated -> collect(stated, words));
    } else if (value instanceof Part part) {
      part.slots().values().forEach(slot -> collect(slot, words));
    } else if (value instanceof Named<?> named) {
      collect(named.value(), words);
    } else if (value instanceof Map<?, ?> map) {
      map.values().forEach(item -> collect(item, words));
    } else if (value instanceof Iterable<?> items) {
      items.forEach(item -> collect(item, words));
    } else if (value instanceof Either either) {
      either.word().ifPresent(words::add);
      either.quantity().ifPresent(quantity -> collect(quantity, words));
    } else if (value instanceof Toleranced quantity) {
      quantity.of().ifPresent(words::add);
    } else if (value instanceof String word) {
      words.add(word);
    }
  }
}
