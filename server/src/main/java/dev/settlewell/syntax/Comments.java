package dev.settlewell.syntax;

import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import java.util.ArrayList;
import java.util.List;

/** Finds the comments of a text whose scalars are known. */
final class Comments {
  private Comments() {}

  /**
   * @param scalars in the order of the text; a {@code #} inside one starts no comment
   */
  static List<Comment> of(SourceText text, List<Span> scalars) {
    String content = text.content();
    List<Comment> found = new ArrayList<>();
    int next = 0;
    int offset = 0;
    while (offset < content.length()) {
      while (next < scalars.size() && scalars.get(next).start() < offset) {
        next++;
      }
      if (next < scalars.size() && scalars.get(next).start() == offset) {
        offset = Math.max(offset + 1, scalars.get(next).end());
      } else if (content.charAt(offset) == '#' && startsComment(content, offset)) {
        int line = text.lineAt(offset);
        Span place = new Span(offset, text.line(line).end());
        found.add(
            new Comment(text.place(place), startsLine(content, text.lineStart(line), offset)));
        offset = place.end();
      } else {
        offset++;
      }
    }
    return found;
  }

  private static boolean startsComment(String content, int offset) {
    char before = offset == 0 ? ' ' : content.charAt(offset - 1);
    return before <= ' ' || "[]{},\"'\uFEFF".indexOf(before) >= 0;
  }

  private static boolean startsLine(String content, int lineStart, int offset) {
    for (int i = lineStart; i < offset; i++) {
      if (content.charAt(i) > ' ' && content.charAt(i) != '\uFEFF') {
        return false;
      }
    }
    return true;
  }
}
