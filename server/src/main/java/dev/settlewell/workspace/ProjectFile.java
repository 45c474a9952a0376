package dev.settlewell.workspace;

import dev.settlewell.syntax.Node;
import dev.settlewell.syntax.Syntax;
import dev.settlewell.syntax.SyntaxTree;
import dev.settlewell.text.Problem;
import dev.settlewell.text.SourceText;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The settings of a project, for every face of the tool alike: {@code .settlewell.yaml}, which also
 * marks the root of a workspace. An empty file is a good one.
 *
 * @param documentation base URL of the pages of the findings
 * @param failOn from which severity on {@code check} fails, where its option does not say
 * @param problems what could not be taken as written
 */
public record ProjectFile(
    Optional<String> documentation, Optional<String> failOn, List<Problem> problems) {
  public static final ProjectFile NONE =
      new ProjectFile(Optional.empty(), Optional.empty(), List.of());

  private static final String DOCUMENTATION = "documentation";
  private static final String FAIL_ON = "fail-on";
  private static final List<String> LEVELS =
      List.of("error", "warning", "information", "hint", "never");

  public ProjectFile {
    problems = List.copyOf(problems);
  }

  /** The nearest one, from a folder upwards; not beyond the root of a repository. */
  public static ProjectFile above(String folder, SheetReader reader) {
    Optional<String> here = Optional.of(reader.real(folder.isEmpty() ? "." : folder));
    while (here.isPresent()) {
      String path = Paths.resolve(here.get(), Workspace.PROJECT_FILE);
      if (reader.exists(path)) {
        return reader.read(path).text().map(t -> read(SourceText.of(path, t))).orElse(NONE);
      }
      if (reader.exists(Paths.resolve(here.get(), ".git"))) {
        return NONE;
      }
      here = Paths.above(here.get());
    }
    return NONE;
  }

  static ProjectFile read(SourceText text) {
    SyntaxTree tree = Syntax.parse(text);
    List<Problem> problems = new ArrayList<>(tree.problems());
    Map<String, String> values = new HashMap<>();
    for (Node.Entry entry : tree.root().entries()) {
      value(entry, problems).ifPresent(value -> values.put(entry.key().text(), value));
    }
    return new ProjectFile(
        Optional.ofNullable(values.get(DOCUMENTATION)),
        Optional.ofNullable(values.get(FAIL_ON)),
        problems);
  }

  private static Optional<String> value(Node.Entry entry, List<Problem> problems) {
    String key = entry.key().text();
    if (!key.equals(DOCUMENTATION) && !key.equals(FAIL_ON)) {
      problems.add(
          new Problem(
              Problem.Kind.UNKNOWN_KEY,
              entry.key().place(),
              "`%s` is no setting of a project; there are `documentation` and `fail-on`"
                  .formatted(key)));
      return Optional.empty();
    }
    Optional<String> value =
        entry.value() instanceof Node.Scalar scalar ? Optional.of(scalar.text()) : Optional.empty();
    boolean fits = value.isPresent() && (!key.equals(FAIL_ON) || LEVELS.contains(value.get()));
    if (!fits) {
      problems.add(
          new Problem(
              Problem.Kind.WRONG_KIND,
              entry.value().place(),
              key.equals(FAIL_ON)
                  ? "`fail-on` takes one of: " + String.join(", ", LEVELS)
                  : "`documentation` takes the address of the pages, as one text"));
    }
    return fits ? value : Optional.empty();
  }
}
