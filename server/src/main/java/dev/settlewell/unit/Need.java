package dev.settlewell.unit;

import java.util.List;

/**
 * How well a channel must be measured.
 *
 * @param tolerances added together; a share is of the width of {@code measures} unless it says else
 * @param worstCase true: the hard limit is judged, else the expanded uncertainty at 95 %
 */
public record Need(List<Tolerance> tolerances, boolean worstCase) {
  public Need {
    tolerances = List.copyOf(tolerances);
  }
}
