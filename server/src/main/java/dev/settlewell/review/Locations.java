package dev.settlewell.review;

import dev.settlewell.sheet.Sheet;
import dev.settlewell.text.Place;
import dev.settlewell.text.PositionEncoding;
import dev.settlewell.text.SourceText;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Where places of the sheets of one report stand, in paths, lines and columns. */
final class Locations {
  private final Map<String, SourceText> texts = new HashMap<>();

  Locations(List<Reviewed> sheets) {
    for (Reviewed sheet : sheets) {
      sheet.analysis().linked().used().stream().map(Sheet::text).forEach(this::add);
      sheet.analysis().linked().sources().values().stream()
          .flatMap(source -> source.text().stream())
          .forEach(this::add);
      add(sheet.text());
    }
  }

  private void add(SourceText text) {
    texts.put(text.name(), text);
  }

  Optional<SourceText> text(Place place) {
    return Optional.ofNullable(texts.get(place.sheet()));
  }

  /** Empty where the place stands in a file that is no sheet of this report. */
  Optional<Location> of(Place place, PositionEncoding columns) {
    return text(place)
        .filter(text -> place.end() <= text.length())
        .map(text -> Location.of(text, place.span(), columns));
  }

  /** What stands there; empty where it is not known. */
  String written(Place place) {
    return text(place)
        .filter(text -> place.end() <= text.length())
        .map(text -> text.slice(place.span()))
        .orElse("");
  }

  /** {@code path:line:column}, columns in characters; the path alone where no more is known. */
  String pointer(Place place) {
    return of(place, PositionEncoding.UTF_32)
        .map(at -> place.sheet() + ":" + at.line() + ":" + at.column())
        .orElse(place.sheet());
  }
}
