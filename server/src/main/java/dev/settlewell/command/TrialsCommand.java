package dev.settlewell.command;

import dev.settlewell.channel.Analyzer;
import dev.settlewell.channel.Simulation;
import dev.settlewell.review.Review;
import dev.settlewell.review.Reviewed;
import dev.settlewell.review.TrialsText;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** The error budgets by random trials, beside those by moving each parameter. */
@Command(
    name = "trials",
    description = {
      "Repeat the error budgets by random trials, every tolerance drawn at once (JCGM 101).",
      "It confirms a budget, or says that the channel is too far from linear for it."
    },
    footer = {
      "",
      "Exit code: 0, or 2 for wrong usage, unreadable input or a fault of the tool.",
      "The same seed gives the same figures on every machine.",
      "",
      "Example: settlewell trials --count 1000000 river.channels.yaml"
    })
final class TrialsCommand implements Callable<Integer> {
  @Parameters(
      arity = "0..*",
      paramLabel = "FILE|FOLDER|-",
      description = "Sheets, folders to search, or - for the standard input. Default: this folder.")
  private List<String> paths = new ArrayList<>();

  @Option(
      names = "--count",
      paramLabel = "N",
      defaultValue = "200000",
      description = "How many trials a channel, 1000 to 10000000. Default: ${DEFAULT-VALUE}.")
  private int count;

  @Option(
      names = "--seed",
      paramLabel = "N",
      defaultValue = "1",
      description = "Seed of the random numbers. Default: ${DEFAULT-VALUE}.")
  private long seed;

  @Option(
      names = "--stdin-name",
      paramLabel = "PATH",
      defaultValue = CheckCommand.STANDARD_INPUT_NAME,
      description = "Where the text of the standard input is taken to stand.")
  private String standardInputName;

  @Spec private CommandSpec spec;

  private final Console console;

  TrialsCommand(Console console) {
    this.console = console;
  }

  @Override
  public Integer call() throws InputException {
    if (count < 1_000 || count > 10_000_000) {
      throw new ParameterException(
          spec.commandLine(), "--count takes 1000 to 10000000, not " + count);
    }
    Review review = new Sheets(console, console.today()).review(paths, standardInputName);
    Output output = new Output(console);
    review.failures().forEach(f -> output.note(f.path() + ": " + f.message()));
    StringBuilder text = new StringBuilder();
    for (Reviewed sheet : review.sheets()) {
      text.append(TrialsText.render(sheet.path(), trials(sheet), output.style()));
    }
    output.result(text.toString());
    return review.failures().isEmpty() ? ExitCode.CLEAN : ExitCode.ERROR;
  }

  private List<Simulation> trials(Reviewed sheet) {
    List<Simulation> all = new ArrayList<>();
    for (String channel : sheet.sheet().channels().keySet()) {
      all.addAll(Analyzer.simulate(sheet.analysis().linked(), channel, seed, count));
    }
    return all;
  }
}
