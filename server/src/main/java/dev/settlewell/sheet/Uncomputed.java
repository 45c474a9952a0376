package dev.settlewell.sheet;

import dev.settlewell.text.Place;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Kind;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/** Finds what a sheet says and nothing is computed from yet: the outermost keys only. */
final class Uncomputed {
  private final Vocabulary vocabulary;
  private final List<Place> keys = new ArrayList<>();

  Uncomputed(Vocabulary vocabulary) {
    this.vocabulary = vocabulary;
  }

  List<Place> keys(Part top) {
    visit(top);
    return List.copyOf(keys);
  }

  private void visit(Object value) {
    if (value instanceof Slot<?> slot) {
      slot.stated().ifPresent(this::visit);
    } else if (value instanceof Part part) {
      part(part);
    } else if (value instanceof Map<?, ?> map) {
      map.values().forEach(this::visit);
    } else if (value instanceof Iterable<?> items) {
      items.forEach(this::visit);
    }
  }

  private void part(Part part) {
    Kind kind = vocabulary.kind(part.kind());
    if (!kind.computed()) {
      keys.add(part.keyPlace());
      return;
    }
    part.slots()
        .forEach(
            (name, slot) -> {
              boolean computed = kind.key(name).map(Key::computed).orElse(true);
              if (computed) {
                visit(slot);
              } else if (slot instanceof Slot.Stated<?> stated) {
                keys.add(stated.keyPlace());
              }
            });
  }
}
