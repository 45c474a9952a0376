package dev.settlewell.syntax;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The cursor is the ^ in the text; ~ is a line's end. */
class CursorTest {

  @ParameterizedTest
  @CsvSource(
      delimiter = '¦',
      quoteCharacter = '`',
      value = {
        // In what the tree has.
        "a: 1~b^c: 2                        ¦ key /bc",
        "^a: 1                              ¦ key /a",
        "a^: 1                              ¦ key /a",
        "a:^                                ¦ value /a ‹›",
        "a: ^                               ¦ value /a ‹›",
        "a: ^~b: 1                          ¦ value /a ‹›",
        "a: ^  # c~b: 1                     ¦ value /a ‹›",
        "a: 2^4 cycles                      ¦ value /a ‹24 cycles›",
        "a: ^24                             ¦ value /a ‹24›",
        "a: 24 ^                            ¦ value /a ‹24 ›",
        "a: \"x^                            ¦ value /a ‹\"x›",
        "a: ^@x                               ¦ value /a ‹@x›",
        "a:^~  b: 1                         ¦ value /a ‹›",
        "a:~  b: 1~  c: ^                   ¦ value /a/c ‹›",
        "a: x # c^omment                    ¦ comment",
        "a: x # comment^                    ¦ comment",
        "a: x ^# comment                    ¦ value /a ‹x ›",
        // In braces and brackets.
        "a: {^}                             ¦ new key /a ‹› in braces",
        "a: {^                              ¦ new key /a ‹› in braces",
        "a: {b^}                            ¦ new key /a ‹b› in braces",
        "a: {b^: 1}                         ¦ key /a/b",
        "a: {b: 1, ^}                       ¦ new key /a ‹› in braces",
        "a: {b: 1, c^                       ¦ new key /a ‹c› in braces",
        "a: {b: ^}                          ¦ value /a/b ‹›",
        "a: {b: ^, c: 2}                    ¦ value /a/b ‹›",
        "a: {b: x^y, c: 2}                  ¦ value /a/b ‹xy›",
        "a: {b: {c: ^}, d: 1}               ¦ value /a/b/c ‹›",
        "a: {b: 1}^                         ¦ value /a ‹{b: 1}›",
        "a: [^]                             ¦ item /a/0 ‹› in brackets",
        "a: [x, ^]                          ¦ item /a/1 ‹› in brackets",
        "a: [x, ^                           ¦ item /a/1 ‹› in brackets",
        "a: [x, y^z]                        ¦ item /a/1 ‹yz› in brackets",
        "a: [^, y]                          ¦ item /a/0 ‹› in brackets",
        "a: [x ^, y]                        ¦ item /a/0 ‹x › in brackets",
        // Lists.
        "p:~  - ^                           ¦ item /p/0 ‹› at 2",
        "p:~  -^                            ¦ item /p/0 ‹› at 2",
        "p:~  - r: 1~  - am^                ¦ item /p/1 ‹am› at 2",
        "p:~  - r: 1~  ^                    ¦ item /p/1 ‹› at 2 without dash",
        "p:~  - r: 1~  ^~  - s: 1           ¦ item /p/1 ‹› at 2 without dash",
        "p:~  - r^: 1                       ¦ key /p/0/r",
        "p:~  - r: ^                        ¦ value /p/0/r ‹›",
        "p:~  - r:~      ^                  ¦ new key /p/0/r ‹› at 6",
        "p:~  - r:~      g: 1~      ^       ¦ new key /p/0/r ‹› at 6",
        "p:~  - f: 1~    ^                  ¦ new key /p/0 ‹› at 4",
        "p:~  - r: 1~  -^                   ¦ item /p/1 ‹› at 2",
        // New keys, by the column.
        "^                                  ¦ new key  ‹› at 0",
        "a^                                 ¦ new key  ‹a› at 0",
        "a: 1~^                             ¦ new key  ‹› at 0",
        "a: 1~be^                           ¦ new key  ‹be› at 0",
        "a: 1~be^~c: 1                      ¦ new key  ‹be› at 0",
        "a:~  ^                             ¦ new key /a ‹› at 2",
        "a:~    ^                           ¦ new key /a ‹› at 4",
        "a:~  be^                           ¦ new key /a ‹be› at 2",
        "a:~^                               ¦ new key  ‹› at 0",
        "a:~  b: 1~  ^                      ¦ new key /a ‹› at 2",
        "a:~  b: 1~^                        ¦ new key  ‹› at 0",
        "a:~  b: 1~^~  c: 2                 ¦ new key /a ‹› at 2",
        "a:~^~  c: 2                        ¦ new key /a ‹› at 2",
        "a:~  b:~    c: 1~  d^              ¦ new key /a ‹d› at 2",
        "a:~  b:~    c: 1~  d^~e: 1         ¦ new key /a ‹d› at 2",
        "a:~  b:~    c: 1~    ^~  d: 1      ¦ new key /a/b ‹› at 4",
        "a:~  b:~    c: 1~  ^~  d: 1        ¦ new key /a ‹› at 2",
        "a:~  b: {c: 1}~  ^                 ¦ new key /a ‹› at 2",
        // At a wrong column.
        "a:~  b: 1~    c^                   ¦ new key /a ‹c› at 2",
        "a:~  b: 1~     ^                   ¦ new key /a ‹› at 2",
        "a:~    b: 1~   c^                  ¦ new key /a ‹c› at 4",
        "a:~  b: 1~ c^                      ¦ new key /a ‹c› at 2",
        "a:~  b: 1~   c^~  d: 2             ¦ new key /a ‹c› at 2",
        // In what cannot be read.
        "a: 1~b = ^                         ¦ nowhere",
      })
  void tellsWhereTheCursorStands(String marked, String expected) {
    String plain = marked.strip();
    for (String lineBreak : new String[] {"\n", "\r\n"}) {
      for (String lead : new String[] {"", "\uFEFF"}) {
        String written = lead + plain.replace("~", lineBreak);
        int offset = written.indexOf('^');
        SourceText text = SourceText.of("s", written.replace("^", ""));
        Cursor cursor = Cursor.at(Syntax.parse(text), offset);
        assertThat(shown(text, cursor)).isEqualTo(expected.stripTrailing());
      }
    }
  }

