package dev.settlewell.unit;

import dev.settlewell.text.Problem;
import dev.settlewell.unit.Token.Kind;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** The rules of {@code schema/grammar.md} that a key may start with. */
final class Grammar {
  private static final Set<Dimension> NO_AMPLITUDE =
      Set.of(
          Dimension.RESISTANCE,
          Dimension.CAPACITANCE,
          Dimension.FREQUENCY,
          Dimension.CYCLES,
          Dimension.BITS);

  /** What data sheets write for {@code peak-to-peak}. */
  private static final Set<String> PEAK_TO_PEAK = Set.of("pp", "p-p", "pk-pk", "Vpp", "PP", "P-P");

  private final Cursor cursor;
  private final Amounts amounts;
  private final Expected expected;

  Grammar(Cursor cursor, Expected expected) {
    this.cursor = cursor;
    this.amounts = new Amounts(cursor);
    this.expected = expected;
  }

  /** {@code quantity = signed , unit , [ "of" , NAME ] , [ amplitude ] , [ errors ]}. */
  Toleranced quantity() {
    leadingLimit();
    Numeral numeral = amounts.signed(expected);
    notTwoEnds(numeral);
    Unit written = amounts.unit(numeral, expected);
    Quantity quantity = numeral.in(written, expected.temperatureDifference());
    int end = amounts.unitEnd(numeral.to());
    amounts.checkPositive(quantity, expected, numeral.from(), end);
    milli(quantity, written, numeral.from(), end);
    Optional<String> of = of(quantity.unit());
    Optional<Toleranced.Amplitude> amplitude = amplitude(quantity.unit());
    trailingLimit(end);
    notTwoEnds(numeral);
    noPoint();
    return Toleranced.exact(quantity).with(errors(quantity.unit())).with(of, amplitude);
  }

  /** {@code component = code , [ errors ] | quantity}. */
  Toleranced component() {
    Optional<Quantity> code = new Codes(cursor, expected).read();
    if (code.isEmpty()) {
      return quantity();
    }
    noPoint();
    return Toleranced.exact(code.get()).with(errors(code.get().unit()));
  }

  Deviation deviation() {
    return new Errors(cursor, differences(), false).read(true);
  }

  Need need() {
    List<Tolerance> tolerances = new Errors(cursor, differences(), false).tolerances();
    Token word = cursor.peek();
    if (word.is(Kind.WORD) && word.text().matches("(?i)worst-?case|worst")) {
      cursor.take();
      Token second = cursor.peek();
      boolean two = word.text().equalsIgnoreCase("worst") && second.text().equals("case");
      int end = two ? cursor.take().to() : word.to();
      if (!word.is("worst-case")) {
        cursor.slip(word.from(), end, "the word is worst-case", "worst-case");
      }
      return new Need(tolerances, true);
    }
    if (word.is(Kind.OPEN)) {
      String why = "a need has no coverage factor: it is judged at 95 %, or as worst-case";
      throw cursor.refuse(word.from(), cursor.lastEnd(), why);
    }
    return new Need(tolerances, false);
  }

  Range range(boolean mayFall) {
    return new Ranges(cursor).read(expected, mayFall);
  }

  private Expected differences() {
    return new Expected(expected.dimensions(), expected.measured(), true, false, true);
  }

  private Deviation errors(Unit unit) {
    boolean point = !expected.temperatureDifference();
    return new Errors(cursor, Errors.ofValue(unit, point), true).read(false);
  }

  /** {@code 5 mohm} is often meant as megohm: read as it stands, and asked back. */
  private void milli(Quantity quantity, Unit unit, int from, int to) {
    String symbol = unit.written();
    boolean doubtful = symbol.equals("mohm") || symbol.equals("mOhm");
    if (doubtful && !expected.shuntSized() && Math.abs(quantity.value()) < 0.1) {
      String number = cursor.text(from, to).replace(symbol, "").trim();
      cursor.note(
          Problem.Kind.AMBIGUOUS_TEXT,
          from,
          to,
          symbol
              + " is read as milliohm: write "
              + number
              + " mΩ, or "
              + number
              + " MΩ if megohm is meant",
          false,
          List.of(number + " mΩ", number + " MΩ"));
    }
  }

  /** {@code 50 % of ref}. */
  private Optional<String> of(Unit unit) {
    Token next = cursor.peek();
    if (!cursor.isNextWord("of")) {
      boolean name = next.is(Kind.WORD) && next.text().matches("[a-z][a-z0-9-]*");
      boolean share = unit.dimension() == Dimension.RATIO && !Leftovers.isGrammarWord(next.text());
      if (name && share && !Leftovers.isRemark(next.text())) {
        throw cursor.refuse(
            next.from(), next.to(), "a percentage is of something", "of " + next.text());
      }
      return Optional.empty();
    }
    Token of = cursor.take();
    Token name = cursor.peek();
    if (unit.dimension() != Dimension.RATIO) {
      throw cursor.refuse(of.from(), cursor.lastEnd(), "only a percentage is of something", "");
    }
    if (!name.is(Kind.NAME)) {
      throw cursor.refuse(of.from(), of.to(), "a name is missing, as in 50 % of ref");
    }
    cursor.take();
    return Optional.of(name.text());
  }

