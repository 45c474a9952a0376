package dev.settlewell.syntax;

import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;

/** Slips that are good YAML, and show only once the tree is there. */
final class Slips {
  /** The keys whose lists hold one key an item, with its parameters below it. */
  static final Set<String> STAGE_LISTS = Set.of("path");

  private static final int STEP = 2;

  private Slips() {}

  /** {@code {upper: 4,7 kΩ}}: a value, and a key without one. */
  static List<Node.Entry> splitByComma(
      SourceText source, List<Node.Entry> entries, List<Problem> problems) {
    List<Node.Entry> read = new ArrayList<>();
    for (Node.Entry entry : entries) {
      int last = read.size() - 1;
      if (last >= 0 && isSecondHalf(source, read.get(last), entry)) {
        Node.Entry first = read.get(last);
        Span both = new Span(first.value().place().start(), entry.key().place().end());
        problems.add(split(source, both, first.value().place().end(), entry.key().text()));
        read.set(last, new Node.Entry(first.key(), new Node.Broken(source.place(both))));
      } else {
        read.add(entry);
      }
    }
    return read;
  }

  private static boolean isSecondHalf(SourceText source, Node.Entry before, Node.Entry entry) {
    if (!(entry.value() instanceof Node.Absent)
        || !(before.value() instanceof Node.Scalar value)
        || value.text().isEmpty()
        || entry.key().text().isEmpty()) {
      return false;
    }
    int comma = value.place().end();
    return isDigit(value.text().charAt(value.text().length() - 1))
        && isDigit(entry.key().text().charAt(0))
        && entry.key().place().start() == comma + 1
        && source.content().charAt(comma) == ',';
  }

  private static Problem split(SourceText source, Span both, int comma, String second) {
    List<Fix> fixes = new ArrayList<>();
    String written = source.slice(both);
    String point =
        source.slice(new Span(both.start(), comma))
            + "."
            + source.slice(new Span(comma + 1, both.end()));
    fixes.add(fix("Write `" + point + "`", new Edit(source.place(comma, comma + 1), ".")));
    String advice = "write `" + point + "`";
    if (second.matches("\\d{3}(\\D.*)?")) {
      String whole = point.replaceFirst("\\.(?=\\d{3}(\\D|$))", "");
      fixes.add(fix("Write `" + whole + "`", new Edit(source.place(comma, comma + 1), "")));
      advice += " or `" + whole + "`";
    }
    return new Problem(
        Problem.Kind.AMBIGUOUS_TEXT,
        source.place(both),
        "YAML splits `" + written + "` at the comma: " + advice,
        List.of(),
        fixes);
  }

  private static Fix fix(String title, Edit edit) {
    return new Fix(title, List.of(edit), false);
  }

  /** {@code - amplifier:} with its parameters beside it instead of below it. */
  static Node.Sequence stages(SourceText source, Node.Sequence list, List<Problem> problems) {
    List<Node> items = new ArrayList<>();
    for (Node item : list.items()) {
      items.add(
          item instanceof Node.Mapping stage && isFlat(source, stage)
              ? nested(source, stage, problems)
              : item);
    }
    return new Node.Sequence(items, list.place(), list.flow());
  }

  private static boolean isFlat(SourceText source, Node.Mapping stage) {
    if (stage.flow() || stage.entries().size() < 2) {
      return false;
    }
    Node.Entry kind = stage.entries().get(0);
    int second = stage.entries().get(1).key().place().start();
    return kind.value() instanceof Node.Absent
        && source.lineAt(second) > source.lineAt(kind.key().place().start());
  }

  private static Node nested(SourceText source, Node.Mapping stage, List<Problem> problems) {
    Node.Scalar kind = stage.entries().get(0).key();
    List<Node.Entry> inner = stage.entries().subList(1, stage.entries().size());
    Span below = new Span(inner.get(0).key().place().start(), stage.place().end());
    List<Edit> edits = new ArrayList<>();
    for (int n = source.lineAt(below.start()); n <= source.lineAt(below.end()); n++) {
      Span line = source.line(n);
      if (!source.slice(line).isBlank()) {
        edits.add(new Edit(source.place(Span.at(line.start())), " ".repeat(STEP)));
      }
    }
    Node.Scalar first = inner.get(0).key();
    problems.add(
        new Problem(
            Problem.Kind.SYNTAX,
            first.place(),
            "`"
                + first.text()
                + "` stands beside `"
                + kind.text()
                + "`, not in it: indent it below",
            new Fix("Indent it below `" + kind.text() + "`", edits, true)));
    Node.Mapping parameters = new Node.Mapping(inner, source.place(below), false);
    return new Node.Mapping(List.of(new Node.Entry(kind, parameters)), stage.place(), false);
  }

  private static boolean isDigit(char c) {
    return c >= '0' && c <= '9';
  }
}
