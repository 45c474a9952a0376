package dev.settlewell.syntax;

import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Finds the {@link Cursor} for one offset: by the tree where it covers it, else by the line. */
final class CursorFinder {
  private final SyntaxTree tree;
  private final SourceText text;
  private final String content;
  private final int offset;

  CursorFinder(SyntaxTree tree, int offset) {
    this.tree = tree;
    this.text = tree.text();
    this.content = text.content();
    this.offset = offset;
  }

  Cursor find() {
    for (Comment comment : tree.comments()) {
      if (comment.place().start() < offset && offset <= comment.place().end()) {
        return new Cursor.InComment(comment);
      }
    }
    return inMapping(tree.root(), List.of()).orElseGet(() -> new LineCursor(tree, offset).find());
  }

  // By the tree.

  private Optional<Cursor> inMapping(Node.Mapping mapping, List<String> path) {
    if (mapping.flow()) {
      return inBraces(mapping, path);
    }
    for (Node.Entry entry : mapping.entries()) {
      List<String> here = with(path, entry.key().text());
      if (entry.key().place().span().touches(offset)) {
        return Optional.of(new Cursor.OnKey(here, mapping, entry));
      }
      if (entry.key().place().end() < offset) {
        Optional<Cursor> found = inValue(entry, here);
        if (found.isPresent()) {
          return found;
        }
      }
    }
    return Optional.empty();
  }

  private Optional<Cursor> inValue(Node.Entry entry, List<String> path) {
    Node value = entry.value();
    boolean keyLine = text.lineAt(offset) == text.lineAt(entry.key().place().end());
    boolean valueOnKeyLine =
        text.lineAt(value.place().start()) == text.lineAt(entry.key().place().end());
    if (keyLine && !valueOnKeyLine) {
      return Optional.of(new Cursor.OnValue(path, entry, Span.at(offset)));
    }
    if (isBlock(value)) {
      return inBlock(value, path);
    }
    if (isFlow(value) && inside(value)) {
      return value instanceof Node.Mapping m ? inBraces(m, path) : inBrackets(value, path);
    }
    boolean covered = value.place().span().touches(offset);
    boolean before = keyLine && offset < value.place().start();
    boolean behind = text.lineAt(offset) == text.lineAt(value.place().end());
    boolean besideIt = !covered && (before || behind);
    if (!covered && !besideIt) {
      return Optional.empty();
    }
    if (value instanceof Node.Scalar scalar && mayBeKey(scalar, valueOnKeyLine)) {
      return Optional.empty();
    }
    return Optional.of(new Cursor.OnValue(path, entry, typed(value)));
  }

  private Optional<Cursor> inBlock(Node node, List<String> path) {
    if (node instanceof Node.Mapping mapping) {
      return inMapping(mapping, path);
    }
    Node.Sequence list = (Node.Sequence) node;
    int indent = column(list.place().start());
    for (int i = 0; i < list.items().size(); i++) {
      Node item = list.items().get(i);
      List<String> here = with(path, String.valueOf(i));
      Optional<Cursor> found = inItem(item, here, indent, i == 0 ? list.place().start() : -1);
      if (found.isPresent()) {
        return found;
      }
    }
    return Optional.empty();
  }

  private Optional<Cursor> inItem(Node item, List<String> path, int indent, int dash) {
    if (isFlow(item) && inside(item)) {
      return item instanceof Node.Mapping m ? inBraces(m, path) : inBrackets(item, path);
    }
    if (isBlock(item)) {
      Optional<Cursor> found = inBlock(item, path);
      if (found.isPresent()) {
        return found;
      }
    }
    int start = item.place().start();
    int end = item.place().end();
    boolean before =
        offset < start && text.lineAt(offset) == text.lineAt(start) && afterDash(start);
    boolean covered = !isBlock(item) && start <= offset && offset <= end;
    boolean behind = !isBlock(item) && offset > end && text.lineAt(offset) == text.lineAt(end);
    if (!before && !covered && !behind) {
      return Optional.empty();
    }
    Span span = before ? Span.at(offset) : typed(item);
    return Optional.of(new Cursor.InItem(path, item, span, false, true, indent));
  }

  /** True where only a dash and blanks stand between the cursor's side of the line and an item. */
  private boolean afterDash(int itemStart) {
    String between = content.substring(offset, itemStart);
    String before = content.substring(text.lineStart(text.lineAt(offset)), offset);
    return between.isBlank() && before.stripTrailing().endsWith("-");
  }

