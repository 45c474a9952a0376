package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.channel.Analysis;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.sheet.Linked;
import dev.settlewell.sheet.Sheet;
import dev.settlewell.syntax.Node;
import dev.settlewell.syntax.SyntaxTree;
import dev.settlewell.text.Related;
import dev.settlewell.text.SourceText;
import dev.settlewell.vocabulary.Vocabulary;
import dev.settlewell.workspace.ProjectFile;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicInteger;

/**
 * A desk that needs no computation: each {@code BAD} in an open text is an error, each {@code IDLE}
 * a hint, {@code CRASH} a mistake of the program.
 */
final class StandIn implements Desk {
  final AtomicInteger checks = new AtomicInteger();

  @Override
  public Optional<Checked> check(String name, Map<String, SourceText> open) {
    checks.incrementAndGet();
    return Optional.ofNullable(open.get(name)).map(StandIn::check);
  }

  @Override
  public List<Finding> trial(String name, String content, Map<String, SourceText> open) {
    return check(SourceText.of(name, content)).findings();
  }

  @Override
  public Vocabulary vocabulary() {
    return Vocabulary.load();
  }

  @Override
  public List<String> sheetsBelow(String folder) {
    return List.of();
  }

  @Override
  public ProjectFile project(String folder) {
    return ProjectFile.NONE;
  }

  private static Checked check(SourceText text) {
    if (text.content().contains("CRASH")) {
      throw new IllegalStateException("a planted mistake");
    }
    List<Finding> findings = new ArrayList<>();
    find(text, "BAD", "wrong-unit", Severity.ERROR, findings);
    find(text, "IDLE", "unused-name", Severity.HINT, findings);
    return new Checked(analysis(text), findings);
  }

  private static void find(
      SourceText text, String word, String name, Severity severity, List<Finding> findings) {
    for (int at = text.content().indexOf(word);
        at >= 0;
        at = text.content().indexOf(word, at + 1)) {
      Related related = new Related(text.place(0, 1), "the beginning");
      findings.add(
          new Finding(
              name,
              severity,
              text.place(at, at + word.length()),
              "level",
              word,
              List.of(),
              List.of(related)));
    }
  }

  private static Analysis analysis(SourceText text) {
    Node.Mapping root = new Node.Mapping(List.of(), text.place(0, 0), false);
    SyntaxTree tree = new SyntaxTree(text, root, List.of(), List.of());
    Sheet sheet =
        new Sheet(
            text, tree, null, Map.of(), Map.of(), Map.of(), Map.of(), Map.of(), List.of(),
            List.of());
    Linked linked =
        new Linked(
            sheet, List.of(), Map.of(), Map.of(), Map.of(), List.of(), LocalDate.of(2026, 1, 1));
    return new Analysis(linked, Map.of(), Map.of(), Map.of());
  }
}
