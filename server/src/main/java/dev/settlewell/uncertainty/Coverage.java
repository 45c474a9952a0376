package dev.settlewell.uncertainty;

import java.util.List;

/**
 * What a sum of independent contributions comes to: combined and expanded uncertainty.
 *
 * <p>The expanded uncertainty is not k = 2 times the combined one: a lone rectangle reaches 95 % at
 * 1.645 u, four equal ones at 1.940 u, a dominating one in between. It is computed from the
 * distribution of the sum itself, without random numbers, so that equal rows give equal figures.
 */
public final class Coverage {
  private Coverage() {}

  /**
   * The combined standard uncertainty u_c = √Σ u_i² (JCGM 100:2008, 5.1.2, all sensitivities
   * already in the rows).
   */
  public static double combined(List<Distribution> rows) {
    double sum = 0;
    for (Distribution row : rows) {
      sum += row.standard() * row.standard();
    }
    return Math.sqrt(sum);
  }

  /**
   * The half width U with P(|X| &lt;= U) = p of the sum X of independent contributions.
   *
   * <p>Rows with infinite degrees of freedom: from the distribution of the sum (see {@link
   * SymmetricSum}), exact but for the numerics: P is met within 5e-7, or 5e-6 where a sine
   * dominates. With type A rows: they enter that distribution as normal ones, and U is widened by
   * t_p(ν_eff) / t_p(∞), ν_eff after {@link #effectiveDegreesOfFreedom} and cut to the next lower
   * whole number (JCGM 100:2008, G.4.1 and G.6.4). So type A and normal rows alone give t_p(ν_eff)
   * u_c, as G.4 has it.
   *
   * @param probability p, above 0 and below 1
   * @return 0 without rows; never more than the sum of the hard limits
   */
  public static double expanded(List<Distribution> rows, double probability) {
    if (!(0 < probability && probability < 1)) {
      throw new IllegalArgumentException("no such probability: " + probability);
    }
    double nu = effectiveDegreesOfFreedom(rows);
    double half = SymmetricSum.of(rows).halfWidth(probability);
    if (nu == Double.POSITIVE_INFINITY) {
      return half;
    }
    return half
        * studentFactor(probability, wholeBelow(nu))
        / studentFactor(probability, Double.POSITIVE_INFINITY);
  }

  /**
   * The effective degrees of freedom ν_eff = u_c⁴ / Σ u_i⁴/ν_i (Welch-Satterthwaite, JCGM 100:2008,
   * G.4.1), ν_i infinite for every row that is no type A evaluation.
   *
   * @return infinite where no type A row has a part in the sum
   */
  public static double effectiveDegreesOfFreedom(List<Distribution> rows) {
    double total = combined(rows);
    double sum = 0;
    for (Distribution row : rows) {
      if (row instanceof Distribution.Student student && student.standard() > 0) {
        double part = student.standard() / total;
        sum += part * part * part * part / student.degreesOfFreedom();
      }
    }
    return sum > 0 ? 1 / sum : Double.POSITIVE_INFINITY;
  }

  /**
   * The coverage factor t_p(ν) with P(|T| &lt;= t) = p of Student's distribution (JCGM 100:2008,
   * table G.2).
   *
   * @param p above 0 and below 1
   * @param nu degrees of freedom, above 0; infinite for the normal distribution
   */
  public static double studentFactor(double p, double nu) {
    return StudentT.factor(p, nu);
  }

  /** JCGM 100:2008, G.4.1, note 1; an integer computed a rounding error too small stays itself. */
  private static double wholeBelow(double nu) {
    return Math.max(1, Math.floor(nu * (1 + 1e-12)));
  }
}
