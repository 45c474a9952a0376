package dev.settlewell.syntax;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.fail;

import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Whatever the text is: no exception, no place outside, and damage stays where it was done. */
class SyntaxRobustnessTest {
  private static final String SHEET = sheet();

  private static String sheet() {
    try (InputStream in =
        SyntaxRobustnessTest.class.getResourceAsStream("cold-store.channels.yaml")) {
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new java.io.UncheckedIOException(e);
    }
  }

  /** A top-level entry of the whole sheet: what it reads as, and from where to where it goes. */
  private record Block(String key, int start, int end, String reading) {}

  private static final List<Block> BLOCKS = blocks();

  private static List<Block> blocks() {
    List<Node.Entry> entries = Syntax.parse(SourceText.of("s", SHEET)).root().entries();
    List<Block> blocks = new ArrayList<>();
    for (int i = 0; i < entries.size(); i++) {
      Node.Entry entry = entries.get(i);
      int start = entry.key().place().start();
      int end = i + 1 < entries.size() ? entries.get(i + 1).key().place().start() : SHEET.length();
      blocks.add(new Block(entry.key().text(), start, end, Shown.values(entry.value())));
    }
    return blocks;
  }

  @Test
  void theSheetItselfHasNoProblem() {
    assertThat(Syntax.parse(SourceText.of("s", SHEET)).problems()).isEmpty();
    assertThat(BLOCKS).extracting(Block::key).contains("channel-sheet", "channels", "firmware");
  }

  @Test
  void everyPrefixKeepsTheEntriesThatAreWhole() {
    for (int length = 0; length <= SHEET.length(); length++) {
      int cut = length;
      SyntaxTree tree = checked(SHEET.substring(0, length), "prefix of " + length);
      Map<String, String> read = readings(tree);
      for (Block block : BLOCKS) {
        if (block.end <= cut && !block.reading.equals(read.get(block.key))) {
          assertThat(read).as("prefix of %d", cut).containsEntry(block.key, block.reading);
        }
      }
    }
  }

