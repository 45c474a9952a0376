package dev.settlewell.sheet;

import dev.settlewell.syntax.Node;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import dev.settlewell.unit.Deviation;
import dev.settlewell.unit.Range;
import dev.settlewell.unit.Toleranced;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Kind;
import dev.settlewell.vocabulary.NameKind;
import dev.settlewell.vocabulary.Shape;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Turns a tree into slots as the schema says: one method a shape. It knows no key by name but the
 * two that decide how others are read: {@code measures} and {@code defaults}.
 */
final class Binder {
  /** A name the user gave, where it stands. */
  record Definition(NameKind kind, String name, Place place) {}

  private static final String MEASURES = "measures";
  private static final String DEFAULTS = "defaults";

  private final Vocabulary vocabulary;
  private final SourceText text;
  private final Report report;
  private final ValueReader values;
  private final LongForm longForm;
  private final Slips slips;
  private final List<Definition> definitions = new ArrayList<>();

  Binder(Vocabulary vocabulary, SourceText text, Report report) {
    this.vocabulary = vocabulary;
    this.text = text;
    this.report = report;
    this.values = new ValueReader(report);
    this.longForm = new LongForm(values, report);
    this.slips = new Slips(vocabulary, text, report);
  }

  Part sheet(Node.Mapping root) {
    Place start = new Place(root.place().sheet(), Span.at(0));
    Place key = root.entries().isEmpty() ? start : root.entries().get(0).key().place();
    return mapping(vocabulary.sheet(), root, key, "", Scope.EMPTY);
  }

  /** Every name that the sheet defines, in the order of the text. */
  List<Definition> definitions() {
    return definitions;
  }

  private Slot<?> value(Key key, Node node, Place keyPlace, String pointer, Scope scope) {
    if (node instanceof Node.Broken) {
      return new Slot.Wrong<>(node.place(), "", pointer);
    }
    boolean mayBeAbsent = key.shape() == Shape.MAP || key.shape() == Shape.PART;
    if (node instanceof Node.Absent && !mayBeAbsent) {
      return absent(key.examples(), keyPlace, pointer);
    }
    return switch (key.shape()) {
      case PART -> part(vocabulary.kind(key.kind().orElseThrow()), node, keyPlace, pointer, scope);
      case ONE_KIND -> oneKind(key, node, keyPlace, pointer, scope);
      case LIST -> list(key, node, keyPlace, pointer, scope);
      case MAP -> map(key, node, keyPlace, pointer, scope);
      default -> single(key, node, keyPlace, pointer, scope);
    };
  }

  private <T> Slot<T> absent(List<String> examples, Place keyPlace, String pointer) {
    report.add(
        Problem.Kind.WRONG_KIND,
        keyPlace,
        "`"
            + text.slice(keyPlace.span())
            + "` has no value: write one"
            + example(examples)
            + ", or remove the key");
    return new Slot.Wrong<>(keyPlace, "", pointer);
  }

  // --- one value -------------------------------------------------------------------------------

  private Slot<?> single(Key key, Node node, Place keyPlace, String pointer, Scope scope) {
    if (node instanceof Node.Scalar scalar) {
      return values.read(key, scalar, keyPlace, pointer, scope);
    }
    boolean takesLongForm = key.shape() == Shape.QUANTITY || key.shape() == Shape.COMPONENT;
    if (takesLongForm && node instanceof Node.Mapping mapping) {
      Entries entries = Entries.of(mapping, report);
      slips.unknownKeys(vocabulary.longForm(), entries);
      Slot<Toleranced> slot =
          longForm.read(key, entries, keyPlace, mapping.place(), pointer, scope);
      return key.takesWordOrQuantity() ? slot.map(Either::quantity) : slot;
    }
    return wrongKind(key, node, pointer, "takes one value" + example(key.examples()));
  }

  // --- mappings --------------------------------------------------------------------------------

  private Slot<Part> part(Kind kind, Node node, Place keyPlace, String pointer, Scope scope) {
    if (node instanceof Node.Absent && !kind.mayBeEmpty()) {
      return absent(kind.examples(), keyPlace, pointer);
    }
    Place place = node instanceof Node.Absent ? keyPlace : node.place();
    Part part;
    if (node instanceof Node.Mapping mapping) {
      part = mapping(kind, mapping, keyPlace, pointer, scope);
    } else if (node instanceof Node.Absent) {
      Node.Mapping empty = new Node.Mapping(List.of(), keyPlace, true);
      part = mapping(kind, empty, keyPlace, pointer, scope);
    } else if (takesShort(kind, node)) {
      part = shortForm(kind, node, keyPlace, pointer, scope);
    } else if (node instanceof Node.Sequence sequence && !kind.columns().isEmpty()) {
      return columns(kind, sequence, keyPlace, pointer, scope);
    } else {
      String form = kind.columns().isEmpty() ? "keys of its own" : "a pair in brackets";
      report.add(
          Problem.Kind.WRONG_KIND,
          node.place(),
          "`" + kind.name() + "` takes " + form + example(kind.examples()));
      return new Slot.Wrong<>(node.place(), rawOf(node), pointer);
    }
    return new Slot.Stated<>(part, keyPlace, place, rawOf(node), pointer);
  }

