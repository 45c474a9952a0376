package dev.settlewell.unit;

import dev.settlewell.text.Problem;
import java.util.List;

/**
 * What keeps a value from being read, or makes it doubtful.
 *
 * @param from first character at fault, counted in the value's raw text
 * @param to behind the last
 * @param spellings what may stand instead of {@code from … to}, the likeliest first
 * @param safe true where the spelling has the same value as the text plainly means
 */
public record Flaw(
    Problem.Kind kind, int from, int to, String message, List<String> spellings, boolean safe) {
  public Flaw {
    spellings = List.copyOf(spellings);
  }
}
