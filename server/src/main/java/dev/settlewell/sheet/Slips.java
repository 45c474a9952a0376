package dev.settlewell.sheet;

import dev.settlewell.syntax.Node;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Kind;
import dev.settlewell.vocabulary.Nearest;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Slips in the shape of a sheet that only the schema shows, each with the way to mend it. Those
 * that YAML itself shows are met where the tree is read.
 */
final class Slips {
  private static final Pattern WHOLE_NUMBER = Pattern.compile("[-+±]?\\d+");
  private static final Pattern DIGITS_AND_UNIT = Pattern.compile("(\\d+)(\\s*\\D.*)?");

  private final Vocabulary vocabulary;
  private final SourceText text;
  private final Report report;

  Slips(Vocabulary vocabulary, SourceText text, Report report) {
    this.vocabulary = vocabulary;
    this.text = text;
    this.report = report;
  }

  // --- commas ----------------------------------------------------------------------------------

  private static boolean isSplit(String whole, String rest) {
    return WHOLE_NUMBER.matcher(whole).matches() && DIGITS_AND_UNIT.matcher(rest).matches();
  }

  private void splitNumber(Place whole, String number, Node.Scalar rest) {
    Place both = join(whole, rest.place());
    Matcher matcher = DIGITS_AND_UNIT.matcher(rest.text());
    boolean thousands = matcher.matches() && matcher.group(1).length() == 3;
    String withPoint = number + "." + rest.text();
    List<Fix> fixes = new ArrayList<>();
    fixes.add(new Fix("write `" + withPoint + "`", List.of(new Edit(both, withPoint)), !thousands));
    if (thousands) {
      String joined = number + rest.text();
      fixes.add(new Fix("write `" + joined + "`", List.of(new Edit(both, joined)), false));
    }
    report.add(
        Problem.Kind.NOT_ONE_VALUE,
        both,
        "the comma splits `" + number + "," + rest.text() + "` in two: write `" + withPoint + "`",
        fixes.toArray(Fix[]::new));
  }

  /** {@code [0 °C, 1,5 V]}: a pair that a decimal comma made three. */
  void wrongColumns(Kind kind, Node.Sequence sequence) {
    List<Node> items = sequence.items();
    for (int i = 0; items.size() == kind.columns().size() + 1 && i + 1 < items.size(); i++) {
      boolean split =
          items.get(i) instanceof Node.Scalar whole
              && items.get(i + 1) instanceof Node.Scalar rest
              && isSplit(whole.text(), rest.text());
      if (split) {
        splitNumber(
            items.get(i).place(),
            ((Node.Scalar) items.get(i)).text(),
            (Node.Scalar) items.get(i + 1));
        return;
      }
    }
    report.add(
        Problem.Kind.WRONG_KIND,
        sequence.place(),
        "a "
            + kind.name()
            + " takes exactly "
            + kind.columns().size()
            + " values, `["
            + String.join(", ", kind.columns())
            + "]`, and here are "
            + items.size());
  }

  // --- keys ------------------------------------------------------------------------------------

  void unknownKeys(Kind kind, Entries entries) {
    Set<String> known = kind.keys().keySet();
    for (Node.Entry entry : entries.byKey().values()) {
      Node.Scalar key = entry.key();
      if (known.contains(key.text())) {
        continue;
      }
      String whole = kind.name().equals(Vocabulary.SHEET) ? "a sheet" : "`" + kind.name() + "`";
      report.unknown(
          Problem.Kind.UNKNOWN_KEY,
          key.place(),
          key.text(),
          whole + " has no key `" + key.text() + "`",
          // The pieces of a long form are known, and too many to name.
          kind.keys().values().stream().filter(k -> k.partOf().isEmpty()).map(Key::name).toList());
    }
  }

  // --- kinds -----------------------------------------------------------------------------------

  void unknownKind(Key key, Node.Scalar name) {
    String what = key.name().equals("path") ? "a stage of a path" : "a " + key.name();
    report.unknown(
        Problem.Kind.UNKNOWN_KEY,
        name.place(),
        name.text(),
        "`" + name.text() + "` is no kind of " + what.substring(2),
        key.kinds());
  }

  /** {@code - resistor 1 kΩ}, {@code sensor: voltage}: a text where a key belongs. */
  void kindAsText(Key key, Node.Scalar scalar) {
    String written = scalar.text().strip();
    int blank = written.indexOf(' ');
    String word = blank < 0 ? written : written.substring(0, blank);
    String rest = blank < 0 ? "" : written.substring(blank).strip();
    Optional<String> kind =
        key.kinds().contains(word) ? Optional.of(word) : Nearest.of(word, key.kinds());
    if (kind.isEmpty() || scalar.inset() > 0) {
      report.unknown(
          Problem.Kind.WRONG_KIND,
          scalar.place(),
          word,
          "here stands one key that names its kind, and `" + written + "` is none",
          key.kinds());
      return;
    }
    Kind meant = vocabulary.kind(kind.get());
    String value = rest.isEmpty() && meant.shortKey().isEmpty() ? "{}" : rest;
    boolean inBlock = key.name().equals("path");
    String mended = kind.get() + ": " + value;
    String spelling = inBlock ? mended : "{" + mended + "}";
    report.add(
        Problem.Kind.WRONG_KIND,
        scalar.place(),
        "`" + word + "` is a key here, with a colon behind it: `" + spelling.strip() + "`",
        new Fix(
            "write `" + spelling.strip() + "`",
            List.of(new Edit(scalar.place(), spelling)),
            kind.get().equals(word)));
  }

