package dev.settlewell.syntax;

import dev.settlewell.text.Span;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * Where in a sheet a cursor stands: what an editor's questions (completion, hover, definition)
 * switch on.
 *
 * <p>Paths run from the root to the thing, outermost first: keys, and places in a list counted from
 * 0, as in a JSON Pointer. The tree knows no schema: where a block may hold keys or a list alike
 * ({@code path:} and a deeper line below it) the answer is {@link NewKey}, and whoever knows the
 * schema offers what belongs there.
 *
 * <p>The answer is right also on lines that could not be read: what was typed there is told from
 * the line, and what it belongs to from its indentation and the tree around it.
 */
public sealed interface Cursor {

  /** Of the thing itself; of a {@link NewKey} the mapping that the key is to go to. */
  List<String> path();

  /**
   * In a key that is in the tree, or at one of its ends.
   *
   * @param path ends with the key
   * @param mapping the one that holds the entry
   */
  record OnKey(List<String> path, Node.Mapping mapping, Node.Entry entry) implements Cursor {
    public OnKey {
      path = List.copyOf(path);
    }
  }

  /**
   * In the value of a key, or between its colon and the line's end.
   *
   * @param path ends with the key
   * @param entry its value is {@link Node.Absent} behind a lone {@code key:}, a collection where
   *     the cursor stands behind the colon of a key that holds one
   * @param span what was typed so far, for a scalar to be replaced by another: from the value's
   *     start to its end, or to the cursor where it stands behind; empty at the cursor where there
   *     is no value
   */
  record OnValue(List<String> path, Node.Entry entry, Span span) implements Cursor {
    public OnValue {
      path = List.copyOf(path);
    }
  }

  /**
   * In a list: on an item that is no mapping, or where a new item may begin.
   *
   * @param path ends with the item's place in the list
   * @param item {@link Node.Absent} where nothing stands yet
   * @param span as in {@link OnValue}
   * @param flow in brackets
   * @param dashed false where {@code "- "} is still to be written; true in brackets
   * @param indent the column of the list's dashes; 0 in brackets
   */
  record InItem(List<String> path, Node item, Span span, boolean flow, boolean dashed, int indent)
      implements Cursor {
    public InItem {
      path = List.copyOf(path);
    }
  }

  /**
   * Where a new key may be written, or a half-typed one that has no colon yet stands.
   *
   * @param path of the mapping that it goes to; empty for the root
   * @param mapping that mapping with the keys it has already; empty where it has none yet
   * @param word what was typed of the key; empty at the cursor where nothing was
   * @param lead what stands before the word on its line; where it is not {@code indent} blanks the
   *     line is indented wrongly. Empty in braces.
   * @param indent the column where the keys beside it stand; 0 in braces
   * @param flow in braces
   */
  record NewKey(
      List<String> path,
      Optional<Node.Mapping> mapping,
      Span word,
      Span lead,
      int indent,
      boolean flow)
      implements Cursor {
    public NewKey {
      path = List.copyOf(path);
    }
  }

  /** Behind the {@code #} of a comment. */
  record InComment(Comment comment) implements Cursor {
    @Override
    public List<String> path() {
      return List.of();
    }
  }

  /** Where nothing can be said: in the rest of a line that could not be read. */
  record Nowhere() implements Cursor {
    @Override
    public List<String> path() {
      return List.of();
    }
  }

  /** Where the cursor stands before the character at {@code offset}. */
  static Cursor at(SyntaxTree tree, int offset) {
    int clamped = Math.max(0, Math.min(offset, tree.text().length()));
    return new CursorFinder(tree, clamped).find();
  }

  /** {@code /channels/level/path/1}: the path as JSON Pointer writes it (RFC 6901). */
  static String pointer(List<String> path) {
    return path.stream()
        .map(key -> "/" + key.replace("~", "~0").replace("/", "~1"))
        .collect(Collectors.joining());
  }
}
