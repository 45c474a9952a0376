package dev.settlewell.finding;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.Analyzer;
import dev.settlewell.sheet.Linked;
import dev.settlewell.sheet.Sheet;
import dev.settlewell.sheet.Sheets;
import dev.settlewell.syntax.Syntax;
import dev.settlewell.text.SourceText;
import dev.settlewell.vocabulary.Vocabulary;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;

/** A text with its findings, from the first character to the last figure. */
record Judged(SourceText text, List<Finding> findings) {
  static final LocalDate TODAY = LocalDate.of(2026, 12, 1);

  private static final Vocabulary VOCABULARY = Vocabulary.load();

  static Judged sheet(String content) {
    return on(TODAY, content);
  }

  static Judged on(LocalDate date, String content) {
    SourceText text = SourceText.of("page.channels.yaml", content);
    Sheet sheet = Sheets.bind(Syntax.parse(text), VOCABULARY);
    return new Judged(text, Findings.of(analyze(link(sheet, date))));
  }

  private static Linked link(Sheet sheet, LocalDate date) {
    return new Linked(
        sheet,
        List.of(),
        sheet.supplies(),
        sheet.converters(),
        sheet.interferers(),
        List.of(),
        date);
  }

  private static Analysis analyze(Linked linked) {
    try {
      return Analyzer.analyze(linked);
    } catch (UnsupportedOperationException e) {
      return new Analysis(linked, Map.of(), Map.of(), Map.of());
    }
  }

  /** {@code warning unknown-key ‹neds› …}. */
  List<String> shown() {
    return findings.stream().map(this::shown).toList();
  }

  private String shown(Finding finding) {
    return "%s %s ‹%s› %s"
        .formatted(
            finding.severity().label(),
            finding.name(),
            text.slice(finding.place().span()),
            finding.message());
  }

  List<String> names() {
    return findings.stream().map(Finding::name).toList();
  }
}
