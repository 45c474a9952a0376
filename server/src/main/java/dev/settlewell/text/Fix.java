package dev.settlewell.text;

import java.util.Comparator;
import java.util.List;

/**
 * One way to mend a text, offered by name.
 *
 * @param title what it does, as an editor's menu shows it, with the value it writes
 * @param edits non-overlapping, all computed against the same text
 * @param safe true where no value changes: another spelling, an indentation, an acceptance no
 *     longer used; only safe fixes are ever applied without being asked for by name
 */
public record Fix(String title, List<Edit> edits, boolean safe) {
  public Fix {
    edits = List.copyOf(edits);
  }

  /** The text with the edits made; those that belong to other sheets are passed over. */
  public String applyTo(SourceText text) {
    List<Edit> last =
        edits.stream()
            .filter(edit -> edit.place().sheet().equals(text.name()))
            .sorted(Comparator.comparingInt((Edit edit) -> edit.place().start()).reversed())
            .toList();
    StringBuilder content = new StringBuilder(text.content());
    for (Edit edit : last) {
      content.replace(edit.place().start(), edit.place().end(), edit.replacement());
    }
    return content.toString();
  }
}
