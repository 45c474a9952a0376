package dev.settlewell.text;

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
}
