package dev.settlewell.firmware;

import dev.settlewell.text.SourceText;
import java.util.Optional;

/**
 * A source file that a sheet names.
 *
 * @param text empty where it could not be read
 * @param why one clause, "" where there is a text: {@code there is no such file}
 */
public record Source(Optional<SourceText> text, String why) {
  public static Source of(SourceText text) {
    return new Source(Optional.of(text), "");
  }

  public static Source none(String why) {
    return new Source(Optional.empty(), why);
  }
}
