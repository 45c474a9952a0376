package dev.settlewell.assist;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.assist.Symbols.Symbol;
import dev.settlewell.assist.Tokens.Token;
import dev.settlewell.text.Place;
import dev.settlewell.text.Span;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** Symbols, folds, selections, links, colours and names: what follows from the tree alone. */
class StructureTest {
  private static final Checked BOARD = Sample.check(Sample.BOARD);

  private static String slice(Span span) {
    return BOARD.text().slice(span);
  }

  @Test
  void symbolsFollowTheSheet() {
    List<Symbol> symbols = Symbols.of(BOARD, Sample.VOCABULARY);
    assertThat(symbols)
        .extracting(Symbol::name)
        .containsExactly(
            "channel-sheet",
            "ambient",
            "supplies",
            "converters",
            "scans",
            "interferers",
            "channels");
    Symbol channels = symbols.get(6);
    assertThat(channels.children()).extracting(Symbol::name).containsExactly("boiler", "battery");
    Symbol boiler = channels.children().get(0);
    assertThat(boiler.detail()).isEqualTo("sensor in the boiler's pocket");
    assertThat(slice(boiler.label())).isEqualTo("boiler");
    assertThat(boiler.span().contains(boiler.label())).isTrue();
  }

  @Test
  void symbolsNest() {
    for (Symbol symbol : Symbols.of(BOARD, Sample.VOCABULARY)) {
      nests(symbol);
    }
  }

  private static void nests(Symbol symbol) {
    assertThat(symbol.span().contains(symbol.label())).isTrue();
    for (Symbol child : symbol.children()) {
      assertThat(symbol.span().contains(child.span())).as(child.name()).isTrue();
      nests(child);
    }
  }

  @Test
  void blocksAndCommentsFold() {
    Checked checked =
        Sample.check("# one\n# two\nchannel-sheet: 1\nsupplies:\n  a: 1 V\n  b: 2 V\n\nscans:\n");
    assertThat(Folding.of(checked, Sample.VOCABULARY))
        .containsExactlyInAnyOrder(new Folding.Fold(0, 1, true), new Folding.Fold(3, 5, false));
  }

  @Test
  void selectionsGrow() {
    Sample sample = Sample.board("100 Ω}", "10‸0 Ω}");
    List<Span> spans = Selections.around(sample.checked(), Sample.VOCABULARY, sample.offset());
    assertThat(spans.stream().map(sample.checked().text()::slice).limit(4))
        .containsExactly(
            "100 Ω", "resistance: 100 Ω", "{resistance: 100 Ω}", "voltage: {resistance: 100 Ω}");
    for (int i = 1; i < spans.size(); i++) {
      assertThat(spans.get(i).contains(spans.get(i - 1))).isTrue();
    }
    assertThat(spans.get(spans.size() - 1))
        .isEqualTo(new Span(0, sample.checked().text().length()));
  }

  @Test
  void pathsLeadSomewhere() {
    Checked checked =
        Sample.check(
            "channel-sheet: 1\nuse: [../common/b.channels.yaml, parts/c.channels.yaml]\n"
                + "firmware:\n  - {constant: A, in: ../src/a.h, equals: x.lsb}\n");
    assertThat(Links.of(checked, Sample.VOCABULARY))
        .extracting(Links.Link::target)
        .containsExactly("/common/b.channels.yaml", "/board/parts/c.channels.yaml", "/src/a.h");
  }

  @Test
  void coloursFollowTheMeaning() {
    List<Token> tokens = Tokens.of(BOARD, Sample.VOCABULARY);
    assertThat(tokens)
        .extracting(token -> slice(token.span()) + " " + token.sort())
        .contains(
            "bits PROPERTY",
            "thermistor TYPE",
            "boiler VARIABLE",
            "mains VARIABLE",
            "4.7 NUMBER",
            "kΩ TYPE",
            "± OPERATOR",
            "to KEYWORD");
    for (int i = 1; i < tokens.size(); i++) {
      assertThat(tokens.get(i).span().start())
          .as(tokens.get(i - 1) + " and " + tokens.get(i))
          .isGreaterThanOrEqualTo(tokens.get(i - 1).span().end());
    }
  }

  @Test
  void namesLeadToTheirDefinitionAndBack() {
    Sample sample = Sample.board("to: ref}", "to: r‸ef}");
    Navigation.NameAt name =
        Navigation.nameAt(sample.checked(), Sample.VOCABULARY, sample.offset()).orElseThrow();
    assertThat(name.name()).isEqualTo("ref");
    Place definition = Navigation.definition(sample.checked(), "ref").orElseThrow();
    assertThat(sample.checked().text().content().substring(definition.start()))
        .startsWith("ref: 2.5 V");
    assertThat(Navigation.occurrences(sample.checked().sheet(), Sample.VOCABULARY, "ref", true))
        .hasSize(3);
  }

  @Test
  void definitionsAreFoundInUsedSheets() {
    String parts = "/board/parts.channels.yaml";
    Checked checked =
        Sample.check(
            Sample.NAME,
            Map.of(
                Sample.NAME,
                "channel-sheet: 1\nuse: [parts.channels.yaml]\nscans:\n  s: {converter: adc,"
                    + " rate: 1 Hz, order: [a]}\n",
                parts,
                "channel-sheet: 1\nconverters:\n  adc: {bits: 12, reference: 2.5 V}\n"));
    assertThat(Navigation.definition(checked, "adc").orElseThrow().sheet()).isEqualTo(parts);
  }

  @Test
  void takenAndUnfitNamesAreRefused() {
    assertThat(Navigation.refusal(BOARD, "mains")).isPresent();
    assertThat(Navigation.refusal(BOARD, "Battery")).isPresent();
    assertThat(Navigation.refusal(BOARD, "")).isPresent();
    assertThat(Navigation.refusal(BOARD, "battery-2")).isEmpty();
  }

  @Test
  void hintsStandBehindTheirValues() {
    Span all = new Span(0, BOARD.text().length());
    List<InlayHints.Hint> hints = InlayHints.of(BOARD, Sample.VOCABULARY, all);
    // 2.5 V in 4096 steps, the measured quantity being the voltage itself.
    assertThat(hints).extracting(InlayHints.Hint::text).anyMatch(t -> t.startsWith("LSB 610 µV"));
    assertThat(hints).extracting(InlayHints.Hint::text).contains("2.5 V", "3.3 V");
    assertThat(hints).extracting(InlayHints.Hint::text).anyMatch(t -> t.startsWith("needs "));
    assertThat(hints).extracting(InlayHints.Hint::text).anyMatch(t -> t.contains(", margin "));
    assertThat(hints).extracting(InlayHints.Hint::text).anyMatch(t -> t.endsWith(" of the error"));
    assertThat(hints).extracting(InlayHints.Hint::text).anyMatch(t -> t.startsWith("lands at "));
    int bits = BOARD.text().content().indexOf("bits");
    assertThat(InlayHints.of(BOARD, Sample.VOCABULARY, new Span(bits, bits + 4))).isEmpty();
  }

  @Test
  void lensesTellHowAChannelStands() {
    assertThat(Lenses.of(BOARD))
        .extracting(lens -> slice(lens.span()))
        .containsExactly("slow", "boiler", "battery");
    assertThat(Lenses.of(BOARD).get(2).text())
        .contains("within the needed ±50.0 mV")
        .contains("acquisition 3.00 µs, needs ");
  }
}
