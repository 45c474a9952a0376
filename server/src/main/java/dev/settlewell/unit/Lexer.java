package dev.settlewell.unit;

import dev.settlewell.unit.Token.Kind;
import java.util.ArrayList;
import java.util.List;

/** Cuts the text of a value into tokens; never fails, every character but blanks is in a token. */
final class Lexer {
  /** What units are spelled with beside letters. */
  private static final String UNIT_SIGNS = "°℃%√‰²³·^";

  private final String text;
  private final List<Token> tokens = new ArrayList<>();
  private int at;

  private Lexer(String text) {
    this.text = text;
  }

  /** All tokens, and an {@link Kind#END} at the text's end. */
  static List<Token> tokens(String raw) {
    Lexer lexer = new Lexer(plain(raw));
    lexer.skipBlanks();
    while (lexer.at < lexer.text.length()) {
      lexer.next();
      lexer.skipBlanks();
    }
    lexer.add(Kind.END, lexer.at);
    return lexer.tokens;
  }

  /** The same text, character by character, with plain blanks and a plain minus sign. */
  static String plain(String raw) {
    StringBuilder plain = new StringBuilder(raw);
    for (int i = 0; i < plain.length(); i++) {
      switch (plain.charAt(i)) {
        case '\u00A0', '\u2009', '\u202F', '\t', '\n', '\r' -> plain.setCharAt(i, ' ');
        case '\u2212' -> plain.setCharAt(i, '-');
        default -> {}
      }
    }
    return plain.toString();
  }

  private void next() {
    if (!tokens.isEmpty() && last().is(Kind.WORD) && last().is("of") && isNameAt(at)) {
      add(Kind.NAME, nameEnd(at));
    } else if (isNumberStart()) {
      add(Kind.NUMBER, numberEnd(at));
    } else if (isLetter(at)) {
      add(Kind.WORD, wordEnd(at));
    } else {
      sign();
    }
  }

  private void sign() {
    if (text.startsWith("+/-", at)) {
      add(Kind.PLUS_MINUS, at + 3);
    } else if (text.startsWith("+-", at)) {
      add(Kind.PLUS_MINUS, at + 2);
    } else if (text.startsWith("/-", at)) {
      add(Kind.SLASH_MINUS, at + 2);
    } else {
      Kind kind =
          switch (text.charAt(at)) {
            case '±' -> Kind.PLUS_MINUS;
            case '+' -> Kind.PLUS;
            case '-' -> Kind.MINUS;
            case '/' -> Kind.SLASH;
            case '(' -> Kind.OPEN;
            case ')' -> Kind.CLOSE;
            case '=' -> Kind.EQUALS;
            default -> Kind.MARK;
          };
      int one = Character.charCount(text.codePointAt(at));
      int length = text.startsWith("...", at) ? 3 : text.startsWith("..", at) ? 2 : one;
      add(kind, at + length);
    }
  }

  private boolean isNumberStart() {
    if (isDigit(at)) {
      return true;
    }
    boolean free = tokens.isEmpty() || last().to() < at || isSign(last());
    return free && (is(at, '.') || is(at, ',')) && isDigit(at + 1);
  }

  private static boolean isSign(Token token) {
    return switch (token.kind()) {
      case PLUS_MINUS, PLUS, MINUS, SLASH_MINUS -> true;
      default -> false;
    };
  }

  /** Takes slips such as {@code 10'000}, {@code 5.} and {@code 0x1F} in one piece. */
  private int numberEnd(int from) {
    if (is(from, '0') && (is(from + 1, 'x') || is(from + 1, 'X')) && isHex(from + 2)) {
      int end = from + 2;
      while (isHex(end)) {
        end++;
      }
      return end;
    }
    int end = groupsEnd(digitsEnd(from), from);
    end = separatedEnd(end);
    if (is(end, '.') && !is(end + 1, '.')) {
      end++;
    }
    return separatedEnd(exponentEnd(end));
  }

  /** Behind groups of three digits set off by one blank: {@code 10 000}. */
  private int groupsEnd(int end, int from) {
    if (end - from < 1 || end - from > 3) {
      return end;
    }
    int behind = end;
    while (is(behind, ' ') && digitsEnd(behind + 1) == behind + 4) {
      behind += 4;
    }
    return behind;
  }

  private int separatedEnd(int from) {
    int end = from;
    while (end < text.length() && ".,'_’".indexOf(text.charAt(end)) >= 0 && isDigit(end + 1)) {
      end = digitsEnd(end + 1);
    }
    return end;
  }

  private int exponentEnd(int from) {
    if (!is(from, 'e') && !is(from, 'E')) {
      return from;
    }
    int digits = is(from + 1, '+') || is(from + 1, '-') ? from + 2 : from + 1;
    return isDigit(digits) ? digitsEnd(digits) : from;
  }

  private int digitsEnd(int from) {
    int end = from;
    while (isDigit(end)) {
      end++;
    }
    return end;
  }

  private int wordEnd(int from) {
    int end = from + 1;
    while (isLetter(end)
        || isDigit(end)
        || (is(end, '/') || is(end, '-') || is(end, '.')) && isLetter(end + 1)) {
      end++;
    }
    return end;
  }

  private boolean isNameAt(int index) {
    return isLetter(index) || isDigit(index);
  }

  private int nameEnd(int from) {
    int end = from;
    while (isNameAt(end) || is(end, '-') || is(end, '_')) {
      end++;
    }
    return end;
  }

  private boolean isLetter(int index) {
    return index < text.length()
        && (Character.isLetter(text.charAt(index)) || UNIT_SIGNS.indexOf(text.charAt(index)) >= 0);
  }

  private boolean isDigit(int index) {
    return index < text.length() && text.charAt(index) >= '0' && text.charAt(index) <= '9';
  }

  private boolean isHex(int index) {
    return index < text.length() && Character.digit(text.charAt(index), 16) >= 0;
  }

  private boolean is(int index, char c) {
    return index < text.length() && text.charAt(index) == c;
  }

  private void skipBlanks() {
    while (is(at, ' ')) {
      at++;
    }
  }

  private Token last() {
    return tokens.get(tokens.size() - 1);
  }

  private void add(Kind kind, int end) {
    tokens.add(new Token(kind, at, end, text.substring(at, end)));
    at = end;
  }
}
