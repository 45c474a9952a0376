package dev.settlewell.unit;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * How a number is written, and what was meant where it is not written as the grammar wants it.
 *
 * @param spellings strict spellings, the likeliest first; empty where none can be told
 * @param safe true where the first spelling has certainly the value that was meant
 * @param why what is wrong; empty for a number without fault
 */
record NumberText(List<String> spellings, boolean safe, String why) {
  private static final String EXPONENT = "(?:[eE][+-]?\\d+)?";

  private static final Pattern STRICT = Pattern.compile("(?:0|[1-9]\\d*)(?:\\.\\d+)?" + EXPONENT);
  private static final Pattern HEX = Pattern.compile("0[xX]([0-9a-fA-F]{1,15})");
  private static final Pattern GROUPED =
      Pattern.compile("\\d{1,3}(?:[ '’_]\\d{3})+(?:[.,]\\d+)?" + EXPONENT);
  private static final Pattern COMMA_GROUPS =
      Pattern.compile("\\d{1,3}(?:,\\d{3}){2,}(?:\\.\\d+)?|\\d{1,3}(?:,\\d{3})+\\.\\d+");
  private static final Pattern POINT_GROUPS =
      Pattern.compile("\\d{1,3}(?:\\.\\d{3}){2,}(?:,\\d+)?|\\d{1,3}(?:\\.\\d{3})+,\\d+");
  private static final Pattern EITHER = Pattern.compile("[1-9]\\d{0,2},\\d{3}");
  private static final Pattern COMMA = Pattern.compile("(\\d+),(\\d+)(" + EXPONENT + ")");
  private static final Pattern UNDERSCORES = Pattern.compile("\\d+(?:_\\d+)+(?:\\.\\d+)?");
  private static final Pattern NO_INTEGER = Pattern.compile("[.,](\\d+)(" + EXPONENT + ")");
  private static final Pattern NO_FRACTION = Pattern.compile("(\\d+)\\.(" + EXPONENT + ")");
  private static final Pattern LEADING_ZEROS =
      Pattern.compile("0+(\\d+(?:\\.\\d+)?" + EXPONENT + ")");

  private static final String SEPARATOR = "digits are not grouped";

  boolean isStrict() {
    return why.isEmpty();
  }

  static NumberText of(String text) {
    if (STRICT.matcher(text).matches()) {
      return new NumberText(List.of(text), true, "");
    }
    NumberText meant = grouped(text);
    if (meant == null) {
      meant = shaped(text);
    }
    return meant != null ? meant : new NumberText(List.of(), false, text + " is not one number");
  }

  private static NumberText grouped(String text) {
    if (GROUPED.matcher(text).matches()) {
      return certain(text.replaceAll("[ '’_]", "").replace(',', '.'), SEPARATOR);
    }
    if (COMMA_GROUPS.matcher(text).matches()) {
      return certain(text.replace(",", ""), SEPARATOR);
    }
    if (POINT_GROUPS.matcher(text).matches()) {
      return certain(text.replace(".", "").replace(',', '.'), SEPARATOR);
    }
    if (UNDERSCORES.matcher(text).matches()) {
      return certain(text.replace("_", ""), SEPARATOR);
    }
    if (EITHER.matcher(text).matches()) {
      return new NumberText(
          List.of(text.replace(",", ""), text.replace(',', '.')),
          false,
          "a comma may mean thousands or a decimal point, so neither is read");
    }
    return null;
  }

  private static NumberText shaped(String text) {
    Matcher hex = HEX.matcher(text);
    if (hex.matches()) {
      return certain(new BigInteger(hex.group(1), 16).toString(), "values are written in decimal");
    }
    Matcher comma = COMMA.matcher(text);
    if (comma.matches()) {
      String whole = comma.group(1) + "." + comma.group(2) + comma.group(3);
      return certain(whole, "a decimal point, not a comma");
    }
    Matcher noInteger = NO_INTEGER.matcher(text);
    if (noInteger.matches()) {
      return certain("0." + noInteger.group(1) + noInteger.group(2), "a digit before the point");
    }
    Matcher noFraction = NO_FRACTION.matcher(text);
    if (noFraction.matches()) {
      return certain(
          noFraction.group(1) + noFraction.group(2), "no point without digits behind it");
    }
    Matcher zeros = LEADING_ZEROS.matcher(text);
    if (zeros.matches()) {
      String meant = zeros.group(1);
      return new NumberText(List.of(meant), false, "no leading zero, which may mean octal");
    }
    return null;
  }

  private static NumberText certain(String meant, String why) {
    return STRICT.matcher(meant).matches()
        ? new NumberText(List.of(meant), true, why)
        : new NumberText(List.of(meant.replaceFirst("^0+(?=\\d)", "")), false, why);
  }

  /** {@code 1/2} as a decimal number. */
  static NumberText ofFraction(String numerator, String denominator) {
    if (!numerator.matches("\\d{1,9}") || !denominator.matches("0*[1-9]\\d{0,8}")) {
      return new NumberText(List.of(), false, "a value is one decimal number, not a fraction");
    }
    BigDecimal top = new BigDecimal(numerator);
    BigDecimal bottom = new BigDecimal(denominator);
    try {
      String exact = top.divide(bottom).stripTrailingZeros().toPlainString();
      return new NumberText(List.of(exact), true, "a decimal number, not a fraction");
    } catch (ArithmeticException endless) {
      String near = Engineering.digits(top.doubleValue() / bottom.doubleValue(), 6);
      return new NumberText(List.of(near), false, "a decimal number, not a fraction");
    }
  }
}
