package dev.settlewell.lsp;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.text.Edit;
import dev.settlewell.text.PositionEncoding;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.eclipse.lsp4j.Position;
import org.eclipse.lsp4j.Range;
import org.eclipse.lsp4j.TextDocumentContentChangeEvent;
import org.eclipse.lsp4j.TextEdit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/**
 * Edits in all three encodings against an oracle that counts by encoding the line with the JDK and
 * taking the number of units: nothing in common with the code but the protocol's words.
 */
class ChangesTest {
  private static final String[] PIECES = {
    "a", "key: ", "Ω", "µ", "±", "é", "漢", "😀", "𝄞", "\uFEFF", "\n", "\r\n", "\r", "\u2028", " "
  };

  private static String randomText(Random random, int most) {
    StringBuilder text = new StringBuilder();
    for (int i = random.nextInt(most + 1); i > 0; i--) {
      text.append(PIECES[random.nextInt(PIECES.length)]);
    }
    return text.toString();
  }

  /** Bytes a unit takes in the encoding that counts them. */
  private static int units(String text, PositionEncoding encoding) {
    return switch (encoding) {
      case UTF_8 -> text.getBytes(StandardCharsets.UTF_8).length;
      case UTF_16 -> text.getBytes(StandardCharsets.UTF_16BE).length / 2;
      case UTF_32 -> text.getBytes(Charset.forName("UTF-32BE")).length / 4;
    };
  }

  /** A line break is CRLF, LF or CR, and nothing else. */
  private static Position oracle(String text, int offset, PositionEncoding encoding) {
    String[] lines = text.substring(0, offset).split("\r\n|\n|\r", -1);
    return new Position(lines.length - 1, units(lines[lines.length - 1], encoding));
  }

  /** Not inside a pair of surrogates, nor between CR and LF, where no position can be. */
  private static int randomOffset(Random random, String text) {
    int offset = random.nextInt(text.length() + 1);
    boolean inside =
        offset > 0
            && offset < text.length()
            && (Character.isLowSurrogate(text.charAt(offset))
                || text.charAt(offset) == '\n' && text.charAt(offset - 1) == '\r');
    return inside ? offset - 1 : offset;
  }

  @ParameterizedTest
  @EnumSource(PositionEncoding.class)
  void sequencesOfEditsGiveTheTextOfTheOracle(PositionEncoding encoding) {
    for (long seed = 1; seed <= 2000; seed++) {
      Random random = new Random(seed);
      String expected = randomText(random, 30);
      SourceText text = SourceText.of("x", expected);
      List<TextDocumentContentChangeEvent> changes = new ArrayList<>();
      for (int i = 0; i < 4; i++) {
        int a = randomOffset(random, expected);
        int b = randomOffset(random, expected);
        int start = Math.min(a, b);
        int end = Math.max(a, b);
        String replacement = randomText(random, 4);
        Range range = new Range(oracle(expected, start, encoding), oracle(expected, end, encoding));
        changes.add(new TextDocumentContentChangeEvent(range, replacement));
        expected = expected.substring(0, start) + replacement + expected.substring(end);
      }
      Optional<SourceText> changed = Changes.apply(Optional.of(text), "x", changes, encoding);
      assertThat(changed.orElseThrow().content()).as("seed %d", seed).isEqualTo(expected);
    }
  }

  /** What we send is where the oracle would put it: the file a client gets is the one we meant. */
  @ParameterizedTest
  @EnumSource(PositionEncoding.class)
  void editsWeSendStandWhereTheyShould(PositionEncoding encoding) {
    for (long seed = 1; seed <= 2000; seed++) {
      Random random = new Random(seed);
      String content = randomText(random, 30);
      int a = randomOffset(random, content);
      int b = randomOffset(random, content);
      SourceText text = SourceText.of("x", content);
      Span span = new Span(Math.min(a, b), Math.max(a, b));
      TextEdit edit = new Ranges(encoding).edit(text, new Edit(text.place(span), "!"));
      assertThat(edit.getRange().getStart())
          .as("seed %d", seed)
          .isEqualTo(oracle(content, span.start(), encoding));
      assertThat(edit.getRange().getEnd())
          .as("seed %d", seed)
          .isEqualTo(oracle(content, span.end(), encoding));
    }
  }

  @Test
  void editsOutsideTheTextAreRefused() {
    List<Range> outside =
        List.of(
            new Range(new Position(2, 0), new Position(2, 0)),
            new Range(new Position(1, 0), new Position(0, 0)),
            new Range(new Position(0, 1), new Position(0, 0)),
            new Range(new Position(-1, 0), new Position(0, 0)),
            new Range(new Position(0, -1), new Position(0, 0)));
    for (Range range : outside) {
      assertThat(
              Changes.apply(
                  Optional.of(SourceText.of("x", "a\nb")),
                  "x",
                  List.of(new TextDocumentContentChangeEvent(range, "!")),
                  PositionEncoding.UTF_16))
          .as("%s", range)
          .isEmpty();
    }
  }
}
