package dev.settlewell.review;

import dev.settlewell.channel.Alias;
import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.Budget;
import dev.settlewell.channel.BudgetRow;
import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.channel.Figure;
import dev.settlewell.channel.Figures;
import dev.settlewell.sheet.Named;
import dev.settlewell.unit.Engineering;
import java.util.List;

/** Figures for people: a heading a channel, a row a figure, no wider than 80 columns. */
public final class FiguresText {
  private static final int COLUMNS = 80;
  private static final int NAME_COLUMNS = 30;
  private static final int SHARE_COLUMNS = 9;
  private static final String INDENT = "  ";

  private final Locations locations;
  private final List<String> channels;
  private final boolean derivations;
  private final Style style;
  private final StringBuilder out = new StringBuilder();

  private FiguresText(Review review, List<String> channels, boolean derivations, Style style) {
    this.locations = review.locations();
    this.channels = channels;
    this.derivations = derivations;
    this.style = style;
  }

  /**
   * @param channels the only ones to tell of; empty: all, with converters and scans
   * @param derivations whether each figure's formula and operands are told
   */
  public static String render(
      Review review, List<String> channels, boolean derivations, Style style) {
    FiguresText text = new FiguresText(review, channels, derivations, style);
    review.sheets().forEach(text::sheet);
    return text.out.toString();
  }

  private void sheet(Reviewed sheet) {
    Analysis analysis = sheet.analysis();
    line(style.bold(Terminal.line(sheet.path())));
    out.append('\n');
    if (channels.isEmpty()) {
      analysis.converters().forEach((name, c) -> block("converter " + name, c.figures()));
      analysis.scans().forEach((name, s) -> block("scan " + name, s.figures()));
    }
    analysis.channels().stream()
        .filter(c -> channels.isEmpty() || channels.contains(c.channel().name()))
        .forEach(this::channel);
  }

  private void channel(ChannelFigures channel) {
    String scan = channel.scan().map(Named::name).map(name -> ", scan " + name).orElse("");
    line(style.bold("channel " + channel.channel().name()) + scan + visits(channel));
    figures(channel.figures());
    aliases(channel);
    channel.budget().ifPresent(this::budget);
    channel.faults().forEach(fault -> line(INDENT + "not worked out: " + Terminal.line(fault)));
    out.append('\n');
  }

  private static String visits(ChannelFigures channel) {
    return channel.visits() > 1 ? ", visited " + channel.visits() + " times" : "";
  }

  private void block(String heading, Figures figures) {
    line(style.bold(heading));
    figures(figures);
    out.append('\n');
  }

  private void figures(Figures figures) {
    figures.all().forEach(this::figure);
  }

  private void figure(Figure figure) {
    String name = Terminal.padded(figure.name(), NAME_COLUMNS);
    String at =
        figure.at().isPresent() && figure.value().isPresent()
            ? " at " + Engineering.digits(figure.at().getAsDouble(), 3)
            : "";
    line(INDENT + name + " " + Terminal.line(FigureWords.state(figure)) + at);
    if (derivations && !figure.formula().isEmpty()) {
      line(INDENT + INDENT + style.faint("= " + Terminal.line(figure.formula())));
      figure.operands().forEach(this::operand);
    }
  }

  private void operand(Figure.Operand operand) {
    String where = operand.place().map(locations::pointer).map(at -> "  " + at).orElse("");
    line(
        INDENT.repeat(3)
            + Terminal.padded(Terminal.line(operand.name()), NAME_COLUMNS - 4)
            + " "
            + FigureWords.value(operand.value(), operand.unit(), false)
            + style.faint(Terminal.line(where)));
  }

  private void aliases(ChannelFigures channel) {
    if (channel.aliases().isEmpty()) {
      return;
    }
    line(INDENT + style.faint("lines of interference, as the results show them"));
    for (Alias alias : channel.aliases()) {
      String name = alias.interferer() + (alias.harmonic() > 1 ? " x" + alias.harmonic() : "");
      line(
          INDENT.repeat(2)
              + Terminal.padded(name, NAME_COLUMNS - 2)
              + " "
              + Engineering.message(alias.frequency(), "Hz")
              + " reads at "
              + lands(alias)
              + ", "
              + Engineering.message(alias.amplitudeLsb(), "LSB")
              + (alias.inBand() ? ", in the band" : "")
              + (alias.readsAsOffset() ? ", as an offset" : ""));
    }
  }

  private static String lands(Alias alias) {
    String low = Engineering.message(alias.landsLow(), "Hz");
    String high = Engineering.message(alias.landsHigh(), "Hz");
    return low.equals(high) ? low : low + " to " + high;
  }

  private void budget(Budget budget) {
    String unit = budget.unit();
    line(
        INDENT
            + style.faint(
                "budget at "
                    + Engineering.message(budget.at(), unit)
                    + ", "
                    + Engineering.digits(budget.ambient(), 3)
                    + " °C"));
    budgetLine("expanded (95 %)", budget.expanded(), unit);
    budgetLine("hard limit", budget.hardLimit(), unit);
    budget.needs().ifPresent(needs -> budgetLine("needs", needs, unit));
    budget.margin().ifPresent(margin -> budgetLine("margin", margin, unit));
    line(INDENT.repeat(2) + style.faint("share of the variance, and limit"));
    budget.rows().forEach(row -> row(row, unit));
  }

  private void budgetLine(String name, double value, String unit) {
    line(
        INDENT.repeat(2)
            + Terminal.padded(name, NAME_COLUMNS - 2)
            + " "
            + Engineering.message(value, unit));
  }

  private void row(BudgetRow row, String unit) {
    String share = Terminal.led(Engineering.message(row.share(), "1"), SHARE_COLUMNS);
    line(
        INDENT.repeat(2)
            + Terminal.padded(Terminal.line(row.name()), NAME_COLUMNS - 2)
            + share
            + "  ±"
            + Engineering.message(row.limit(), unit)
            + (row.bounded() ? "" : " (three sigma)"));
  }

  private void line(String text) {
    Terminal.wrapped(text, COLUMNS, NAME_COLUMNS + 3)
        .forEach(part -> out.append(part).append('\n'));
  }
}
