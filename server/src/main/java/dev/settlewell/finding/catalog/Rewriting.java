package dev.settlewell.finding.catalog;

import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Edits that put a computed value in place of a written one, its tolerances kept. */
final class Rewriting {
  /** The value itself: up to the first sign of a tolerance, a bracket or an {@code of}. */
  private static final Pattern NOMINAL =
      Pattern.compile("^[-+]?[0-9][^±(,{}\\[\\]]*?(?=\\s*(?:±|\\+|\\(|[0-9.]+ ppm|$))");

  private Rewriting() {}

  /** {@code 470 kΩ ±0.1 %} with {@code 47 kΩ} becomes {@code 47 kΩ ±0.1 %}. */
  static Optional<Edit> nominal(SourceText text, Slot<?> slot, String value) {
    if (!(slot instanceof Slot.Stated<?> stated) || !stated.place().sheet().equals(text.name())) {
      return Optional.empty();
    }
    String written = text.slice(stated.place().span());
    Matcher matcher = NOMINAL.matcher(written);
    if (!matcher.find()) {
      return Optional.empty();
    }
    Span span = stated.place().span().sub(0, matcher.group().stripTrailing().length());
    return Optional.of(new Edit(text.place(span), value));
  }

  static Optional<Fix> fix(SourceText text, Slot<?> slot, String value, String title) {
    return nominal(text, slot, value).map(edit -> new Fix(title, List.of(edit), false));
  }

  /**
   * Puts {@code key: value} on a line of its own below a neighbour in the same mapping; nothing
   * where the neighbour does not stand on a line of its own.
   */
  static Optional<Edit> lineBelow(SourceText text, Slot<?> neighbour, String key, String value) {
    if (!(neighbour instanceof Slot.Stated<?> stated)
        || !stated.place().sheet().equals(text.name())) {
      return Optional.empty();
    }
    Span line = text.line(text.lineAt(stated.place().start()));
    String head = text.slice(new Span(line.start(), stated.keyPlace().start()));
    String tail = text.slice(new Span(Math.min(stated.place().end(), line.end()), line.end()));
    if (!head.isBlank() || !tail.matches("\\s*(#.*)?")) {
      return Optional.empty();
    }
    String added = text.lineBreak() + head + key + ": " + value;
    return Optional.of(new Edit(text.place(Span.at(line.end())), added));
  }
}
