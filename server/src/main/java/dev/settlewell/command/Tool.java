package dev.settlewell.command;

import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Help;
import picocli.CommandLine.IVersionProvider;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;
import picocli.CommandLine.UnmatchedArgumentException;

/** The command line as a whole: what a person types after {@code settlewell}. */
@Command(
    name = "settlewell",
    description = "Checks channel sheets: what a multiplexed ADC measures, and how well.",
    synopsisSubcommandLabel = "COMMAND",
    footer = {
      "",
      "`settlewell COMMAND --help` tells more of each.",
      "",
      "Example: settlewell check boards/"
    })
public final class Tool implements Runnable {
  private static final int HELP_WIDTH = 80;

  @Spec private CommandSpec spec;

  @Option(
      names = {"-h", "--help"},
      usageHelp = true,
      scope = CommandLine.ScopeType.INHERIT,
      description = "Show this help and exit.")
  private boolean help;

  @Option(
      names = {"-V", "--version"},
      versionHelp = true,
      description = "Show the version and exit.")
  private boolean version;

  private Tool() {}

  /**
   * Runs one command.
   *
   * @return the exit code of the process
   */
  public static int run(Console console, String... arguments) {
    CommandLine line = new CommandLine(new Tool());
    line.addSubcommand(new CheckCommand(console));
    line.addSubcommand(new FiguresCommand(console));
    line.addSubcommand(new TrialsCommand(console));
    line.addSubcommand(new ExplainCommand(console));
    line.addSubcommand(new MendCommand(console));
    line.addSubcommand(new CompareCommand(console));
    line.addSubcommand(new ServeCommand(console));
    IVersionProvider version = () -> new String[] {"settlewell " + console.version()};
    line.getCommandSpec().versionProvider(version);
    Output output = new Output(console);
    line.setExpandAtFiles(false);
    line.setUsageHelpWidth(HELP_WIDTH);
    line.setColorScheme(
        Help.defaultColorScheme(Output.coloured(console) ? Help.Ansi.ON : Help.Ansi.OFF));
    line.setOut(Output.printer(console.out()));
    line.setErr(Output.printer(console.err()));
    line.setParameterExceptionHandler((wrong, given) -> wrongUsage(wrong, output));
    line.setExecutionExceptionHandler((fault, command, parsed) -> failed(fault, output));
    return line.execute(arguments);
  }

  /** No command was given. */
  @Override
  public void run() {
    throw new ParameterException(spec.commandLine(), "a command is missing");
  }

  private static int wrongUsage(ParameterException wrong, Output output) {
    String help = "try `" + wrong.getCommandLine().getCommandSpec().qualifiedName() + " --help`";
    String message = wrong.getMessage();
    if (wrong instanceof UnmatchedArgumentException unmatched) {
      String word = unmatched.getUnmatched().get(0);
      String nearest = unmatched.getSuggestions().stream().findFirst().orElse("");
      message =
          (word.startsWith("-") ? "no option " : "no command ")
              + word
              + (nearest.isEmpty() ? "" : "; did you mean " + nearest + "?");
    }
    output.note(message);
    output.note(help);
    return ExitCode.ERROR;
  }

  private static int failed(Exception fault, Output output) {
    output.note(fault instanceof InputException ? fault.getMessage() : Faults.sentence(fault));
    return ExitCode.ERROR;
  }
}
