package dev.settlewell.finding;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.Analyzer;
import dev.settlewell.text.SourceText;
import dev.settlewell.vocabulary.Vocabulary;
import dev.settlewell.workspace.Memo;
import dev.settlewell.workspace.SheetReader;
import dev.settlewell.workspace.Workspace;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;

/** A text with its findings, from the first character to the last figure. */
record Judged(SourceText text, List<Finding> findings) {
  static final LocalDate TODAY = LocalDate.of(2026, 12, 1);

  private static final String PATH = "/plant/page.channels.yaml";
  private static final Vocabulary VOCABULARY = Vocabulary.load();

  static Judged sheet(String content) {
    return on(TODAY, content);
  }

  static Judged on(LocalDate date, String content) {
    return on(date, Map.of(PATH, content));
  }

  /** The first sheet, with the others beside it to be used. */
  static Judged with(String content, String otherName, String other) {
    return on(TODAY, Map.of(PATH, content, "/plant/" + otherName, other));
  }

  static Analysis analysis(String content) {
    return analysis(TODAY, Map.of(PATH, content));
  }

  private static Analysis analysis(LocalDate date, Map<String, String> files) {
    Workspace workspace =
        Workspace.read(List.of(PATH), new Files(files), date, new Memo(VOCABULARY));
    return Analyzer.analyze(workspace.find(PATH).orElseThrow());
  }

  private static Judged on(LocalDate date, Map<String, String> files) {
    return new Judged(SourceText.of(PATH, files.get(PATH)), Findings.of(analysis(date, files)));
  }

  private record Files(Map<String, String> texts) implements SheetReader {
    @Override
    public Content read(String path) {
      String text = texts.get(real(path));
      return text == null ? Content.none("there is no such file") : Content.of(text);
    }

    @Override
    public boolean exists(String path) {
      return texts.keySet().stream().anyMatch(file -> file.startsWith(real(path)));
    }

    @Override
    public String real(String path) {
      return Path.of("/").resolve(path).normalize().toString();
    }
  }

  /** {@code warning unknown-key ‹neds› …}. */
  List<String> shown() {
    return findings.stream().map(this::shown).toList();
  }

  private String shown(Finding finding) {
    return "\n%s %s ‹%s› %s"
        .formatted(
            finding.severity().label(),
            finding.name(),
            finding.place().sheet().equals(PATH) ? text.slice(finding.place().span()) : "elsewhere",
            finding.message());
  }

  List<String> names() {
    return findings.stream().map(Finding::name).toList();
  }
}