  private static boolean takesShort(Kind kind, Node node) {
    return kind.shortKey()
        .map(kind.keys()::get)
        .map(
            key ->
                key.shape() == Shape.LIST
                    ? node instanceof Node.Sequence
                    : node instanceof Node.Scalar)
        .orElse(false);
  }

  private Part shortForm(Kind kind, Node node, Place keyPlace, String pointer, Scope scope) {
    String principal = kind.shortKey().orElseThrow();
    Map<String, Slot<?>> slots = new LinkedHashMap<>();
    for (Key key : kind.keys().values()) {
      if (key.name().equals(principal)) {
        slots.put(principal, value(key, node, keyPlace, pointer, scope));
      } else if (key.partOf().isEmpty()) {
        slots.put(key.name(), new Slot.Missing<>(keyPlace, pointer + "/" + key.name()));
      }
    }
    return new Part(kind.name(), keyPlace, node.place(), pointer, slots);
  }

  private Slot<Part> columns(
      Kind kind, Node.Sequence sequence, Place keyPlace, String pointer, Scope scope) {
    if (sequence.items().size() != kind.columns().size()) {
      slips.wrongColumns(kind, sequence);
      return new Slot.Wrong<>(sequence.place(), "", pointer);
    }
    Map<String, Slot<?>> slots = new LinkedHashMap<>();
    for (int i = 0; i < kind.columns().size(); i++) {
      Key key = kind.keys().get(kind.columns().get(i));
      Node item = sequence.items().get(i);
      slots.put(key.name(), value(key, item, item.place(), pointer + "/" + i, scope));
    }
    Part part = new Part(kind.name(), keyPlace, sequence.place(), pointer, slots);
    return new Slot.Stated<>(part, keyPlace, sequence.place(), "", pointer);
  }

  /** A mapping of a known kind, bound; what a whole sheet is, and every part of it. */
  Part mapping(Kind kind, Node.Mapping mapping, Place keyPlace, String pointer, Scope outer) {
    Entries entries = Entries.of(mapping, report);
    slips.unknownKeys(kind, entries);
    Map<String, Slot<?>> early = new HashMap<>();
    Scope scope = scopeInside(kind, entries, early, keyPlace, pointer, outer);
    Map<String, Slot<?>> slots = new LinkedHashMap<>();
    for (Key key : kind.keys().values()) {
      if (key.partOf().isPresent()) {
        continue;
      }
      Slot<?> slot = early.get(key.name());
      if (slot == null) {
        slot = slot(kind, key, entries, mapping, keyPlace, pointer, scope);
      }
      if (slot.isMissing() && key.required()) {
        missing(kind, key, keyPlace);
      }
      slots.put(key.name(), slot);
    }
    return new Part(kind.name(), keyPlace, mapping.place(), pointer, slots);
  }

  private void missing(Kind kind, Key key, Place keyPlace) {
    report.add(
        Problem.Kind.MISSING_KEY,
        keyPlace,
        labelled(kind, keyPlace) + " lacks the key `" + key.name() + "`" + example(key.examples()));
  }

  private String labelled(Kind kind, Place keyPlace) {
    String at = text.slice(keyPlace.span());
    if (kind.name().equals(Vocabulary.SHEET)) {
      return "the sheet";
    }
    if (at.equals(kind.name())) {
      return "`" + at + "`";
    }
    boolean named =
        Arrays.stream(NameKind.values()).anyMatch(name -> name.word().equals(kind.name()));
    return named ? kind.name() + " `" + at + "`" : "this " + kind.name();
  }

  private Slot<?> slot(
      Kind kind,
      Key key,
      Entries entries,
      Node.Mapping mapping,
      Place keyPlace,
      String pointer,
      Scope scope) {
    boolean inPieces =
        kind.shortKey().filter(key.name()::equals).isPresent() && hasPieces(kind, entries);
    if (inPieces) {
      return longForm.read(key, entries, keyPlace, mapping.place(), pointer, scope);
    }
    String below = pointer + "/" + escaped(key.name());
    Optional<Node.Entry> entry = entries.find(key.name());
    if (entry.isEmpty()) {
      return new Slot.Missing<>(keyPlace, below);
    }
    return value(key, entry.get().value(), entry.get().key().place(), below, scope);
  }

