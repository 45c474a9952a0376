package dev.settlewell.channel;

/**
 * A budget by random trials (JCGM 101), beside the one by moving each parameter.
 *
 * @param seed of the random numbers: the same seed gives the same figures
 * @param low low end of the shortest interval that holds 95 % of the errors, measured unit
 * @param high its high end
 * @param expanded the budget's own figure
 * @param agrees whether that interval ends within 5 % of the budget's expanded uncertainty
 */
public record Simulation(
    String channel,
    String scan,
    String unit,
    long seed,
    int trials,
    double mean,
    double standard,
    double low,
    double high,
    double expanded,
    boolean agrees) {

  /** The half width that is comparable with an expanded uncertainty about zero. */
  public double reach() {
    return Math.max(Math.abs(low), Math.abs(high));
  }

  /** What a reader should conclude. */
  public String verdict() {
    return agrees
        ? "random trials confirm the budget"
        : "random trials disagree with the budget: the channel is far from linear within its"
            + " tolerances; take the trials' interval";
  }
}
