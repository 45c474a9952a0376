package dev.settlewell.unit;

import dev.settlewell.text.Problem;
import dev.settlewell.unit.Token.Kind;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;

/** Walks through the tokens of one value, and keeps what was found wrong on the way. */
final class Cursor {
  /** Ends the reading of a value that cannot be taken; the flaw is already noted. */
  private static final class Refusal extends RuntimeException {
    private static final long serialVersionUID = 1;

    Refusal() {
      super(null, null, false, false);
    }
  }

  /** No value is longer; a whole file in one scalar is answered at once. */
  private static final int LONGEST = 1000;

  private final String raw;
  private final List<Token> tokens;
  private final Flaws flaws;
  private int at;

  private Cursor(String raw) {
    this.raw = raw;
    this.tokens = Lexer.tokens(raw);
    this.flaws = new Flaws(raw);
  }

  /** Reads a whole text by a rule. */
  static <T> Reading<T> read(String raw, Function<Cursor, T> rule) {
    if (raw.length() > LONGEST) {
      String why = "this text is too long to be one value";
      return Reading.refused(
          new Flaw(Problem.Kind.NOT_ONE_VALUE, 0, raw.length(), why, List.of(), false));
    }
    Cursor cursor = new Cursor(raw);
    try {
      T value = rule.apply(cursor);
      cursor.end();
      return cursor.reading(value);
    } catch (Refusal refusal) {
      return cursor.reading(null);
    }
  }

  private <T> Reading<T> reading(T value) {
    boolean certain = value != null && flaws.leaveMeaning();
    return new Reading<>(certain ? Optional.of(value) : Optional.empty(), flaws.finished());
  }

  Token peek() {
    return peek(0);
  }

  Token peek(int ahead) {
    return tokens.get(Math.min(at + ahead, tokens.size() - 1));
  }

  Token take() {
    Token token = peek();
    at = Math.min(at + 1, tokens.size() - 1);
    return token;
  }

  boolean isNext(Kind kind) {
    return peek().is(kind);
  }

  boolean isNextWord(String word) {
    return peek().is(Kind.WORD) && peek().is(word);
  }

  boolean takeWord(String word) {
    boolean there = isNextWord(word);
    if (there) {
      take();
    }
    return there;
  }

  String text(int from, int to) {
    return raw.substring(from, to);
  }

  /** The text from the first token on, without blanks at its end. */
  int lastEnd() {
    return tokens.size() < 2 ? 0 : tokens.get(tokens.size() - 2).to();
  }

  /** Notes a flaw and goes on: what is meant is known. */
  void note(Problem.Kind kind, int from, int to, String why, boolean safe, List<String> spellings) {
    flaws.add(new Flaw(kind, from, to, why, spellings, safe));
  }

  /** Notes a slip of spelling whose meaning is certain, and goes on. */
  void slip(int from, int to, String why, String spelling) {
    note(Problem.Kind.NOT_ONE_VALUE, from, to, why, true, List.of(spelling));
  }

  /** Notes a flaw and gives the value up. */
  RuntimeException refuse(Problem.Kind kind, int from, int to, String why, List<String> spellings) {
    note(kind, from, to, why, false, spellings);
    return new Refusal();
  }

  /** Gives the value up although what is meant is certain: the mended text says it. */
  RuntimeException mend(Problem.Kind kind, int from, int to, String why, String spelling) {
    note(kind, from, to, why, true, List.of(spelling));
    return new Refusal();
  }

  RuntimeException refuse(int from, int to, String why, String... spellings) {
    return refuse(Problem.Kind.NOT_ONE_VALUE, from, to, why, List.of(spellings));
  }

  private void end() {
    if (!isNext(Kind.END)) {
      throw Leftovers.refusal(this);
    }
  }
}
