package dev.settlewell.syntax;

import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * One reading of one text: patches what is known to be no YAML, has the rest parsed, and where the
 * parser still fails takes out the line it fails on and tries again.
 */
final class Reader {
  /** Each try reads the whole text; a sheet has a handful of broken lines, not hundreds. */
  private static final int MAX_TRIES = 60;

  /** Characters read in all tries together: bounds the time on long texts. */
  private static final long MAX_WORK = 20_000_000;

  /** More than anybody reads, and than an editor shows with ease. */
  private static final int MAX_PROBLEMS = 500;

  private final SourceText text;
  private final Mending mending;

  Reader(SourceText text, Set<String> textKeys) {
    this.text = text;
    this.mending = new Mending(text, textKeys);
  }

  SyntaxTree read() {
    if (text.length() > Syntax.MAX_LENGTH) {
      mending.syntax(0, 0, "longer than 3 MB: this is not read as a sheet");
      return new SyntaxTree(text, emptyRoot(), mending.problems, List.of());
    }
    mend();
    Recovery recovery = new Recovery(mending);
    TreeBuilder builder = null;
    Optional<Node> root = Optional.empty();
    long work = 0;
    for (int tries = 0; builder == null || tries < MAX_TRIES && work < MAX_WORK; tries++) {
      work += text.length();
      Draft.Rendered rendered = mending.draft.render();
      builder = new TreeBuilder(text, rendered, mending.broken);
      root = builder.build();
      Optional<Events.Failure> failure = builder.failure();
      if (failure.isEmpty()
          || !recovery.takeOut(rendered.offset(failure.get().index()), failure.get().message())) {
        break;
      }
    }
    mending.problems.addAll(builder.problems());
    return tree(builder, root);
  }

  private void mend() {
    Characters characters = new Characters(mending);
    characters.clean();
    new Conflicts(mending).takeOut();
    new Tabs(mending).mendIndentation();
    new BlockScan(mending).scan();
    characters.blankTabs();
  }

  private SyntaxTree tree(TreeBuilder builder, Optional<Node> root) {
    Node.Mapping mapping = emptyRoot();
    if (root.isPresent() && root.get() instanceof Node.Mapping m) {
      mapping = m;
    } else if (root.isPresent() && !(root.get() instanceof Node.Absent)) {
      Span span = root.get().place().span();
      mending.syntax(
          span.start(), span.end(), "a sheet is made of keys and values: `channel-sheet: 1`");
    }
    List<Problem> problems =
        mending.problems.stream()
            .sorted(Comparator.comparingInt(p -> p.place().start()))
            .limit(MAX_PROBLEMS)
            .toList();
    return new SyntaxTree(text, mapping, problems, Comments.of(text, builder.scalars()));
  }

  private Node.Mapping emptyRoot() {
    return new Node.Mapping(List.of(), text.place(0, 0), false);
  }
}
