package dev.settlewell.assist;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Findings;
import dev.settlewell.finding.Remedies;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.syntax.Node;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Stream;

/** What can be done about the findings at the cursor, and what else a sheet offers to do. */
public final class CodeActions {
  /** What an editor sorts actions by. */
  public enum Sort {
    QUICK_FIX,
    REFACTOR,
    FIX_ALL
  }

  /**
   * @param edits of one text, none overlapping another
   * @param finding what it mends
   */
  public record Action(String title, Sort sort, List<Edit> edits, Optional<Finding> finding) {}

  private CodeActions() {}

  /**
   * @param analyse the findings of this sheet with another text: fixes with computed values are
   *     offered only once that shows that they help
   */
  public static List<Action> at(
      Checked checked, Vocabulary vocabulary, Span range, Function<String, List<Finding>> analyse) {
    List<Action> actions = new ArrayList<>();
    for (Finding finding : here(checked, range)) {
      for (Fix fix : Remedies.offered(checked.text(), finding, checked.findings(), analyse)) {
        actions.add(new Action(fix.title(), Sort.QUICK_FIX, fix.edits(), Optional.of(finding)));
      }
    }
    for (Finding finding : here(checked, range)) {
      accept(checked, finding).ifPresent(actions::add);
    }
    Defaults.action(checked, vocabulary, range.start()).ifPresent(actions::add);
    fixAll(checked).ifPresent(actions::add);
    return actions;
  }

  private static List<Finding> here(Checked checked, Span range) {
    return checked.findings().stream()
        .filter(finding -> !finding.isAccepted())
        .filter(finding -> finding.place().sheet().equals(checked.text().name()))
        .filter(finding -> touches(finding.place().span(), range))
        .toList();
  }

  private static boolean touches(Span place, Span range) {
    return place.start() <= range.end() && range.start() <= place.end();
  }

  /** Every fix that changes no value, of all findings: what may be applied without being read. */
  public static Optional<Action> fixAll(Checked checked) {
    List<Edit> edits = new ArrayList<>();
    checked.findings().stream()
        .filter(finding -> !finding.isAccepted())
        .flatMap(finding -> finding.fixes().stream().filter(Fix::safe).limit(1))
        .filter(fix -> isOf(fix, checked.text()))
        .filter(fix -> fix.edits().stream().noneMatch(edit -> clashes(edit, edits)))
        .forEach(fix -> edits.addAll(fix.edits()));
    if (edits.isEmpty()) {
      return Optional.empty();
    }
    edits.sort(Comparator.comparingInt(edit -> edit.place().start()));
    return Optional.of(
        new Action(
            "Write every value as the format spells it", Sort.FIX_ALL, edits, Optional.empty()));
  }

  private static boolean isOf(Fix fix, SourceText text) {
    return fix.edits().stream().allMatch(edit -> edit.place().sheet().equals(text.name()));
  }

  private static boolean clashes(Edit edit, List<Edit> others) {
    return others.stream().anyMatch(other -> touches(edit.place().span(), other.place().span()));
  }

  /** The reason is left to be written: an acceptance without one is a finding of its own. */
  private static Optional<Action> accept(Checked checked, Finding finding) {
    boolean meant =
        finding.name().equals(Findings.INTERNAL_FAULT) || finding.name().startsWith("acceptance-");
    if (finding.subject().isEmpty() || meant) {
      return Optional.empty();
    }
    return Stream.of(
            checked.sheet().channels(), checked.sheet().scans(), checked.sheet().converters())
        .map((Map<String, Named<Part>> parts) -> parts.get(finding.subject()))
        .filter(named -> named != null)
        .findFirst()
        .flatMap(named -> node(checked.tree().root(), named))
        .filter(mapping -> !mapping.flow())
        .flatMap(mapping -> acceptance(checked.text(), mapping, finding))
        .map(
            edit ->
                new Action(
                    "Accept " + finding.name() + " here, with a reason",
                    Sort.QUICK_FIX,
                    List.of(edit),
                    Optional.of(finding)));
  }

  /** The mapping behind the name. */
  private static Optional<Node.Mapping> node(Node.Mapping root, Named<Part> named) {
    for (Node.Entry section : root.entries()) {
      if (section.value() instanceof Node.Mapping names) {
        for (Node.Entry entry : names.entries()) {
          if (entry.key().place().equals(named.place())
              && entry.value() instanceof Node.Mapping mapping) {
            return Optional.of(mapping);
          }
        }
      }
    }
    return Optional.empty();
  }

  private static Optional<Edit> acceptance(SourceText text, Node.Mapping mapping, Finding finding) {
    if (mapping.entries().isEmpty()) {
      return Optional.empty();
    }
    Node.Entry last = mapping.entries().get(mapping.entries().size() - 1);
    Optional<Node.Entry> list =
        mapping.entries().stream().filter(e -> e.key().text().equals("accept")).findFirst();
    int keyColumn = column(text, mapping.entries().get(0).key().place().start());
    if (list.isPresent()) {
      if (!(list.get().value() instanceof Node.Sequence items)
          || items.flow()
          || items.items().isEmpty()) {
        return Optional.empty();
      }
      int column = column(text, items.items().get(0).place().start()) - 2;
      Node item = items.items().get(items.items().size() - 1);
      return Optional.of(behind(text, item.place().end(), entry(finding, column)));
    }
    String lines = "\n" + " ".repeat(keyColumn) + "accept:" + entry(finding, keyColumn + 2);
    return Optional.of(behind(text, last.place().end(), lines));
  }

  private static String entry(Finding finding, int column) {
    String inner = "\n" + " ".repeat(column + 2);
    String about = finding.about().isEmpty() ? "" : inner + "about: " + finding.about();
    return "\n" + " ".repeat(column) + "- finding: " + finding.name() + about + inner + "because: ";
  }

  private static int column(SourceText text, int offset) {
    return offset - text.lineStart(text.lineAt(offset));
  }

  /** At the end of the line on which a value ends, behind any comment. */
  private static Edit behind(SourceText text, int valueEnd, String lines) {
    int end = valueEnd;
    while (end > 0 && Character.isWhitespace(text.content().charAt(end - 1))) {
      end--;
    }
    int lineEnd = text.line(text.lineAt(end)).end();
    return new Edit(text.place(lineEnd, lineEnd), lines.replace("\n", text.lineBreak()));
  }
}
