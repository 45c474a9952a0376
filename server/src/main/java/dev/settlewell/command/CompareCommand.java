package dev.settlewell.command;

import dev.settlewell.review.Comparison;
import dev.settlewell.review.ComparisonText;
import dev.settlewell.review.Review;
import dev.settlewell.review.Reviewed;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

@Command(
    name = "compare",
    description = "Tell what changed in figures and findings between two revisions.",
    footer = {
      "",
      "Sheets of two folders are paired by their path below them.",
      "",
      "Exit code: 0 no new finding, 1 new findings at or above --fail-on, 2 wrong usage,",
      "unreadable input or a fault of the tool.",
      "",
      "Example: settlewell compare --format markdown main/boards boards"
    })
final class CompareCommand implements Callable<Integer> {
  @Parameters(index = "0", paramLabel = "OLD", description = "A sheet or folder, before.")
  private String before;

  @Parameters(index = "1", paramLabel = "NEW", description = "The same, after.")
  private String after;

  @Option(
      names = "--format",
      paramLabel = "FORMAT",
      converter = Format.OfComparison.class,
      description = "text or markdown. Default: text.")
  private Format format = Format.TEXT;

  @Option(
      names = "--fail-on",
      paramLabel = "SEVERITY",
      defaultValue = "warning",
      converter = FailLevel.Converter.class,
      description = "error, warning, information, hint or never. Default: warning.")
  private FailLevel failOn;

  private final Console console;

  CompareCommand(Console console) {
    this.console = console;
  }

  @Override
  public Integer call() throws InputException {
    boolean folders = isFolder(before);
    if (folders != isFolder(after)) {
      throw new InputException("compare two sheets, or two folders");
    }
    Sheets sheets = new Sheets(console, console.today());
    Review old = sheets.review(List.of(before), CheckCommand.STANDARD_INPUT_NAME);
    Review now = sheets.review(List.of(after), CheckCommand.STANDARD_INPUT_NAME);
    Output output = new Output(console);
    List<Review.Failure> failures = new ArrayList<>(old.failures());
    failures.addAll(now.failures());
    failures.forEach(f -> output.note(f.path() + ": " + f.message()));
    if (!failures.isEmpty()) {
      return ExitCode.ERROR;
    }
    Comparison comparison = Comparison.of(pairs(old, now, folders));
    output.result(
        format == Format.MARKDOWN
            ? ComparisonText.markdown(comparison)
            : ComparisonText.plain(comparison, output.style()));
    boolean fails =
        failOn.severity().isPresent()
            && comparison.come().stream()
                .anyMatch(finding -> finding.severity().atLeast(failOn.severity().get()));
    return fails ? ExitCode.FINDINGS : ExitCode.CLEAN;
  }

  private List<Comparison.Pair> pairs(Review old, Review now, boolean folders) {
    Map<String, Reviewed> olds = byName(old, before, folders);
    Map<String, Reviewed> news = byName(now, after, folders);
    TreeSet<String> names = new TreeSet<>(olds.keySet());
    names.addAll(news.keySet());
    return names.stream()
        .map(
            name ->
                new Comparison.Pair(
                    name.isEmpty() ? now.sheets().get(0).path() : name,
                    Optional.ofNullable(olds.get(name)),
                    Optional.ofNullable(news.get(name))))
        .toList();
  }

  /** By the path below the folder; two single sheets are a pair whatever their names. */
  private Map<String, Reviewed> byName(Review review, String root, boolean folders) {
    Map<String, Reviewed> named = new TreeMap<>();
    Path base = console.folder().resolve(root).normalize();
    for (Reviewed sheet : review.sheets()) {
      Path file = console.folder().resolve(sheet.path()).normalize();
      named.put(folders ? base.relativize(file).toString().replace('\\', '/') : "", sheet);
    }
    return named;
  }

  private boolean isFolder(String argument) throws InputException {
    try {
      return Files.isDirectory(console.folder().resolve(argument));
    } catch (InvalidPathException e) {
      throw new InputException("no path: " + argument);
    }
  }
}
