package dev.settlewell.workspace;

import dev.settlewell.sheet.Linked;
import java.time.LocalDate;
import java.util.Collection;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.TreeSet;

/**
 * All sheets asked for, each with what it uses, as they were at one moment. Immutable.
 *
 * @param sheets by path, in the order of the paths
 * @param unreadable paths asked for that gave no text, and why
 */
public record Workspace(Map<String, Linked> sheets, Map<String, String> unreadable) {
  /** Marks the root of a workspace where there is no repository. */
  public static final String PROJECT_FILE = ".settlewell.yaml";

  public Workspace {
    sheets = Collections.unmodifiableMap(new LinkedHashMap<>(sheets));
    unreadable = Collections.unmodifiableMap(new LinkedHashMap<>(unreadable));
  }

  /**
   * Reads the sheets at {@code paths} and all they use.
   *
   * @param date the day acceptances are judged on
   * @param memo of earlier readings; what it holds of unchanged texts is used again
   */
  public static Workspace read(
      Collection<String> paths, SheetReader reader, LocalDate date, Memo memo) {
    Map<String, Linked> sheets = new LinkedHashMap<>();
    Map<String, String> unreadable = new LinkedHashMap<>();
    TreeSet<String> sorted = new TreeSet<>(paths);
    Uses uses = new Uses(sorted, reader, memo);
    for (String path : sorted) {
      SheetReader.Content content = uses.content(path);
      if (content.text().isPresent()) {
        sheets.put(path, uses.link(memo.sheet(path, content.text().get()), date));
      } else {
        unreadable.put(path, content.why());
      }
    }
    return new Workspace(sheets, unreadable);
  }

  public Optional<Linked> find(String path) {
    return Optional.ofNullable(sheets.get(path));
  }
}
