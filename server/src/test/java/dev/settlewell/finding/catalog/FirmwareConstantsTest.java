package dev.settlewell.finding.catalog;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.Analyzer;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Findings;
import dev.settlewell.firmware.Source;
import dev.settlewell.sheet.Link;
import dev.settlewell.sheet.Linked;
import dev.settlewell.sheet.Sheet;
import dev.settlewell.sheet.Sheets;
import dev.settlewell.syntax.Syntax;
import dev.settlewell.text.SourceText;
import dev.settlewell.vocabulary.Vocabulary;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What the sheet says of the code against what the code says. */
class FirmwareConstantsTest {
  private static final Vocabulary VOCABULARY = Vocabulary.load();
  private static final String SHEET =
      """
      channel-sheet: 1
      supplies: {ref: 3.3 V}
      converters: {adc: {bits: 12, reference: ref, clock: 4 MHz, conversion-cycles: 13}}
      scans: {slow: {converter: adc, rate: 10 Hz, order: [level]}}
      channels:
        level:
          measures: 0 V to 3 V
          sensor: {voltage: {}}
          acquisition: 24 cycles
          average: 16
      firmware: [%s]
      """;

  /** LSB = 3.3 V / 2^12 = 0.80566 mV; rate/average = 0.625 Hz. */
  @ParameterizedTest
  @CsvSource(
      delimiter = ';',
      quoteCharacter = '"',
      value = {
        "level.acquisition-cycles; 1; 24; ''",
        "level.acquisition-cycles; 1; 25; firmware-constant-differs",
        "level.acquisition-cycles; 10; 240; ''",
        "level.lsb; 1; 0.00081f; ''",
        "level.lsb; 1; 0.000806f; ''",
        "level.lsb; 1; 0.000805f; firmware-constant-differs",
        "level.lsb; 1000; 0.8; ''",
        "level.lsb; 1000; 0.80; firmware-constant-differs",
        "level.lsb; 1; 3.3 / 4096; ''",
        "level.average; 1; 16u; ''",
        "slow.level.result-rate; 1; 0.625; ''",
        "slow.level.result-rate; 1; 0.635; firmware-constant-differs",
        "adc.bits; 1; 12; ''",
        "adc.bits; 1; 10; firmware-constant-differs",
        "adc.clock; 1; 4000000; ''",
        "slow.rate; 1; 10; ''",
        "level.nothing; 1; 1; firmware-constant-missing",
        "slow.other.level.lsb; 1; 1; firmware-constant-missing",
        "level.average; 1; read(); firmware-constant-missing"
      })
  void compares_to_half_the_last_digit(String figure, String times, String code, String expected) {
    String entry = "{constant: X, in: a.h, equals: %s, times: %s}".formatted(figure, times);
    Source source = Source.of(SourceText.of("a.h", "#define X " + code + "\n"));
    List<String> names = names(SHEET.formatted(entry), Map.of("a.h", source));
    String wanted = expected.replace("'", "");
    assertThat(names).isEqualTo(wanted.isEmpty() ? List.of() : List.of(wanted));
  }

  @ParameterizedTest
  @CsvSource({"level.average,#define Y 1", "level.average,''"})
  void misses_what_is_not_defined(String figure, String code) {
    String entry = "{constant: X, in: a.h, equals: %s}".formatted(figure);
    Source source = Source.of(SourceText.of("a.h", code));
    assertThat(names(SHEET.formatted(entry), Map.of("a.h", source)))
        .containsExactly("firmware-constant-missing");
    assertThat(names(SHEET.formatted(entry), Map.of("a.h", Source.none("there is no such file"))))
        .containsExactly("firmware-constant-missing");
    assertThat(names(SHEET.formatted(entry), Map.of())).as("nobody looked").isEmpty();
  }

  private static List<String> names(String text, Map<String, Source> sources) {
    Sheet sheet = Sheets.bind(Syntax.parse(SourceText.of("t.channels.yaml", text)), VOCABULARY);
    assertThat(sheet.problems()).isEmpty();
    Linked linked =
        Link.link(sheet, List.of(), true, List.of(), VOCABULARY, LocalDate.of(2026, 12, 1))
            .with(sources);
    Analysis analysis = Analyzer.analyze(linked);
    return Findings.of(analysis).stream()
        .map(Finding::name)
        .filter(name -> name.startsWith("firmware"))
        .toList();
  }
}
