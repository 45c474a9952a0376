package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.sheet.Linked;
import dev.settlewell.text.Problem;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.stream.Stream;

/**
 * A finding of the text itself. The readers have found it and say what is wrong; here it only gets
 * its name. Problems of a used sheet are told in that sheet alone.
 */
abstract class TextCheck implements Check {
  private final Problem.Kind kind;

  TextCheck(Problem.Kind kind) {
    this.kind = kind;
  }

  @Override
  public void run(Analysis analysis, Consumer<Finding> report) {
    Linked linked = analysis.linked();
    Stream.of(linked.sheet().problems(), linked.sheet().tree().problems(), linked.problems())
        .flatMap(List::stream)
        .distinct()
        .filter(problem -> problem.kind() == kind)
        .filter(problem -> problem.place().sheet().equals(linked.sheet().path()))
        .map(this::finding)
        .forEach(report);
  }

  private Finding finding(Problem problem) {
    return new Finding(
        name(),
        severity(),
        problem.place(),
        "",
        "",
        problem.message(),
        List.of(),
        problem.related(),
        problem.fixes(),
        Optional.empty());
  }
}