  private Optional<Toleranced.Amplitude> amplitude(Unit unit) {
    Token word = cursor.peek();
    if (!word.is(Kind.WORD)) {
      return Optional.empty();
    }
    Optional<Toleranced.Amplitude> meant = Optional.empty();
    if (word.text().equalsIgnoreCase("rms")) {
      meant = spelled(word, "rms", Toleranced.Amplitude.RMS);
    } else if (word.is("peak-to-peak") || PEAK_TO_PEAK.contains(word.text())) {
      meant = spelled(word, "peak-to-peak", Toleranced.Amplitude.PEAK_TO_PEAK);
    } else if (List.of("peak", "DC", "dc").contains(word.text())) {
      remark(word);
    }
    if (meant.isPresent() && NO_AMPLITUDE.contains(unit.dimension())) {
      throw cursor.refuse(word.from(), word.to(), "this value has no amplitude", "");
    }
    return meant;
  }

  private Optional<Toleranced.Amplitude> spelled(
      Token word, String spelling, Toleranced.Amplitude meant) {
    cursor.take();
    if (!word.is(spelling)) {
      cursor.slip(word.from(), word.to(), "the word is " + spelling, spelling);
    }
    return Optional.of(meant);
  }

  private void remark(Token word) {
    cursor.take();
    String why =
        word.is("peak") ? "an amplitude is the peak unless it says else" : "a unit bears no remark";
    cursor.slip(word.from(), word.to(), why, "");
  }

  /** {@code <5 mV}, {@code max 5 pF}. */
  private void leadingLimit() {
    Optional<String> key = Leftovers.limit(cursor.peek());
    if (key.isPresent() && cursor.peek(1).is(Kind.NUMBER)) {
      throw limit(key.get(), cursor.text(cursor.peek(1).from(), cursor.lastEnd()));
    }
  }

  /** {@code 5 pF max}. */
  private void trailingLimit(int end) {
    Optional<String> key = Leftovers.limit(cursor.peek());
    boolean last = cursor.peek(1).is(Kind.END) || cursor.peek(1).is(".");
    if (key.isPresent() && last && cursor.peek().is(Kind.WORD)) {
      throw limit(key.get(), cursor.text(0, end).strip());
    }
    Optional<String> inside = Leftovers.limit(cursor.peek(1));
    if (cursor.isNext(Kind.OPEN) && inside.isPresent() && cursor.peek(3).is(Kind.END)) {
      throw limit(inside.get(), cursor.text(0, end).strip());
    }
  }

  private RuntimeException limit(String key, String value) {
    int end = cursor.lastEnd();
    if (key.equals("min")) {
      return cursor.refuse(
          0, end, "a least value alone says too little: write {min: …, typical: …, max: …}");
    }
    String why = "a limit or a typical figure is said in the long form";
    return cursor.refuse(0, end, why, "{" + key + ": " + value + "}");
  }

  /** {@code 5..7 pF}, {@code 5 pF to 7 pF} where one value is wanted. */
  private void notTwoEnds(Numeral first) {
    boolean to = cursor.isNextWord("to") || cursor.isNextWord("until");
    boolean two = to ? !cursor.peek(1).is(Kind.END) : Leftovers.isDash(cursor);
    if (!two) {
      return;
    }
    int end = cursor.lastEnd();
    String low = cursor.text(first.from(), cursor.peek().from()).strip();
    cursor.take();
    String high = cursor.text(cursor.peek().from(), end);
    String unit = high.replaceFirst("^[-+]?[0-9.,eE]*\\s*", "");
    String lower = low.matches(".*[0-9]") && !unit.isEmpty() ? low + " " + unit : low;
    String why = "one value is wanted here, and limits are said in the long form";
    throw cursor.refuse(first.from(), end, why, "{min: " + lower + ", max: " + high + "}");
  }

  /** {@code 10 kΩ @ 25 °C}: a value without errors holds at no point of its own. */
  private void noPoint() {
    Token token = cursor.peek();
    if (token.is("@") || cursor.isNextWord("at")) {
      String why =
          "a value without errors is not stated at a temperature; the sheet's is stated-at";
      throw cursor.refuse(token.from(), cursor.lastEnd(), why, "");
    }
  }
}
