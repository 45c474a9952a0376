package dev.settlewell.review;

import dev.settlewell.channel.Budget;
import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.channel.Figure;
import java.util.ArrayList;
import java.util.List;

/** The heads of an error budget as figures, for a comparison of revisions. */
final class BudgetFigures {
  private BudgetFigures() {}

  static List<Figure> of(ChannelFigures channel) {
    List<Figure> figures = new ArrayList<>();
    channel.budget().ifPresent(budget -> add(budget, figures));
    return figures;
  }

  private static void add(Budget budget, List<Figure> figures) {
    String unit = budget.unit();
    figures.add(Figure.of("budget-expanded", budget.expanded(), unit, ""));
    figures.add(Figure.of("budget-hard-limit", budget.hardLimit(), unit, ""));
    budget.margin().ifPresent(m -> figures.add(Figure.of("budget-margin", m, unit, "")));
  }
}
