package dev.settlewell.unit;

import dev.settlewell.text.Problem;
import dev.settlewell.unit.Token.Kind;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Reads numbers and units, the parts that every form of value is made of. */
final class Amounts {
  private final Cursor cursor;

  Amounts(Cursor cursor) {
    this.cursor = cursor;
  }

  /** A number with its unit. */
  Quantity quantity(Expected expected) {
    Numeral numeral = signed(expected);
    Unit unit = unit(numeral, expected);
    return numeral.in(unit, expected.temperatureDifference());
  }

  /** {@code signed}: a number with its sign, without a blank between them. */
  Numeral signed(Expected expected) {
    Token sign = cursor.peek();
    if (!sign.is(Kind.PLUS) && !sign.is(Kind.MINUS)) {
      return number(expected, "");
    }
    cursor.take();
    Token next = cursor.peek();
    if (next.is(Kind.NUMBER) && !sign.touches(next)) {
      cursor.slip(sign.from(), next.from(), "no blank behind the sign", sign.text());
    }
    Numeral magnitude = number(expected, sign.is(Kind.MINUS) ? "-" : "");
    return new Numeral(sign.from(), magnitude.to(), magnitude.digits());
  }

  /** {@code number}: without a sign of its own. */
  Numeral number(Expected expected, String sign) {
    Token token = cursor.peek();
    if (!token.is(Kind.NUMBER)) {
      throw Leftovers.noNumber(cursor, expected);
    }
    cursor.take();
    String digits = digits(token);
    Numeral numeral = new Numeral(token.from(), unitEnd(token.from()), sign + digits);
    if (numeral.isTooLarge()) {
      throw outOfRange(numeral, "the number is larger than any value here can be (1e30)");
    }
    if (numeral.isTooSmall()) {
      throw outOfRange(numeral, "the number is too small to be told from 0 (1e-30)");
    }
    return numeral;
  }

  private RuntimeException outOfRange(Numeral numeral, String why) {
    return cursor.refuse(
        Problem.Kind.VALUE_OUT_OF_RANGE, numeral.from(), numeral.to(), why, List.of());
  }

  private String digits(Token token) {
    Token slash = cursor.peek();
    Token denominator = cursor.peek(1);
    boolean fraction = slash.is(Kind.SLASH) && denominator.is(Kind.NUMBER);
    if (fraction) {
      cursor.take();
      cursor.take();
      NumberText text = NumberText.ofFraction(token.text(), denominator.text());
      return meant(text, token.from(), denominator.to());
    }
    return meant(NumberText.of(token.text()), token.from(), token.to());
  }

  private String meant(NumberText text, int from, int to) {
    if (text.spellings().isEmpty()) {
      throw cursor.refuse(from, to, text.why());
    }
    if (!text.isStrict()) {
      cursor.note(Problem.Kind.NOT_ONE_VALUE, from, to, text.why(), text.safe(), text.spellings());
    }
    return text.spellings().get(0);
  }

  /** The unit behind a number, of a dimension that is expected here. */
  Unit unit(Numeral numeral, Expected expected) {
    Token word = cursor.peek();
    Unit unit = anyUnit(numeral, expected, UnitSlips.likely(expected));
    if (!UnitSlips.accepts(expected, unit)) {
      throw UnitSlips.wrong(cursor, word.from(), unitEnd(numeral.to()), unit, expected);
    }
    return unit;
  }

  /** The unit behind a number, whatever it measures. */
  Unit anyUnit(Numeral numeral, Expected expected, List<String> likely) {
    Token word = cursor.peek();
    if (!word.is(Kind.WORD) || Leftovers.isGrammarWord(word.text())) {
      throw missing(numeral, expected, likely);
    }
    cursor.take();
    Token joined = joined(word);
    Optional<Unit> known = UnitTable.read(joined.text());
    return known.isPresent() ? known.get() : UnitSlips.meant(cursor, numeral, joined, expected);
  }

  /** Where the text that was read last ends, the unit behind a number as a rule. */
  int unitEnd(int from) {
    String between = cursor.text(from, Math.max(from, cursor.peek().from()));
    return from + between.stripTrailing().length();
  }

  /** Gives up a value that is not above zero where the key wants one that is. */
  void checkPositive(Quantity quantity, Expected expected, int from, int to) {
    if (expected.positive() && !(quantity.value() > 0)) {
      throw cursor.refuse(
          Problem.Kind.VALUE_OUT_OF_RANGE, from, to, "the value must be above zero", List.of());
    }
  }

  /** {@code k Ω} as {@code kΩ}, where only the blank is wrong. */
  private Token joined(Token word) {
    Token next = cursor.peek();
    boolean apart = next.is(Kind.WORD) || next.is(Kind.SLASH);
    if (!apart || UnitTable.read(word.text()).isPresent() && !next.is(Kind.SLASH)) {
      return word;
    }
    int pieces = next.is(Kind.SLASH) ? 2 : 1;
    StringBuilder text = new StringBuilder(word.text());
    for (int i = 0; i < pieces; i++) {
      text.append(cursor.peek(i).text());
    }
    if (UnitTable.read(text.toString()).isEmpty()) {
      return word;
    }
    Token whole = new Token(Kind.WORD, word.from(), cursor.peek(pieces - 1).to(), text.toString());
    for (int i = 0; i < pieces; i++) {
      cursor.take();
    }
    cursor.slip(whole.from(), whole.to(), "no blank inside a unit", whole.text());
    return whole;
  }

  /** Four digits and more of ohms are plain ohms. */
  private static List<String> bySize(List<String> likely, Numeral numeral) {
    boolean ohms = likely.equals(UnitTable.likely(Dimension.RESISTANCE));
    return ohms && Math.abs(numeral.times(0)) >= 1000 ? List.of("Ω") : likely;
  }

  private RuntimeException missing(Numeral numeral, Expected expected, List<String> likely) {
    String number = cursor.text(numeral.from(), numeral.to());
    List<String> spellings = new ArrayList<>(Marking.meant(number, expected));
    if (numeral.times(0) == 0 && UnitSlips.base(expected).isPresent()) {
      spellings.add(0, "0 " + UnitSlips.base(expected).get());
    } else {
      bySize(likely, numeral).forEach(unit -> spellings.add(numeral.digits() + " " + unit));
    }
    String why = "a value carries its unit";
    if (spellings.isEmpty()) {
      why = number + " has no unit: " + why;
    }
    return cursor.refuse(Problem.Kind.MISSING_UNIT, numeral.from(), numeral.to(), why, spellings);
  }
}
