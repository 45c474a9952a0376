package dev.settlewell.text;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.fail;

import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/**
 * Offsets against lines and columns, in the three encodings of the language server protocol (3.17,
 * "Text Documents" and "PositionEncodingKind"), by an oracle that walks through the characters and
 * asks the platform for their bytes.
 */
class SourceTextTest {
  private static final List<String> PIECES =
      List.of(
          "a",
          "Ω",
          "µ",
          "漢",
          "\uD83D\uDE00",
          "\uD834\uDD1E",
          "\n",
          "\r\n",
          "\r",
          "\n\r",
          " ",
          "\t",
          "\u0085",
          "\u2028",
          "\u2029",
          "\uFEFF",
          "é",
          "e\u0301",
          "key: 1 V",
          "");

  @ParameterizedTest
  @EnumSource(PositionEncoding.class)
  void agreesWithTheOracleAtEveryCharacter(PositionEncoding encoding) {
    for (int seed = 0; seed < 2_000; seed++) {
      String content = anyText(new Random(seed));
      SourceText text = SourceText.of("a", content);
      for (int offset = 0; offset <= content.length(); offset++) {
        if (isInside(content, offset)) {
          continue;
        }
        Position expected = oracle(content, offset, encoding);
        Position actual = text.position(offset, encoding);
        if (!actual.equals(expected)) {
          fail("seed %d, offset %d: %s, not %s", seed, offset, actual, expected);
        }
        if (text.offset(actual, encoding) != offset && !isInBreak(content, offset)) {
          fail("seed %d: %s is not offset %d", seed, actual, offset);
        }
      }
    }
  }

  private static String anyText(Random random) {
    StringBuilder text = new StringBuilder();
    int pieces = random.nextInt(12);
    for (int i = 0; i < pieces; i++) {
      text.append(PIECES.get(random.nextInt(PIECES.size())));
    }
    return text.toString();
  }

  private static boolean isInside(String content, int offset) {
    return 0 < offset
        && offset < content.length()
        && Character.isSurrogatePair(content.charAt(offset - 1), content.charAt(offset));
  }

  /** Between CR and LF: no line holds that place but the one before the break. */
  private static boolean isInBreak(String content, int offset) {
    return offset > 0 && content.startsWith("\r\n", offset - 1);
  }

  /** Line and column by walking from the text's start. */
  private static Position oracle(String content, int offset, PositionEncoding encoding) {
    int line = 0;
    int column = 0;
    int at = 0;
    while (at < offset) {
      if (content.startsWith("\r\n", at) && at + 2 <= offset) {
        line++;
        column = 0;
        at += 2;
        continue;
      }
      int codePoint = content.codePointAt(at);
      boolean ends = codePoint == '\n' || codePoint == '\r' && !content.startsWith("\r\n", at);
      line += ends ? 1 : 0;
      column = ends ? 0 : column + width(new String(Character.toChars(codePoint)), encoding);
      at += Character.charCount(codePoint);
    }
    return new Position(line, column);
  }

  private static int width(String character, PositionEncoding encoding) {
    return switch (encoding) {
      case UTF_8 -> character.getBytes(StandardCharsets.UTF_8).length;
      case UTF_16 -> character.getBytes(StandardCharsets.UTF_16BE).length / 2;
      case UTF_32 -> character.getBytes(java.nio.charset.Charset.forName("UTF-32BE")).length / 4;
    };
  }

  @Test
  void everyKindOfLineBreakCounts() {
    SourceText text = SourceText.of("a", "one\r\ntwo\rthree\nfour\u2028still\u0085four");
    List<String> lines = new ArrayList<>();
    for (int line = 0; line < text.lineCount(); line++) {
      lines.add(text.slice(text.line(line)));
    }
    assertThat(lines).containsExactly("one", "two", "three", "four\u2028still\u0085four");
    assertThat(text.lineStart(1)).isEqualTo(5);
    assertThat(text.lineBreak()).isEqualTo("\r\n");
    assertThat(SourceText.of("a", "x\ry").lineBreak()).isEqualTo("\r");
    assertThat(SourceText.of("a", "x").lineBreak()).isEqualTo("\n");
  }

