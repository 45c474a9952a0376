package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.Figure;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.function.Consumer;

/** Figures of a channel that lack an input: "could not judge" is not "nothing found". */
final class NotComputed implements Check {
  private static final int FIGURES_TOLD = 4;

  @Override
  public String name() {
    return "not-computed";
  }

  @Override
  public Severity severity() {
    return Severity.HINT;
  }

  @Override
  public String summary() {
    return "figures of a channel that lack an input";
  }

  @Override
  public void run(Analysis analysis, Consumer<Finding> report) {
    Map<String, List<ChannelView>> byName = new LinkedHashMap<>();
    for (ChannelView channel : ChannelView.all(analysis)) {
      byName.computeIfAbsent(channel.name(), name -> new ArrayList<>()).add(channel);
    }
    byName.values().forEach(scans -> check(analysis, scans, report));
    for (Place key : analysis.linked().sheet().uncomputed()) {
      report.accept(notYet(analysis, byName, key));
    }
  }

  private Finding notYet(Analysis analysis, Map<String, List<ChannelView>> channels, Place key) {
    String subject =
        channels.entrySet().stream()
            .filter(e -> e.getValue().get(0).part().place().span().contains(key.span()))
            .map(Map.Entry::getKey)
            .findFirst()
            .orElse("");
    String name = analysis.linked().sheet().text().slice(key.span());
    return FindingBuilder.of(this, key, subject)
        .about(name)
        .message("`%s` is read, and nothing is computed from it yet".formatted(name))
        .build();
  }

  private void check(Analysis analysis, List<ChannelView> scans, Consumer<Finding> report) {
    Map<String, Place> inputs = new LinkedHashMap<>();
    Set<String> figures = new LinkedHashSet<>();
    for (ChannelView channel : scans) {
      for (Figure figure : channel.figures().figures().all()) {
        if (figure.state() instanceof Figure.State.Missing missing) {
          int before = inputs.size();
          missing.inputs().stream()
              .filter(input -> !isMissedAsKey(analysis, input))
              .forEach(input -> inputs.putIfAbsent(input.pointer(), input.parent()));
          if (inputs.size() > before || !missing.inputs().isEmpty()) {
            figures.add(figure.name());
          }
        }
      }
    }
    if (inputs.isEmpty()) {
      return;
    }
    FindingBuilder finding =
        FindingBuilder.of(this, scans.get(0).figures().channel().place(), scans.get(0).name())
            .message(
                "not computed: %s; lacking: %s"
                    .formatted(told(figures), String.join(", ", inputs.keySet())));
    inputs.forEach((pointer, parent) -> finding.related(parent, "lacks " + lastKey(pointer)));
    report.accept(finding.build());
  }

  /** A required key that is not there has an error of its own. */
  private static boolean isMissedAsKey(Analysis analysis, Figure.Input input) {
    return analysis.linked().sheet().problems().stream()
        .filter(problem -> problem.kind() == Problem.Kind.MISSING_KEY)
        .anyMatch(
            problem ->
                problem.place().equals(input.parent())
                    && problem.message().contains("`" + lastKey(input.pointer()) + "`"));
  }

  private static String lastKey(String pointer) {
    return pointer.substring(pointer.lastIndexOf('/') + 1);
  }

  private static String told(Set<String> figures) {
    List<String> all = List.copyOf(figures);
    return all.size() <= FIGURES_TOLD
        ? String.join(", ", all)
        : String.join(", ", all.subList(0, FIGURES_TOLD))
            + " and "
            + (all.size() - FIGURES_TOLD)
            + " more";
  }
}
