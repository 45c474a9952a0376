package dev.settlewell.firmware;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.function.Function;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Evaluates a constant expression of C: literals, other constants of the same source, arithmetic,
 * shifts and bit operations, casts, and the macros of {@code stdint.h} that give literals a type.
 */
final class Expression {
  /** Why an expression has no value that can be told. */
  static final class NoValue extends Exception {
    private static final long serialVersionUID = 1L;

    NoValue(String why) {
      super(why, null, false, false);
    }
  }

  private static final Pattern LITERAL =
      Pattern.compile(
          "0[xX][0-9a-fA-F']+(?![.pP0-9a-fA-F'])|0[bB][01']+"
              + "|(?:[0-9][0-9']*\\.?[0-9']*|\\.[0-9][0-9']*)(?:[eE][-+]?[0-9]+)?");

  private static final Pattern SUFFIX = Pattern.compile("(?i)(?:u|l|ll|ul|lu|ull|llu|z|uz|f)?");
  private static final Pattern NAME = Pattern.compile("[A-Za-z_][A-Za-z0-9_]*");
  private static final Pattern TYPE_MACRO = Pattern.compile("U?INT(?:8|16|32|64|MAX)_C");
  private static final Pattern CAST =
      Pattern.compile("\\(\\s*((?:[A-Za-z_][A-Za-z0-9_:]*\\s*)+)\\)");
  private static final Pattern NAMED_CAST =
      Pattern.compile("(?:static_cast|constexpr_cast)\\s*<\\s*([^<>]+?)\\s*>");

  private static final Set<String> TYPE_WORDS =
      Set.of(
          "unsigned",
          "signed",
          "char",
          "short",
          "int",
          "long",
          "float",
          "double",
          "bool",
          "const",
          "size_t");

  private static final Map<String, Integer> STRENGTH =
      Map.of("|", 1, "^", 2, "&", 3, "<<", 4, ">>", 4, "+", 5, "-", 5, "*", 6, "/", 6, "%", 6);

  private static final int DEEPEST = 100;

  private final String text;
  private final Function<String, Number> others;
  private int at;
  private int depth;

  /**
   * @param others the values of other constants; null for a name that has none
   */
  private Expression(String text, Function<String, Number> others) {
    this.text = text;
    this.others = others;
  }

  static Number value(String text, Function<String, Number> others) throws NoValue {
    Expression expression = new Expression(text, others);
    Number value = expression.binary(1);
    expression.blanks();
    if (expression.at < text.length()) {
      throw new NoValue("`" + text.substring(expression.at).strip() + "` is no literal");
    }
    if (!Double.isFinite(value.value())) {
      throw new NoValue("its value is no finite number");
    }
    return value;
  }

  private Number binary(int weakest) throws NoValue {
    if (++depth > DEEPEST) {
      throw new NoValue("it is nested too deep");
    }
    Number left = unary();
    for (String operator = operator(); !operator.isEmpty(); operator = operator()) {
      int strength = STRENGTH.get(operator);
      if (strength < weakest) {
        break;
      }
      at += operator.length();
      left = applied(operator, left, binary(strength + 1));
    }
    depth--;
    return left;
  }

  private String operator() {
    blanks();
    for (String two : new String[] {"<<", ">>"}) {
      if (text.startsWith(two, at)) {
        return two;
      }
    }
    if (at >= text.length()) {
      return "";
    }
    String one = text.substring(at, at + 1);
    boolean logical = text.startsWith(one + one, at); // && and || compute no figure
    return STRENGTH.containsKey(one) && !logical ? one : "";
  }

  private static Number applied(String operator, Number a, Number b) throws NoValue {
    boolean whole = a.whole() && b.whole();
    double x = a.value();
    double y = b.value();
    boolean divides = operator.equals("/") || operator.equals("%");
    if (divides && y == 0) {
      throw new NoValue("it divides by zero");
    }
    return switch (operator) {
      case "+" -> of(x + y, whole, a.spread() + b.spread());
      case "-" -> of(x - y, whole, a.spread() + b.spread());
      case "*" -> of(x * y, whole, Math.abs(x) * b.spread() + Math.abs(y) * a.spread());
      case "/" -> {
        double quotient = x / y;
        double spread = (a.spread() + Math.abs(quotient) * b.spread()) / Math.abs(y);
        yield of(whole ? truncated(quotient) : quotient, whole, spread);
      }
      default -> bits(operator, a, b);
    };
  }

  private static Number of(double value, boolean whole, double spread) throws NoValue {
    if (whole && Math.abs(value) > 1L << 53) {
      throw new NoValue("it is larger than can be told exactly");
    }
    return new Number(value, whole, spread);
  }

  private static double truncated(double value) {
    return value < 0 ? Math.ceil(value) : Math.floor(value);
  }

  private static Number bits(String operator, Number a, Number b) throws NoValue {
    if (!a.whole() || !b.whole()) {
      throw new NoValue("`" + operator + "` takes whole numbers");
    }
    long x = (long) a.value();
    long y = (long) b.value();
    boolean shifts = operator.equals("<<") || operator.equals(">>");
    if (shifts && (y < 0 || y > 62)) {
      throw new NoValue("it shifts by " + y);
    }
    if (operator.equals("<<") && Math.abs(x) > Long.MAX_VALUE >> y) {
      throw new NoValue("it is larger than can be told exactly");
    }
    return of(
        switch (operator) {
          case "<<" -> x << y;
          case ">>" -> x >> y;
          case "&" -> x & y;
          case "|" -> x | y;
          case "^" -> x ^ y;
          default -> x % y;
        },
        true,
        0);
  }

