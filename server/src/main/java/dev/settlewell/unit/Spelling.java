package dev.settlewell.unit;

import dev.settlewell.unit.ValueTokens.Kind;
import dev.settlewell.unit.ValueTokens.Piece;
import java.util.List;

/**
 * The one normal spelling of a value, for the formatter: {@code 100 nF} for {@code 100nF}, {@code
 * ±1 %} for {@code +/-1%}, {@code Ω} U+03A9, {@code µ} U+00B5. Digits stay as they are written, and
 * so does the value.
 */
public final class Spelling {
  private Spelling() {}

  /**
   * @param raw a value that reads without flaws; any other text comes back unchanged as far as it
   *     has a piece that is not understood
   */
  public static String normal(Form form, String raw) {
    List<Piece> pieces = ValueTokens.of(form, raw);
    if (pieces.isEmpty() || pieces.stream().anyMatch(p -> p.kind() == Kind.UNKNOWN)) {
      return raw;
    }
    StringBuilder text = new StringBuilder();
    Piece before = null;
    for (Piece piece : pieces) {
      if (before != null && blankBetween(raw, before, piece)) {
        text.append(' ');
      }
      text.append(written(raw, piece));
      before = piece;
    }
    return text.toString();
  }

  private static boolean blankBetween(String raw, Piece before, Piece piece) {
    if (before.kind() == Kind.SIGN) {
      return false;
    }
    String sign = raw.substring(piece.from(), piece.to());
    if (piece.kind() == Kind.SIGN && sign.startsWith("/")) {
      return false;
    }
    String last = raw.substring(before.to() - 1, before.to());
    if (piece.kind() == Kind.PUNCTUATION) {
      return sign.equals("(");
    }
    return before.kind() != Kind.PUNCTUATION || last.equals(")");
  }

  private static String written(String raw, Piece piece) {
    String text = raw.substring(piece.from(), piece.to());
    return switch (piece.kind()) {
      case UNIT -> UnitTable.canonical(text);
      case CODE -> text.replace('u', 'µ').replace('μ', 'µ');
      case NUMBER -> Lexer.plain(text);
      case SIGN -> sign(Lexer.plain(text));
      default -> text;
    };
  }

  private static String sign(String text) {
    return text.equals("+-") || text.equals("+/-") ? "±" : text;
  }
}
