package dev.settlewell.assist;

import dev.settlewell.text.Span;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;

/** What a sheet holds, as an editor's outline shows it. */
public final class Symbols {
  /** What a symbol is. */
  public enum Sort {
    SECTION,
    NAME,
    PART,
    VALUE
  }

  /**
   * @param detail the value, or the first words about it; "" where there is none
   * @param label the stretch to go to
   */
  public record Symbol(
      String name, String detail, Sort sort, Span span, Span label, List<Symbol> children) {}

  private Symbols() {}

  public static List<Symbol> of(Checked checked, Vocabulary vocabulary) {
    return children(Outline.of(checked.tree(), vocabulary));
  }

  /** Only what has a name of its own, for a search over all sheets. */
  public static List<Symbol> named(Checked checked, Vocabulary vocabulary) {
    return of(checked, vocabulary).stream()
        .flatMap(section -> section.children().stream())
        .flatMap(Symbols::withInner)
        .filter(symbol -> symbol.sort() == Sort.NAME)
        .toList();
  }

  private static Stream<Symbol> withInner(Symbol symbol) {
    return symbol.sort() == Sort.NAME ? Stream.of(symbol) : symbol.children().stream();
  }

  private static List<Symbol> children(Piece piece) {
    List<Symbol> symbols = new ArrayList<>();
    for (Piece child : piece.children()) {
      switch (child.role()) {
        case KEY, NAME, KIND -> symbols.add(symbol(child));
        case ITEM -> symbols.addAll(children(child));
        default -> {}
      }
    }
    return symbols;
  }

  private static Symbol symbol(Piece piece) {
    List<Symbol> children = children(piece);
    Sort sort =
        switch (piece.role()) {
          case NAME -> Sort.NAME;
          case KIND -> Sort.PART;
          default -> children.isEmpty() ? Sort.VALUE : Sort.SECTION;
        };
    String detail =
        piece.valueText().isEmpty()
            ? piece.child("about").map(Piece::valueText).orElse("")
            : piece.valueText();
    Span label = piece.label().orElseThrow().place().span();
    return new Symbol(piece.labelText(), detail, sort, piece.span(), label, children);
  }
}
