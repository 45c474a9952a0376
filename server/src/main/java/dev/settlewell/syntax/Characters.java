package dev.settlewell.syntax;

import dev.settlewell.text.Span;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;

/**
 * Replaces the characters that no YAML reader takes by blanks of the same length, and reports them.
 * Blanks of a fixed width become blanks too; told only where YAML itself needs a blank.
 */
final class Characters {
  /** More of one kind than anybody reads; the rest is replaced all the same. */
  private static final int MAX_REPORTED = 20;

  private final Mending mending;
  private int reported;

  Characters(Mending mending) {
    this.mending = mending;
  }

  void clean() {
    String content = mending.text.content();
    for (int i = content.startsWith("\uFEFF") ? 1 : 0; i < content.length(); i++) {
      char c = content.charAt(i);
      boolean blank = Unreadable.isFixedBlank(c);
      if (blank || Unreadable.isForbidden(c) || Unreadable.isLoneSurrogate(content, i)) {
        mending.draft.overwrite(i, ' ');
        if (!blank || separates(i)) {
          report(i, c);
        }
      }
    }
  }

  /** Where YAML itself wants a blank: inside a value the grammar of values takes both alike. */
  private boolean separates(int offset) {
    int before = offset - 1;
    while (before >= 0 && mending.blank(before)) {
      before--;
    }
    char c = before < 0 ? '\n' : mending.draft.at(before);
    return c == '\n' || c == '\r' || c == ':' || c == '-' && before == offset - 1;
  }

  private void report(int offset, char c) {
    if (++reported > MAX_REPORTED) {
      return;
    }
    String code = String.format(Locale.ROOT, "U+%04X", (int) c);
    String message =
        Character.isSurrogate(c)
            ? "half a character (" + code + "): write the whole one"
            : "the invisible character " + code + " does not belong here: write a blank";
    mending.syntax(
        offset,
        offset + 1,
        message,
        mending.guess("Replace it by a blank", mending.edit(offset, offset + 1, " ")));
  }

  /** Tabs between things become blanks; in quotes they are meant, in indentation mended before. */
  void blankTabs() {
    List<Span> verbatim =
        mending.verbatim.stream().sorted(Comparator.comparingInt(Span::start)).toList();
    int next = 0;
    for (int i = 0; i < mending.draft.length(); i++) {
      while (next < verbatim.size() && verbatim.get(next).end() <= i) {
        next++;
      }
      boolean quoted = next < verbatim.size() && verbatim.get(next).start() <= i;
      if (!quoted && mending.draft.at(i) == '\t') {
        mending.draft.overwrite(i, ' ');
      }
    }
  }
}
