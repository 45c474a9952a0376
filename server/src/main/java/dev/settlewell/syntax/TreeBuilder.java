package dev.settlewell.syntax;

import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import org.yaml.snakeyaml.DumperOptions.ScalarStyle;
import org.yaml.snakeyaml.events.AliasEvent;
import org.yaml.snakeyaml.events.CollectionEndEvent;
import org.yaml.snakeyaml.events.CollectionStartEvent;
import org.yaml.snakeyaml.events.DocumentEndEvent;
import org.yaml.snakeyaml.events.DocumentStartEvent;
import org.yaml.snakeyaml.events.Event;
import org.yaml.snakeyaml.events.MappingStartEvent;
import org.yaml.snakeyaml.events.NodeEvent;
import org.yaml.snakeyaml.events.ScalarEvent;
import org.yaml.snakeyaml.events.StreamEndEvent;
import org.yaml.snakeyaml.events.StreamStartEvent;

/** Turns the events of a draft into a tree whose places are those of the original text. */
final class TreeBuilder {
  /** Deeper than any sheet; keeps the recursion here and in all readers of the tree bounded. */
  static final int MAX_DEPTH = 50;

  /** So many nodes all aliases of a sheet may bring in together. */
  static final int MAX_ALIASED = 10_000;

  private final SourceText source;
  private final Draft.Rendered draft;
  private final Events events;
  private final TreeMap<Integer, Span> broken;
  private final List<Problem> problems = new ArrayList<>();
  private final List<Span> scalars = new ArrayList<>();
  private final Map<String, Node> anchors = new HashMap<>();
  private int aliased;

  /**
   * @param broken stretches of the original that were blanked out of the draft, by their start: an
   *     empty value that stands before one of them is not absent but broken
   */
  TreeBuilder(SourceText source, Draft.Rendered draft, TreeMap<Integer, Span> broken) {
    this.source = source;
    this.draft = draft;
    this.broken = broken;
    this.events = new Events(draft.text());
  }

  /** The root, of whatever kind; empty where the text holds no document. */
  Optional<Node> build() {
    Node root = null;
    while (!(events.peek() instanceof StreamEndEvent)) {
      Event event = events.next();
      if (event instanceof StreamStartEvent
          || event instanceof DocumentStartEvent
          || event instanceof DocumentEndEvent) {
        continue;
      }
      Node node = node(event, 0);
      if (root == null) {
        root = node;
      }
    }
    return Optional.ofNullable(root);
  }

  Optional<Events.Failure> failure() {
    return events.failure();
  }

  List<Problem> problems() {
    return problems;
  }

  /** Where scalars stand, in the order of the text: a {@code #} inside them starts no comment. */
  List<Span> scalars() {
    return scalars;
  }

  private Node node(Event event, int depth) {
    if (event instanceof AliasEvent alias) {
      return alias(alias);
    }
    Node node;
    if (event instanceof ScalarEvent scalar) {
      node = scalar(scalar);
    } else if (event instanceof CollectionStartEvent start) {
      if (depth >= MAX_DEPTH) {
        return tooDeep(start);
      }
      node = start instanceof MappingStartEvent ? mapping(start, depth) : sequence(start, depth);
    } else {
      return new Node.Absent(source.place(draft.span(index(event), index(event))));
    }
    String anchor = ((NodeEvent) event).getAnchor();
    if (anchor != null) {
      anchors.put(anchor, node);
    }
    return node;
  }

  private Node mapping(CollectionStartEvent start, int depth) {
    Extent extent = new Extent(start.isFlow() ? draft.offset(contentStart(start)) : Extent.OPEN);
    List<Node.Entry> entries = new ArrayList<>();
    while (!ended()) {
      Node key = node(events.next(), depth + 1);
      extent.add(key);
      Node value =
          ended() ? new Node.Absent(at(key.place().end())) : node(events.next(), depth + 1);
      if (value instanceof Node.Absent && value.place().start() < key.place().end()) {
        value = new Node.Absent(at(key.place().end()));
      }
      extent.add(value);
      entry(key, value).ifPresent(entries::add);
    }
    Place place = close(start, extent);
    List<Node.Entry> read =
        start.isFlow() ? Slips.splitByComma(source, entries, problems) : entries;
    return new Node.Mapping(read, place, start.isFlow());
  }

