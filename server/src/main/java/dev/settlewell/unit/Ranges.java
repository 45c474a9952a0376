package dev.settlewell.unit;

import dev.settlewell.text.Problem;
import dev.settlewell.unit.Token.Kind;
import java.util.List;
import java.util.Optional;

/** Reads {@code 0 °C to 40 °C}. */
final class Ranges {
  private final Cursor cursor;
  private final Amounts amounts;

  Ranges(Cursor cursor) {
    this.cursor = cursor;
    this.amounts = new Amounts(cursor);
  }

  /** What stands at one end; the first may leave its unit to the second. */
  private record End(Numeral numeral, Optional<Unit> unit, int to) {}

  Range read(Expected expected, boolean mayFall) {
    Token sign = cursor.peek();
    if (sign.is(Kind.PLUS_MINUS)) {
      return around(expected);
    }
    End first = first(expected);
    to(first, expected);
    Numeral second = amounts.signed(expected);
    Unit unit = secondUnit(second, first, expected);
    Quantity high = second.in(unit, expected.temperatureDifference());
    Unit firstUnit = first.unit().orElse(unit);
    Quantity low = first.numeral().in(firstUnit, expected.temperatureDifference());
    int end = amounts.unitEnd(second.to());
    if (!low.unit().comparableWith(high.unit())) {
      String why = "both ends of a range have one unit, and these are " + firstUnit.written();
      int from = Math.max(second.to(), end - unit.written().length());
      throw cursor.refuse(
          Problem.Kind.WRONG_UNIT, from, end, why + " and " + unit.written(), List.of());
    }
    checkOrder(first, second, low.value(), high.value(), mayFall, end);
    if (expected.positive() && !(Math.min(low.value(), high.value()) > 0)) {
      throw outOfRange(first.numeral().from(), end, "the range must stay above zero");
    }
    noTolerance();
    return new Range(low.value(), high.value(), high.unit());
  }

  private End first(Expected expected) {
    Numeral numeral = amounts.signed(expected);
    boolean bare =
        !cursor.isNext(Kind.WORD) || cursor.isNextWord("to") || cursor.isNextWord("until");
    Optional<Unit> unit = bare ? Optional.empty() : Optional.of(amounts.unit(numeral, expected));
    return new End(numeral, unit, amounts.unitEnd(numeral.to()));
  }

  private void to(End first, Expected expected) {
    if (cursor.takeWord("to")) {
      return;
    }
    Token between = cursor.peek();
    if (Leftovers.isDash(cursor)) {
      cursor.take();
      cursor.slip(first.to(), cursor.peek().from(), "a range is written with to", " to ");
      return;
    }
    if (between.is(Kind.END)) {
      throw cursor.refuse(first.numeral().from(), first.to(), twoEnds(expected));
    }
    noTolerance();
    throw cursor.refuse(
        between.from(), between.to(), "to is expected before the range's other end");
  }

  private static String twoEnds(Expected expected) {
    List<String> likely = UnitSlips.likely(expected);
    String unit = likely.isEmpty() ? "V" : likely.get(0);
    return "a range has two ends, such as 0 " + unit + " to 5 " + unit;
  }

  private Unit secondUnit(Numeral second, End first, Expected expected) {
    if (cursor.isNext(Kind.WORD) || first.unit().isEmpty()) {
      return amounts.unit(second, expected);
    }
    String unit = UnitTable.canonical(first.unit().get().written());
    throw cursor.refuse(
        Problem.Kind.MISSING_UNIT,
        second.from(),
        second.to(),
        "the unit stands behind the second end",
        List.of(second.digits() + " " + unit));
  }

  private void checkOrder(
      End first, Numeral second, double low, double high, boolean mayFall, int end) {
    int from = first.numeral().from();
    if (low == high) {
      throw outOfRange(from, end, "the range has no width: both ends are the same");
    }
    if (low > high && !mayFall) {
      String swapped = cursor.text(second.from(), end) + " to " + cursor.text(from, first.to());
      throw cursor.refuse(
          Problem.Kind.VALUE_OUT_OF_RANGE,
          from,
          end,
          "a range goes from its lower end to its upper",
          List.of(swapped));
    }
  }

  /** {@code ±20 A} where a range is wanted. */
  private Range around(Expected expected) {
    Token sign = cursor.take();
    Numeral numeral = amounts.number(expected, "");
    Unit unit = amounts.unit(numeral, expected);
    int end = amounts.unitEnd(numeral.to());
    if (UnitTable.isKelvin(unit) || numeral.times(0) == 0) {
      throw outOfRange(sign.from(), end, twoEnds(expected));
    }
    String amount = numeral.digits() + " " + UnitTable.canonical(unit.written());
    cursor.slip(sign.from(), end, "a range names both its ends", "-" + amount + " to " + amount);
    double high = numeral.times(UnitTable.power(unit));
    return new Range(-high, high, unit);
  }

  private void noTolerance() {
    Token next = cursor.peek();
    if (next.is(Kind.PLUS_MINUS)) {
      throw cursor.refuse(next.from(), cursor.lastEnd(), "the ends of a range bear no tolerance");
    }
  }

  private RuntimeException outOfRange(int from, int to, String why) {
    return cursor.refuse(Problem.Kind.VALUE_OUT_OF_RANGE, from, to, why, List.of());
  }
}
