package dev.settlewell.command;

import dev.settlewell.review.FindingsJson;
import dev.settlewell.review.FindingsJunit;
import dev.settlewell.review.FindingsSarif;
import dev.settlewell.review.FindingsText;
import dev.settlewell.review.Review;
import dev.settlewell.review.Summary;
import dev.settlewell.workspace.ProjectFile;
import dev.settlewell.workspace.Workspace;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

@Command(
    name = "check",
    description = "Check channel sheets and report what is wrong, with the figures.",
    footer = {
      "",
      "Exit code: 0 clean, 1 findings at or above --fail-on, 2 wrong usage, unreadable",
      "input or a fault of the tool.",
      "",
      "Example: settlewell check firmware/ --format sarif > findings.sarif"
    })
final class CheckCommand implements Callable<Integer> {
  static final String STANDARD_INPUT_NAME = "stdin.channels.yaml";

  @Parameters(
      arity = "0..*",
      paramLabel = "FILE|FOLDER|-",
      description = "Sheets, folders to search, or - for the standard input. Default: this folder.")
  private List<String> paths = new ArrayList<>();

  @Option(
      names = "--format",
      paramLabel = "FORMAT",
      converter = Format.OfFindings.class,
      description = "text, json, sarif or junit. Default: text.")
  private Format format = Format.TEXT;

  @Option(
      names = "--fail-on",
      paramLabel = "SEVERITY",
      converter = FailLevel.Converter.class,
      description =
          "error, warning, information, hint or never. Default: what .settlewell.yaml says, else"
              + " warning.")
  private FailLevel failOn;

  @Option(
      names = "--fail-on-unjudged",
      description = "Fail too when a figure lacks an input and could not be judged.")
  private boolean failOnUnjudged;

  @Option(names = "--accepted", description = "Show the findings that the sheets accept, too.")
  private boolean accepted;

  @Option(
      names = "--remedies",
      description = "Show the ways to mend a finding that a fresh computation proves.")
  private boolean remedies;

  @Option(
      names = "--date",
      paramLabel = "DAY",
      converter = DayConverter.class,
      description = "Judge acceptances on this day (2027-06-30). Default: today, UTC.")
  private LocalDate date;

  @Option(
      names = "--stdin-name",
      paramLabel = "PATH",
      defaultValue = STANDARD_INPUT_NAME,
      description = "Where the text of the standard input is taken to stand.")
  private String standardInputName;

  private final Console console;

  CheckCommand(Console console) {
    this.console = console;
  }

  @Override
  public Integer call() throws InputException {
    Sheets sheets = new Sheets(console, date == null ? console.today() : date);
    Review review = sheets.review(paths, standardInputName);
    if (remedies || format == Format.SARIF || format == Format.JSON) {
      review = sheets.withRemedies(review);
    }
    Output output = new Output(console);
    ProjectFile project = sheets.project();
    project.problems().forEach(p -> output.note(Workspace.PROJECT_FILE + ": " + p.message()));
    if (failOn == null) {
      failOn = FailLevel.of(project.failOn().orElse("warning"));
    }
    review.failures().forEach(f -> output.note(f.path() + ": " + f.message()));
    output.result(render(review, output));
    return exitCode(review);
  }

  private String render(Review review, Output output) {
    return switch (format) {
      case TEXT -> FindingsText.render(review, accepted, output.style());
      case JSON -> FindingsJson.render(review);
      case SARIF -> FindingsSarif.render(review);
      case JUNIT -> FindingsJunit.render(review, failOn.severity());
      case MARKDOWN -> throw new IllegalStateException("not offered");
    };
  }

  private int exitCode(Review review) {
    Summary summary = Summary.of(review);
    if (summary.faults() > 0 || !review.failures().isEmpty()) {
      return ExitCode.ERROR;
    }
    boolean fails = failOn.severity().map(level -> summary.atLeast(level) > 0).orElse(false);
    boolean unjudged = failOnUnjudged && summary.unjudged() > 0;
    return fails || unjudged ? ExitCode.FINDINGS : ExitCode.CLEAN;
  }
}
