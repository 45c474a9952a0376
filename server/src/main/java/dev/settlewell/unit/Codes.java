package dev.settlewell.unit;

import dev.settlewell.text.Problem;
import dev.settlewell.unit.Token.Kind;
import java.util.Optional;

/** Reads a letter-digit code where a component stands. */
final class Codes {
  private final Cursor cursor;
  private final Expected expected;

  Codes(Cursor cursor, Expected expected) {
    this.cursor = cursor;
    this.expected = expected;
  }

  /** The value of a code, or empty where a number with its unit stands. */
  Optional<Quantity> read() {
    Token first = cursor.peek();
    Token second = cursor.peek(1);
    boolean two = first.is(Kind.NUMBER) && second.is(Kind.WORD);
    String text = two ? first.text() + second.text() : first.text();
    Optional<Code.Reading> code = two || first.is(Kind.WORD) ? Code.read(text) : Optional.empty();
    if (code.isEmpty() || two && isUnit(second, code.get())) {
      return Optional.empty();
    }
    Token last = two ? second : first;
    if (!UnitSlips.accepts(expected, code.get().quantity().unit())) {
      return otherKind(first, last, code.get());
    }
    cursor.take();
    if (two) {
      cursor.take();
    }
    if (two && !first.touches(second)) {
      cursor.slip(first.from(), second.to(), "a letter-digit code has no blank", text);
    }
    Quantity quantity = code.get().quantity();
    new Amounts(cursor).checkPositive(quantity, expected, first.from(), last.to());
    letter(code.get(), first.from(), last.to());
    return Optional.of(quantity);
  }

  /** {@code 5 F} and {@code 5F} have their unit; {@code 100 n} lacks it, and is no code either. */
  private boolean isUnit(Token word, Code.Reading code) {
    return UnitTable.read(word.text()).filter(u -> u.dimension() == code.dimension()).isPresent()
        || word.text().length() == 1 && !cursor.peek().touches(word);
  }

  /** {@code 1M} at a capacitor; but {@code 5m} at a resistor is a unit that does not fit. */
  private Optional<Quantity> otherKind(Token first, Token last, Code.Reading code) {
    boolean apart = first != last && !first.touches(last);
    if (apart || last.is("m")) {
      return Optional.empty();
    }
    throw code.notTaken(cursor, first.from(), last.to(), expected);
  }

  /** {@code 4K7J}: the letter of a tolerance is not read, and said in percent instead. */
  private void letter(Code.Reading code, int from, int to) {
    if (code.tolerance().isEmpty()) {
      return;
    }
    String tolerance = code.plain() + " ±" + code.tolerance().get() + " %";
    String why = "a tolerance is written in percent, not as a letter";
    boolean farad = code.dimension() == Dimension.CAPACITANCE;
    if (farad && cursor.text(to - 1, to).equals("F")) {
      throw cursor.refuse(from, to, why, code.plain(), tolerance);
    }
    throw cursor.mend(Problem.Kind.NOT_ONE_VALUE, from, to, why, tolerance);
  }
}
