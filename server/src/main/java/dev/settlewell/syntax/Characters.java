package dev.settlewell.syntax;

import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import java.util.List;
import java.util.Locale;

/**
 * Replaces the characters that no YAML reader takes by blanks of the same length, and reports them;
 * fixed-width blanks become blanks silently.
 */
final class Characters {
  /** More of one kind than anybody reads; the rest is replaced all the same. */
  private static final int MAX_REPORTED = 20;

  private final SourceText text;
  private final Draft draft;
  private final List<Problem> problems;
  private int reported;

  Characters(SourceText text, Draft draft, List<Problem> problems) {
    this.text = text;
    this.draft = draft;
    this.problems = problems;
  }

  void clean() {
    String content = text.content();
    int first = content.startsWith("\uFEFF") ? 1 : 0;
    for (int i = first; i < content.length(); i++) {
      char c = content.charAt(i);
      if (Unreadable.isFixedBlank(c)) {
        draft.overwrite(i, ' ');
      } else if (Unreadable.isForbidden(c) || Unreadable.isLoneSurrogate(content, i)) {
        draft.overwrite(i, ' ');
        report(i, c);
      }
    }
  }

  private void report(int offset, char c) {
    if (++reported > MAX_REPORTED) {
      return;
    }
    Place place = text.place(offset, offset + 1);
    String code = String.format(Locale.ROOT, "U+%04X", (int) c);
    String what =
        Character.isSurrogate(c)
            ? "half a character (" + code + "); write the whole one"
            : "the invisible character " + code + " cannot stand in a sheet; a blank is read";
    Fix fix = new Fix("Replace it by a blank", List.of(new Edit(place, " ")), false);
    problems.add(new Problem(Problem.Kind.SYNTAX, place, what, fix));
  }
}
