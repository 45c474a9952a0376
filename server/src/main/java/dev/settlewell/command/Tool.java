package dev.settlewell.command;

import java.io.PrintWriter;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Help;
import picocli.CommandLine.IVersionProvider;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;

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
    line.addSubcommand(new ExplainCommand(console));
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
    CommandLine command = wrong.getCommandLine();
    output.note(wrong.getMessage());
    PrintWriter err = command.getErr();
    if (!CommandLine.UnmatchedArgumentException.printSuggestions(wrong, err)) {
      output.note("try `" + command.getCommandSpec().qualifiedName() + " --help`");
    }
    return ExitCode.ERROR;
  }

  private static int failed(Exception fault, Output output) {
    output.note(fault instanceof InputException ? fault.getMessage() : Faults.sentence(fault));
    return ExitCode.ERROR;
  }
}
