package dev.settlewell.assist;

import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Finds what was read at a place of a sheet. */
final class Slots {
  private Slots() {}

  /** The value that stands exactly here; of a short form ({@code resistor: 1 kΩ}) the inner one. */
  static Optional<Object> valueAt(Part top, Place place) {
    for (Slot<?> slot : top.slots().values()) {
      Optional<Object> found = valueAt(slot, place);
      if (found.isPresent()) {
        return found;
      }
    }
    return Optional.empty();
  }

  private static Optional<Object> valueAt(Slot<?> slot, Place place) {
    if (!(slot instanceof Slot.Stated<?> stated)) {
      return Optional.empty();
    }
    Object value = stated.value();
    if (value instanceof Part part) {
      return part.place().span().contains(place.span()) ? valueAt(part, place) : Optional.empty();
    }
    if (value instanceof List<?> list) {
      return first(list, place);
    }
    if (value instanceof Map<?, ?> map) {
      return first(map.values(), place);
    }
    return stated.place().equals(place) ? Optional.of(value) : Optional.empty();
  }

  private static Optional<Object> first(Iterable<?> slots, Place place) {
    for (Object slot : slots) {
      Optional<Object> found = valueAt((Slot<?>) slot, place);
      if (found.isPresent()) {
        return found;
      }
    }
    return Optional.empty();
  }
}