  private Number unary() throws NoValue {
    if (++depth > DEEPEST) {
      throw new NoValue("it is nested too deep");
    }
    blanks();
    Number value;
    if (takes("-")) {
      Number inner = unary();
      value = new Number(-inner.value(), inner.whole(), inner.spread());
    } else if (takes("+")) {
      value = unary();
    } else if (takes("~")) {
      Number inner = unary();
      if (!inner.whole()) {
        throw new NoValue("`~` takes a whole number");
      }
      value = Number.whole(~(long) inner.value());
    } else {
      value = primary();
    }
    depth--;
    return value;
  }

  private Number primary() throws NoValue {
    Matcher cast = matcher(CAST);
    if (cast.lookingAt() && isType(cast.group(1))) {
      at = cast.end();
      return cast(cast.group(1), unary());
    }
    Matcher named = matcher(NAMED_CAST);
    if (named.lookingAt()) {
      at = named.end();
      return cast(named.group(1), parenthesised());
    }
    if (at < text.length() && text.charAt(at) == '(') {
      return parenthesised();
    }
    Matcher literal = matcher(LITERAL);
    if (literal.lookingAt()) {
      at = literal.end();
      return literal(literal.group());
    }
    Matcher name = matcher(NAME);
    if (name.lookingAt()) {
      at = name.end();
      return name(name.group());
    }
    throw new NoValue(
        at >= text.length() ? "it ends too early" : "it is no expression of literals");
  }

  private Number name(String name) throws NoValue {
    if (TYPE_MACRO.matcher(name).matches()) {
      return parenthesised();
    }
    blanks();
    if (at < text.length() && (text.charAt(at) == '(' || text.charAt(at) == '{')) {
      throw new NoValue("`" + name + "` is not evaluated");
    }
    Number value = others.apply(name);
    if (value == null) {
      throw new NoValue("`" + name + "` is no constant of this source");
    }
    return value;
  }

  private Number parenthesised() throws NoValue {
    blanks();
    if (!takes("(")) {
      throw new NoValue("a parenthesis is missing");
    }
    Number value = binary(1);
    blanks();
    if (!takes(")")) {
      throw new NoValue("a parenthesis is not closed, or holds no literal");
    }
    return value;
  }

  private static boolean isType(String words) {
    for (String word : words.strip().split("\\s+")) {
      boolean type =
          TYPE_WORDS.contains(word)
              || word.matches("(?:std::)?u?int(?:_fast|_least)?\\d+_t|float\\d+_t");
      if (!type) {
        return false;
      }
    }
    return true;
  }

  private static Number cast(String type, Number value) {
    boolean real = type.contains("float") || type.contains("double");
    return real
        ? Number.real(value.value(), value.spread())
        : Number.whole(truncated(value.value()));
  }

  private Number literal(String written) throws NoValue {
    String digits = written.replace("'", "").toLowerCase(Locale.ROOT);
    Matcher suffix = matcher(SUFFIX);
    suffix.lookingAt();
    boolean floats = suffix.group().equalsIgnoreCase("f");
    at = suffix.end();
    if (at < text.length() && Character.isJavaIdentifierPart(text.charAt(at))) {
      throw new NoValue("`" + written + text.charAt(at) + "` is no literal");
    }
    if (digits.startsWith("0x")) {
      return integer(digits.substring(2), 16);
    }
    if (digits.startsWith("0b")) {
      return integer(digits.substring(2), 2);
    }
    boolean real = floats || digits.contains(".") || digits.contains("e");
    if (real) {
      BigDecimal value = new BigDecimal(digits.replaceFirst("\\.(?=e|$)", ""));
      // Trailing zeros are digits too: 2.50 is known to half a hundredth.
      return Number.real(
          value.doubleValue(), BigDecimal.valueOf(5, value.scale() + 1).doubleValue());
    }
    boolean octal = digits.length() > 1 && digits.startsWith("0");
    return integer(digits, octal ? 8 : 10);
  }

  private static Number integer(String digits, int radix) throws NoValue {
    try {
      BigInteger value = new BigInteger(digits, radix);
      if (value.bitLength() > 53) {
        throw new NoValue("it is larger than can be told exactly");
      }
      return Number.whole(value.doubleValue());
    } catch (NumberFormatException e) {
      throw new NoValue("`" + digits + "` is no number");
    }
  }

  private Matcher matcher(Pattern pattern) {
    return pattern.matcher(text).region(at, text.length());
  }

  private boolean takes(String token) {
    boolean here = text.startsWith(token, at);
    // `--x` and `++x` are no constants.
    if (here && !text.startsWith(token + token, at) || here && token.matches("[()~]")) {
      at += token.length();
      return true;
    }
    return false;
  }

  private void blanks() {
    while (at < text.length() && Character.isWhitespace(text.charAt(at))) {
      at++;
    }
  }
}
