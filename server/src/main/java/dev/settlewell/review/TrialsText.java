package dev.settlewell.review;

import dev.settlewell.channel.Simulation;
import dev.settlewell.unit.Engineering;
import java.util.List;

/** Budgets by random trials, for people. */
public final class TrialsText {
  private static final int COLUMNS = 80;
  private static final int LABEL_COLUMNS = 26;
  private static final String INDENT = "  ";

  private TrialsText() {}

  public static String render(String path, List<Simulation> simulations, Style style) {
    StringBuilder out = new StringBuilder();
    out.append(style.bold(Terminal.line(path))).append("\n\n");
    if (simulations.isEmpty()) {
      out.append(INDENT).append("no channel of a scan has all that an error budget needs\n\n");
    }
    simulations.forEach(simulation -> channel(simulation, style, out));
    return out.toString();
  }

  private static void channel(Simulation trials, Style style, StringBuilder out) {
    out.append(style.bold("channel " + trials.channel())).append(", scan ").append(trials.scan());
    out.append('\n');
    row(out, "budget, 95 %", "±" + Engineering.message(trials.expanded(), trials.unit()));
    row(
        out,
        "trials, shortest 95 %",
        Engineering.message(trials.low(), trials.unit())
            + " to "
            + Engineering.message(trials.high(), trials.unit()));
    row(out, "trials, mean", Engineering.message(trials.mean(), trials.unit()));
    row(out, "trials, standard", Engineering.message(trials.standard(), trials.unit()));
    row(out, "trials, seed", trials.trials() + ", " + trials.seed());
    for (String line : Terminal.wrapped(INDENT + trials.verdict(), COLUMNS, INDENT.length())) {
      out.append(line).append('\n');
    }
    out.append('\n');
  }

  private static void row(StringBuilder out, String label, String value) {
    out.append(INDENT).append(Terminal.padded(label, LABEL_COLUMNS)).append(value).append('\n');
  }
}
