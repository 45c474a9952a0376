package dev.settlewell.unit;

import dev.settlewell.text.Problem;
import dev.settlewell.unit.Token.Kind;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;

/** Reads {@code errors}: tolerances, a drift, their basis and the point they hold at. */
final class Errors {
  private static final Expected POINT = Expected.of(Dimension.TEMPERATURE);

  /** What data sheets print behind a percentage, and the words of the grammar. */
  private static final Map<String, String> SHARES =
      Map.of(
          "FS", "of full scale",
          "FSR", "of full scale",
          "fs", "of full scale",
          "rdg", "of reading",
          "reading", "of reading",
          "span", "of span");

  private final Cursor cursor;
  private final Amounts amounts;
  private final Expected expected;
  private final boolean ofValue;
  private final List<Tolerance> tolerances = new ArrayList<>();
  private Optional<Drift> drift = Optional.empty();
  private Optional<Basis> basis = Optional.empty();

  /**
   * @param expected the units that tolerances and drifts may have, as {@link #ofValue} or the key
   *     says
   * @param ofValue true behind a value, where a bare number is most likely a percentage
   */
  Errors(Cursor cursor, Expected expected, boolean ofValue) {
    this.ofValue = ofValue;
    this.cursor = cursor;
    this.amounts = new Amounts(cursor);
    this.expected = expected;
  }

  /** What the errors of a value in this unit may be written in. */
  static Expected ofValue(Unit unit, boolean point) {
    List<Dimension> dimensions =
        point && unit.dimension() == Dimension.TEMPERATURE
            ? List.of(Dimension.TEMPERATURE)
            : List.of(Dimension.RATIO);
    return new Expected(dimensions, Optional.of(unit), true, false, true);
  }

  /** Errors behind a value, or none; {@code errors} of a key that must state some. */
  Deviation read(boolean required) {
    while (isNext()) {
      item();
    }
    boolean some = !tolerances.isEmpty() || drift.isPresent();
    if (required && !some) {
      throw nothing();
    }
    if (!some) {
      return Deviation.NONE;
    }
    bareBasis();
    if (cursor.isNext(Kind.OPEN)) {
      basis = Optional.of(basis());
    }
    if (isNext() && basis.isPresent()) {
      Token next = cursor.peek();
      String why = "the coverage factor stands last and holds for every tolerance before it";
      throw cursor.refuse(next.from(), next.to(), why);
    }
    return new Deviation(tolerances, drift, basis, at());
  }

  /** {@code need}: tolerances only. */
  List<Tolerance> tolerances() {
    while (isNext()) {
      Token first = cursor.peek();
      item();
      if (drift.isPresent()) {
        throw cursor.refuse(first.from(), cursor.lastEnd(), "a need is a tolerance, not a drift");
      }
    }
    if (tolerances.isEmpty()) {
      throw nothing();
    }
    return tolerances;
  }

  private RuntimeException nothing() {
    if (cursor.isNext(Kind.OPEN)) {
      return Leftovers.refusal(cursor);
    }
    List<String> likely = UnitSlips.likely(expected);
    String example = "±1 " + (likely.isEmpty() ? "%" : likely.get(0));
    Token token = cursor.peek();
    return cursor.refuse(token.from(), token.to(), "an error is expected here, such as " + example);
  }

  /** Takes a comma between errors for the slip it is. */
  private boolean isNext() {
    Token token = cursor.peek();
    if (token.is(",") && isStart(cursor.peek(1))) {
      cursor.take();
      cursor.slip(token.from(), token.to(), "a blank between errors, not a comma", "");
    }
    return isStart(cursor.peek());
  }

  private static boolean isStart(Token token) {
    return token.is(Kind.PLUS_MINUS) || token.is(Kind.PLUS) || token.is(Kind.NUMBER);
  }

  private void item() {
    Token sign = cursor.peek();
    if (sign.is(Kind.PLUS)) {
      asymmetric();
      return;
    }
    if (sign.is(Kind.PLUS_MINUS)) {
      cursor.take();
      signBehind(sign);
    }
    Numeral numeral = amounts.number(expected, "");
    Token word = cursor.peek();
    Unit unit = amounts.anyUnit(numeral, withDrifts(), likely());
    Optional<Unit> numerator = UnitTable.numeratorPerKelvin(unit.written());
    if (numerator.isPresent()) {
      drift(sign, numeral, word, unit, numerator.get());
    } else {
      tolerance(sign, numeral, word, unit);
    }
  }

  /** What a number without a unit may mean: a share first, where the errors are a value's. */
  private List<String> likely() {
    List<String> likely = UnitSlips.likely(expected);
    if (!ofValue || !likely.contains("%")) {
      return likely;
    }
    List<String> shareFirst = new ArrayList<>(List.of("%"));
    likely.stream().filter(unit -> !unit.equals("%")).forEach(shareFirst::add);
    return shareFirst;
  }

