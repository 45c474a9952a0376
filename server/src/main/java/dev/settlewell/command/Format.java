package dev.settlewell.command;

import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import picocli.CommandLine;

/** The forms an output comes in; no command has all of them. */
enum Format {
  TEXT,
  JSON,
  SARIF,
  JUNIT,
  MARKDOWN;

  String word() {
    return name().toLowerCase(Locale.ROOT);
  }

  /** Reads the word of {@code --format}. */
  private static Format of(String word, List<Format> offered) {
    return offered.stream()
        .filter(format -> format.word().equals(word))
        .findFirst()
        .orElseThrow(
            () ->
                new CommandLine.TypeConversionException(
                    "'"
                        + word
                        + "' is none of: "
                        + offered.stream().map(Format::word).collect(Collectors.joining(", "))));
  }

  /** What {@code check} offers. */
  static final class OfFindings implements CommandLine.ITypeConverter<Format> {
    @Override
    public Format convert(String word) {
      return of(word, List.of(TEXT, JSON, SARIF, JUNIT));
    }
  }

  /** What {@code figures} offers. */
  static final class OfFigures implements CommandLine.ITypeConverter<Format> {
    @Override
    public Format convert(String word) {
      return of(word, List.of(TEXT, JSON));
    }
  }

  /** What {@code compare} offers. */
  static final class OfComparison implements CommandLine.ITypeConverter<Format> {
    @Override
    public Format convert(String word) {
      return of(word, List.of(TEXT, MARKDOWN));
    }
  }
}
