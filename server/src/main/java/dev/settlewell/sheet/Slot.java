package dev.settlewell.sheet;

import dev.settlewell.text.Place;
import java.util.Optional;
import java.util.function.Function;

/**
 * What a sheet says at one key. Missing, wrong and stated are three things: a figure that needs a
 * missing value says which; one that needs a wrong value stays silent, for the wrong value has its
 * own finding.
 *
 * @param <T> what a reading of the key gives
 */
public sealed interface Slot<T> {

  /** JSON Pointer of the value in its sheet: {@code /channels/level/path/1/resistor}. */
  String pointer();

  /** The value's own stretch; of a missing key the stretch of its parent's key. */
  Place place();

  /** Read and understood. {@code raw} is the text of the value; "" for mappings and lists. */
  record Stated<T>(T value, Place keyPlace, Place place, String raw, String pointer)
      implements Slot<T> {}

  /** The key is not there. */
  record Missing<T>(Place place, String pointer) implements Slot<T> {}

  /** The key is there, and what it says cannot be taken as written. */
  record Wrong<T>(Place place, String raw, String pointer) implements Slot<T> {}

  default Optional<T> stated() {
    return this instanceof Stated<T> stated ? Optional.of(stated.value()) : Optional.empty();
  }

  default T orElse(T other) {
    return stated().orElse(other);
  }

  default boolean isStated() {
    return this instanceof Stated<T>;
  }

  default boolean isMissing() {
    return this instanceof Missing<T>;
  }

  default boolean isWrong() {
    return this instanceof Wrong<T>;
  }

  /** The same slot with its value seen as something else. */
  default <R> Slot<R> map(Function<? super T, ? extends R> view) {
    if (this instanceof Stated<T> s) {
      return new Stated<>(view.apply(s.value()), s.keyPlace(), s.place(), s.raw(), s.pointer());
    }
    if (this instanceof Wrong<T> w) {
      return new Wrong<>(w.place(), w.raw(), w.pointer());
    }
    return new Missing<>(place(), pointer());
  }
}
