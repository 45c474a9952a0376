package dev.settlewell.workspace;

import dev.settlewell.firmware.Source;
import dev.settlewell.sheet.Link;
import dev.settlewell.sheet.Linked;
import dev.settlewell.sheet.Sheet;
import dev.settlewell.sheet.Sheets;
import dev.settlewell.syntax.Syntax;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import dev.settlewell.vocabulary.Vocabulary;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;

/**
 * Keeps the last reading of each path, so that what did not change is not computed again: the same
 * text gives the same {@link Sheet} object, and the same sheets the same {@link Linked}. Whoever
 * computes further may therefore compare by identity.
 */
public final class Memo {
  private record Known(
      Sheet sheet, List<Sheet> used, boolean whole, List<Problem> problems, Linked linked) {
    boolean isOf(
        Sheet s, List<Sheet> u, boolean w, List<Problem> p, Map<String, Source> f, LocalDate d) {
      return sheet == s
          && same(used, u)
          && whole == w
          && problems.equals(p)
          && linked.sources().equals(f)
          && linked.date().equals(d);
    }

    private static boolean same(List<Sheet> a, List<Sheet> b) {
      boolean same = a.size() == b.size();
      for (int i = 0; same && i < a.size(); i++) {
        same = a.get(i) == b.get(i);
      }
      return same;
    }
  }

  private final Vocabulary vocabulary;
  private final Map<String, Sheet> sheets = new ConcurrentHashMap<>();
  private final Map<String, Source> sources = new ConcurrentHashMap<>();
  private final Map<String, Known> links = new ConcurrentHashMap<>();

  public Memo(Vocabulary vocabulary) {
    this.vocabulary = vocabulary;
  }

  public Vocabulary vocabulary() {
    return vocabulary;
  }

  Sheet sheet(String path, String content) {
    Sheet known = sheets.get(path);
    if (known != null && known.text().content().equals(content)) {
      return known;
    }
    Sheet sheet = Sheets.bind(Syntax.parse(SourceText.of(path, content)), vocabulary);
    sheets.put(path, sheet);
    return sheet;
  }

  /** A source of firmware; the same object while its text is the same. */
  Source source(String path, String content) {
    Source known = sources.get(path);
    boolean same = known != null && known.text().orElseThrow().content().equals(content);
    if (!same) {
      known = Source.of(SourceText.of(path, content));
      sources.put(path, known);
    }
    return known;
  }

  Linked linked(
      Sheet sheet,
      List<Sheet> used,
      boolean whole,
      List<Problem> problems,
      Map<String, Source> sources,
      LocalDate date) {
    Known known = links.get(sheet.path());
    if (known != null && known.isOf(sheet, used, whole, problems, sources, date)) {
      return known.linked();
    }
    Linked linked = Link.link(sheet, used, whole, problems, vocabulary, date).with(sources);
    links.put(sheet.path(), new Known(sheet, used, whole, problems, linked));
    return linked;
  }

  /** Forgets a path that is gone. */
  public void forget(String path) {
    sheets.remove(path);
    sources.remove(path);
    links.remove(path);
  }
}
