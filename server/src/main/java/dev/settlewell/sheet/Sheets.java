package dev.settlewell.sheet;

import dev.settlewell.syntax.SyntaxTree;
import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import dev.settlewell.text.Related;
import dev.settlewell.unit.Toleranced;
import dev.settlewell.vocabulary.NameKind;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Binds the tree of a text to the schema. */
public final class Sheets {
  private static final List<String> PARTS_OF_TOTAL =
      List.of("offset-error", "gain-error", "integral-nonlinearity");

  private Sheets() {}

  /**
   * The sheet that a tree holds; never fails. Its problems are those of the binding alone, in the
   * order of the text: those of the YAML stand in the tree.
   */
  public static Sheet bind(SyntaxTree tree, Vocabulary vocabulary) {
    Report report = new Report();
    Binder binder = new Binder(vocabulary, tree.text(), report);
    Part top = binder.sheet(tree.root());
    Names.requireOneMeaning(binder.definitions(), report);
    Map<NameKind, Map<String, Place>> places = places(binder.definitions());
    Map<String, Named<Part>> converters = named(top, NameKind.CONVERTER, Part.class, places);
    converters.values().forEach(converter -> checkTotal(converter.value(), report));
    return new Sheet(
        tree.text(),
        tree,
        top,
        named(top, NameKind.SUPPLY, Toleranced.class, places),
        converters,
        named(top, NameKind.SCAN, Part.class, places),
        named(top, NameKind.INTERFERER, Part.class, places),
        named(top, NameKind.CHANNEL, Part.class, places),
        report.sorted(),
        new Uncomputed(vocabulary).keys(top));
  }

  private static Map<NameKind, Map<String, Place>> places(List<Binder.Definition> definitions) {
    Map<NameKind, Map<String, Place>> places = new LinkedHashMap<>();
    for (Binder.Definition definition : definitions) {
      places
          .computeIfAbsent(definition.kind(), kind -> new LinkedHashMap<>())
          .putIfAbsent(definition.name(), definition.place());
    }
    return places;
  }

  private static <T> Map<String, Named<T>> named(
      Part top, NameKind kind, Class<T> type, Map<NameKind, Map<String, Place>> places) {
    Map<String, Named<T>> named = new LinkedHashMap<>();
    top.map(kind.section(), type)
        .orElse(Map.of())
        .forEach(
            (name, slot) -> named.put(name, new Named<>(name, places.get(kind).get(name), slot)));
    return Collections.unmodifiableMap(named);
  }

  /**
   * The total unadjusted error holds offset, gain and non-linearity: beside it they count twice.
   */
  private static void checkTotal(Slot<Part> converter, Report report) {
    Part part = converter.stated().orElse(null);
    if (part == null || !part.has("total-unadjusted-error")) {
      return;
    }
    List<Related> twice = new ArrayList<>();
    for (String key : PARTS_OF_TOTAL) {
      if (part.has(key)) {
        twice.add(new Related(part.slot(key).place(), "`" + key + "`"));
      }
    }
    if (!twice.isEmpty()) {
      report.add(
          new Problem(
              Problem.Kind.ERROR_STATED_TWICE,
              part.slot("total-unadjusted-error").place(),
              "the total unadjusted error holds offset, gain and non-linearity: state either it or"
                  + " them",
              twice,
              List.of()));
    }
  }
}
