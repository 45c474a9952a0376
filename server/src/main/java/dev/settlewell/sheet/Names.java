package dev.settlewell.sheet;

import dev.settlewell.syntax.Node;
import dev.settlewell.text.Problem;
import dev.settlewell.vocabulary.Key;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Pattern;

/** What a name of the user's own may be, and that each stands for one thing only. */
final class Names {
  private static final Pattern NAME = Pattern.compile("[a-z][a-z0-9-]*");
  private static final Pattern NUMBER = Pattern.compile("\\d{1,6}");

  /** Truth values and nothing to YAML readers, and the words of the grammar of values. */
  private static final Set<String> RESERVED =
      Set.of(
          "on", "off", "yes", "no", "true", "false", "null", "y", "n", "~", "of", "to", "at", "box",
          "rms", "full", "reading", "span");

  private Names() {}

  /** The name as the sheet will know it, or empty where it is none and a problem says so. */
  static Optional<String> check(Key.MapNames names, Node.Scalar name, Report report) {
    String text = name.text();
    if (names == Key.MapNames.NUMBER) {
      return number(name, report);
    }
    if (RESERVED.contains(text) && names.nameKind().isPresent()) {
      report.add(
          Problem.Kind.SYNTAX,
          name.place(),
          "`" + text + "` is a word of the format and cannot be a name: choose another");
      return Optional.of(text);
    }
    if (NAME.matcher(text).matches()) {
      return Optional.of(text);
    }
    String mended =
        text.toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]+", "-").replaceAll("^[^a-z]+|-+$", "");
    String message = "`" + text + "` is no name: small letters, digits and hyphens, a letter first";
    if (mended.isEmpty() || RESERVED.contains(mended)) {
      report.add(Problem.Kind.SYNTAX, name.place(), message);
    } else {
      report.add(Problem.Kind.SYNTAX, name.place(), message, Report.replace(name.place(), mended));
    }
    // Known under its text all the same, so that what refers to it is not reported as well.
    return names.nameKind().isPresent() ? Optional.of(text) : Optional.empty();
  }

  private static Optional<String> number(Node.Scalar name, Report report) {
    if (!NUMBER.matcher(name.text()).matches()) {
      report.add(
          Problem.Kind.WRONG_KIND,
          name.place(),
          "`" + name.text() + "` is no number of a harmonic: write 2, 3, …");
      return Optional.empty();
    }
    int number = Integer.parseInt(name.text());
    if (number < 2) {
      report.add(
          Problem.Kind.VALUE_OUT_OF_RANGE,
          name.place(),
          "harmonics count from 2: the first is the interferer's own `amplitude`");
      return Optional.empty();
    }
    return Optional.of(Integer.toString(number));
  }

  /** Supplies, converters, scans, interferers and channels share one namespace. */
  static void requireOneMeaning(List<Binder.Definition> definitions, Report report) {
    Map<String, Binder.Definition> first = new HashMap<>();
    for (Binder.Definition definition : definitions) {
      Binder.Definition before = first.putIfAbsent(definition.name(), definition);
      if (before != null) {
        report.twice(
            definition.place(),
            before.place(),
            "the name `"
                + definition.name()
                + "` is taken by "
                + before.kind().withArticle()
                + ": names of all sections are one namespace",
            "the " + before.kind().word() + " `" + definition.name() + "`");
      }
    }
  }
}
