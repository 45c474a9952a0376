package dev.settlewell.syntax;

import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import java.util.List;

/**
 * What could be read of a text, and what could not. There always is a tree: of a text that holds no
 * mapping at all the root is an empty mapping.
 */
public record SyntaxTree(
    SourceText text, Node.Mapping root, List<Problem> problems, List<Comment> comments) {
  public SyntaxTree {
    problems = List.copyOf(problems);
    comments = List.copyOf(comments);
  }
}
