package dev.settlewell.assist;

import dev.settlewell.channel.Budget;
import dev.settlewell.channel.BudgetRow;
import dev.settlewell.unit.Engineering;

/** An error budget as lines: the total against what is needed, then what it is made of. */
final class BudgetWords {
  private static final double SMALLEST_SHARE = 0.005;

  private BudgetWords() {}

  static void tell(Budget budget, Prose prose) {
    String unit = budget.unit();
    prose.paragraph(total(budget));
    prose.item("hard limit: ±" + Engineering.message(budget.hardLimit(), unit));
    if (budget.offset() != 0) {
      prose.item("known offset: " + Engineering.message(budget.offset(), unit));
    }
    double rest = 0;
    for (BudgetRow row : budget.rows()) {
      if (row.share() < SMALLEST_SHARE) {
        rest += row.share();
      } else {
        prose.item(row(row, unit));
      }
    }
    if (rest > 0) {
      prose.item("all others: " + Engineering.message(rest, "1"));
    }
  }

  static String total(Budget budget) {
    String unit = budget.unit();
    String judged = budget.worstCase() ? "hard limit" : "error at 95 %";
    String total = judged + ": ±" + Engineering.message(budget.judged(), unit);
    if (budget.needs().isPresent()) {
      String needs = Engineering.message(budget.needs().getAsDouble(), unit);
      boolean met = budget.judged() <= budget.needs().getAsDouble();
      total += (met ? ", within" : ", more than") + " the needed ±" + needs;
    }
    return total + ", at " + Engineering.message(budget.at(), unit);
  }

  private static String row(BudgetRow row, String unit) {
    return row.name().replace('-', ' ')
        + ": "
        + Engineering.message(row.share(), "1")
        + " (±"
        + Engineering.message(row.limit(), unit)
        + (row.bounded() ? ")" : ", three standard uncertainties)");
  }
}