  private Optional<Node.Entry> entry(Node key, Node value) {
    if (key instanceof Node.Scalar name) {
      if (name.text().equals("<<") && name.inset() == 0) {
        problems.add(
            problem(
                name.place(),
                "`<<` does not merge keys in a sheet: write the keys themselves here"));
        return Optional.empty();
      }
      if (value instanceof Node.Sequence list && Slips.STAGE_LISTS.contains(name.text())) {
        return Optional.of(new Node.Entry(name, Slips.stages(source, list, problems)));
      }
      return Optional.of(new Node.Entry(name, value));
    }
    if (key instanceof Node.Absent) {
      problems.add(problem(at(key.place().start()), "a key is missing before this colon"));
    } else if (!(key instanceof Node.Broken)) {
      problems.add(problem(key.place(), "a key is one word; a list or a mapping cannot be a key"));
    }
    return Optional.empty();
  }

  private Node sequence(CollectionStartEvent start, int depth) {
    Extent extent = new Extent(draft.offset(contentStart(start)));
    List<Node> items = new ArrayList<>();
    while (!ended()) {
      Node item = node(events.next(), depth + 1);
      extent.add(item);
      items.add(item);
    }
    return new Node.Sequence(items, close(start, extent), start.isFlow());
  }

  private boolean ended() {
    Event next = events.peek();
    return next instanceof CollectionEndEvent
        || next instanceof StreamEndEvent
        || next instanceof DocumentEndEvent;
  }

  /** A block ends with its last value: the parser's own mark runs past trailing comments. */
  private Place close(CollectionStartEvent start, Extent extent) {
    if (events.peek() instanceof CollectionEndEvent end) {
      events.next();
      if (start.isFlow()) {
        extent.end = Math.max(extent.end, draft.endOffset(end.getEndMark().getIndex()));
      }
    }
    return source.place(extent.span());
  }

  private Node scalar(ScalarEvent event) {
    int from = contentStart(event);
    int to = Math.max(from, event.getEndMark().getIndex());
    boolean plain = event.getScalarStyle() == ScalarStyle.PLAIN;
    Span span = draft.span(from, to);
    if (plain && event.getValue().isEmpty()) {
      return absentOrBroken(draft.endOffset(event.getEndMark().getIndex()));
    }
    boolean block =
        event.getScalarStyle() == ScalarStyle.LITERAL
            || event.getScalarStyle() == ScalarStyle.FOLDED;
    if (block) {
      span = new Span(span.start(), trimmedEnd(span));
    }
    scalars.add(span);
    return scalar(event.getValue(), span, !plain && !block);
  }

  private Node.Scalar scalar(String text, Span span, boolean quoted) {
    if (sameText(text, span)) {
      return new Node.Scalar(text, source.place(span), true, 0);
    }
    char first = span.length() > 0 ? source.content().charAt(span.start()) : ' ';
    if (!quoted || first != '"' && first != '\'') {
      return new Node.Scalar(text, source.place(span), false, 0);
    }
    boolean exact = span.length() >= 2 && sameText(text, span.sub(1, span.length() - 1));
    return new Node.Scalar(text, source.place(span), exact, 1);
  }

  /** True also where the draft has a blank for a tab or for a character that YAML cannot read. */
  private boolean sameText(String text, Span span) {
    if (text.length() != span.length()) {
      return false;
    }
    for (int i = 0; i < text.length(); i++) {
      char typed = source.content().charAt(span.start() + i);
      if (text.charAt(i) != typed && !(text.charAt(i) == ' ' && Unreadable.readAsBlank(typed))) {
        return false;
      }
    }
    return true;
  }

  private Node absentOrBroken(int offset) {
    Map.Entry<Integer, Span> next = broken.ceilingEntry(offset);
    if (next != null && nothingBetween(offset, next.getKey())) {
      return new Node.Broken(source.place(next.getValue()));
    }
    return new Node.Absent(at(offset));
  }

  /** True where only blanks, line breaks and comments stand. */
  private boolean nothingBetween(int start, int end) {
    boolean comment = false;
    for (int i = start; i < end; i++) {
      char c = source.content().charAt(i);
      comment = c == '#' || comment && c != '\n' && c != '\r';
      if (c > ' ' && !comment) {
        return false;
      }
    }
    return true;
  }

