package dev.settlewell.syntax;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.text.Edit;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import org.yaml.snakeyaml.LoaderOptions;
import org.yaml.snakeyaml.Yaml;
import org.yaml.snakeyaml.constructor.SafeConstructor;

/**
 * What people write that is no YAML, or not the YAML they mean. Each row: the text, with the place
 * of the problem between ⟦ and ⟧ (~ is a line's end); the tree that is read all the same (? nothing
 * there, ! not readable); a part of the message; and the text after the first fix.
 */
class SyntaxSlipsTest {

  static Stream<Arguments> slips() {
    return Stream.of(
        // Half-typed.
        slip("a: 1~⟦pi⟧~b: 2", "{a: 1, b: 2}", "`pi` has no colon", "a: 1~pi:~b: 2"),
        slip("a:~  ⟦pi⟧~  b: 2", "{a: {b: 2}}", "`pi` has no colon", "a:~  pi:~  b: 2"),
        slip("⟦a⟧~  b: 2~c: 3", "{a: {b: 2}, c: 3}", "colon is missing", "a:~  b: 2~c: 3"),
        slip("a:~  ⟦b⟧~    c: 2", "{a: {b: {c: 2}}}", "colon is missing", "a:~  b:~    c: 2"),
        slip("⟦a:1⟧~b: 2", "{a: 1, b: 2}", "blank is missing", "a: 1~b: 2"),
        slip("p:~- ⟦r:1 kΩ⟧~- c: 2", "{p: [{r: 1 kΩ}, {c: 2}]}", "blank", "p:~- r: 1 kΩ~- c: 2"),
        slip("p:~⟦-⟧r: 1~- c: 2", "{p: [{r: 1}, {c: 2}]}", "dash", "p:~- r: 1~- c: 2"),
        slip("a: {⟦b:1⟧, c: 2}", "{a: {b: 1, c: 2}}", "blank", "a: {b: 1, c: 2}"),
        slip("h: {⟦2:1 mV⟧, ⟦3:2 mV⟧}", "{h: {2: 1 mV, 3: 2 mV}}", "blank", "h: {2: 1 mV, 3:2 mV}"),
        slip("a: ⟦\"x⟧~b: \"y\"", "{a: x, b: y}", "quote is not closed", "a: \"x\"~b: \"y\""),
        slip("a: [x, ⟦'y⟧]~b: 1", "{a: [x, y], b: 1}", "quote is not closed", "a: [x, 'y']~b: 1"),
        slip("a: ⟦[⟧1, 2 # c~b: 1", "{a: [1, 2], b: 1}", "not closed", "a: [1, 2] # c~b: 1"),
        slip("a: {b: ⟦[⟧1~c: 1", "{a: {b: [1]}, c: 1}", "not closed", "a: {b: [1]}~c: 1"),
        slip("a: [1⟦}⟧~c: 1", "{a: [1], c: 1}", "closed by `]`", "a: [1]~c: 1"),
        slip("a: 1~⟦-⟧~b: 2", "{a: 1, b: 2}", "list item", null),
        slip("a: 1~⟦- x: 1⟧~  y: 2~b: 2", "{a: 1, b: 2}", "list item", null),
        slip("a: ⟦-⟧~b: 2", "{a: !, b: 2}", "list", null),
        slip("a: ⟦3: 4⟧~b: 2", "{a: !, b: 2}", "second colon", "a: \"3: 4\"~b: 2"),
        slip("s: ⟦t⟧: {r: 1}~b: 2", "{s: {t: {r: 1}}, b: 2}", "second key", "s:~  t: {r: 1}~b: 2"),
        slip("s: ⟦t⟧:~  r: 1~b: 2", "{s: {t: {r: 1}}, b: 2}", "second key", null),
        slip("a: {b: ⟦c: d⟧, e: 1}", "{a: {b: !, e: 1}}", "second colon", null),
        slip("⟦: 1⟧~b: 2", "{b: 2}", "key is missing", null),
        slip("⟦a = 1⟧~b: 2", "{b: 2}", "colon", "a: 1~b: 2"),
        slip("a: \"x\" ⟦y⟧ # c~b: 2", "{a: x, b: 2}", "closing \"", "a: \"x\" # c~b: 2"),
        slip("a: [1]⟦]⟧~b: 2", "{a: [1], b: 2}", "closing ]", "a: [1]~b: 2"),
        slip("a: ⟦@x⟧~b: 2", "{a: !, b: 2}", "cannot begin", "a: \"@x\"~b: 2"),
        slip("a: ⟦*x*⟧~b: 2", "{a: !, b: 2}", "cannot begin", "a: \"*x*\"~b: 2"),
        slip("a: ⟦> 5 V⟧~b: 2", "{a: !, b: 2}", "cannot begin", "a: \"> 5 V\"~b: 2"),
        slip("a: {b: ⟦@x⟧, c: 1}", "{a: {b: !, c: 1}}", "cannot begin", "a: {b: \"@x\", c: 1}"),
        slip("a: ⟦\"\\q\"⟧~b: 2", "{a: !, b: 2}", "escape", null),
        slip("a: [1, ⟦,⟧ 2]~b: 2", "{a: [1, 2], b: 2}", "comma", "a: [1,  2]~b: 2"),
        slip(
            "a: {⟦,⟧ c: 2, d: , }~b: 2",
            "{a: {c: 2, d: ?}, b: 2}",
            "comma",
            "a: { c: 2, d: , }~b: 2"),
        slip("a: [1 V, \"x\" ⟦y⟧]", "{a: [1 V, x, y]}", "comma is missing", "a: [1 V, \"x\", y]"),
        slip("a: {b: [1] ⟦c⟧: 2}", "{a: {b: [1], c: 2}}", "comma is missing", "a: {b: [1], c: 2}"),
        slip("⟦{⟧a: 1~b: 2", "{a: 1, b: 2}", "before a key", "a: 1~b: 2"),
        slip("a: {b: ⟦[⟧1}~c: 1", "{a: {b: [1]}, c: 1}", "not closed", "a: {b: [1]}~c: 1"),
        slip(
            "a:~  b: 1~⟦]⟧  c: 2~  d: 3",
            "{a: {b: 1, c: 2, d: 3}}",
            "before a key",
            "a:~  b: 1~  c: 2~  d: 3"),
        slip("a:~  ⟦\"⟧b: 1~  d: 3", "{a: {b: 1, d: 3}}", "before a key", "a:~  b: 1~  d: 3"),
        slip("a: ⟦]⟧~  b: 1~d: 3", "{a: {b: 1}, d: 3}", "does not belong", "a: ~  b: 1~d: 3"),
        slip("a: ⟦[⟧~  b: 1~d: 3", "{a: {b: 1}, d: 3}", "does not belong", "a: ~  b: 1~d: 3"),
        slip("a: 1~⟦-⟧b: 1~d: 3", "{a: 1, b: 1, d: 3}", "dash", "a: 1~b: 1~d: 3"),
        slip("⟦-⟧ a: 1~b: 1~d: 3", "{a: 1, b: 1, d: 3}", "dash", "a: 1~b: 1~d: 3"),
        slip(
            "x:~  ⟦-⟧ a: 1~  b: 1~  d: 3",
            "{x: {a: 1, b: 1, d: 3}}",
            "dash",
            "x:~  a: 1~  b: 1~  d: 3"),
        slip(
            "p:~  - ⟦]⟧a:~      b: 1~  - d: 3",
            "{p: [{a: {b: 1}}, {d: 3}]}",
            "before a key",
            "p:~  - a:~      b: 1~  - d: 3"),
        slip(
            "a:~  b: 1~    ⟦o⟧:~  - x~  gap: 1",
            "{a: {b: 1, o: [x], gap: 1}}",
            "indented",
            "a:~  b: 1~  o:~  - x~  gap: 1"),
        slip("about: >-\t~  x~b: 1", "{about: x, b: 1}", null, null),
        // Indentation.
        slip(
            "a:~  b: 1~    ⟦c⟧: 2~  d: 3",
            "{a: {b: 1, c: 2, d: 3}}",
            "indented by 4",
            "a:~  b: 1~  c: 2~  d: 3"),
        slip(
            "a:~    b: 1~   ⟦c⟧: 2~    d: 3",
            "{a: {b: 1, c: 2, d: 3}}",
            "indented by 3",
            "a:~    b: 1~    c: 2~    d: 3"),
        slip(
            "a:~  b: 1~    ⟦c⟧: 2~    e: 4~  d: 3",
            "{a: {b: 1, c: 2, e: 4, d: 3}}",
            "indented",
            "a:~  b: 1~  c: 2~  e: 4~  d: 3"),
        slip(
            "a:~  b:~    c: 1~   ⟦d⟧:~    e: 1",
            "{a: {b: {c: 1}, d: {e: 1}}}",
            "indented by 3",
            "a:~  b:~    c: 1~  d:~    e: 1"),
        slip("  ⟦a⟧: 1~b: 2", "{a: 1, b: 2}", "indented by 2", "a: 1~b: 2"),
        slip(
            "a:~⟦\t⟧b: 1~\tc:~\t\td: 2",
            "{a: {b: 1, c: {d: 2}}}",
            "tab",
            "a:~  b: 1~  c:~    d: 2"),
        slip("a:~    b: 1~⟦\t⟧c: 2", "{a: {b: 1, c: 2}}", "tab", "a:~    b: 1~    c: 2"),
        slip(
            "p:~  - r: 1~  ⟦c⟧: 2~  - d: 3",
            "{p: [{r: 1}, {c: 2}, {d: 3}]}",
            "dash",
            "p:~  - r: 1~  - c: 2~  - d: 3"),
        slip(
            "path:~  - amplifier:~    ⟦gain⟧: 5~    offset: 1~  - r: 1",
            "{path: [{amplifier: {gain: 5, offset: 1}}, {r: 1}]}",
            "indent it below",
            "path:~  - amplifier:~      gain: 5~      offset: 1~  - r: 1"),
        slip("a:~  b: 1~  ⟦!⟧c: 2", "{a: {b: 1, c: 2}}", "before a key", "a:~  b: 1~  c: 2"),
        slip("a: ⟦&⟧~  - c: 2", "{a: [{c: 2}]}", "does not belong", "a: ~  - c: 2"),
        slip("a:~  b: 1~⟦ \t ⟧⟦c⟧:~  - d: 2~  e: 3", "{a: {b: 1, c: [{d: 2}], e: 3}}", "tab", null),
        slip("a: ⟦!⟧{b: 1, c: 2}", "{a: {b: 1, c: 2}}", "tag", "a: {b: 1, c: 2}"),
        slip("a:~⟦-⟧x: 1~  y: 2", "{a: [{x: 1, y: 2}]}", "dash", "a:~- x: 1~  y: 2"),
        // Prose.
        slip(
            "about: ⟦Rev C: x⟧~b: 2",
            "{about: Rev C: x, b: 2}",
            "quotes",
            "about: \"Rev C: x\"~b: 2"),
        slip(
            "about: ⟦Rev C: \"x\" it's⟧ # c",
            "{about: Rev C: \"x\" it's}",
            "quotes",
            "about: 'Rev C: \"x\" it''s' # c"),
        slip("because: ⟦[draft] x⟧", "{because: [draft] x}", "quotes", "because: \"[draft] x\""),
        slip(
            "because: ⟦[draft⟧~b: 2",
            "{because: [draft, b: 2}",
            "quotes",
            "because: \"[draft\"~b: 2"),
        slip("because: ⟦*x*⟧", "{because: *x*}", "quotes", "because: \"*x*\""),
        slip("because: ⟦@x⟧", "{because: @x}", "quotes", "because: \"@x\""),
        slip("because: ⟦> 5 V⟧", "{because: > 5 V}", "quotes", "because: \"> 5 V\""),
        slip("because: ⟦% of⟧", "{because: % of}", "quotes", "because: \"% of\""),
        slip("because: ⟦\"x\" y⟧", "{because: \"x\" y}", "quotes", "because: '\"x\" y'"),
        slip(
            "because: ⟦x:~  y⟧~b: 1",
            "{because: x: y, b: 1}",
            "quotes",
            "because: \"x:~  y\"~b: 1"),
        slip(
            "a: {because: ⟦this, that⟧, b: 2}",
            "{a: {because: this, that, b: 2}}",
            "quotes",
            "a: {because: \"this, that\", b: 2}"),
        slip("about: ⟦!urgent⟧ # c", "{about: !urgent}", "a tag", "about: \"!urgent\" # c"),
        slip("about: ⟦&x y⟧", "{about: &x y}", "an anchor", "about: \"&x y\""),
        slip(
            "because: known, see ⟦#12⟧",
            "{because: known, see}",
            "cuts",
            "because: \"known, see #12\""),
        // Values.
        slip("o: ⟦- 1 V to 30 V⟧~b: 1", "{o: -1 V to 30 V, b: 1}", "sign", "o: -1 V to 30 V~b: 1"),
        slip("o: [⟦- 1 V⟧, 3 V]", "{o: [-1 V, 3 V]}", "sign", "o: [-1 V, 3 V]"),
        slip(
            "d: {upper: ⟦4,7 kΩ⟧, lower: 1}",
            "{d: {upper: !, lower: 1}}",
            "comma",
            "d: {upper: 4.7 kΩ, lower: 1}"),
        slip("d: {upper: ⟦10,000 Ω⟧}", "{d: {upper: !}}", "`10000 Ω`", "d: {upper: 10.000 Ω}"),
        slip("a: x⟦\u2028⟧y~b: 1", "{a: x y, b: 1}", "U+2028", "a: x y~b: 1"),
        slip("a: x⟦\u0085⟧y~b: 1", "{a: x y, b: 1}", "U+0085", null),
        slip("a: x⟦\0⟧y~b: 1", "{a: x y, b: 1}", "U+0000", null),
        slip("a: x⟦\uD83D⟧y~b: 1", "{a: x y, b: 1}", "half a character", null),
        slip("a:⟦\u00A0⟧x~b: 1", "{a: x, b: 1}", "U+00A0", "a: x~b: 1"),
        slip("a: ⟦!x⟧ 1~b: 1", "{a: 1, b: 1}", "tag", "a: 1~b: 1"),
        slip("a: &p~  c: 1~b:~  ⟦<<⟧: *p~  d: 1", "{a: {c: 1}, b: {d: 1}}", "merge", null),
        slip("⟦? a⟧~b: 1", "{b: 1}", "`?`", null),
        slip("a: 1~⟦[⟧x: 2~b: 1", "{a: 1, x: 2, b: 1}", "before a key", "a: 1~x: 2~b: 1"),
        slip("a: 1~⟦---⟧~b: 2", "{a: 1, b: 2}", "another document", "a: 1~b: 2"),
        slip("a: ⟦*gone⟧~b: 1", "{a: !, b: 1}", "&gone", null),
        slip("a: &p~  c: ⟦*p⟧", "{a: {c: !}}", "&p", null),
        slip("⟦- a~- b⟧", "{}", "keys and values", null),
        slip("⟦just words⟧", "{}", "no key", null),
        slip(
            "a: 1~⟦<<<<<<< ours⟧~b: 2~=======~b: 3~>>>>>>> theirs~c: 4",
            "{a: 1, b: 2, c: 4}",
            "conflict",
            "a: 1~b: 2~c: 4"),
        slip("a: 1~⟦=======⟧~c: 4", "{a: 1, c: 4}", "conflict", null),
        // No slip at all.
        slip(
            "a: {because: why? x, b: [?x, c?d]}",
            "{a: {because: why? x, b: [?x, c?d]}}",
            null,
            null),
        slip("", "{}", null, null),
        slip("# only~~# comments", "{}", null, null),
        slip("---~a: 1~...", "{a: 1}", null, null),
        slip(
            "a: [~  1,~  2~]~b: {~  c: 1,   # x~  d: 'y~    z' }",
            "{a: [1, 2], b: {c: 1, d: y z}}",
            null,
            null),
        slip("a:\tx\t# c~b: \"x\ty\"", "{a: x, b: x\ty}", null, null),
        slip(
            "a: it's~b: x#y~c: http://h/p~d: r:4~e: 1:30",
            "{a: it's, b: x#y, c: http://h/p, d: r:4, e: 1:30}",
            null,
            null),
        slip(
            "about: >-~  Rev C: x~  - y # z~~  [~b: 1",
            "{about: Rev C: x - y # z~[, b: 1}",
            null,
            null),
        slip("about: &n shared~b: *n", "{about: shared, b: shared}", null, null),
        slip(
            "about: text   # note~because: text # note",
            "{about: text, because: text}",
            null,
            null),
        slip(
            "a:~- - 1~  - 2~- x: 1~  y:~  - 2~b: -1~  x",
            "{a: [[1, 2], {x: 1, y: [2]}], b: -1 x}",
            null,
            null),
        slip("a:~  words that~  go on~b: 1", "{a: words that go on, b: 1}", null, null),
        slip("{a: 1,~b: [x]}", "{a: 1, b: [x]}", null, null));
  }

