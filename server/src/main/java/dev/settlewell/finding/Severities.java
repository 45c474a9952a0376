package dev.settlewell.finding;

import dev.settlewell.sheet.Sheet;
import dev.settlewell.syntax.Node;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** What the top of a sheet says of the severity of findings: {@code findings: {…: off}}. */
final class Severities {
  private static final List<Node.Entry> NONE = List.of();

  private final Map<String, Severity> stated;

  private Severities(Map<String, Severity> stated) {
    this.stated = stated;
  }

  static Severities of(Sheet sheet) {
    Map<String, Severity> stated = new HashMap<>();
    for (Node.Entry entry : entries(sheet)) {
      if (entry.value() instanceof Node.Scalar word) {
        read(word.text(), stated, entry.key().text());
      }
    }
    return new Severities(stated);
  }

  /** The entries of {@code findings}, their names as written. */
  private static List<Node.Entry> entries(Sheet sheet) {
    return sheet.tree().root().entries().stream()
        .filter(entry -> entry.key().text().equals("findings"))
        .map(entry -> entry.value() instanceof Node.Mapping map ? map.entries() : NONE)
        .flatMap(List::stream)
        .toList();
  }

  private static void read(String word, Map<String, Severity> stated, String name) {
    if (word.equals("false")) {
      // Some YAML tools write `off` back as `false`.
      stated.put(name, Severity.OFF);
      return;
    }
    for (Severity severity : Severity.values()) {
      if (severity.label().equals(word)) {
        stated.put(name, severity);
      }
    }
  }

  /**
   * A fault of this program stays as it is: switching it off would hide that nothing was judged.
   */
  Finding apply(Finding finding) {
    Severity severity = stated.get(finding.name());
    boolean fixed = severity == null || finding.name().equals(Findings.INTERNAL_FAULT);
    return fixed ? finding : finding.with(severity);
  }
}
