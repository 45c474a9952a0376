package dev.settlewell.assist;

import dev.settlewell.finding.Check;
import dev.settlewell.finding.catalog.Catalog;
import dev.settlewell.syntax.Cursor;
import dev.settlewell.syntax.Node;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Span;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Kind;
import dev.settlewell.vocabulary.NameKind;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/**
 * What may be written at the cursor. Where it stands and how far to indent comes from the tree,
 * what fits there from the vocabulary, so that half-typed text gets an answer like any other.
 */
public final class Completion {
  /** What is proposed. */
  public enum Sort {
    KEY,
    KIND,
    NAME,
    VALUE,
    FINDING
  }

  /**
   * One proposal; they are in the order to be shown.
   *
   * @param detail a few words beside the label
   * @param span what it replaces, on the cursor's line
   * @param text what it writes
   * @param snippet the same with tab stops
   * @param also further edits, apart from {@code span}: the line's indentation
   */
  public record Proposal(
      String label,
      Sort sort,
      String detail,
      Prose doc,
      Span span,
      String text,
      Optional<String> snippet,
      List<Edit> also) {}

  private static final int STEP = 2;

  private final Checked checked;
  private final Vocabulary vocabulary;
  private final List<Proposal> proposals = new ArrayList<>();
  private Span span = Span.at(0);
  private List<Edit> also = List.of();

  private Completion(Checked checked, Vocabulary vocabulary) {
    this.checked = checked;
    this.vocabulary = vocabulary;
  }

  public static List<Proposal> at(Checked checked, Vocabulary vocabulary, int offset) {
    Completion completion = new Completion(checked, vocabulary);
    completion.at(Cursor.at(checked.tree(), offset));
    return List.copyOf(completion.proposals);
  }

  private void at(Cursor cursor) {
    if (cursor instanceof Cursor.OnKey on) {
      onKey(on);
    } else if (cursor instanceof Cursor.NewKey at) {
      newKey(at);
    } else if (cursor instanceof Cursor.OnValue on) {
      span = on.span();
      boolean collection =
          on.entry().value() instanceof Node.Mapping || on.entry().value() instanceof Node.Sequence;
      if (!collection) {
        value(Meaning.at(on.path(), vocabulary), on.path());
      }
    } else if (cursor instanceof Cursor.InItem in) {
      item(in);
    }
  }

  private void onKey(Cursor.OnKey on) {
    List<String> outer = on.path().subList(0, on.path().size() - 1);
    span = on.entry().key().place().span();
    Set<String> others = keys(on.mapping());
    others.remove(on.entry().key().text());
    Meaning meaning = Meaning.at(outer, vocabulary);
    if (meaning instanceof Meaning.Keys keys) {
      absent(keys.kind(), others).forEach(key -> key(key, Template.plain(key.name())));
    } else if (meaning instanceof Meaning.Kinds kinds) {
      kinds(kinds.key()).forEach(kind -> kind(kind, Template.plain(kind.name())));
    }
  }

  private void newKey(Cursor.NewKey at) {
    span = at.word();
    boolean misplaced =
        !at.flow()
            && !checked.text().slice(at.lead()).equals(" ".repeat(at.indent()))
            && checked.text().slice(at.lead()).isBlank();
    also =
        misplaced
            ? List.of(new Edit(checked.text().place(at.lead()), " ".repeat(at.indent())))
            : List.of();
    Meaning meaning = Meaning.at(at.path(), vocabulary);
    Set<String> present = at.mapping().map(Completion::keys).orElse(Set.of());
    if (meaning instanceof Meaning.Keys keys) {
      absent(keys.kind(), present).forEach(k -> key(k, keyText(k, at.flow(), at.indent())));
    } else if (meaning instanceof Meaning.Names names) {
      names(names.key(), present, at.indent());
    } else if (meaning instanceof Meaning.Kinds kinds && present.isEmpty()) {
      kinds(kinds.key()).forEach(kind -> kind(kind, Skeletons.kind(kind)));
    } else if (meaning instanceof Meaning.Items items && !at.flow()) {
      newItem(items.key(), at.path(), at.indent());
    } else if (meaning instanceof Meaning.Value) {
      absent(vocabulary.longForm(), present)
          .forEach(k -> key(k, keyText(k, at.flow(), at.indent())));
    }
  }

  private static Set<String> keys(Node.Mapping mapping) {
    return mapping.entries().stream()
        .map(entry -> entry.key().text())
        .collect(Collectors.toCollection(java.util.LinkedHashSet::new));
  }

  /** Required ones first, what is not computed yet last, else in the schema's order. */
  private static List<Key> absent(Kind kind, Set<String> present) {
    return kind.keys().values().stream()
        .filter(key -> !present.contains(key.name()))
        .sorted(
            java.util.Comparator.comparing((Key key) -> !key.required())
                .thenComparing(key -> !key.computed()))
        .toList();
  }

  private void key(Key key, Template template) {
    Prose doc = new Prose().paragraph(key.doc());
    if (!key.examples().isEmpty()) {
      doc.paragraph("Example: `" + key.examples().get(0) + "`");
    }
    add(key.name(), Sort.KEY, key.required() ? "required" : "", doc, template);
  }

  private Template keyText(Key key, boolean flow, int indent) {
    Meaning inside = Meaning.of(key, vocabulary);
    boolean block =
        !flow
            && (inside instanceof Meaning.Names
                || inside instanceof Meaning.Kinds
                || inside instanceof Meaning.Keys keys && keys.kind().shortKey().isEmpty()
                || inside instanceof Meaning.Items items && isBlockList(items.key()));
    String dash = inside instanceof Meaning.Items ? "- " : "";
    return new Template(
        block ? key.name() + ":\n" + " ".repeat(indent + STEP) + dash : key.name() + ": ");
  }

