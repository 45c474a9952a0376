package dev.settlewell.assist;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.syntax.Node;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class HoverTest {

  private static String hover(String before, String after) {
    Sample sample = Sample.board(before, after);
    return Hover.at(sample.checked(), Sample.VOCABULARY, sample.offset())
        .map(told -> told.prose().markdown())
        .orElse("");
  }

  @Test
  void aKeyTellsWhatTheSchemaSaysOfIt() {
    String doc = Sample.VOCABULARY.kind("converter").key("clock").orElseThrow().doc();
    assertThat(hover("clock: 8", "cl‸ock: 8")).startsWith("**`clock`**").contains(doc);
  }

  /** 4.7 kΩ less and plus 1 %: 4653 Ω and 4747 Ω. */
  @Test
  void aValueTellsHowItWasRead() {
    assertThat(hover("4.7 kΩ ±1 %", "4.7 k‸Ω ±1 %"))
        .contains("- 4.7 kΩ")
        .contains("limits 4.653 kΩ to 4.747 kΩ")
        .contains("hard limit (rectangular distribution)");
    assertThat(hover("4.7 kΩ ±1 %", "4k‸7 ±1 % (k=2)"))
        .contains("- 4.7 kΩ")
        .contains("normal distribution with coverage factor 2");
  }

  @Test
  void aLongFormTellsItsLimits() {
    assertThat(hover("hold-capacitor: 5 pF", "hold-capa‸citor: {typical: 5 pF, max: 7 pF}"))
        .contains("- 5 pF")
        .contains("5 pF to 7 pF");
  }

  /**
   * 2.5 V in 4096 steps is 0.61035 mV; code 0 at 0 V and 4095 at full scale; the ladder is 100 Ω
   * and 4.7 kΩ with 1 % more, 4.847 kΩ.
   */
  @Test
  void aChannelTellsItsResolutionAndSettling() {
    assertThat(hover("  battery:\n    m", "  bat‸tery:\n    m"))
        .contains("channel `battery`")
        .contains("in scan `slow`")
        .contains("LSB: 610 µV")
        .contains("code low: 0 at 0 V")
        .contains("code high: 4095 at 2.50 V")
        .contains("source resistance: 4.85 kΩ")
        .contains("acquisition: 3.00 µs")
        .contains("within the needed ±50.0 mV");
  }

  @Test
  void needsTellsTheBudgetByShare() {
    assertThat(hover("needs: ±0.05", "ne‸eds: ±0.05"))
        .contains("error at 95 %: ±")
        .contains("hard limit: ±")
        .containsPattern("supply ref: [0-9.]+ %");
  }

  @Test
  void anInterfererTellsWhereItLands() {
    assertThat(hover("[mains]", "[ma‸ins]")).contains("mains, 50.0 Hz: lands at");
  }

  @ParameterizedTest
  @CsvSource({
    "to: ref, to: re‸f, supply `ref`",
    "converter: adc, converter: a‸dc, converter `adc`",
    "'[boiler, battery]', '[boiler, batt‸ery]', channel `battery`",
    "'  slow:', '  sl‸ow:', scan `slow`",
    "'  mains:', '  ma‸ins:', interferer `mains`",
    "'  logic:', '  lo‸gic:', supply `logic`",
  })
  void aNameTellsOfWhatItNames(String before, String after, String told) {
    assertThat(hover(before, after)).contains(told);
  }

  @Test
  void aFindingIsToldWithItsPage() {
    String told = hover("acquisition: 24 cycles", "acquisition: 2‸5 cycles");
    assertThat(told).contains("`acquisition-not-offered` (error)");
  }

  @Test
  void plainTextHasNoMarks() {
    Sample sample = Sample.board("needs: ±0.05", "ne‸eds: ±0.05");
    String plain =
        Hover.at(sample.checked(), Sample.VOCABULARY, sample.offset())
            .orElseThrow()
            .prose()
            .plain();
    assertThat(plain).startsWith("needs\n\n").doesNotContain("**").doesNotContain("`");
  }

  /** Every key, kind and name of the sheet has something to tell, without tables and HTML. */
  @Test
  void nothingStaysSilent() {
    Checked checked = Sample.check(Sample.BOARD);
    Piece root = Outline.of(checked.tree(), Sample.VOCABULARY);
    for (Piece piece : root.all().filter(p -> p.label().isPresent()).toList()) {
      Node.Scalar label = piece.label().orElseThrow();
      Optional<Hover.Told> told = Hover.at(checked, Sample.VOCABULARY, label.place().start());
      assertThat(told).as(label.text()).isPresent();
      assertThat(told.get().span()).isEqualTo(label.place().span());
      assertThat(told.get().prose().markdown()).doesNotContain("|--").doesNotContain("<br");
    }
  }

  @Test
  void blanksAndCommentsTellNothing() {
    Checked checked = Sample.check("channel-sheet: 1\n\n# about\n");
    assertThat(Hover.at(checked, Sample.VOCABULARY, 17)).isEmpty();
    assertThat(Hover.at(checked, Sample.VOCABULARY, 20)).isEmpty();
  }
}
