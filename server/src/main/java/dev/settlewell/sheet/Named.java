package dev.settlewell.sheet;

import dev.settlewell.text.Place;

/**
 * Something the user gave a name.
 *
 * @param place of the name itself, where it is defined
 * @param value what stands there: {@code Toleranced} for a supply, a {@link Part} else
 */
public record Named<T>(String name, Place place, Slot<T> value) {}
