package dev.settlewell.assist;

import dev.settlewell.syntax.Comment;
import dev.settlewell.syntax.Node;
import dev.settlewell.text.Span;
import dev.settlewell.unit.Form;
import dev.settlewell.unit.ValueTokens;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Shape;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/** Colours by meaning: which key is one of the format, which word is a name, what is a unit. */
public final class Tokens {
  /** What a stretch is; the protocol's standard types name them. */
  public enum Sort {
    PROPERTY,
    TYPE,
    VARIABLE,
    NUMBER,
    OPERATOR,
    KEYWORD,
    ENUM_MEMBER,
    STRING,
    COMMENT
  }

  /** One stretch on one line. */
  public record Token(Span span, Sort sort, boolean declaration) {}

  private final List<Token> tokens = new ArrayList<>();

  private Tokens() {}

  /** In the order of the text, none overlapping another. */
  public static List<Token> of(Checked checked, Vocabulary vocabulary) {
    Tokens all = new Tokens();
    Outline.of(checked.tree(), vocabulary).all().forEach(all::piece);
    for (Comment comment : checked.tree().comments()) {
      all.add(comment.place().span(), Sort.COMMENT, false);
    }
    all.tokens.sort(Comparator.comparingInt(token -> token.span().start()));
    return all.tokens.stream().filter(token -> isOneLine(checked, token.span())).toList();
  }

  private static boolean isOneLine(Checked checked, Span span) {
    return span.length() > 0
        && checked.text().lineAt(span.start()) == checked.text().lineAt(span.end() - 1);
  }

  private void piece(Piece piece) {
    piece.label().map(label -> label.place().span()).ifPresent(span -> label(piece, span));
    if (piece.value() instanceof Node.Scalar scalar) {
      Optional<Key> key = scalarKey(piece);
      key.ifPresent(k -> value(k, scalar));
    }
  }

  private void label(Piece piece, Span span) {
    switch (piece.role()) {
      case KEY -> add(span, Sort.PROPERTY, false);
      case KIND -> add(span, Sort.TYPE, false);
      case NAME -> add(span, Sort.VARIABLE, true);
      default -> {}
    }
  }

  /** Of a short form ({@code resistor: 1 kΩ}) the key that the scalar stands for. */
  private static Optional<Key> scalarKey(Piece piece) {
    return piece.kind().isPresent()
        ? piece.kind().flatMap(kind -> kind.shortKey().flatMap(kind::key))
        : piece.key();
  }

  private void value(Key key, Node.Scalar scalar) {
    Span span = scalar.place().span();
    Optional<Form> form = form(key.shape());
    boolean word = scalar.text().matches("[a-z][a-z-]*.*") && key.takesWordOrQuantity();
    if (form.isPresent() && !word && scalar.exact()) {
      Span inside = new Span(span.start() + scalar.inset(), span.end());
      for (ValueTokens.Piece part : ValueTokens.of(form.get(), scalar.text())) {
        sort(part.kind()).ifPresent(s -> add(inside.sub(part.from(), part.to()), s, false));
      }
    } else if (key.refersTo().isPresent() && !key.words().contains(scalar.text())) {
      add(span, Sort.VARIABLE, false);
    } else if (word || key.shape() == Shape.CHOICE || key.shape() == Shape.FLAG) {
      add(span, Sort.ENUM_MEMBER, false);
    } else {
      add(span, Sort.STRING, false);
    }
  }

  private static Optional<Form> form(Shape shape) {
    for (Form form : Form.values()) {
      if (form.name().equals(shape.name())) {
        return Optional.of(form);
      }
    }
    return Optional.empty();
  }

  private static Optional<Sort> sort(ValueTokens.Kind kind) {
    return switch (kind) {
      case NUMBER, CODE -> Optional.of(Sort.NUMBER);
      case UNIT -> Optional.of(Sort.TYPE);
      case SIGN -> Optional.of(Sort.OPERATOR);
      case KEYWORD -> Optional.of(Sort.KEYWORD);
      case NAME -> Optional.of(Sort.VARIABLE);
      case PUNCTUATION, UNKNOWN -> Optional.empty();
    };
  }

  private void add(Span span, Sort sort, boolean declaration) {
    tokens.add(new Token(span, sort, declaration));
  }
}
