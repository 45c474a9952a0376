package dev.settlewell.syntax;

import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;

/**
 * One reading of one text: patches what is known to be no YAML, has the rest parsed, and where the
 * parser still fails takes out the line it fails on and tries again.
 */
final class Reader {
  /** Each try reads the whole text; a sheet has a handful of broken lines, not hundreds. */
  private static final int MAX_TRIES = 60;

  /** Characters read in all tries together: bounds the time on long texts. */
  private static final long MAX_WORK = 20_000_000;

  private final SourceText text;
  private final Set<String> textKeys;
  private final Draft draft;
  private final TreeMap<Integer, Span> broken = new TreeMap<>();
  private final List<Problem> problems = new ArrayList<>();

  Reader(SourceText text, Set<String> textKeys) {
    this.text = text;
    this.textKeys = textKeys;
    this.draft = new Draft(text.content());
  }

  SyntaxTree read() {
    if (text.length() > Syntax.MAX_LENGTH) {
      report(new Span(0, 0), "longer than 3 MB: this is not read as a sheet");
      return new SyntaxTree(text, emptyRoot(), problems, List.of());
    }
    new Characters(text, draft, problems).clean();
    TreeBuilder builder = null;
    Optional<Node> root = Optional.empty();
    long work = 0;
    for (int tries = 0; tries < MAX_TRIES && work < MAX_WORK; tries++) {
      work += text.length();
      Draft.Rendered rendered = draft.render();
      builder = new TreeBuilder(text, rendered, broken);
      root = builder.build();
      if (builder.failure().isEmpty()) {
        break;
      }
      Events.Failure failure = builder.failure().get();
      if (!takeOut(rendered.offset(failure.index()), failure.message())) {
        break;
      }
    }
    problems.addAll(builder.problems());
    return tree(builder, root);
  }

  private SyntaxTree tree(TreeBuilder builder, Optional<Node> root) {
    Node.Mapping mapping = emptyRoot();
    if (root.isPresent() && root.get() instanceof Node.Mapping m) {
      mapping = m;
    } else if (root.isPresent() && !(root.get() instanceof Node.Absent)) {
      report(
          root.get().place().span(),
          "a sheet is made of keys and values, such as `channel-sheet: 1`");
    }
    problems.sort(Comparator.comparingInt((Problem p) -> p.place().start()));
    return new SyntaxTree(text, mapping, problems, Comments.of(text, builder.scalars()));
  }

  /** Takes the value, else the line, else everything from there on out of the draft. */
  private boolean takeOut(int offset, String reason) {
    int number = text.lineAt(Math.min(offset, text.length()));
    while (number > 0 && isEmpty(number)) {
      number--;
    }
    if (isEmpty(number)) {
      return false;
    }
    Span line = text.line(number);
    int start = contentStart(line);
    Span out = new Span(start, Math.max(start, contentEnd(line)));
    report(out, Messages.of(reason, text.slice(out)));
    int colon = text.slice(out).indexOf(": ");
    int value = colon < 0 ? -1 : start + colon + 1;
    if (value > 0 && !draft.isBlank(value, out.end())) {
      while (text.content().charAt(value) == ' ') {
        value++;
      }
      broken.put(value, new Span(value, out.end()));
      draft.blank(value, line.end());
    } else {
      draft.blank(start, line.end());
    }
    return true;
  }

  private boolean isEmpty(int number) {
    Span line = text.line(number);
    return draft.isBlank(line.start(), line.end())
        || text.slice(line).stripLeading().startsWith("#");
  }

  private int contentStart(Span line) {
    int at = line.start();
    while (at < line.end() && text.content().charAt(at) <= ' ') {
      at++;
    }
    return at;
  }

  private int contentEnd(Span line) {
    int end = line.end();
    while (end > line.start() && text.content().charAt(end - 1) <= ' ') {
      end--;
    }
    return end;
  }

  private Node.Mapping emptyRoot() {
    return new Node.Mapping(List.of(), text.place(0, 0), false);
  }

  private void report(Span span, String message) {
    Place place = text.place(span);
    if (problems.stream().noneMatch(p -> p.place().span().overlaps(span))) {
      problems.add(new Problem(Problem.Kind.SYNTAX, place, message));
    }
  }
}