  private Optional<Cursor> inBraces(Node.Mapping mapping, List<String> path) {
    Node.Entry last = null;
    for (Node.Entry entry : mapping.entries()) {
      List<String> here = with(path, entry.key().text());
      Span key = entry.key().place().span();
      if (key.touches(offset)) {
        return Optional.of(
            hasColon(key.end())
                ? new Cursor.OnKey(here, mapping, entry)
                : newKey(mapping, path, key));
      }
      Node value = entry.value();
      if (isFlow(value) && inside(value)) {
        return value instanceof Node.Mapping m ? inBraces(m, here) : inBrackets(value, here);
      }
      if (value.place().span().touches(offset) && !(value instanceof Node.Absent)) {
        return Optional.of(new Cursor.OnValue(here, entry, typed(value)));
      }
      if (key.end() < offset) {
        last = entry;
      }
    }
    char before = before();
    if (last != null && before != ',' && before != '{') {
      List<String> here = with(path, last.key().text());
      return Optional.of(new Cursor.OnValue(here, last, typed(last.value())));
    }
    return Optional.of(newKey(mapping, path, Span.at(offset)));
  }

  private Cursor newKey(Node.Mapping mapping, List<String> path, Span word) {
    return new Cursor.NewKey(path, Optional.of(mapping), word, Span.at(word.start()), 0, true);
  }

  private Optional<Cursor> inBrackets(Node node, List<String> path) {
    List<Node> items = ((Node.Sequence) node).items();
    int index = 0;
    for (Node item : items) {
      List<String> here = with(path, String.valueOf(index));
      if (isFlow(item) && inside(item)) {
        return item instanceof Node.Mapping m ? inBraces(m, here) : inBrackets(item, here);
      }
      boolean behind = item.place().end() < offset && before() != ',';
      boolean last = index + 1 == items.size() || items.get(index + 1).place().start() > offset;
      if (item.place().span().touches(offset) || behind && last) {
        return Optional.of(new Cursor.InItem(here, item, typed(item), true, true, 0));
      }
      if (item.place().start() > offset) {
        break;
      }
      index++;
    }
    Node none = new Node.Absent(text.place(offset, offset));
    List<String> here = with(path, String.valueOf(index));
    return Optional.of(new Cursor.InItem(here, none, Span.at(offset), true, true, 0));
  }

  /** Between the brackets; behind the closing one no more, unless it is still to be typed. */
  private boolean inside(Node flow) {
    int start = flow.place().start();
    int end = flow.place().end();
    if (offset <= start) {
      return false;
    }
    boolean closed = end > start + 1 && Quotes.closer(content.charAt(end - 1));
    return closed ? offset < end : text.lineAt(offset) == text.lineAt(end) || offset <= end;
  }

  /** A word on a line of its own that was taken for a value, or for more of the value above it. */
  private boolean mayBeKey(Node.Scalar scalar, boolean valueOnKeyLine) {
    int line = text.lineAt(offset);
    boolean alone = !valueOnKeyLine || line > text.lineAt(scalar.place().start());
    int start = scalar.place().start();
    boolean plain =
        scalar.inset() == 0
            && (start == content.length() || "|>".indexOf(content.charAt(start)) < 0);
    return alone && plain && isWord(text.slice(text.line(line)).strip());
  }

  static boolean isWord(String written) {
    return written.chars().allMatch(c -> Mending.wordChar((char) c));
  }

  /** From the start of what stands here to its end, or to the cursor behind it. */
  private Span typed(Node value) {
    if (value instanceof Node.Absent || offset < value.place().start()) {
      return Span.at(offset);
    }
    return new Span(value.place().start(), Math.max(value.place().end(), offset));
  }

  /** The last character before the cursor that is no blank. */
  private char before() {
    int at = offset - 1;
    while (at >= 0 && content.charAt(at) <= ' ') {
      at--;
    }
    return at < 0 ? ' ' : content.charAt(at);
  }

  private boolean hasColon(int keyEnd) {
    int at = keyEnd;
    while (at < content.length() && content.charAt(at) == ' ') {
      at++;
    }
    return at < content.length() && content.charAt(at) == ':';
  }

  private boolean isBlock(Node node) {
    return (node instanceof Node.Mapping m && !m.flow()
            || node instanceof Node.Sequence s && !s.flow())
        && !isAlias(node, content);
  }

  private boolean isFlow(Node node) {
    return (node instanceof Node.Mapping m && m.flow()
            || node instanceof Node.Sequence s && s.flow())
        && !isAlias(node, content);
  }

  /** What an alias brought in stands elsewhere; here stands a {@code *}. */
  static boolean isAlias(Node node, String content) {
    int start = node.place().start();
    return start < content.length() && content.charAt(start) == '*';
  }

  private int column(int at) {
    return LineCursor.column(text, at);
  }

  static List<String> with(List<String> path, String last) {
    List<String> longer = new ArrayList<>(path);
    longer.add(last);
    return longer;
  }
}
