package dev.settlewell.unit;

import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** What a bare number may be where it was copied from a part's marking. */
final class Marking {
  /** Two digits and the number of zeros behind them, in ohm or picofarad (IEC 60062). */
  private static final Pattern THREE_DIGITS = Pattern.compile("([1-9]\\d)([0-7])");

  /** {@code E} in the place of the decimal point, as some makers mark ohms. */
  private static final Pattern POINT_E = Pattern.compile("(\\d{1,3})E(\\d{1,2})");

  private Marking() {}

  /** Values with their units, the likeliest first; empty where the number is no marking. */
  static List<String> meant(String number, Expected expected) {
    List<String> meant = new ArrayList<>();
    boolean ohm = expected.dimensions().equals(List.of(Dimension.RESISTANCE));
    boolean farad = expected.dimensions().equals(List.of(Dimension.CAPACITANCE));
    Matcher three = THREE_DIGITS.matcher(number);
    if (three.matches() && !three.group(2).equals("0") && (ohm || farad)) {
      int power = Integer.parseInt(three.group(2)) - (ohm ? 0 : 12);
      double value = new Numeral(0, 0, three.group(1)).times(power);
      meant.add(Engineering.exact(value, ohm ? "Ω" : "F"));
    }
    Matcher point = POINT_E.matcher(number);
    if (point.matches() && ohm) {
      meant.add(point.group(1) + "." + point.group(2) + " Ω");
    }
    return meant;
  }
}