  /** True where the mapping holds pieces of the long form of its kind's one value. */
  private static boolean hasPieces(Kind kind, Entries entries) {
    for (String name : entries.byKey().keySet()) {
      if (kind.key(name).flatMap(Key::partOf).isPresent()) {
        return true;
      }
    }
    return false;
  }

  /** Binds first what decides how the rest is read, and keeps its slot. */
  private Scope scopeInside(
      Kind kind,
      Entries entries,
      Map<String, Slot<?>> early,
      Place keyPlace,
      String pointer,
      Scope outer) {
    Optional<Key> measures = kind.key(MEASURES);
    if (measures.isPresent()) {
      Slot<?> slot = slot(kind, measures.get(), entries, null, keyPlace, pointer, outer);
      early.put(MEASURES, slot);
      return outer.measuring(slot.stated().map(range -> ((Range) range).unit()));
    }
    Optional<Key> defaults = kind.key(DEFAULTS);
    if (defaults.isPresent()) {
      Slot<?> slot = slot(kind, defaults.get(), entries, null, keyPlace, pointer, outer);
      early.put(DEFAULTS, slot);
      return outer.with(slot.stated().map(part -> deviations((Part) part)).orElse(Map.of()));
    }
    return outer;
  }

  private static Map<String, Deviation> deviations(Part defaults) {
    Map<String, Deviation> deviations = new HashMap<>();
    for (String component : defaults.slots().keySet()) {
      defaults.deviation(component).stated().ifPresent(d -> deviations.put(component, d));
    }
    return deviations;
  }

  // --- one key that names a kind ---------------------------------------------------------------

  private Slot<?> oneKind(Key key, Node node, Place keyPlace, String pointer, Scope scope) {
    if (node instanceof Node.Scalar scalar) {
      slips.kindAsText(key, scalar);
      return new Slot.Wrong<>(scalar.place(), scalar.text(), pointer);
    }
    if (!(node instanceof Node.Mapping mapping) || mapping.entries().isEmpty()) {
      return wrongKind(
          key, node, pointer, "takes one key that names its kind" + example(key.examples()));
    }
    Node.Entry first = mapping.entries().get(0);
    String kindName = first.key().text();
    if (!key.kinds().contains(kindName)) {
      slips.unknownKind(key, first.key());
      return new Slot.Wrong<>(first.key().place(), kindName, pointer);
    }
    Kind kind = vocabulary.kind(kindName);
    String below = pointer + "/" + kindName;
    if (mapping.entries().size() == 1) {
      return part(kind, first.value(), first.key().place(), below, scope);
    }
    if (slips.keysBesideTheirKind(kind, mapping)) {
      List<Node.Entry> rest = mapping.entries().subList(1, mapping.entries().size());
      Place place =
          new Place(
              mapping.place().sheet(),
              new Span(rest.get(0).key().place().start(), mapping.place().end()));
      return part(kind, new Node.Mapping(rest, place, false), first.key().place(), below, scope);
    }
    slips.severalKinds(key, mapping);
    return new Slot.Wrong<>(mapping.place(), "", pointer);
  }

  // --- lists and maps --------------------------------------------------------------------------

  private Slot<?> list(Key key, Node node, Place keyPlace, String pointer, Scope scope) {
    Key item = key.item().orElseThrow();
    if (node instanceof Node.Sequence sequence) {
      List<Slot<?>> slots = new ArrayList<>();
      for (int i = 0; i < sequence.items().size(); i++) {
        Node element = sequence.items().get(i);
        slots.add(value(item, element, itemKey(element, keyPlace), pointer + "/" + i, scope));
      }
      boolean holds = Lists.check(key, slots, sequence, report);
      return holds
          ? new Slot.Stated<Object>(List.copyOf(slots), keyPlace, node.place(), "", pointer)
          : new Slot.Wrong<>(node.place(), "", pointer);
    }
    if (node instanceof Node.Mapping mapping && !key.entries().isEmpty()) {
      List<Slot<?>> slots = asEntries(key, mapping, pointer, scope);
      return new Slot.Stated<Object>(slots, keyPlace, node.place(), "", pointer);
    }
    if (node instanceof Node.Mapping mapping && item.shape() == Shape.ONE_KIND) {
      slips.listAsMapping(key, mapping);
      return new Slot.Wrong<>(node.place(), "", pointer);
    }
    boolean ofScalars =
        item.shape() == Shape.PART
            ? vocabulary.kind(item.kind().orElseThrow()).shortKey().isPresent()
            : item.shape() != Shape.ONE_KIND;
    if (ofScalars && node instanceof Node.Scalar scalar && !scalar.text().contains(",")) {
      String list = "[" + text.slice(scalar.place().span()) + "]";
      report.add(
          Problem.Kind.WRONG_KIND,
          node.place(),
          "`" + key.name() + "` takes a list: `" + list + "`",
          new Fix("write `" + list + "`", List.of(new Edit(node.place(), list)), true));
      return new Slot.Wrong<>(node.place(), scalar.text(), pointer);
    }
    return wrongKind(key, node, pointer, "takes a list" + example(key.examples()));
  }

