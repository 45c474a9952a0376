package dev.settlewell.firmware;

import dev.settlewell.text.SourceText;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Finds constants in C and C++ sources: {@code #define NAME value}, {@code const} and {@code
 * constexpr} variables, enumerators. The preprocessor is not run: every definition is found, those
 * of all branches of an {@code #if} among them.
 */
public final class Constants {
  /** A value of 0.1f is not 0.1: what single precision may make of it, relative. */
  private static final double SINGLE_PRECISION = 1e-7;

  private static final Pattern DECLARED_CONST =
      Pattern.compile("\\b(?:const|constexpr|constinit)\\b[^;{}]*[\\w*&,>]\\s*$");

  private static final Pattern ENUM_OPENED = Pattern.compile("\\benum\\b[^;{}()]*\\{[^{}]*$");

  private final SourceText source;
  private final String code;
  private final Set<String> open = new HashSet<>();

  private Constants(SourceText source) {
    this.source = source;
    this.code = Blanking.of(source.content());
  }

  /** Every definition of {@code name}, in the order of the text; none where it is not defined. */
  public static List<Constant> find(SourceText source, String name) {
    return new Constants(source).find(name);
  }

  private List<Constant> find(String name) {
    List<Constant> found = new ArrayList<>();
    if (!name.matches("[A-Za-z_][A-Za-z0-9_]*")) {
      return found;
    }
    Matcher word = Pattern.compile("\\b" + name + "\\b").matcher(code);
    while (word.find()) {
      int[] expression = expression(word.start(), word.end());
      if (expression != null) {
        found.add(constant(name, expression[0], expression[1]));
      }
    }
    return found;
  }

  private Constant constant(String name, int from, int to) {
    String text = code.substring(from, to);
    OptionalDouble value = OptionalDouble.empty();
    double halfDigit = 0;
    String why = "";
    try {
      Number number = Expression.value(text, other -> value(other));
      value = OptionalDouble.of(number.value());
      halfDigit =
          number.whole()
              ? 0.5
              : Math.max(number.spread(), SINGLE_PRECISION * Math.abs(number.value()));
    } catch (Expression.NoValue e) {
      why = e.getMessage();
    }
    return new Constant(name, source.place(from, to), value, halfDigit, why);
  }

  /**
   * The value of another constant of this source, or null: none, several, or one that is itself.
   */
  private Number value(String name) {
    if (!open.add(name)) {
      return null;
    }
    try {
      List<Constant> found = find(name);
      if (found.size() != 1) {
        return null;
      }
      int from = found.get(0).place().start();
      int to = found.get(0).place().end();
      return Expression.value(code.substring(from, to), other -> value(other));
    } catch (Expression.NoValue e) {
      return null;
    } finally {
      open.remove(name);
    }
  }

  /** The stretch of the expression that defines the name standing here, or null for a mere use. */
  private int[] expression(int start, int end) {
    int line = code.lastIndexOf('\n', Math.max(0, start - 1)) + 1;
    if (code.substring(line, start).matches("\\s*#\\s*define\\s+")) {
      boolean takesParameters = code.startsWith("(", end);
      int stop = code.indexOf('\n', end);
      return takesParameters ? null : trimmed(end, stop < 0 ? code.length() : stop);
    }
    int sign = skipBlanks(end);
    boolean assigned = code.startsWith("=", sign) && !code.startsWith("==", sign);
    boolean braced = code.startsWith("{", sign);
    String before = code.substring(Math.max(0, start - 2000), start);
    boolean enumerator =
        assigned && ENUM_OPENED.matcher(before).find() && before.matches("(?s).*[{,]\\s*");
    boolean variable = (assigned || braced) && DECLARED_CONST.matcher(before).find();
    if (!enumerator && !variable) {
      return null;
    }
    return trimmed(sign + 1, expressionEnd(sign + 1));
  }

  /** Up to the comma, semicolon or closing brace outside all parentheses. */
  private int expressionEnd(int from) {
    int depth = 0;
    for (int i = from; i < code.length(); i++) {
      char c = code.charAt(i);
      if (depth == 0 && (c == ',' || c == ';' || c == '}')) {
        return i;
      }
      depth += c == '(' || c == '{' ? 1 : c == ')' || c == '}' ? -1 : 0;
    }
    return code.length();
  }

  private int skipBlanks(int from) {
    int at = from;
    while (at < code.length() && Character.isWhitespace(code.charAt(at))) {
      at++;
    }
    return at;
  }

  private int[] trimmed(int from, int to) {
    int start = Math.min(skipBlanks(from), to);
    int end = to;
    while (end > start && Character.isWhitespace(code.charAt(end - 1))) {
      end--;
    }
    return new int[] {start, end};
  }
}