  @Test
  void everyMissingLineCostsItsEntryOnly() {
    SourceText whole = SourceText.of("s", SHEET);
    for (int line = 0; line < whole.lineCount(); line++) {
      int from = whole.lineStart(line);
      int to = line + 1 < whole.lineCount() ? whole.lineStart(line + 1) : SHEET.length();
      unharmed(SHEET.substring(0, from) + SHEET.substring(to), from, to, "without line " + line);
    }
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "\"",
        "'",
        "[",
        "]",
        "{",
        "}",
        ":",
        ": ",
        "#",
        " #",
        "-",
        "- ",
        "\t",
        "|",
        "> ",
        "&",
        "*",
        "!",
        "%",
        "@",
        "`",
        ",",
        "?",
        "=",
        "x",
        "\n",
        "\n\n",
        " ",
        "<<<<<<< ",
        "\u2028",
        "\0",
        "😀"
      })
  void everyStrayCharacterCostsItsEntryOnly(String stray) {
    for (int at = 0; at <= SHEET.length(); at++) {
      boolean insidePair = at > 0 && Character.isHighSurrogate(SHEET.charAt(at - 1));
      if (!insidePair && at % STRIDE == stray.charAt(0) % STRIDE) {
        String damaged = SHEET.substring(0, at) + stray + SHEET.substring(at);
        unharmed(damaged, at, at, "with <" + stray + "> at " + at);
      }
    }
  }

  /** Every so many offsets; which ones differs from character to character. */
  private static final int STRIDE = Integer.getInteger("stride", 11);

  /** All entries but the damaged one; where a key's own line is damaged also the one before it. */
  private static void unharmed(String damaged, int from, int to, String what) {
    Map<String, String> read = readings(checked(damaged, what));
    for (int i = 0; i < BLOCKS.size(); i++) {
      Block block = BLOCKS.get(i);
      boolean hit = block.start <= to && from <= block.end;
      int keyLineEnd =
          i + 1 < BLOCKS.size() ? SHEET.indexOf('\n', BLOCKS.get(i + 1).start) + 1 : -1;
      boolean nextKeyHit = i + 1 < BLOCKS.size() && from < keyLineEnd && to >= block.end;
      if (!hit && !nextKeyHit && !block.reading.equals(read.get(block.key))) {
        assertThat(read.get(block.key)).as("%s: %s", what, block.key).isEqualTo(block.reading);
      }
    }
  }

  private static Map<String, String> readings(SyntaxTree tree) {
    Map<String, String> read = new LinkedHashMap<>();
    for (Node.Entry entry : tree.root().entries()) {
      read.putIfAbsent(entry.key().text(), Shown.values(entry.value()));
    }
    return read;
  }

  /** Reads it and holds every place to the text. */
  static SyntaxTree checked(String written, String what) {
    SourceText text = SourceText.of("s", written);
    try {
      SyntaxTree tree = Syntax.parse(text);
      inside(tree.root(), text);
      for (Problem problem : tree.problems()) {
        inside(problem.place(), text);
        held(!problem.message().isBlank(), problem);
        for (Fix fix : problem.fixes()) {
          fix.edits().stream().map(Edit::place).forEach(place -> inside(place, text));
          apart(fix.edits());
        }
      }
      tree.comments().forEach(comment -> inside(comment.place(), text));
      return tree;
    } catch (RuntimeException | Error e) {
      return fail(what + ": " + written.substring(0, Math.min(written.length(), 200)), e);
    }
  }

  private static void apart(List<Edit> edits) {
    for (int i = 1; i < edits.size(); i++) {
      assertThat(edits.get(i - 1).place().end()).isLessThanOrEqualTo(edits.get(i).place().start());
    }
  }

  private static void inside(Node node, SourceText text) {
    inside(node.place(), text);
    if (node instanceof Node.Mapping mapping) {
      for (Node.Entry entry : mapping.entries()) {
        inside(entry.key(), text);
        inside(entry.value(), text);
        held(mapping.place().span().contains(entry.place().span()), entry);
      }
    } else if (node instanceof Node.Sequence list) {
      for (Node item : list.items()) {
        inside(item, text);
        held(list.place().span().contains(item.place().span()), item);
      }
    } else if (node instanceof Node.Scalar scalar && scalar.exact()) {
      int start = scalar.place().start() + scalar.inset();
      held(start + scalar.text().length() == scalar.place().end() - scalar.inset(), scalar);
    }
  }

  /** Asked millions of times: too often for an assertion library. */
  private static void held(boolean holds, Object what) {
    if (!holds) {
      fail("the place does not fit: " + what);
    }
  }

  private static void inside(Place place, SourceText text) {
    if (place.end() > text.length()) {
      fail("outside the text: " + place);
    }
  }

  @Test
  void lineBreaksDoNotMatter() {
    List<String> texts = new ArrayList<>(List.of(SHEET));
    for (int cut = 50; cut < SHEET.length(); cut += 97) {
      texts.add(SHEET.substring(0, cut) + "\"" + SHEET.substring(cut));
    }
    for (String lf : texts) {
      SyntaxTree one = Syntax.parse(SourceText.of("s", lf));
      SourceText crlf = SourceText.of("s", lf.replace("\n", "\r\n"));
      SyntaxTree other = Syntax.parse(crlf);
      assertThat(Shown.values(other.root())).isEqualTo(Shown.values(one.root()));
      assertThat(Shown.places(crlf, other.root()).replace("\r\n", "\n"))
          .isEqualTo(Shown.places(one.text(), one.root()));
      assertThat(other.problems())
          .extracting(Problem::message)
          .isEqualTo(one.problems().stream().map(Problem::message).toList());
      assertThat(other.comments()).hasSameSizeAs(one.comments());
    }
  }

  @Test
  void anythingAtAllIsRead() {
    String[] pieces = {
      "a",
      "b:",
      ": ",
      ":",
      "- ",
      "-",
      "\n",
      "\n",
      "\n  ",
      "\n    ",
      "\r\n",
      "\t",
      " ",
      "\"",
      "'",
      "[",
      "]",
      "{",
      "}",
      ",",
      "#",
      " #",
      "|",
      ">",
      "&a",
      "*a",
      "!",
      "?",
      "? ",
      "%",
      "@",
      "<<: ",
      "---\n",
      "...\n",
      "\\",
      "about: ",
      "path:",
      "4,7",
      "kΩ",
      "\u2028",
      "\u0085",
      "\0",
      "\uFEFF",
      "\uD83D",
      "\uDE00",
      "😀",
      "\u00A0",
      "<<<<<<< x\n",
      "=======\n",
      ">>>>>>> x\n",
      "\r"
    };
    for (int seed = 0; seed < 6000; seed++) {
      Random random = new Random(seed);
      StringBuilder text = new StringBuilder();
      int length = random.nextInt(40);
      for (int i = 0; i < length; i++) {
        text.append(pieces[random.nextInt(pieces.length)]);
      }
      SyntaxTree tree = checked(text.toString(), "seed " + seed);
      for (int at = 0; at <= text.length(); at++) {
        inside(Cursor.at(tree, at), tree.text(), "seed");
      }
    }
  }

  @Test
  void anyCharactersAreRead() {
    for (int seed = 0; seed < 2000; seed++) {
      Random random = new Random(seed);
      char[] chars = new char[random.nextInt(60)];
      for (int i = 0; i < chars.length; i++) {
        chars[i] = (char) (random.nextInt(3) == 0 ? random.nextInt(0x10000) : random.nextInt(0x80));
      }
      checked(new String(chars), "seed " + seed);
    }
  }

  @Test
  void theCursorIsSomewhereAtEveryOffset() {
    SyntaxTree tree = Syntax.parse(SourceText.of("s", SHEET));
    for (int at = 0; at <= SHEET.length(); at++) {
      Cursor cursor = Cursor.at(tree, at);
      inside(cursor, tree.text(), "at " + at);
      assertThat(cursor).as("at %d", at).isNotInstanceOf(Cursor.Nowhere.class);
    }
  }

  private static void inside(Cursor cursor, SourceText text, String what) {
    int end = 0;
    if (cursor instanceof Cursor.NewKey key) {
      end = Math.max(key.word().end(), key.lead().end());
    } else if (cursor instanceof Cursor.OnValue value) {
      end = value.span().end();
    } else if (cursor instanceof Cursor.InItem item) {
      end = item.span().end();
    }
    held(end <= text.length(), cursor + " " + what);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {"[", "{", "{a: ", "- ", "[[{a: [", "\"", "a: ", "- a:\n", "? ", "&a [", "!a "})
  void deepAndLongTextsEnd(String piece) {
    long start = System.nanoTime();
    checked("a: " + piece.repeat(30_000), "long");
    checked(piece.repeat(30_000), "long");
    StringBuilder stairs = new StringBuilder();
    for (int i = 0; i < 400; i++) {
      stairs.append(" ".repeat(i)).append("k:\n");
    }
    assertThat(checked(stairs.toString(), "stairs").problems()).isNotEmpty();
    System.out.printf("%s: %d ms%n", piece.strip(), (System.nanoTime() - start) / 1_000_000);
  }

  @Test
  void aliasesThatMultiplyAreBounded() {
    StringBuilder bomb = new StringBuilder("a0: &a0 [x, x, x, x, x, x, x, x, x, x]\n");
    for (int i = 1; i < 12; i++) {
      bomb.append("a").append(i).append(": &a").append(i).append(" [");
      bomb.append(("*a" + (i - 1) + ", ").repeat(10)).append("x]\n");
    }
    SyntaxTree tree = checked(bomb + "z: 1\n", "bomb");
    assertThat(tree.problems()).isNotEmpty();
    assertThat(readings(tree)).containsEntry("z", "1");
  }

  @Test
  void manyBrokenLinesEnd() {
    String[] bad = {
      "k: \"\\q\"\n", "k: [a: b: c, {]\n", "\"k\n", "k: @x: y\n", "k: {a}: b\n", "%x\n", "k: & x\n"
    };
    StringBuilder text = new StringBuilder();
    for (int i = 0; i < 3000; i++) {
      text.append(bad[i % bad.length]).append("good").append(i).append(": 1\n");
    }
    long start = System.nanoTime();
    SyntaxTree tree = checked(text.toString(), "many");
    System.out.printf(
        "6000 lines, half of them broken: %d ms%n", (System.nanoTime() - start) / 1_000_000);
    assertThat(readings(tree)).containsEntry("good0", "1");
  }

  @Test
  void aTextThatIsNoSheetIsNotRead() {
    SyntaxTree tree = checked("a: 1\n".repeat(700_000), "long");
    assertThat(tree.problems()).hasSize(1);
    assertThat(tree.root().entries()).isEmpty();
  }
}
