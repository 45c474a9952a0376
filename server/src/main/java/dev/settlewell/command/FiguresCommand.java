package dev.settlewell.command;

import dev.settlewell.review.FiguresJson;
import dev.settlewell.review.FiguresText;
import dev.settlewell.review.Review;
import dev.settlewell.review.Summary;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

@Command(
    name = "figures",
    description = "Print every figure that is computed of a sheet, and what it rests on.",
    footer = {
      "",
      "Exit code: 0, or 2 for wrong usage, unreadable input or a fault of the tool.",
      "Findings do not count here: that is what `settlewell check` is for.",
      "",
      "Example: settlewell figures --channel level river.channels.yaml"
    })
final class FiguresCommand implements Callable<Integer> {
  @Parameters(
      arity = "0..*",
      paramLabel = "FILE|FOLDER|-",
      description = "Sheets, folders to search, or - for the standard input. Default: this folder.")
  private List<String> paths = new ArrayList<>();

  @Option(
      names = "--format",
      paramLabel = "FORMAT",
      converter = Format.OfFigures.class,
      description = "text or json. Default: text.")
  private Format format = Format.TEXT;

  @Option(
      names = "--channel",
      paramLabel = "NAME",
      description = "In text: only this channel; may be given several times.")
  private List<String> channels = new ArrayList<>();

  @Option(
      names = "--derivations",
      description = "In text: the formula of each figure, and the values that enter it.")
  private boolean derivations;

  @Option(
      names = "--stdin-name",
      paramLabel = "PATH",
      defaultValue = CheckCommand.STANDARD_INPUT_NAME,
      description = "Where the text of the standard input is taken to stand.")
  private String standardInputName;

  private final Console console;

  FiguresCommand(Console console) {
    this.console = console;
  }

  @Override
  public Integer call() throws InputException {
    Review review = new Sheets(console, console.today()).review(paths, standardInputName);
    Output output = new Output(console);
    review.failures().forEach(f -> output.note(f.path() + ": " + f.message()));
    requireChannels(review);
    output.result(
        format == Format.JSON
            ? FiguresJson.render(review)
            : FiguresText.render(review, channels, derivations, output.style()));
    boolean failed = Summary.of(review).faults() > 0 || !review.failures().isEmpty();
    return failed ? ExitCode.ERROR : ExitCode.CLEAN;
  }

  private void requireChannels(Review review) throws InputException {
    List<String> known =
        review.sheets().stream().flatMap(s -> s.sheet().channels().keySet().stream()).toList();
    for (String channel : channels) {
      if (!known.contains(channel)) {
        throw new InputException("no channel " + channel + ExplainCommand.nearest(channel, known));
      }
    }
  }
}
