package dev.settlewell.sheet;

import dev.settlewell.text.Place;
import dev.settlewell.unit.Deviation;
import dev.settlewell.unit.Need;
import dev.settlewell.unit.Range;
import dev.settlewell.unit.Toleranced;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * One mapping of a sheet, bound to the schema: a converter, a channel, a sensor, a stage of a path.
 * Which keys it has, and what a reading of each gives, the schema alone says; this class only hands
 * them out by name and type.
 *
 * <p>Asking for a key that the part's own schema does not know, or as another type than its form
 * gives, is a mistake in the program and throws; a text can never cause it.
 *
 * @param kind the schema's name of this mapping: {@code converter}, {@code resistor}
 * @param keyPlace the key that introduced it
 * @param place the whole value
 * @param slots every key the schema knows for this kind, stated or missing, in the schema's order
 */
public record Part(
    String kind, Place keyPlace, Place place, String pointer, Map<String, Slot<?>> slots) {

  public Part {
    slots = java.util.Collections.unmodifiableMap(new LinkedHashMap<>(slots));
  }

  public Slot<?> slot(String key) {
    Slot<?> slot = slots.get(key);
    if (slot == null) {
      throw new IllegalArgumentException("the schema has no key " + key + " in " + kind);
    }
    return slot;
  }

  public boolean has(String key) {
    return slots.containsKey(key) && slots.get(key).isStated();
  }

  /** Forms {@code quantity} and {@code component}. */
  public Slot<Toleranced> quantity(String key) {
    return as(key, Toleranced.class);
  }

  /** Form {@code deviation}. */
  public Slot<Deviation> deviation(String key) {
    return as(key, Deviation.class);
  }

  /** Form {@code range}. */
  public Slot<Range> range(String key) {
    return as(key, Range.class);
  }

  /** Form {@code need}. */
  public Slot<Need> need(String key) {
    return as(key, Need.class);
  }

  /** Forms {@code count}, {@code plain}, {@code ratio} (as a plain ratio, dB turned into it), {@code fraction}. */
  public Slot<Double> number(String key) {
    return as(key, Double.class);
  }

  /** Forms {@code text}, {@code name}, {@code choice}, {@code date} (as written). */
  public Slot<String> text(String key) {
    return as(key, String.class);
  }

  /** Form {@code flag}. */
  public Slot<Boolean> flag(String key) {
    return as(key, Boolean.class);
  }

  public Slot<Part> part(String key) {
    return as(key, Part.class);
  }

  /** A list; each item a slot of its own, so that one wrong item costs only itself. */
  @SuppressWarnings("unchecked")
  public <T> Slot<List<Slot<T>>> list(String key, Class<T> item) {
    Slot<?> slot = slot(key);
    if (slot instanceof Slot.Stated<?> stated) {
      for (Object element : (List<?>) stated.value()) {
        if (element instanceof Slot.Stated<?> e && !item.isInstance(e.value())) {
          throw new IllegalArgumentException(key + " in " + kind + " does not list " + item);
        }
      }
    }
    return (Slot<List<Slot<T>>>) slot;
  }

  @SuppressWarnings("unchecked")
  private <T> Slot<T> as(String key, Class<T> type) {
    Slot<?> slot = slot(key);
    if (slot instanceof Slot.Stated<?> stated && !type.isInstance(stated.value())) {
      throw new IllegalArgumentException(
          key + " in " + kind + " is " + stated.value().getClass() + ", not " + type);
    }
    return (Slot<T>) slot;
  }
}