  private Node alias(AliasEvent event) {
    Span span = draft.span(index(event), event.getEndMark().getIndex());
    Place place = source.place(span);
    Node target = anchors.get(event.getAnchor());
    if (target == null) {
      problems.add(
          problem(
              place,
              "nothing above is marked `&"
                  + event.getAnchor()
                  + "`; a text that begins with `*` stands in quotes"));
      return new Node.Broken(place);
    }
    Optional<Node> copy = moved(target, place);
    if (copy.isEmpty()) {
      problems.add(
          problem(
              place,
              "the aliases of this sheet bring in more than "
                  + MAX_ALIASED
                  + " values; write this part out"));
    }
    return copy.orElse(new Node.Broken(place));
  }

  /** The node as if it stood at the alias; empty once the sheet has used up its share. */
  private Optional<Node> moved(Node node, Place place) {
    if (++aliased > MAX_ALIASED) {
      return Optional.empty();
    }
    if (node instanceof Node.Scalar s) {
      return Optional.of(new Node.Scalar(s.text(), place, false, 0));
    }
    if (node instanceof Node.Absent) {
      return Optional.of(new Node.Absent(place));
    }
    if (node instanceof Node.Broken) {
      return Optional.of(new Node.Broken(place));
    }
    if (node instanceof Node.Sequence sequence) {
      List<Node> items = new ArrayList<>();
      for (Node item : sequence.items()) {
        Optional<Node> copy = moved(item, place);
        if (copy.isEmpty()) {
          return copy;
        }
        items.add(copy.get());
      }
      return Optional.of(new Node.Sequence(items, place, sequence.flow()));
    }
    Node.Mapping mapping = (Node.Mapping) node;
    List<Node.Entry> entries = new ArrayList<>();
    for (Node.Entry entry : mapping.entries()) {
      Optional<Node> copy = moved(entry.value(), place);
      if (copy.isEmpty()) {
        return copy;
      }
      Node.Scalar key = new Node.Scalar(entry.key().text(), place, false, 0);
      entries.add(new Node.Entry(key, copy.get()));
    }
    return Optional.of(new Node.Mapping(entries, place, mapping.flow()));
  }

  private Node tooDeep(CollectionStartEvent start) {
    int from = index(start);
    int to = from + 1;
    int open = 1;
    while (open > 0 && !(events.peek() instanceof StreamEndEvent)) {
      Event event = events.next();
      if (event instanceof CollectionStartEvent) {
        open++;
      } else if (event instanceof CollectionEndEvent) {
        open--;
      } else {
        to = Math.max(to, event.getEndMark().getIndex());
      }
    }
    Place place = source.place(draft.span(from, to));
    problems.add(problem(place, Messages.tooDeep()));
    return new Node.Broken(place);
  }

  /** Where the content begins, behind an anchor and a tag, which the parser counts in. */
  private int contentStart(NodeEvent event) {
    int at = index(event);
    boolean tagged =
        event.getAnchor() != null
            || event instanceof ScalarEvent s && s.getTag() != null
            || event instanceof CollectionStartEvent c && c.getTag() != null;
    if (!tagged) {
      return at;
    }
    int end = event.getEndMark().getIndex();
    int limit = event instanceof ScalarEvent ? end : draft.count();
    int unit = draft.text().offsetByCodePoints(0, at);
    while (at < limit) {
      int c = draft.text().codePointAt(unit);
      if (c == '&' || c == '!') {
        while (at < limit && !Character.isWhitespace(draft.text().codePointAt(unit))) {
          unit += Character.charCount(draft.text().codePointAt(unit));
          at++;
        }
      } else if (Character.isWhitespace(c)) {
        unit++;
        at++;
      } else {
        break;
      }
    }
    return at;
  }

  private int trimmedEnd(Span span) {
    int end = span.end();
    while (end > span.start() && Character.isWhitespace(source.content().charAt(end - 1))) {
      end--;
    }
    return end;
  }

  private static int index(Event event) {
    return event.getStartMark() == null ? 0 : event.getStartMark().getIndex();
  }

  private Place at(int offset) {
    return source.place(offset, offset);
  }

  private static Problem problem(Place place, String message) {
    return new Problem(Problem.Kind.SYNTAX, place, message);
  }

  /** From the first to the last character of what a collection holds. */
  private static final class Extent {
    private static final int OPEN = Integer.MAX_VALUE;
    private int start;
    private int end;

    /** {@code OPEN} where the first child decides. */
    Extent(int start) {
      this.start = start;
    }

    void add(Node node) {
      start = Math.min(start, node.place().start());
      end = Math.max(end, node.place().end());
    }

    Span span() {
      int from = start == OPEN ? end : start;
      return new Span(from, Math.max(from, end));
    }
  }
}
