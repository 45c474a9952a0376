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
 * <p>Shapes worth knowing, each the same however the sheet spells it:
 *
 * <ul>
 *   <li>{@code resistor}, {@code capacitor}, {@code pull-down}, {@code shunt}, {@code beta}: the
 *       value with its errors is {@code quantity("value")}, in the short and the long form alike.
 *   <li>{@code channel.part("band")}: {@code frequency}, {@code amplitude}.
 *   <li>{@code channel.list("interferers", Part.class)}: parts of kind {@code coupling} with {@code
 *       text("interferer")} and, where this sensor has its own, {@code quantity("amplitude")}. An
 *       empty list is stated ("none, and meant"), which is not the same as missing.
 *   <li>{@code channel.part("calibrated")}: kind {@code calibration}; {@code [offset, gain]} is
 *       {@code list("terms", String.class)}.
 *   <li>{@code table.list("points", Part.class)}: kind {@code point} with {@code measured}, {@code
 *       output}.
 *   <li>{@code interferer.map("harmonics", Toleranced.class)}: keys {@code "2"}, {@code "3"}.
 * </ul>
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

  /**
   * Forms {@code count}, {@code plain}, {@code ratio} (as a plain ratio, dB turned into it), {@code
   * fraction}.
   */
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

  /**
   * A quantity, or one of a few words or a name: every key of form {@code quantity} with {@code
   * x-words} or {@code x-refers-to}: {@code reference}, {@code reference-low}, {@code
   * hold-starts-at}, {@code rate}, {@code acquisition}.
   */
  public Slot<Either> either(String key) {
    return as(key, Either.class);
  }

  /**
   * Form {@code part}: one mapping of a known kind, whatever short form it was written in. Form
   * {@code one-kind} ({@code sensor}, the items of {@code path}): the part named by its one key,
   * {@code part("sensor")} is a part of kind {@code thermistor}.
   */
  public Slot<Part> part(String key) {
    return as(key, Part.class);
  }

  /** Form {@code map}: the user's names, or numbers without leading zeros, to what stands there. */
  @SuppressWarnings("unchecked")
  public <T> Slot<Map<String, Slot<T>>> map(String key, Class<T> item) {
    Slot<?> slot = slot(key);
    if (slot instanceof Slot.Stated<?> stated) {
      requireItems(key, ((Map<?, ?>) stated.value()).values(), item);
    }
    return (Slot<Map<String, Slot<T>>>) slot;
  }

  /** A list; each item a slot of its own, so that one wrong item costs only itself. */
  @SuppressWarnings("unchecked")
  public <T> Slot<List<Slot<T>>> list(String key, Class<T> item) {
    Slot<?> slot = slot(key);
    if (slot instanceof Slot.Stated<?> stated) {
      requireItems(key, (List<?>) stated.value(), item);
    }
    return (Slot<List<Slot<T>>>) slot;
  }

  private void requireItems(String key, Iterable<?> slots, Class<?> item) {
    for (Object element : slots) {
      if (element instanceof Slot.Stated<?> e && !item.isInstance(e.value())) {
        throw new IllegalArgumentException(key + " in " + kind + " does not hold " + item);
      }
    }
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