  @Test
  void emptyTextHasOneEmptyLine() {
    SourceText text = SourceText.of("a", "");
    assertThat(text.lineCount()).isEqualTo(1);
    assertThat(text.line(0)).isEqualTo(new Span(0, 0));
    assertThat(text.offset(new Position(5, 5), PositionEncoding.UTF_8)).isZero();
  }

  @Test
  void lastLineAfterABreakIsEmpty() {
    SourceText text = SourceText.of("a", "x\r\n");
    assertThat(text.lineCount()).isEqualTo(2);
    assertThat(text.line(1)).isEqualTo(new Span(3, 3));
    assertThat(text.position(3, PositionEncoding.UTF_16)).isEqualTo(new Position(1, 0));
  }

  /** The protocol: a column past the line's end is the line's end. */
  @ParameterizedTest
  @CsvSource({"0, 99, 2", "1, 99, 6", "2, 99, 7", "99, 0, 7", "-1, 5, 0", "0, -3, 0"})
  void clamps(int line, int column, int offset) {
    SourceText text = SourceText.of("a", "ab\r\ncd\n");
    for (PositionEncoding encoding : PositionEncoding.values()) {
      assertThat(text.offset(new Position(line, column), encoding)).isEqualTo(offset);
    }
  }

  @Test
  void offsetsOutsideAreTheNearestEnd() {
    SourceText text = SourceText.of("a", "ab\ncd");
    assertThat(text.position(-7, PositionEncoding.UTF_16)).isEqualTo(new Position(0, 0));
    assertThat(text.position(77, PositionEncoding.UTF_16)).isEqualTo(new Position(1, 2));
    assertThat(text.lineAt(-1)).isZero();
    assertThat(text.lineAt(77)).isEqualTo(1);
  }

  /** U+1F600 is four bytes, two UTF-16 units, one code point. */
  @Test
  void columnInsideACharacterIsItsStart() {
    SourceText text = SourceText.of("a", "x\uD83D\uDE00y");
    assertThat(text.offset(new Position(0, 2), PositionEncoding.UTF_16)).isEqualTo(1);
    for (int inside = 2; inside < 5; inside++) {
      assertThat(text.offset(new Position(0, inside), PositionEncoding.UTF_8)).isEqualTo(1);
    }
    assertThat(text.offset(new Position(0, 5), PositionEncoding.UTF_8)).isEqualTo(3);
    assertThat(text.offset(new Position(0, 2), PositionEncoding.UTF_32)).isEqualTo(3);
  }

  /** An offset between two surrogates is no place of its own in code points or bytes. */
  @Test
  void offsetInsideACharacterIsItsStart() {
    SourceText text = SourceText.of("a", "x\uD83D\uDE00y");
    assertThat(text.position(2, PositionEncoding.UTF_32)).isEqualTo(new Position(0, 1));
    assertThat(text.position(2, PositionEncoding.UTF_8)).isEqualTo(new Position(0, 1));
    assertThat(text.position(2, PositionEncoding.UTF_16)).isEqualTo(new Position(0, 2));
  }

  @Test
  void loneSurrogatesAreCountedAndKept() {
    SourceText text = SourceText.of("a", "\uDE00x\uD83D");
    for (PositionEncoding encoding : PositionEncoding.values()) {
      for (int offset = 0; offset <= 3; offset++) {
        assertThat(text.offset(text.position(offset, encoding), encoding)).isEqualTo(offset);
      }
    }
  }

  @Test
  void manyLinesAreFoundByTheirOffset() {
    SourceText text = SourceText.of("a", "ab\n".repeat(10_000));
    assertThat(text.lineCount()).isEqualTo(10_001);
    for (int line = 0; line < 10_000; line += 97) {
      assertThat(text.lineAt(3 * line)).isEqualTo(line);
      assertThat(text.lineAt(3 * line + 2)).isEqualTo(line);
    }
  }

  @Test
  void spansKnowWhatTheyHold() {
    Span span = new Span(2, 5);
    assertThat(span.length()).isEqualTo(3);
    assertThat(span.touches(5)).isTrue();
    assertThat(span.touches(6)).isFalse();
    assertThat(span.contains(new Span(2, 5))).isTrue();
    assertThat(span.overlaps(new Span(5, 6))).isFalse();
    assertThat(span.sub(1, 2)).isEqualTo(new Span(3, 4));
    assertThat(span.shifted(-2)).isEqualTo(new Span(0, 3));
  }
}