  @Test
  void aWrongIndentationIsInTheLead() {
    SourceText text = SourceText.of("s", "a:\n  b: 1\n     c");
    Cursor.NewKey key = (Cursor.NewKey) Cursor.at(Syntax.parse(text), text.length());
    assertThat(key.lead()).isEqualTo(new Span(10, 15));
    assertThat(key.mapping().orElseThrow().entries()).hasSize(1);
  }

  @Test
  void pointersEscape() {
    // RFC 6901, section 5.
    assertThat(Cursor.pointer(List.of("a/b", "m~n"))).isEqualTo("/a~1b/m~0n");
  }

  private static String shown(SourceText text, Cursor cursor) {
    String at = Cursor.pointer(cursor.path());
    if (cursor instanceof Cursor.OnKey) {
      return "key " + at;
    } else if (cursor instanceof Cursor.OnValue value) {
      return "value " + at + " ‹" + text.slice(value.span()) + "›";
    } else if (cursor instanceof Cursor.InItem item) {
      String where = item.flow() ? " in brackets" : " at " + item.indent();
      return "item "
          + at
          + " ‹"
          + text.slice(item.span())
          + "›"
          + where
          + (item.dashed() ? "" : " without dash");
    } else if (cursor instanceof Cursor.NewKey key) {
      String where = key.flow() ? " in braces" : " at " + key.indent();
      return "new key " + at + " ‹" + text.slice(key.word()) + "›" + where;
    }
    return cursor instanceof Cursor.InComment ? "comment" : "nowhere";
  }
}
