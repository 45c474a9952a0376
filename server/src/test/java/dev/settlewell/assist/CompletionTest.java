package dev.settlewell.assist;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.assist.Completion.Proposal;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Problem;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class CompletionTest {

  private static List<Proposal> complete(Sample sample) {
    return Completion.at(sample.checked(), Sample.VOCABULARY, sample.offset());
  }

  private static List<String> labels(Sample sample) {
    return complete(sample).stream().map(Proposal::label).toList();
  }

  private static String accept(Sample sample, String label) {
    Proposal proposal =
        complete(sample).stream().filter(p -> p.label().equals(label)).findFirst().orElseThrow();
    List<Edit> edits = new ArrayList<>(proposal.also());
    edits.add(new Edit(sample.checked().text().place(proposal.span()), proposal.text()));
    return Sample.apply(sample.checked().text(), edits);
  }

  @Test
  void keysThatAreNotThereYetRequiredFirst() {
    Sample sample = Sample.board("    converter: adc\n", "    ‸\n");
    List<String> labels = labels(sample);
    assertThat(labels.get(0)).isEqualTo("converter");
    assertThat(labels).contains("gap", "jitter").doesNotContain("rate", "order", "bits");
  }

  @ParameterizedTest
  @CsvSource({
    "'to: ref', 'to: ‸', 'logic, ref'",
    "'converter: adc', 'converter: ‸', 'adc'",
    "'[boiler, battery]', '[boiler, ‸]', 'boiler, battery'",
    "'interferers: [mains]', 'interferers: [‸]', 'mains'",
    "'reference: ref', 'reference: ‸', 'logic, ref'",
    "'reference: ref', 'reference: r‸', 'logic, ref'",
  })
  void namesThatFit(String before, String after, String names) {
    assertThat(labels(Sample.board(before, after))).startsWith(names.split(", "));
  }

  @Test
  void choicesAndFlags() {
    assertThat(labels(Sample.board("bits: 12", "bits: 12\n    input: ‸")))
        .contains("single-ended", "differential", "bipolar");
  }

  /**
   * 100 Ω and 4.7 kΩ charge 5 pF: the time constant with the switch is 29 ns, so 6.9 of them (1/2
   * LSB of 12 bits is 2^-13, ln 2^13 = 9.0) fit into a fraction of a microsecond, two cycles of 125
   * ns; all that are offered suffice.
   */
  @Test
  void cyclesThatTheConverterOffers() {
    List<Proposal> proposals = complete(Sample.board("acquisition: 24 cycles", "acquisition: ‸"));
    assertThat(proposals.stream().limit(5).map(Proposal::label))
        .containsExactly("3 cycles", "6 cycles", "12 cycles", "24 cycles", "48 cycles");
    assertThat(proposals.get(0).detail()).startsWith("settles");
  }

  /** With 2.2 MΩ in the path: 2.2 MΩ times 5 pF times 9 is 99 µs, beyond all that is offered. */
  @Test
  void cyclesThatDoNotSufficeSayIt() {
    Sample sample =
        Sample.of(
            Sample.BOARD
                .replace("4.7 kΩ ±1 %", "2.2 MΩ ±1 %")
                .replace("acquisition: 24 cycles", "acquisition: ‸24 cycles"));
    assertThat(complete(sample).get(0).detail()).startsWith("too short");
  }

  /** IEC 60063: 4.3 and 4.7 are neighbours in E24; 4.53 and 4.64 in E96. */
  @Test
  void preferredValuesNearTheTypedOne() {
    assertThat(labels(Sample.board("4.7 kΩ ±1 %", "4.6‸ kΩ ±1 %")))
        .startsWith("4.3 kΩ ±1 %", "4.7 kΩ ±1 %", "4.53 kΩ ±1 %", "4.64 kΩ ±1 %");
  }

  @Test
  void unitsBehindABareNumber() {
    assertThat(labels(Sample.board("clock: 8 MHz", "clock: 8‸"))).contains("8 MHz", "8 kHz");
  }

  @Test
  void stagesAndSensorsAreWrittenWhole() {
    Sample stage = Sample.board("      - resistor: 4.7 kΩ ±1 %\n", "      - ‸\n");
    assertThat(labels(stage)).contains("resistor", "capacitor", "divider", "amplifier");
    assertThat(accept(stage, "divider")).contains("- divider: {upper: ");
    Proposal divider =
        complete(stage).stream().filter(p -> p.label().equals("divider")).findFirst().orElseThrow();
    assertThat(divider.snippet().orElseThrow()).contains("upper: ${1:").contains("\\}");
    Sample sensor = Sample.board("      voltage: {resistance: 100 Ω}\n", "      ‸\n");
    assertThat(labels(sensor)).contains("thermistor", "rtd", "voltage").doesNotContain("resistor");
  }

  @Test
  void aNewItemGetsItsDash() {
    Sample sample =
        Sample.board("      - resistor: 4.7 kΩ ±1 %\n", "      - resistor: 4.7 kΩ ±1 %\n      ‸\n");
    assertThat(accept(sample, "capacitor")).contains("\n      - capacitor: ");
  }

  /** What is written is indented as what stands beside it, wherever the cursor was. */
  @Test
  void indentationIsMended() {
    Sample sample = Sample.board("    rate: 100 Hz\n", "    rate: 100 Hz\n     ga‸\n");
    assertThat(accept(sample, "gap")).contains("\n    rate: 100 Hz\n    gap: ");
  }

  @Test
  void aWholeChannel() {
    Sample sample = Sample.of(Sample.BOARD + "  ‸\n");
    String text = accept(sample, "new channel");
    assertThat(text).contains("\n  name:\n    measures: 0 V to 2.5 V\n");
    assertThat(Sample.findings(text))
        .noneMatch(f -> f.name().equals("syntax") || f.name().equals("unknown-key"));
  }

  @Test
  void namesOfFindingsInAnAcceptance() {
    Sample sample =
        Sample.board(
            "acquisition: 24 cycles", "acquisition: 24 cycles\n    accept:\n      - finding: ‸");
    assertThat(labels(sample)).contains("source-resistance-too-high", "filter-droop");
  }

  @Test
  void severitiesOfFindings() {
    assertThat(labels(Sample.of("channel-sheet: 1\nfindings:\n  ‸\n"))).contains("filter-droop");
    assertThat(labels(Sample.of("channel-sheet: 1\nfindings:\n  filter-droop: ‸\n")))
        .contains("error", "warning", "off");
  }

  @Test
  void theLongForm() {
    assertThat(labels(Sample.board("hold-capacitor: 5 pF", "hold-capacitor: {‸}")))
        .contains("min", "typical", "max", "value");
  }

  @Test
  void everyProposalHasDocumentationOfItsKey() {
    assertThat(complete(Sample.board("    converter: adc\n", "    ‸\n")))
        .allMatch(proposal -> !proposal.doc().isEmpty());
  }

  @ParameterizedTest
  @CsvSource({
    "'bits: 12', 'bi‸', 'bits'",
    "'bits: 12', 'bits 12\n    no‸', 'noise'",
    "'bits: 12', 'bits: \"12\n    no‸', 'noise'",
  })
  void halfTypedTextIsCompletedToo(String before, String after, String label) {
    assertThat(labels(Sample.board(before, after))).contains(label);
  }

  /** Wherever the cursor stands: no fault, and ranges that stay on its line. */
  @Test
  void anywhere() {
    Checked checked = Sample.check(Sample.BOARD);
    for (int offset = 0; offset <= checked.text().length(); offset++) {
      for (Proposal proposal : Completion.at(checked, Sample.VOCABULARY, offset)) {
        assertThat(checked.text().lineAt(proposal.span().start()))
            .isEqualTo(checked.text().lineAt(proposal.span().end()));
      }
    }
  }

  /** A key that is accepted never breaks the sheet. */
  @Test
  void acceptedKeysParse() {
    Sample sample = Sample.board("    rate: 100 Hz\n", "    rate: 100 Hz\n    ‸\n");
    for (Proposal proposal : complete(sample)) {
      String text = accept(sample, proposal.label());
      assertThat(Sample.check(text).tree().problems())
          .as(proposal.label())
          .noneMatch(p -> p.kind() == Problem.Kind.SYNTAX);
    }
  }
}
