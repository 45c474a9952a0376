package dev.settlewell.assist;

import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Reference;
import dev.settlewell.sheet.References;
import dev.settlewell.sheet.Sheet;
import dev.settlewell.text.Place;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/** From a name to where it is defined and used. All names of a sheet share one namespace. */
public final class Navigation {
  /** What the user may call things: the format's own rule. */
  private static final String NAME_PATTERN = "[a-z][a-z0-9-]*";

  /** A name under the cursor. */
  public record NameAt(String name, Place place) {}

  private Navigation() {}

  public static Optional<NameAt> nameAt(Checked checked, Vocabulary vocabulary, int offset) {
    return Stream.concat(
            definitions(checked.sheet()).map(named -> new NameAt(named.name(), named.place())),
            references(checked.sheet(), vocabulary))
        .filter(name -> name.place().span().touches(offset))
        .findFirst();
  }

  /** Where the name is defined: in this sheet or in one that it uses. */
  public static Optional<Place> definition(Checked checked, String name) {
    return Stream.of(
            checked.linked().supplies(),
            checked.linked().converters(),
            checked.linked().interferers(),
            checked.sheet().scans(),
            checked.sheet().channels())
        .map(names -> (Named<?>) names.get(name))
        .filter(named -> named != null)
        .map(Named::place)
        .findFirst();
  }

  /**
   * Every place of one sheet where the name stands, in the order of the text.
   *
   * @param withDefinition whether the place that defines it counts
   */
  public static List<Place> occurrences(
      Sheet sheet, Vocabulary vocabulary, String name, boolean withDefinition) {
    List<Place> places = new ArrayList<>();
    if (withDefinition) {
      definitions(sheet)
          .filter(named -> named.name().equals(name))
          .forEach(named -> places.add(named.place()));
    }
    references(sheet, vocabulary)
        .filter(reference -> reference.name().equals(name))
        .forEach(reference -> places.add(reference.place()));
    places.sort(Comparator.comparingInt(Place::start));
    return places.stream().distinct().toList();
  }

  /** Why a name cannot be given; empty where it can. */
  public static Optional<String> refusal(Checked checked, String newName) {
    if (!newName.matches(NAME_PATTERN)) {
      return Optional.of(
          "a name is lower-case letters, digits and hyphens, and begins with a letter");
    }
    if (definition(checked, newName).isPresent()) {
      return Optional.of("`" + newName + "` is taken: all names of a sheet share one namespace");
    }
    return Optional.empty();
  }

  private static Stream<? extends Named<?>> definitions(Sheet sheet) {
    return Stream.<Map<String, ? extends Named<?>>>of(
            sheet.supplies(),
            sheet.converters(),
            sheet.scans(),
            sheet.interferers(),
            sheet.channels())
        .flatMap(names -> names.values().stream());
  }

  private static Stream<NameAt> references(Sheet sheet, Vocabulary vocabulary) {
    Stream<NameAt> meant =
        References.of(sheet, vocabulary).stream()
            .map((Reference reference) -> new NameAt(reference.name(), reference.place()));
    // `accept` may be narrowed to an interferer by its name, in a key of plain text.
    Stream<NameAt> narrowed =
        Outline.of(sheet.tree(), vocabulary)
            .all()
            .filter(piece -> piece.isKey("about"))
            .filter(piece -> piece.parent().map(p -> p.isKind("acceptance")).orElse(false))
            .map(piece -> new NameAt(piece.valueText(), piece.value().place()));
    return Stream.concat(meant, narrowed);
  }
}
