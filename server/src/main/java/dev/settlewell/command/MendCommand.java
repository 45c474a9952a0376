package dev.settlewell.command;

import dev.settlewell.finding.catalog.Catalog;
import dev.settlewell.review.MendingText;
import dev.settlewell.review.Review;
import dev.settlewell.review.Reviewed;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

@Command(
    name = "mend",
    description = {
      "Mend what is certain: spellings, units' case, indentation, idle acceptances.",
      "No value changes, unless a finding is named with --finding."
    },
    footer = {
      "",
      "Every change is checked afresh before it is kept. Line ends stay as they are.",
      "",
      "Exit code: 0 done or nothing to do, 2 wrong usage or a file that was not written.",
      "",
      "Example: settlewell mend --dry-run boards/"
    })
final class MendCommand implements Callable<Integer> {
  @Parameters(
      arity = "1..*",
      paramLabel = "FILE|FOLDER",
      description = "Sheets, or folders to search.")
  private List<String> paths = new ArrayList<>();

  @Option(names = "--dry-run", description = "Show what would change, and write nothing.")
  private boolean dryRun;

  @Option(
      names = "--finding",
      paramLabel = "NAME",
      description = "Also apply the first computed remedy of this finding.")
  private Set<String> asked = new LinkedHashSet<>();

  private final Console console;

  MendCommand(Console console) {
    this.console = console;
  }

  @Override
  public Integer call() throws InputException {
    requireFindings();
    if (paths.contains(Sheets.STANDARD_INPUT)) {
      throw new InputException("mend writes files; it cannot mend the standard input");
    }
    Sheets sheets = new Sheets(console, console.today());
    Review review = sheets.review(paths, CheckCommand.STANDARD_INPUT_NAME);
    Output output = new Output(console);
    review.failures().forEach(f -> output.note(f.path() + ": " + f.message()));
    Mending mending = new Mending(sheets, asked);
    MendingText text = new MendingText(output.style(), dryRun);
    boolean failed = !review.failures().isEmpty();
    for (Reviewed sheet : review.sheets()) {
      Mending.Result result = mending.mend(sheet);
      try {
        write(result);
        result.steps().forEach(step -> text.step(step.before(), step.finding(), step.fix()));
      } catch (InputException e) {
        output.note(e.getMessage());
        failed = true;
      }
    }
    output.result(text.render());
    return failed ? ExitCode.ERROR : ExitCode.CLEAN;
  }

  private void write(Mending.Result result) throws InputException {
    if (!dryRun && result.changed()) {
      AtomicWriter.replace(
          console.folder().resolve(result.before().path()),
          result.before().text().content(),
          result.after().text().content());
    }
  }

  private void requireFindings() throws InputException {
    for (String name : asked) {
      if (!Catalog.NAMES.contains(name)) {
        throw new InputException(
            "no finding " + name + ExplainCommand.nearest(name, Catalog.NAMES));
      }
    }
  }
}
