package dev.settlewell.unit;

import java.util.List;
import java.util.Optional;

/**
 * What a key takes, as far as reading one value needs it.
 *
 * @param dimensions those the key takes, the likeliest first; empty: any (a measured unit)
 * @param measured the channel's measured unit, where the key takes it
 * @param temperatureDifference true where °C and K both mean a difference
 * @param positive true where the value must be above zero
 * @param shuntSized true where milliohms are usual, so that {@code 5 mohm} is not asked back about
 */
public record Expected(
    List<Dimension> dimensions,
    Optional<Unit> measured,
    boolean temperatureDifference,
    boolean positive,
    boolean shuntSized) {
  public Expected {
    dimensions = List.copyOf(dimensions);
  }

  public static Expected of(Dimension... dimensions) {
    return new Expected(List.of(dimensions), Optional.empty(), false, false, false);
  }
}
