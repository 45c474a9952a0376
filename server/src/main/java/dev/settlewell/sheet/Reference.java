package dev.settlewell.sheet;

import dev.settlewell.text.Place;
import dev.settlewell.vocabulary.NameKind;
import java.util.Set;

/**
 * A name where it is used.
 *
 * @param kinds what it may be the name of: one kind, but for the names in a firmware constant's
 *     {@code equals}
 * @param place of the name alone: {@code ref} in {@code 50 % of ref}
 */
public record Reference(Set<NameKind> kinds, String name, Place place) {
  public Reference {
    kinds = Set.copyOf(kinds);
  }
}
