package dev.settlewell.unit;

import dev.settlewell.text.Problem;
import dev.settlewell.unit.Token.Kind;
import java.util.List;

/** The rules for numbers without a unit: counts, plain numbers, fractions, ratios. */
final class PlainNumbers {
  private static final Expected NO_UNIT = Expected.of();

  private final Cursor cursor;
  private final Amounts amounts;

  PlainNumbers(Cursor cursor) {
    this.cursor = cursor;
    this.amounts = new Amounts(cursor);
  }

  /** {@code count = digits}. */
  double count() {
    Token token = cursor.peek();
    if (!token.is(Kind.NUMBER)) {
      throw wholeNumber(token.from(), cursor.lastEnd());
    }
    double value = amounts.number(NO_UNIT, "").times(0);
    boolean plain = token.text().chars().allMatch(c -> c >= '0' && c <= '9');
    if (value != Math.rint(value)) {
      throw wholeNumber(token.from(), amounts.unitEnd(token.to()));
    }
    if (!plain && NumberText.of(token.text()).isStrict()) {
      String whole = Engineering.decimal(value).toPlainString();
      cursor.slip(token.from(), token.to(), "a count is written in digits", whole);
    }
    return value;
  }

  private RuntimeException wholeNumber(int from, int to) {
    return cursor.refuse(from, to, "a whole number is expected here, such as 16");
  }

  /** {@code plain = signed}. */
  double plain() {
    return amounts.signed(NO_UNIT).times(0);
  }

  /** {@code fraction = digits , "/" , digits}. */
  double fraction() {
    Token top = cursor.peek();
    Token bottom = cursor.peek(2);
    boolean shaped = top.is(Kind.NUMBER) && cursor.peek(1).is(Kind.SLASH) && bottom.is(Kind.NUMBER);
    if (!shaped) {
      throw noFraction(top);
    }
    cursor.take();
    cursor.take();
    cursor.take();
    boolean whole = top.text().matches("\\d{1,9}") && bottom.text().matches("\\d{1,9}");
    if (!whole || Integer.parseInt(bottom.text()) == 0) {
      throw cursor.refuse(
          top.from(), bottom.to(), "a fraction of two whole numbers is expected, such as 1/8");
    }
    return Double.parseDouble(top.text()) / Double.parseDouble(bottom.text());
  }

  private RuntimeException noFraction(Token token) {
    String why = "a fraction is expected here, such as 1/8";
    boolean alone = token.is(Kind.NUMBER) && cursor.peek(1).is(Kind.END);
    if (alone && NumberText.of(token.text()).isStrict()) {
      double parts = 1 / Double.parseDouble(token.text());
      if (parts == Math.rint(parts) && parts >= 1 && parts < 1e9) {
        String spelling = "1/" + Engineering.decimal(parts).toPlainString();
        return cursor.refuse(token.from(), token.to(), "a fraction, not a decimal", spelling);
      }
    }
    return cursor.refuse(token.from(), cursor.lastEnd(), why);
  }

  /** {@code ratio = signed , [ "V/V" | "dB" ]}; decibels become a ratio of amplitudes. */
  double ratio() {
    Numeral numeral = amounts.signed(NO_UNIT);
    Token word = cursor.peek();
    if (word.is(Kind.END)) {
      return numeral.times(0);
    }
    if (!word.is(Kind.WORD)) {
      throw Leftovers.refusal(cursor);
    }
    boolean volts = word.text().equalsIgnoreCase("V/V");
    if (!volts && !word.text().equalsIgnoreCase("dB")) {
      String why = "a ratio has no unit, or V/V or dB";
      throw cursor.refuse(Problem.Kind.WRONG_UNIT, word.from(), word.to(), why, List.of(""));
    }
    Unit unit = amounts.unit(numeral, Expected.of(Dimension.RATIO, Dimension.DECIBEL));
    return unit.dimension() == Dimension.DECIBEL
        ? StrictMath.pow(10, numeral.times(0) / 20)
        : numeral.times(0);
  }
}
