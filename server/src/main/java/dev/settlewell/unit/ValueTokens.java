package dev.settlewell.unit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The pieces of a value's text, for colouring and completion: what a stretch is, and which part of
 * the value it belongs to. Tolerant: what cannot be read is {@link Kind#UNKNOWN}, and the rest goes
 * on.
 */
public final class ValueTokens {
  /** What a piece is. */
  public enum Kind {
    /** Digits, their sign included where it is part of the number. */
    NUMBER,
    UNIT,
    /** A letter-digit code, value and unit in one: {@code 4k7}. */
    CODE,
    /** {@code ±}, {@code +} and {@code /-} of a tolerance. */
    SIGN,
    /** A word of the grammar: {@code to}, {@code of}, {@code box}, {@code worst-case}. */
    KEYWORD,
    /** The name behind {@code of}. */
    NAME,
    /** Parentheses, {@code =}, the stroke of a fraction. */
    PUNCTUATION,
    UNKNOWN
  }

  /** The part of the value that a piece belongs to. */
  public enum Part {
    VALUE,
    TOLERANCE,
    DRIFT,
    /** The range behind {@code box}. */
    BOX,
    /** {@code (k=2)}. */
    BASIS,
    /** The point behind {@code at}. */
    AT,
    /** The upper end of a range. */
    UPPER
  }

  /** One piece, in offsets of the value's text. */
  public record Piece(Kind kind, Part part, int from, int to) {}

  private static final List<String> KEYWORDS =
      List.of("to", "of", "at", "box", "rms", "peak-to-peak", "worst-case");

  private static final List<String> SHARES_OF = List.of("reading", "span", "full");

  private final Form form;
  private final List<Token> tokens;
  private final List<Piece> pieces = new ArrayList<>();
  private Part part;
  private int at;

  private ValueTokens(Form form, String raw) {
    this.form = form;
    this.tokens = Lexer.tokens(raw);
    boolean errors = form == Form.DEVIATION || form == Form.NEED;
    this.part = errors ? Part.TOLERANCE : Part.VALUE;
  }

  /** Every piece of the text in its order; blanks are in none. */
  public static List<Piece> of(Form form, String raw) {
    ValueTokens reader = new ValueTokens(form, raw);
    while (!reader.peek().is(Token.Kind.END)) {
      reader.next();
    }
    return List.copyOf(reader.pieces);
  }

  /** The piece a cursor stands in or behind; behind a blank it stands in none. */
  public static Optional<Piece> at(Form form, String raw, int offset) {
    Optional<Piece> found = Optional.empty();
    for (Piece piece : of(form, raw)) {
      if (piece.from() < offset && offset <= piece.to() || piece.from() == offset) {
        found = found.isPresent() && piece.from() == offset ? found : Optional.of(piece);
      }
    }
    return found;
  }

  private void next() {
    Token token = peek();
    switch (token.kind()) {
      case PLUS_MINUS -> sign();
      case PLUS, MINUS -> plusOrMinus();
      case SLASH_MINUS -> add(Kind.SIGN, 1);
      case NUMBER -> number();
      case WORD -> word();
      case NAME -> add(SHARES_OF.contains(token.text()) ? Kind.KEYWORD : Kind.NAME, 1);
      case OPEN -> {
        part = Part.BASIS;
        add(Kind.PUNCTUATION, 1);
      }
      case CLOSE, EQUALS, SLASH -> add(Kind.PUNCTUATION, 1);
      default -> add(Kind.UNKNOWN, 1);
    }
  }

  private void sign() {
    part = driftFollows(1) ? Part.DRIFT : Part.TOLERANCE;
    add(Kind.SIGN, 1);
  }

  /** Part of a number at a value's start, a sign of its own in {@code +80/-20 %}. */
  private void plusOrMinus() {
    boolean asymmetric = peek().is(Token.Kind.PLUS) && ahead(2).is(Token.Kind.SLASH_MINUS);
    if (asymmetric) {
      part = Part.TOLERANCE;
    }
    boolean number = !asymmetric && ahead(1).is(Token.Kind.NUMBER) && peek().touches(ahead(1));
    add(number ? Kind.NUMBER : Kind.SIGN, number ? 2 : 1);
  }

  private void number() {
    boolean code =
        form == Form.COMPONENT
            && part == Part.VALUE
            && ahead(1).is(Token.Kind.WORD)
            && peek().touches(ahead(1))
            && UnitTable.read(ahead(1).text()).isEmpty()
            && Code.read(peek().text() + ahead(1).text()).isPresent();
    boolean unsigned = !pieces.isEmpty() && part != Part.BASIS && driftFollows(0);
    if (unsigned) {
      part = Part.DRIFT;
    }
    add(code ? Kind.CODE : Kind.NUMBER, code ? 2 : 1);
  }

  /** True where a number and a unit per kelvin stand from here on. */
  private boolean driftFollows(int ahead) {
    return ahead(ahead).is(Token.Kind.NUMBER)
        && ahead(ahead + 1).is(Token.Kind.WORD)
        && UnitTable.numeratorPerKelvin(ahead(ahead + 1).text()).isPresent();
  }

  private void word() {
    String text = peek().text();
    boolean code = form == Form.COMPONENT && pieces.isEmpty() && Code.read(text).isPresent();
    if (code) {
      add(Kind.CODE, 1);
    } else if (KEYWORDS.contains(text) || text.equals("scale") && lastIs(Kind.KEYWORD)) {
      keyword(text);
    } else if (part == Part.BASIS) {
      add(text.equals("k") || text.equals("n") ? Kind.KEYWORD : Kind.UNKNOWN, 1);
    } else {
      add(lastIs(Kind.NUMBER) ? Kind.UNIT : Kind.UNKNOWN, 1);
    }
  }

  private void keyword(String text) {
    switch (text) {
      case "at" -> part = Part.AT;
      case "box" -> part = Part.BOX;
      case "to" -> part = part == Part.BOX ? Part.BOX : Part.UPPER;
      default -> {}
    }
    add(Kind.KEYWORD, 1);
  }

  private boolean lastIs(Kind kind) {
    return !pieces.isEmpty() && pieces.get(pieces.size() - 1).kind() == kind;
  }

  private Token peek() {
    return ahead(0);
  }

  private Token ahead(int count) {
    return tokens.get(Math.min(at + count, tokens.size() - 1));
  }

  private void add(Kind kind, int count) {
    pieces.add(new Piece(kind, part, peek().from(), ahead(count - 1).to()));
    at += count;
  }
}
