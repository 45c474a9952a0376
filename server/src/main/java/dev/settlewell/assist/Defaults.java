package dev.settlewell.assist;

import dev.settlewell.syntax.Node;
import dev.settlewell.text.Edit;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Moves the errors of one component into {@code defaults}, where they hold for all that lack some.
 */
final class Defaults {
  private static final Pattern WITH_ERRORS = Pattern.compile("(.*?\\S)(\\s*)((?:±|\\+-|\\+/-).*)");

  private Defaults() {}

  static Optional<CodeActions.Action> action(Checked checked, Vocabulary vocabulary, int offset) {
    Piece root = Outline.of(checked.tree(), vocabulary);
    Optional<Piece> at = root.at(offset).filter(piece -> !piece.isOnLabel(offset));
    Optional<String> component = at.flatMap(Defaults::component);
    if (component.isEmpty() || !(at.get().value() instanceof Node.Scalar scalar)) {
      return Optional.empty();
    }
    Matcher parts = WITH_ERRORS.matcher(scalar.text());
    if (!scalar.exact() || !parts.matches()) {
      return Optional.empty();
    }
    Span whole = scalar.place().span();
    int start = whole.start() + scalar.inset();
    Edit removal = new Edit(checked.text().place(start + parts.end(1), start + parts.end(3)), "");
    return insertion(checked, root, component.get(), parts.group(3))
        .map(
            insertion ->
                new CodeActions.Action(
                    "Put " + parts.group(3) + " into defaults for every " + component.get(),
                    CodeActions.Sort.REFACTOR,
                    List.of(insertion, removal),
                    Optional.empty()));
  }

  /** The key of {@code defaults} that a value takes missing errors from. */
  private static Optional<String> component(Piece piece) {
    Optional<Key> key =
        piece.kind().isPresent()
            ? piece.kind().flatMap(kind -> kind.shortKey().flatMap(kind::key))
            : piece.key();
    return key.flatMap(Key::errorsFrom).filter(name -> piece.nameAround("channel").isPresent());
  }

  /** Empty where the sheet has such a default already: two answers to one question. */
  private static Optional<Edit> insertion(
      Checked checked, Piece root, String component, String errors) {
    SourceText text = checked.text();
    Optional<Piece> defaults = root.child("defaults");
    if (defaults.isEmpty()) {
      Optional<Piece> before = root.child("supplies").or(() -> root.child("channels"));
      if (before.isEmpty()) {
        return Optional.empty();
      }
      int at = text.lineStart(text.lineAt(before.get().span().start()));
      String lines =
          ("defaults:\n  " + component + ": " + errors + "\n\n").replace("\n", text.lineBreak());
      return Optional.of(new Edit(text.place(at, at), lines));
    }
    boolean fits =
        defaults.get().value() instanceof Node.Mapping mapping
            && !mapping.flow()
            && !mapping.entries().isEmpty()
            && defaults.get().child(component).isEmpty();
    if (!fits) {
      return Optional.empty();
    }
    int first = defaults.get().children().get(0).span().start();
    int lineStart = text.lineStart(text.lineAt(first));
    String indent = " ".repeat(first - lineStart);
    return Optional.of(
        new Edit(
            text.place(lineStart, lineStart),
            indent + component + ": " + errors + text.lineBreak()));
  }
}