  private Expected withDrifts() {
    List<Dimension> dimensions = new ArrayList<>(expected.dimensions());
    expected.measured().ifPresent(unit -> dimensions.add(unit.dimension()));
    for (Dimension dimension : List.copyOf(dimensions)) {
      UnitTable.drift(dimension).ifPresent(dimensions::add);
    }
    return new Expected(dimensions, expected.measured(), true, false, true);
  }

  /** {@code ±-1 %}: the second sign says nothing. */
  private void signBehind(Token sign) {
    Token second = cursor.peek();
    if (second.is(Kind.MINUS) || second.is(Kind.PLUS)) {
      cursor.take();
      cursor.slip(sign.from(), second.to(), "± is the only sign of a tolerance", "±");
    }
  }

  private void tolerance(Token sign, Numeral numeral, Token word, Unit unit) {
    accept(numeral, word, unit);
    double magnitude = numeral.times(UnitTable.power(unit));
    if (!sign.is(Kind.PLUS_MINUS)) {
      cursor.slip(numeral.from(), numeral.to(), "a tolerance has its sign", "±" + numeral.digits());
    }
    tolerances.add(new Tolerance(magnitude, magnitude, unit, of(unit)));
  }

  /** {@code +80/-20 %}. */
  private void asymmetric() {
    Token sign = cursor.take();
    Numeral plus = amounts.number(expected, "");
    if (!cursor.isNext(Kind.SLASH_MINUS)) {
      plusThenMinus(sign, plus);
      return;
    }
    cursor.take();
    Numeral minus = amounts.number(expected, "");
    Unit unit = unit(minus);
    int power = UnitTable.power(unit);
    tolerances.add(new Tolerance(minus.times(power), plus.times(power), unit, of(unit)));
  }

  /** {@code +20 % -80 %} for {@code +20/-80 %}. */
  private void plusThenMinus(Token sign, Numeral plus) {
    Unit unit = unit(plus);
    Token slash = cursor.peek();
    if (slash.is(Kind.SLASH)) {
      cursor.take();
    }
    if (!cursor.isNext(Kind.MINUS) && !cursor.isNext(Kind.SLASH_MINUS)) {
      throw cursor.refuse(sign.from(), sign.to(), "a tolerance goes both ways", "±", "+0/-");
    }
    cursor.take();
    Numeral minus = amounts.number(expected, "");
    Unit second = unit(minus);
    if (!second.written().equals(unit.written())) {
      throw cursor.refuse(sign.from(), cursor.lastEnd(), "both sides in one unit, as +20/-80 %");
    }
    String spelling =
        "+" + plus.digits() + "/-" + minus.digits() + " " + UnitTable.canonical(unit.written());
    int end = amounts.unitEnd(minus.to());
    cursor.slip(sign.from(), end, "the unit stands once, behind both sides", spelling);
    int power = UnitTable.power(unit);
    tolerances.add(new Tolerance(minus.times(power), plus.times(power), unit, of(unit)));
  }

  private Unit unit(Numeral numeral) {
    Token word = cursor.peek();
    Unit unit = amounts.anyUnit(numeral, withDrifts(), likely());
    accept(numeral, word, unit);
    return unit;
  }

  private void accept(Numeral numeral, Token word, Unit unit) {
    if (UnitSlips.accepts(expected, unit)) {
      return;
    }
    int end = amounts.unitEnd(numeral.to());
    boolean temperature = expected.dimensions().equals(List.of(Dimension.TEMPERATURE));
    if (temperature && unit.dimension() == Dimension.RATIO) {
      String why = "a share of a temperature says nothing: write kelvin, such as ±0.5 K";
      throw cursor.refuse(Problem.Kind.WRONG_UNIT, numeral.from(), end, why, List.of());
    }
    throw UnitSlips.wrong(cursor, word.from(), end, unit, expected);
  }

  private Tolerance.Of of(Unit unit) {
    Token next = cursor.peek();
    if (SHARES.containsKey(next.text()) && unit.dimension() == Dimension.RATIO) {
      String meant = SHARES.get(next.text());
      throw cursor.mend(
          Problem.Kind.NOT_ONE_VALUE,
          next.from(),
          next.to(),
          "a percentage says in words what it is of",
          meant);
    }
    if (!cursor.isNextWord("of")) {
      return Tolerance.Of.UNSAID;
    }
    Token of = cursor.take();
    Token name = cursor.take();
    if (unit.dimension() != Dimension.RATIO) {
      throw cursor.refuse(of.from(), name.to(), "only a percentage is of something");
    }
    return switch (name.text()) {
      case "reading" -> Tolerance.Of.READING;
      case "span" -> Tolerance.Of.SPAN;
      case "full" -> fullScale(name);
      case "rdg", "rd", "value" -> said(name, "reading", Tolerance.Of.READING);
      case "FS", "fs", "FSR", "full-scale", "fullscale" ->
          said(name, "full scale", Tolerance.Of.FULL_SCALE);
      default -> throw ofWhat(name);
    };
  }

