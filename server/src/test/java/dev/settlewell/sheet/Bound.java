package dev.settlewell.sheet;

import dev.settlewell.syntax.Syntax;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import dev.settlewell.vocabulary.Vocabulary;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;

/** A text bound as a sheet, and its problems as tests compare them. */
final class Bound {
  static final Vocabulary VOCABULARY = Vocabulary.load();

  private Bound() {}

  static Sheet sheet(String text) {
    return Sheets.bind(Syntax.parse(SourceText.of("test.channels.yaml", text)), VOCABULARY);
  }

  static String resource(String name) {
    try (InputStream in = Bound.class.getResourceAsStream(name)) {
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new IllegalStateException(e);
    }
  }

  /** {@code unknown-key ‹ouput› `voltage` has no key …}, those of the YAML first. */
  static List<String> problems(Sheet sheet) {
    return Stream.concat(sheet.tree().problems().stream(), sheet.problems().stream())
        .map(problem -> shown(sheet.text(), problem))
        .toList();
  }

  static String shown(SourceText text, Problem problem) {
    String kind = problem.kind().name().toLowerCase(Locale.ROOT).replace('_', '-');
    return kind + " ‹" + text.slice(problem.place().span()) + "› " + problem.message();
  }
}
