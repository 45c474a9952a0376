package dev.settlewell.command;

import dev.settlewell.lsp.Server;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;

@Command(
    name = "serve",
    description = "Run the language server for an editor, over standard input and output.",
    footer = {"", "Example (an editor's setting): [\"settlewell\", \"serve\"]"})
final class ServeCommand implements Callable<Integer> {
  /** Some clients append it to every server's command. */
  @Option(names = "--stdio", description = "What it does anyway; accepted as editors pass it.")
  private boolean standardStreams;

  private final Console console;

  ServeCommand(Console console) {
    this.console = console;
  }

  @Override
  public Integer call() {
    return Server.run(console.in(), console.out(), console.version());
  }
}