  private Tolerance.Of said(Token name, String spelling, Tolerance.Of meant) {
    cursor.slip(name.from(), name.to(), "a percentage says in words what it is of", spelling);
    return meant;
  }

  private Tolerance.Of fullScale(Token full) {
    if (!cursor.takeWord("scale")) {
      cursor.slip(full.from(), full.to(), "both words", "full scale");
    }
    return Tolerance.Of.FULL_SCALE;
  }

  private RuntimeException ofWhat(Token name) {
    String why = "a percentage is of one of these";
    return cursor.refuse(name.from(), name.to(), why, "reading", "span", "full scale");
  }

  private void drift(Token sign, Numeral numeral, Token word, Unit unit, Unit numerator) {
    int end = amounts.unitEnd(numeral.to());
    if (!takesDrift(numerator)) {
      throw UnitSlips.wrong(cursor, word.from(), end, unit, expected);
    }
    if (drift.isPresent()) {
      throw cursor.refuse(sign.from(), end, "a value has one drift, and this is a second");
    }
    Optional<Range> box = box(sign, numeral);
    if (box.isEmpty() && !sign.is(Kind.PLUS_MINUS)) {
      throw cursor.refuse(
          numeral.from(),
          numeral.to(),
          "a drift has its sign, or is a box over a range",
          "±" + numeral.digits());
    }
    drift = Optional.of(new Drift(numeral.times(UnitTable.power(numerator)), numerator, box));
  }

  private boolean takesDrift(Unit numerator) {
    Optional<Dimension> named = UnitTable.drift(numerator.dimension());
    return UnitSlips.accepts(expected, numerator)
        || named.isPresent() && expected.dimensions().contains(named.get());
  }

  /** {@code 25 ppm/K box -40 °C to 125 °C}. */
  private Optional<Range> box(Token sign, Numeral numeral) {
    if (!cursor.takeWord("box")) {
      return Optional.empty();
    }
    if (sign.is(Kind.PLUS_MINUS)) {
      cursor.slip(sign.from(), numeral.from(), "a box bounds the whole excursion, unsigned", "");
    }
    return Optional.of(new Ranges(cursor).read(POINT, false));
  }

  /** {@code k=2} without its parentheses. */
  private void bareBasis() {
    Token k = cursor.peek();
    Token value = cursor.peek(2);
    if (cursor.isNextWord("k") && cursor.peek(1).is(Kind.EQUALS) && value.is(Kind.NUMBER)) {
      throw cursor.mend(
          Problem.Kind.NOT_ONE_VALUE,
          k.from(),
          value.to(),
          "a coverage factor stands in parentheses",
          "(k=" + value.text() + ")");
    }
  }

  /** {@code (k=2)}, {@code (k=2 n=10)}. */
  private Basis basis() {
    Token open = cursor.take();
    if (!cursor.takeWord("k") || !cursor.isNext(Kind.EQUALS)) {
      throw cursor.refuse(
          open.from(), cursor.lastEnd(), "what a tolerance rests on is written (k=2)");
    }
    cursor.take();
    Numeral k = amounts.number(expected, "");
    if (!(k.times(0) > 0)) {
      throw cursor.refuse(k.from(), k.to(), "a coverage factor is above zero");
    }
    Token comma = cursor.peek();
    if (comma.is(",")) {
      cursor.take();
      cursor.slip(comma.from(), comma.to(), "a blank, not a comma", "");
    }
    OptionalInt n = cursor.takeWord("n") ? OptionalInt.of(observations()) : OptionalInt.empty();
    Token close = cursor.peek();
    if (!close.is(Kind.CLOSE)) {
      throw cursor.refuse(close.from(), close.to(), "a ) is missing, as in (k=2)");
    }
    cursor.take();
    return new Basis(k.times(0), n);
  }

  private int observations() {
    Token equals = cursor.peek();
    if (!equals.is(Kind.EQUALS)) {
      throw cursor.refuse(equals.from(), equals.to(), "the number of values is written n=10");
    }
    cursor.take();
    Token count = cursor.peek();
    if (!count.text().matches("[1-9]\\d{0,8}") || count.is("1")) {
      throw cursor.refuse(count.from(), count.to(), "n is a whole number of two and more");
    }
    cursor.take();
    return Integer.parseInt(count.text());
  }

  /** {@code at 85 °C}. */
  private Optional<Quantity> at() {
    Token token = cursor.peek();
    if (token.is("@")) {
      cursor.slip(token.from(), token.to(), "the word, not the sign", "at");
    } else if (!cursor.isNextWord("at")) {
      return Optional.empty();
    }
    cursor.take();
    return Optional.of(amounts.quantity(POINT));
  }
}