  /** What marks an item that lacks something: its first key, never the whole block. */
  private static Place itemKey(Node item, Place listKey) {
    if (item instanceof Node.Mapping mapping && !mapping.entries().isEmpty()) {
      return mapping.entries().get(0).key().place();
    }
    return item instanceof Node.Absent ? listKey : item.place();
  }

  /** {@code {mains: 20 mV}} as the list of its entries: the key and the value each fill one key. */
  private List<Slot<?>> asEntries(Key key, Node.Mapping mapping, String pointer, Scope scope) {
    Kind kind = vocabulary.kind(key.item().orElseThrow().kind().orElseThrow());
    Key first = kind.keys().get(key.entries().get(0));
    Key second = kind.keys().get(key.entries().get(1));
    List<Slot<?>> slots = new ArrayList<>();
    for (Node.Entry entry : Entries.of(mapping, report).byKey().values()) {
      String below = pointer + "/" + escaped(entry.key().text());
      Place name = entry.key().place();
      Map<String, Slot<?>> both = new LinkedHashMap<>();
      both.put(first.name(), value(first, entry.key(), name, below, scope));
      both.put(
          second.name(),
          entry.value() instanceof Node.Absent
              ? new Slot.Missing<>(name, below)
              : value(second, entry.value(), name, below, scope));
      Part part = new Part(kind.name(), name, entry.place(), below, both);
      slots.add(new Slot.Stated<>(part, name, entry.place(), "", below));
    }
    return List.copyOf(slots);
  }

  private Slot<?> map(Key key, Node node, Place keyPlace, String pointer, Scope scope) {
    if (node instanceof Node.Absent) {
      return new Slot.Stated<Object>(Map.of(), keyPlace, keyPlace, "", pointer);
    }
    if (!(node instanceof Node.Mapping mapping)) {
      return wrongKind(
          key, node, pointer, "takes names with a value each" + example(key.examples()));
    }
    Key item = key.item().orElseThrow();
    Key.MapNames names = key.names().orElseThrow();
    Map<String, Slot<?>> slots = new LinkedHashMap<>();
    for (Node.Entry entry : Entries.of(mapping, report).byKey().values()) {
      Node.Scalar name = entry.key();
      Optional<String> canonical = Names.check(names, name, report);
      if (canonical.isEmpty()) {
        continue;
      }
      String below = pointer + "/" + escaped(canonical.get());
      if (slots.containsKey(canonical.get())) {
        report.twice(
            name.place(),
            slots.get(canonical.get()).place(),
            "harmonic " + canonical.get() + " stands twice: remove one of them",
            "the first");
        continue;
      }
      names
          .nameKind()
          .ifPresent(kind -> definitions.add(new Definition(kind, name.text(), name.place())));
      slots.put(canonical.get(), value(item, entry.value(), name.place(), below, scope));
    }
    return new Slot.Stated<Object>(
        Collections.unmodifiableMap(slots), keyPlace, node.place(), "", pointer);
  }

  // --- small things ----------------------------------------------------------------------------

  private Slot<?> wrongKind(Key key, Node node, String pointer, String takes) {
    report.add(Problem.Kind.WRONG_KIND, node.place(), "`" + key.name() + "` " + takes);
    return new Slot.Wrong<>(node.place(), rawOf(node), pointer);
  }

  private static String example(List<String> examples) {
    return examples.isEmpty() ? "" : ", such as `" + examples.get(0) + "`";
  }

  private static String rawOf(Node node) {
    return node instanceof Node.Scalar scalar ? scalar.text() : "";
  }

  /** A step of a JSON Pointer (RFC 6901, section 3). */
  private static String escaped(String step) {
    return step.replace("~", "~0").replace("/", "~1");
  }
}
