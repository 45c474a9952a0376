package dev.settlewell.command;

import dev.settlewell.finding.Pages;
import dev.settlewell.finding.catalog.Catalog;
import dev.settlewell.review.CatalogText;
import dev.settlewell.vocabulary.Nearest;
import java.util.Collection;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Parameters;

@Command(
    name = "explain",
    description = "Explain a finding: the mistake, its computation, how to mend it, its sources.",
    footer = {
      "",
      "Without a name it lists all findings.",
      "",
      "Example: settlewell explain acquisition-too-short"
    })
final class ExplainCommand implements Callable<Integer> {
  @Parameters(arity = "0..1", paramLabel = "FINDING", description = "The name of a finding.")
  private String name;

  private final Console console;

  ExplainCommand(Console console) {
    this.console = console;
  }

  @Override
  public Integer call() throws InputException {
    Output output = new Output(console);
    if (name == null) {
      output.result(CatalogText.render(Catalog.CHECKS, output.style()));
      return ExitCode.CLEAN;
    }
    if (!Catalog.NAMES.contains(name)) {
      throw new InputException(
          "no finding "
              + name
              + nearest(name, Catalog.NAMES)
              + " (`settlewell explain` lists all)");
    }
    Pages.Page page =
        Pages.of(name).orElseThrow(() -> new InputException("there is no page of " + name));
    output.result(page.text().stripTrailing() + "\n");
    return ExitCode.CLEAN;
  }

  /** {@code ; did you mean over-range?}, or nothing. */
  static String nearest(String written, Collection<String> known) {
    return Nearest.of(written, known).map(word -> "; did you mean " + word + "?").orElse("");
  }
}
