package dev.settlewell.sheet;

import dev.settlewell.unit.Toleranced;
import java.util.Optional;

/**
 * What a key holds that takes a word or a quantity: {@code reference: ref} or {@code reference: 2.5
 * V ±0.1 %}. Exactly one of the two is present.
 *
 * @param word one of the key's own words ({@code previous-channel}) or a name the user gave ({@code
 *     ref}); names are checked where sheets are linked
 */
public record Either(Optional<String> word, Optional<Toleranced> quantity) {

  public static Either word(String word) {
    return new Either(Optional.of(word), Optional.empty());
  }

  public static Either quantity(Toleranced quantity) {
    return new Either(Optional.empty(), Optional.of(quantity));
  }

  public boolean is(String other) {
    return word.isPresent() && word.get().equals(other);
  }
}