  private static Arguments slip(String marked, String tree, String message, String mended) {
    return Arguments.of(marked, tree, message, mended);
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("slips")
  void eachSlipIsToldAtItsPlaceAndCostsNothingElse(
      String marked, String tree, String message, String mended) {
    Marked written = Marked.of(marked);
    SourceText text = SourceText.of("s", written.text);
    SyntaxTree read = Syntax.parse(text);

    assertThat(Shown.values(read.root()).replace('\n', '~')).isEqualTo(tree);
    assertThat(read.problems().stream().map(p -> p.place().span()).toList())
        .as("%s", read.problems())
        .isEqualTo(written.spans);
    if (message != null) {
      assertThat(read.problems().get(0).message()).contains(message);
    }
    if (mended != null) {
      String after = applied(text, read.problems().get(0).fixes().get(0).edits());
      assertThat(after.replace('\n', '~')).isEqualTo(mended);
    }
  }

  /** The judge is a YAML reader of its own: what all first fixes leave must be YAML. */
  @ParameterizedTest(name = "{0}")
  @MethodSource("slips")
  void fixesLeadToYaml(String marked, String tree, String message, String mended) {
    if (mended == null) {
      return;
    }
    SourceText text = SourceText.of("s", Marked.of(marked).text);
    for (int round = 0; round < 5; round++) {
      List<Problem> problems = Syntax.parse(text).problems();
      if (problems.isEmpty()) {
        break;
      }
      text = SourceText.of("s", applied(text, problems.get(0).fixes().get(0).edits()));
    }
    assertThat(Syntax.parse(text).problems()).isEmpty();
    new Yaml(new SafeConstructor(new LoaderOptions())).load(text.content());
  }

  static String applied(SourceText text, List<Edit> edits) {
    StringBuilder out = new StringBuilder(text.content());
    edits.stream()
        .sorted(Comparator.comparingInt((Edit e) -> e.place().start()).reversed())
        .forEach(e -> out.replace(e.place().start(), e.place().end(), e.replacement()));
    return out.toString();
  }

  private static final class Marked {
    final String text;
    final List<Span> spans = new ArrayList<>();

    private Marked(String marked) {
      StringBuilder out = new StringBuilder();
      int open = 0;
      for (char c : marked.replace('~', '\n').toCharArray()) {
        if (c == '⟦') {
          open = out.length();
        } else if (c == '⟧') {
          spans.add(new Span(open, out.length()));
        } else {
          out.append(c);
        }
      }
      text = out.toString();
    }

    static Marked of(String marked) {
      return new Marked(marked);
    }
  }
}