  private boolean isBlockList(Key list) {
    return list.item()
        .map(item -> !(Meaning.of(item, vocabulary) instanceof Meaning.Value))
        .orElse(false);
  }

  private List<Kind> kinds(Key key) {
    return key.kinds().stream().flatMap(name -> vocabulary.find(name).stream()).toList();
  }

  private void kind(Kind kind, Template template) {
    String detail = kind.computed() ? "" : "read, not computed with yet";
    add(kind.name(), Sort.KIND, detail, new Prose().paragraph(kind.doc()), template);
  }

  private void names(Key key, Set<String> present, int indent) {
    if (key.names().filter(Key.MapNames.FINDING::equals).isPresent()) {
      findingNames(present, ": ");
      return;
    }
    Skeletons.named(key.name())
        .ifPresent(
            skeleton ->
                add(
                    "new "
                        + key.names()
                            .flatMap(Key.MapNames::nameKind)
                            .map(NameKind::word)
                            .orElse("entry"),
                    Sort.KIND,
                    "",
                    new Prose().paragraph(key.doc()),
                    skeleton.indented(indent)));
  }

  private void findingNames(Set<String> present, String behind) {
    for (Check check : Catalog.CHECKS) {
      if (!present.contains(check.name())) {
        Prose doc = new Prose().paragraph(check.summary());
        String detail = check.severity().label();
        add(check.name(), Sort.FINDING, detail, doc, Template.plain(check.name() + behind));
      }
    }
  }

  private void item(Cursor.InItem in) {
    span = in.span();
    Meaning meaning = Meaning.at(in.path(), vocabulary);
    if (!in.dashed()) {
      newItem(meaning, in.path(), in.indent());
    } else if (meaning instanceof Meaning.Kinds kinds) {
      kinds(kinds.key())
          .forEach(kind -> kind(kind, in.flow() ? braced(kind) : Skeletons.kind(kind)));
    } else if (meaning instanceof Meaning.Keys keys) {
      if (!in.flow()) {
        absent(keys.kind(), Set.of())
            .forEach(key -> key(key, keyText(key, false, in.indent() + STEP)));
      }
      value(meaning, in.path());
    } else {
      value(meaning, in.path());
    }
  }

  private static Template braced(Kind kind) {
    return new Template("{" + Skeletons.kind(kind).marked() + "}");
  }

  private void newItem(Key list, List<String> path, int indent) {
    list.item()
        .ifPresent(
            item -> {
              List<String> inside = new ArrayList<>(path);
              inside.add("0");
              newItem(Meaning.of(item, vocabulary), inside, indent);
            });
  }

  /** An item whose dash is still to be written. */
  private void newItem(Meaning meaning, List<String> path, int indent) {
    int from = checked.text().lineStart(checked.text().lineAt(span.start()));
    Span lead = new Span(from, span.start());
    boolean blank = checked.text().slice(lead).isBlank();
    boolean misplaced = blank && lead.length() != indent;
    also =
        misplaced ? List.of(new Edit(checked.text().place(lead), " ".repeat(indent))) : List.of();
    int first = proposals.size();
    if (meaning instanceof Meaning.Kinds kinds) {
      kinds(kinds.key()).forEach(kind -> kind(kind, Skeletons.kind(kind)));
    } else if (meaning instanceof Meaning.Keys keys) {
      absent(keys.kind(), Set.of()).forEach(k -> key(k, keyText(k, false, indent + STEP)));
    } else {
      value(meaning, path);
    }
    for (int i = first; i < proposals.size(); i++) {
      Proposal p = proposals.get(i);
      proposals.set(
          i,
          new Proposal(
              p.label(),
              p.sort(),
              p.detail(),
              p.doc(),
              p.span(),
              "- " + p.text(),
              p.snippet().map(snippet -> "- " + snippet),
              p.also()));
    }
  }

  private void value(Meaning meaning, List<String> path) {
    if (meaning instanceof Meaning.Value value) {
      values(value.key(), path);
    } else if (meaning instanceof Meaning.Keys keys) {
      keys.kind().shortKey().flatMap(keys.kind()::key).ifPresent(key -> values(key, path));
    } else if (meaning instanceof Meaning.Kinds kinds) {
      kinds(kinds.key()).forEach(kind -> kind(kind, braced(kind)));
    } else if (meaning instanceof Meaning.Items items) {
      items
          .key()
          .examples()
          .forEach(e -> add(e, Sort.VALUE, "example", new Prose(), new Template(e)));
    }
  }

  private void values(Key key, List<String> path) {
    boolean finding = key.name().equals("finding") && path.contains("accept");
    if (finding) {
      findingNames(Set.of(), "");
      return;
    }
    String typed = checked.text().slice(span);
    for (ValueProposals.Choice choice : new ValueProposals(checked, key, path, typed).choices()) {
      Prose doc = new Prose().paragraph(key.doc());
      add(
          choice.text(),
          choice.isName() ? Sort.NAME : Sort.VALUE,
          choice.detail(),
          doc,
          Template.plain(choice.text()));
    }
  }

  private void add(String label, Sort sort, String detail, Prose doc, Template template) {
    boolean blankBefore =
        span.start() == 0
            || " \t\n\r{[,".indexOf(checked.text().content().charAt(span.start() - 1)) >= 0;
    String gap = blankBefore ? "" : " ";
    proposals.add(
        new Proposal(
            label,
            sort,
            detail,
            doc,
            span,
            gap + template.text(),
            template.hasStops() ? Optional.of(gap + template.snippet()) : Optional.empty(),
            also));
  }
}
