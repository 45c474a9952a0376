package dev.settlewell.unit;

import dev.settlewell.text.Problem;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The letter-digit codes of resistors and capacitors (IEC 60062, clause on letter and digit codes):
 * the letter stands in the place of the decimal point and names the multiple. Lower-case {@code k}
 * is common use; the standard has {@code K}.
 */
final class Code {
  /** Value digits and mark, and perhaps the letter of a tolerance. */
  private static final Pattern SHAPE =
      Pattern.compile("(\\d{0,15})([RKkMGLpnuµμmF])(\\d{0,15})([A-Z]?)");

  private static final Map<String, Integer> OHMS =
      Map.of("L", -3, "R", 0, "K", 3, "k", 3, "M", 6, "G", 9);
  private static final Map<String, Integer> FARADS =
      Map.of("p", -12, "n", -9, "u", -6, "µ", -6, "μ", -6, "m", -3, "F", 0);

  /** Letters of tolerance in percent (IEC 60062, symmetric tolerances). */
  private static final Map<String, String> TOLERANCES =
      Map.of(
          "B", "0.1", "C", "0.25", "D", "0.5", "F", "1", "G", "2", "J", "5", "K", "10", "M", "20");

  private Code() {}

  /**
   * @param tolerance percent, where a letter of tolerance follows ({@code 4K7J})
   * @param plain the code without that letter
   */
  record Reading(Quantity quantity, Optional<String> tolerance, String plain) {
    Dimension dimension() {
      return quantity.unit().dimension();
    }

    /** Gives up a code where the key takes none, or not this kind: {@code 1M} at a capacitor. */
    RuntimeException notTaken(Cursor cursor, int from, int to, Expected expected) {
      String value = Engineering.exact(quantity.value(), quantity.unit().symbol());
      boolean fits = UnitSlips.accepts(expected, quantity.unit());
      String why =
          fits
              ? "a letter-digit code stands only for a component"
              : cursor.text(from, to)
                  + " is the code of "
                  + value
                  + ": this key takes "
                  + UnitSlips.takes(expected);
      List<String> spellings = fits ? List.of(value) : List.of();
      return cursor.refuse(Problem.Kind.WRONG_UNIT, from, to, why, spellings);
    }
  }

  static Optional<Reading> read(String text) {
    Matcher shape = SHAPE.matcher(text);
    if (!shape.matches() || shape.group(1).isEmpty() && shape.group(3).isEmpty()) {
      return Optional.empty();
    }
    String mark = shape.group(2);
    String letter = shape.group(4);
    Optional<String> tolerance = Optional.ofNullable(TOLERANCES.get(letter));
    if (!letter.isEmpty() && tolerance.isEmpty()) {
      return Optional.empty();
    }
    boolean ohm = OHMS.containsKey(mark);
    int power = ohm ? OHMS.get(mark) : FARADS.get(mark);
    String whole = shape.group(1).isEmpty() ? "0" : shape.group(1);
    String digits = shape.group(3).isEmpty() ? whole : whole + "." + shape.group(3);
    double value = new Numeral(0, 0, digits).times(power);
    Quantity quantity = new Quantity(value, ohm ? UnitTable.OHM : UnitTable.FARAD);
    String plain = text.substring(0, text.length() - letter.length());
    return Optional.of(new Reading(quantity, tolerance, plain));
  }
}
