package dev.settlewell.command;

import dev.settlewell.finding.Severity;
import java.util.List;
import java.util.Optional;
import picocli.CommandLine;

/**
 * From which severity on findings make a command fail.
 *
 * @param severity empty: never
 */
record FailLevel(Optional<Severity> severity) {
  static final String NEVER = "never";
  static final String WORDS = "error, warning, information, hint, never";

  private static final List<Severity> LEVELS =
      List.of(Severity.ERROR, Severity.WARNING, Severity.INFORMATION, Severity.HINT);

  /**
   * @param word one of {@link #WORDS}
   */
  static FailLevel of(String word) {
    return new FailLevel(
        LEVELS.stream().filter(severity -> severity.label().equals(word)).findFirst());
  }

  /** Reads the word of an option. */
  static final class Converter implements CommandLine.ITypeConverter<FailLevel> {
    @Override
    public FailLevel convert(String word) {
      FailLevel level = of(word);
      if (level.severity().isEmpty() && !word.equals(NEVER)) {
        throw new CommandLine.TypeConversionException("'" + word + "' is none of: " + WORDS);
      }
      return level;
    }
  }
}
