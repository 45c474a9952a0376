package dev.settlewell.channel;

import dev.settlewell.text.Place;
import java.util.List;

/**
 * One contribution to a channel's error, in the measured unit.
 *
 * @param name kebab-case: {@code quantization}, {@code reference-drift}, {@code resistor-1}
 * @param limit largest magnitude; three standard uncertainties where it has no hard limit
 * @param standard standard uncertainty
 * @param share of the combined variance, 0 to 1
 * @param distribution {@code rectangular}, {@code normal}, {@code sine}, {@code student}
 * @param bounded false where the limit is three standard uncertainties
 * @param scalesWithLsb whether a smaller LSB makes it smaller (quantization, converter errors)
 * @param places the values it rests on
 */
public record BudgetRow(
    String name,
    double limit,
    double standard,
    double share,
    String distribution,
    boolean bounded,
    boolean scalesWithLsb,
    List<Place> places) {
  public BudgetRow {
    places = List.copyOf(places);
  }
}