  /** {@code thermistor:} with its keys at the same depth, so that they stand beside it. */
  boolean keysBesideTheirKind(Kind kind, Node.Mapping mapping) {
    List<Node.Entry> entries = mapping.entries();
    Node.Entry first = entries.get(0);
    List<Node.Entry> rest = entries.subList(1, entries.size());
    boolean beside =
        !mapping.flow()
            && first.value() instanceof Node.Absent
            && rest.stream().anyMatch(entry -> kind.keys().containsKey(entry.key().text()))
            && rest.stream()
                .allMatch(
                    entry ->
                        !vocabulary.find(entry.key().text()).isPresent()
                            || kind.keys().containsKey(entry.key().text()));
    if (beside) {
      String name = first.key().text();
      report.add(
          Problem.Kind.WRONG_KIND,
          first.key().place(),
          "`"
              + rest.get(0).key().text()
              + "` stands beside `"
              + name
              + "`, not below it: indent"
              + " the keys of `"
              + name
              + "` by two more blanks",
          new Fix("indent the keys below `" + name + "`", indent(rest), true));
    }
    return beside;
  }

  private List<Edit> indent(List<Node.Entry> entries) {
    List<Edit> edits = new ArrayList<>();
    int first = text.lineAt(entries.get(0).key().place().start());
    int last = text.lineAt(entries.get(entries.size() - 1).place().end());
    for (int line = first; line <= last; line++) {
      Span span = text.line(line);
      if (!text.slice(span).isBlank()) {
        edits.add(new Edit(text.place(Span.at(span.start())), "  "));
      }
    }
    return edits;
  }

  /** Two stages in one item of a path, or two kinds of sensor. */
  void severalKinds(Key key, Node.Mapping mapping) {
    Node.Entry second = mapping.entries().get(1);
    String names = "`" + mapping.entries().get(0).key().text() + "` and `" + second.key().text();
    boolean path = key.name().equals("path");
    List<Fix> fixes = new ArrayList<>();
    if (path && key.kinds().contains(second.key().text())) {
      itemsOfTheirOwn(mapping).ifPresent(fixes::add);
    }
    report.add(
        Problem.Kind.WRONG_KIND,
        second.key().place(),
        path
            ? names + "` stand in one item: begin each stage with `- `"
            : names + "` stand side by side: a sensor is one key that names its kind",
        fixes.toArray(Fix[]::new));
  }

  private Optional<Fix> itemsOfTheirOwn(Node.Mapping mapping) {
    List<Edit> edits = new ArrayList<>();
    for (Node.Entry entry : mapping.entries().subList(1, mapping.entries().size())) {
      int start = entry.key().place().start();
      if (mapping.flow() || start < 2 || !text.content().startsWith("  ", start - 2)) {
        return Optional.empty();
      }
      edits.add(new Edit(text.place(start - 2, start), "- "));
    }
    return Optional.of(new Fix("make each stage an item of its own", edits, false));
  }

  /** {@code path: {resistor: …, capacitor: …}}: a mapping has no order. */
  void listAsMapping(Key key, Node.Mapping mapping) {
    List<Edit> edits = mapping.flow() ? List.of(asFlowList(mapping)) : asItems(mapping);
    report.add(
        Problem.Kind.WRONG_KIND,
        mapping.flow() ? mapping.place() : mapping.entries().get(0).key().place(),
        "`" + key.name() + "` is a list, for its order counts: begin each stage with `- `",
        new Fix("make it a list, in the order written", edits, false));
  }

  private Edit asFlowList(Node.Mapping mapping) {
    List<String> items = new ArrayList<>();
    for (Node.Entry entry : mapping.entries()) {
      items.add("{" + text.slice(entry.place().span()) + "}");
    }
    return new Edit(mapping.place(), "[" + String.join(", ", items) + "]");
  }

  private List<Edit> asItems(Node.Mapping mapping) {
    List<Edit> edits = new ArrayList<>();
    for (Node.Entry entry : mapping.entries()) {
      int start = entry.key().place().start();
      edits.add(new Edit(text.place(Span.at(start)), "- "));
      int last = text.lineAt(entry.place().end());
      for (int line = text.lineAt(start) + 1; line <= last; line++) {
        Span span = text.line(line);
        if (!text.slice(span).isBlank()) {
          edits.add(new Edit(text.place(Span.at(span.start())), "  "));
        }
      }
    }
    return edits;
  }

  private static Place join(Place first, Place last) {
    return new Place(first.sheet(), new Span(first.start(), last.end()));
  }
}
