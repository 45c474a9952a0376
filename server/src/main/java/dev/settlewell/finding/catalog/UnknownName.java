package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Sheet;
import dev.settlewell.sheet.Slot;
import dev.settlewell.syntax.Node;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import dev.settlewell.vocabulary.Nearest;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.stream.Stream;

/**
 * A name that nothing defines: of a supply, converter, channel or interferer, which the readers
 * find, and of a finding, which only the catalogue knows.
 */
final class UnknownName extends TextCheck {
  UnknownName() {
    super(Problem.Kind.UNKNOWN_NAME);
  }

  @Override
  public String name() {
    return "unknown-name";
  }

  @Override
  public Severity severity() {
    return Severity.ERROR;
  }

  @Override
  public String summary() {
    return "a name that nothing defines";
  }

  @Override
  public void run(Analysis analysis, Consumer<Finding> report) {
    super.run(analysis, report);
    Sheet sheet = analysis.linked().sheet();
    Stream.of(sheet.channels(), sheet.scans(), sheet.converters())
        .flatMap(all -> accepted(all).stream())
        .forEach(slot -> judge(slot.value(), slot.place(), report));
    for (Node.Entry top : sheet.tree().root().entries()) {
      if (top.key().text().equals("findings") && top.value() instanceof Node.Mapping severities) {
        severities
            .entries()
            .forEach(entry -> judge(entry.key().text(), entry.key().place(), report));
      }
    }
  }

  private static List<Slot.Stated<String>> accepted(Map<String, Named<Part>> all) {
    return all.values().stream()
        .flatMap(named -> named.value().stated().stream())
        .flatMap(part -> part.list("accept", Part.class).stated().stream())
        .flatMap(List::stream)
        .flatMap(item -> item.stated().stream())
        .map(item -> item.text("finding"))
        .filter(Slot::isStated)
        .map(slot -> (Slot.Stated<String>) slot)
        .toList();
  }

  private void judge(String written, Place place, Consumer<Finding> report) {
    if (Catalog.NAMES.contains(written)) {
      return;
    }
    Optional<String> nearest = Nearest.of(written, Catalog.NAMES);
    String hint =
        nearest
            .map(name -> "; the nearest is `" + name + "`")
            .orElse("; the list of findings names them all");
    FindingBuilder finding =
        FindingBuilder.of(this, place, "").message("there is no finding `" + written + "`" + hint);
    nearest.ifPresent(
        name -> finding.fix(new Fix("Write " + name, List.of(new Edit(place, name)), false)));
    report.accept(finding.build());
  }
}
