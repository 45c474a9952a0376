package dev.settlewell.syntax;

import dev.settlewell.text.Span;
import java.util.Arrays;
import java.util.Map;
import java.util.TreeMap;

/**
 * The text as the YAML parser is given it: the sheet's own text with what keeps YAML from reading
 * it patched over, and the way back from the parser's indices to the sheet's own offsets.
 *
 * <p>A patch writes one character over another, drops one, or inserts a few. Nothing here changes
 * what the user sees: every place handed out is a place in the original text.
 */
final class Draft {
  /** Stands for a dropped character; never legal in a YAML text, so it cannot be meant. */
  private static final char DROPPED = '\uFFFF';

  private final String original;
  private final char[] chars;
  private final TreeMap<Integer, String> insertions = new TreeMap<>();

  Draft(String original) {
    this.original = original;
    this.chars = original.toCharArray();
  }

  int length() {
    return chars.length;
  }

  /** The character as it is read; a line break behind the text's end. */
  char at(int offset) {
    return offset < chars.length ? chars[offset] : '\n';
  }

  /** Puts {@code text} before the character at {@code offset}, behind what was put there before. */
  void insert(int offset, String text) {
    insertions.merge(offset, text, String::concat);
  }

  boolean isDropped(int offset) {
    return chars[offset] == DROPPED;
  }

  /** Puts blanks before the character at {@code offset}, in place of what was put there before. */
  void indent(int offset, int blanks) {
    insertions.put(offset, " ".repeat(blanks));
  }

  void overwrite(int offset, char c) {
    chars[offset] = c;
  }

  void drop(int start, int end) {
    Arrays.fill(chars, start, end, DROPPED);
  }

  /** Empties a stretch, also of what was inserted in it or at its ends; line breaks stay. */
  void blank(int start, int end) {
    for (int i = start; i < end; i++) {
      if (chars[i] != '\n' && chars[i] != '\r') {
        chars[i] = ' ';
      }
    }
    insertions.subMap(start, true, end, true).clear();
  }

  boolean isBlank(int start, int end) {
    for (int i = start; i < end; i++) {
      if (chars[i] > ' ' && chars[i] != DROPPED && chars[i] != '\uFEFF') {
        return false;
      }
    }
    return insertions.subMap(start, true, end, false).isEmpty();
  }

  Rendered render() {
    StringBuilder text = new StringBuilder(chars.length + 64);
    int[] starts = new int[chars.length + 64];
    int[] ends = new int[chars.length + 64];
    int count = 0;
    int offset = 0;
    Map.Entry<Integer, String> next = insertions.firstEntry();
    while (offset <= chars.length) {
      if (next != null && next.getKey() == offset) {
        String inserted = next.getValue();
        next = insertions.higherEntry(offset);
        int needed = count + inserted.length() + chars.length - offset + 1;
        if (needed > starts.length) {
          starts = Arrays.copyOf(starts, needed + 64);
          ends = Arrays.copyOf(ends, needed + 64);
        }
        text.append(inserted);
        for (int i = 0; i < inserted.length(); i++) {
          starts[count] = offset;
          ends[count++] = offset;
        }
      }
      if (offset == chars.length) {
        break;
      }
      char c = chars[offset];
      boolean pair =
          Character.isHighSurrogate(c)
              && offset + 1 < chars.length
              && Character.isLowSurrogate(chars[offset + 1]);
      int width = pair ? 2 : 1;
      if (c != DROPPED) {
        text.append(chars, offset, width);
        starts[count] = offset;
        ends[count++] = offset + width;
      }
      offset += width;
    }
    return new Rendered(original, text.toString(), starts, ends, count);
  }

  /**
   * One state of the draft. Indices count code points, as the YAML parser's marks do; offsets are
   * UTF-16 offsets into the original text.
   */
  record Rendered(String original, String text, int[] starts, int[] ends, int count) {

    /** Where the character at an index stands. */
    int offset(int index) {
      return index < count ? starts[index] : original.length();
    }

    /** Where the stretch that ends before {@code index} ends. */
    int endOffset(int index) {
      return index <= 0 ? 0 : ends[Math.min(index, count) - 1];
    }

    Span span(int from, int to) {
      int start = offset(from);
      return new Span(start, Math.max(start, to > from ? endOffset(to) : start));
    }
  }
}
