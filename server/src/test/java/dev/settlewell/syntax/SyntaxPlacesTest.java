package dev.settlewell.syntax;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.text.SourceText;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What well-formed text gives, and that every piece knows the stretch it was read from. */
class SyntaxPlacesTest {

  @ParameterizedTest
  @CsvSource(
      delimiter = '¦',
      quoteCharacter = '`',
      value = {
        "a: 1                 ¦ {a‹a›: 1‹1›}‹a: 1›",
        "a: \"x y\"  # c      ¦ {a‹a›: x y‹\"x y\"›}‹a: \"x y\"›",
        "a: 'it''s'           ¦ {a‹a›: it's‹'it''s'›}‹a: 'it''s'›",
        "a:                   ¦ {a‹a›: ?‹›}‹a:›",
        "a: [1, 2 V ]         ¦ {a‹a›: [1‹1›, 2 V‹2 V›]‹[1, 2 V ]›}‹a: [1, 2 V ]›",
        "a: {b: 😀, c: x}     ¦ {a‹a›: {b‹b›: 😀‹😀›, c‹c›: x‹x›}‹{b: 😀, c: x}›}‹a: {b: 😀, c:"
            + " x}›",
        "a: {}                ¦ {a‹a›: {}‹{}›}‹a: {}›",
        "a: &p x~b: *p        ¦ {a‹a›: x‹x›, b‹b›: x‹*p›}‹a: &p x~b: *p›",
        "a: &p~  c: x~b: *p   ¦ {a‹a›: {c‹c›: x‹x›}‹c: x›, b‹b›: {c‹*p›: x‹*p›}‹*p›}‹a: &p~  c:"
            + " x~b: *p›",
        "a:~  b: x~# c~~z: 1  ¦ {a‹a›: {b‹b›: x‹x›}‹b: x›, z‹z›: 1‹1›}‹a:~  b: x~# c~~z: 1›",
        "a:~- x~-~  # c~b: 1  ¦ {a‹a›: [x‹x›, ?‹›]‹- x~-›, b‹b›: 1‹1›}‹a:~- x~-~  # c~b: 1›",
        "a: |~  x~  y~~b: 1   ¦ {a‹a›: x~y~‹|~  x~  y›, b‹b›: 1‹1›}‹a: |~  x~  y~~b: 1›",
        "a: x~  y~b: 1        ¦ {a‹a›: x y‹x~  y›, b‹b›: 1‹1›}‹a: x~  y~b: 1›",
      })
  void everyPieceHasItsStretch(String written, String expected) {
    String lf = written.strip().replace('~', '\n');
    for (String prefix : new String[] {"", "\uFEFF", "# 😀\n"}) {
      SourceText text = SourceText.of("s", prefix + lf);
      SyntaxTree tree = Syntax.parse(text);
      assertThat(Shown.places(text, tree.root()).replace('\n', '~')).isEqualTo(expected.strip());
      assertThat(tree.problems()).isEmpty();
    }
    SourceText crlf = SourceText.of("s", lf.replace("\n", "\r\n"));
    assertThat(
            Shown.places(crlf, Syntax.parse(crlf).root()).replace("\r\n", "~").replace('\n', '~'))
        .isEqualTo(expected.strip());
  }
}
