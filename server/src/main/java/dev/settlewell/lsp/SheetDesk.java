package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.channel.Analyzer;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Findings;
import dev.settlewell.sheet.Linked;
import dev.settlewell.text.SourceText;
import dev.settlewell.vocabulary.Vocabulary;
import dev.settlewell.workspace.Discovery;
import dev.settlewell.workspace.Memo;
import dev.settlewell.workspace.Overlay;
import dev.settlewell.workspace.ProjectFile;
import dev.settlewell.workspace.SheetReader;
import dev.settlewell.workspace.Workspace;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Supplier;

/**
 * Reads, computes and judges sheets, and keeps the last result of each: what did not change is not
 * computed again. For one thread.
 */
final class SheetDesk implements Desk {
  private static final int MOST_KEPT = 1000;

  private final SheetReader files;
  private final Supplier<LocalDate> today;
  private final Vocabulary vocabulary = Vocabulary.load();
  private final Memo memo = new Memo(vocabulary);

  /** Of texts that only might be: apart, so that they do not drive out what is. */
  private final Memo trials = new Memo(vocabulary);

  private final Map<String, Checked> kept =
      new LinkedHashMap<>(64, 0.75f, true) {
        @Override
        protected boolean removeEldestEntry(Map.Entry<String, Checked> eldest) {
          return size() > MOST_KEPT;
        }
      };

  SheetDesk(SheetReader files, Supplier<LocalDate> today) {
    this.files = files;
    this.today = today;
  }

  @Override
  public Optional<Checked> check(String name, Map<String, SourceText> open) {
    Optional<Linked> linked = link(name, texts(open), memo);
    if (linked.isEmpty()) {
      kept.remove(name);
      return Optional.empty();
    }
    Checked known = kept.get(name);
    if (known == null || known.linked() != linked.get()) {
      known = judge(linked.get());
      kept.put(name, known);
    }
    return Optional.of(known);
  }

  @Override
  public List<Finding> trial(String name, String content, Map<String, SourceText> open) {
    Map<String, String> texts = texts(open);
    texts.put(name, content);
    return link(name, texts, trials).map(linked -> judge(linked).findings()).orElse(List.of());
  }

  private Optional<Linked> link(String name, Map<String, String> texts, Memo readings) {
    return Workspace.read(List.of(name), new Overlay(texts, files), today.get(), readings)
        .find(name);
  }

  private static Checked judge(Linked linked) {
    var analysis = Analyzer.analyze(linked);
    return new Checked(analysis, Findings.of(analysis));
  }

  private static Map<String, String> texts(Map<String, SourceText> open) {
    Map<String, String> texts = new HashMap<>();
    open.forEach((name, text) -> texts.put(name, text.content()));
    return texts;
  }

  @Override
  public Vocabulary vocabulary() {
    return vocabulary;
  }

  /** Editors name the home folder, or none at all, where they do not know better. */
  @Override
  public List<String> sheetsBelow(String folder) {
    boolean marked =
        files.exists(folder + "/.git") || files.exists(folder + "/" + Workspace.PROJECT_FILE);
    if (!marked) {
      return List.of();
    }
    try {
      return Discovery.below(List.of(Path.of(folder))).sheets().stream()
          .map(path -> path.toAbsolutePath().toString().replace('\\', '/'))
          .toList();
    } catch (InvalidPathException elsewhere) {
      return List.of();
    }
  }

  @Override
  public ProjectFile project(String folder) {
    return ProjectFile.above(folder, files);
  }
}
