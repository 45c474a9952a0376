package dev.settlewell.unit;

import dev.settlewell.text.Problem;
import dev.settlewell.unit.Token.Kind;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** What stands where the grammar has no place for it, and what to write instead. */
final class Leftovers {
  private static final Set<String> GRAMMAR =
      Set.of("of", "to", "at", "box", "rms", "peak-to-peak", "worst-case");

  /** Words that data sheets put beside a value, and the key of the long form that says so. */
  private static final Map<String, String> LIMITS =
      Map.ofEntries(
          Map.entry("max", "max"),
          Map.entry("max.", "max"),
          Map.entry("maximum", "max"),
          Map.entry("<", "max"),
          Map.entry("≤", "max"),
          Map.entry("min", "min"),
          Map.entry("min.", "min"),
          Map.entry("minimum", "min"),
          Map.entry(">", "min"),
          Map.entry("≥", "min"),
          Map.entry("typ", "typical"),
          Map.entry("typ.", "typical"),
          Map.entry("typical", "typical"),
          Map.entry("~", "typical"),
          Map.entry("≈", "typical"));

  private static final Set<String> DASHES =
      Set.of("-", "–", "—", "..", "...", "…", "~", "until", "/");

  private Leftovers() {}

  static boolean isGrammarWord(String word) {
    return GRAMMAR.contains(word);
  }

  /** True for words that say something about a value and are no unit. */
  static boolean isRemark(String word) {
    return LIMITS.containsKey(word)
        || List.of("DC", "AC", "dc", "ac", "pp", "p-p", "RMS", "peak").contains(word);
  }

  /** The key of the long form that a word beside a value stands for. */
  static Optional<String> limit(Token token) {
    return Optional.ofNullable(LIMITS.get(token.text()));
  }

  /** True where a dash or dots stand between two ends, and a number follows. */
  static boolean isDash(Cursor cursor) {
    Token next = cursor.peek(1);
    boolean number = next.is(Kind.NUMBER) || next.is(Kind.MINUS) || next.is(Kind.PLUS);
    return DASHES.contains(cursor.peek().text()) && number;
  }

  static RuntimeException noNumber(Cursor cursor, Expected expected) {
    Token token = cursor.peek();
    List<String> likely = UnitSlips.likely(expected);
    String example = likely.isEmpty() ? "4.7 kΩ" : "5 " + likely.get(0);
    if (token.is(Kind.END)) {
      return cursor.refuse(
          token.from(), token.to(), "a number with its unit is missing, such as " + example);
    }
    if (token.is(Kind.WORD) && token.text().matches("(?i)[.]?(nan|inf|infinity)")) {
      return cursor.refuse(token.from(), token.to(), token.text() + " is no value: write a number");
    }
    String why = "a number is expected before " + token.text() + ", such as " + example;
    return cursor.refuse(token.from(), token.to(), why);
  }

  /** A value is complete, and something follows. */
  static RuntimeException refusal(Cursor cursor) {
    Token token = cursor.peek();
    int end = cursor.lastEnd();
    String rest = cursor.text(token.from(), end);
    if (token.is(Kind.OPEN) && rest.replace(" ", "").startsWith("(k=")) {
      String why = "a coverage factor follows a tolerance, such as ±1 % (k=2)";
      return cursor.refuse(token.from(), end, why);
    }
    int before = token.from();
    while (before > 0 && Lexer.plain(cursor.text(before - 1, before)).equals(" ")) {
      before--;
    }
    String shown = rest.length() > 30 ? rest.substring(0, 30) + "…" : rest;
    String why = "nothing may follow the value, and a remark stands behind a # (" + shown + ")";
    if (before == 0) {
      return cursor.refuse(token.from(), end, shown + " cannot be read as a value");
    }
    return cursor.refuse(Problem.Kind.NOT_ONE_VALUE, before, end, why, List.of(""));
  }
}
