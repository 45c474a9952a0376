package dev.settlewell.sheet;

import dev.settlewell.text.Place;
import dev.settlewell.text.SourceText;
import dev.settlewell.unit.Toleranced;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Kind;
import dev.settlewell.vocabulary.NameKind;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Set;

/** Finds every place of a sheet where a name is used, by what the schema says of its keys. */
public final class References {
  private static final String EQUALS = "equals";

  private final Vocabulary vocabulary;
  private final SourceText text;
  private final List<Reference> found = new ArrayList<>();

  private References(Vocabulary vocabulary, SourceText text) {
    this.vocabulary = vocabulary;
    this.text = text;
  }

  /** In the order of the text. */
  public static List<Reference> of(Sheet sheet, Vocabulary vocabulary) {
    References references = new References(vocabulary, sheet.text());
    references.part(sheet.top());
    references.found.sort(Comparator.comparingInt(reference -> reference.place().start()));
    return List.copyOf(references.found);
  }

  private void part(Part part) {
    Kind kind = vocabulary.kind(part.kind());
    part.slots().forEach((name, slot) -> slot(kind.keys().get(name), slot));
  }

  private void slot(Key key, Slot<?> slot) {
    slot.stated().ifPresent(value -> value(key, value, slot.place()));
  }

  private void value(Key key, Object value, Place place) {
    if (value instanceof Part part) {
      part(part);
    } else if (value instanceof List<?> items) {
      items.forEach(item -> slot(key.item().orElseThrow(), (Slot<?>) item));
    } else if (value instanceof Map<?, ?> map) {
      map.values().forEach(item -> slot(key.item().orElseThrow(), (Slot<?>) item));
    } else if (value instanceof Either either) {
      either.quantity().ifPresent(quantity -> value(key, quantity, place));
      either
          .word()
          .filter(word -> !key.words().contains(word))
          .ifPresent(w -> named(key, w, place));
    } else if (value instanceof Toleranced quantity) {
      quantity.of().ifPresent(supply -> add(Set.of(NameKind.SUPPLY), supply, place));
    } else if (value instanceof String word && key.name().equals(EQUALS)) {
      figure(word, place);
    } else if (value instanceof String word) {
      named(key, word, place);
    }
  }

  private void named(Key key, String word, Place place) {
    key.refersTo().ifPresent(kind -> add(Set.of(kind), word, place));
  }

  /** {@code CHANNEL.FIGURE}, {@code CONVERTER.KEY}, {@code SCAN.CHANNEL.FIGURE}. */
  private void figure(String path, Place place) {
    String[] steps = path.split("\\.", -1);
    if (steps.length >= 3) {
      add(Set.of(NameKind.SCAN), steps[0], place);
      add(Set.of(NameKind.CHANNEL), steps[1], place);
    } else {
      add(Set.of(NameKind.CHANNEL, NameKind.CONVERTER, NameKind.SCAN), steps[0], place);
    }
  }

  private void add(Set<NameKind> kinds, String name, Place place) {
    found.add(new Reference(kinds, name, within(place, name)));
  }

  /** The stretch of a name inside its value; the whole value where escapes hide it. */
  private Place within(Place place, String name) {
    String written = text.slice(place.span());
    int at = written.endsWith(name) ? written.length() - name.length() : written.indexOf(name);
    return at < 0 || name.isEmpty()
        ? place
        : new Place(place.sheet(), place.span().sub(at, at + name.length()));
  }
}
