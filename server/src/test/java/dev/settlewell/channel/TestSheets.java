package dev.settlewell.channel;

import dev.settlewell.sheet.Linked;
import dev.settlewell.sheet.Sheet;
import dev.settlewell.sheet.Sheets;
import dev.settlewell.syntax.Syntax;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import dev.settlewell.vocabulary.Vocabulary;
import java.time.LocalDate;
import java.util.List;

/** A sheet's text to its figures, as the faces do it, without files. */
public final class TestSheets {
  private static final Vocabulary VOCABULARY = Vocabulary.load();
  private static final LocalDate DAY = LocalDate.of(2026, 12, 1);

  private TestSheets() {}

  public static Linked link(String text) {
    SourceText source = SourceText.of("test.channels.yaml", text);
    Sheet sheet = Sheets.bind(Syntax.parse(source), VOCABULARY);
    return new Linked(
        sheet,
        List.of(),
        sheet.supplies(),
        sheet.converters(),
        sheet.interferers(),
        List.<Problem>of(),
        DAY);
  }

  public static Analysis analyze(String text) {
    return Analyzer.analyze(link(text));
  }

  /** The figures of the only channel of that name. */
  public static ChannelFigures channel(String text, String name) {
    Analysis analysis = analyze(text);
    List<ChannelFigures> found = analysis.of(name);
    if (found.size() != 1) {
      throw new AssertionError(
          name + " stands " + found.size() + " times; " + analysis.linked().sheet().problems());
    }
    return found.get(0);
  }
}
