package dev.settlewell.unit;

import java.util.List;
import java.util.Optional;

/**
 * All that a text says of a value's errors: {@code ±0.1 % of reading ±2 mm ±25 ppm/K (k=2)}.
 *
 * @param at the point the figures hold at, where stated ({@code ±80 nA at 85 °C})
 */
public record Deviation(
    List<Tolerance> tolerances,
    Optional<Drift> drift,
    Optional<Basis> basis,
    Optional<Quantity> at) {
  public static final Deviation NONE =
      new Deviation(List.of(), Optional.empty(), Optional.empty(), Optional.empty());

  public Deviation {
    tolerances = List.copyOf(tolerances);
  }

  public boolean isNone() {
    return tolerances.isEmpty() && drift.isEmpty();
  }
}
