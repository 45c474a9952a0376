package dev.settlewell.channel;

import dev.settlewell.text.Place;
import dev.settlewell.unit.Basis;
import java.util.List;
import java.util.Optional;

/**
 * One independent reason why a parameter differs from its nominal value: one row of a budget.
 *
 * @param row the row's name
 * @param parameter index of the parameter it moves
 * @param minus how far below the nominal it may lie
 * @param plus how far above
 * @param basis empty: a hard limit
 * @param oneSided true where the middle of its effect is a known offset (self-heating), not an
 *     accident of rounding
 * @param scalesWithLsb a property of the converter that is stated in LSB
 * @param typicalOnly rests on a figure that is typical only
 */
record Spread(
    String row,
    int parameter,
    Extent minus,
    Extent plus,
    Optional<Basis> basis,
    boolean oneSided,
    boolean scalesWithLsb,
    boolean typicalOnly,
    List<Place> places) {
  Spread {
    places = List.copyOf(places);
  }

  static Spread of(String row, int parameter, Extent both, Optional<Basis> basis, List<Place> at) {
    return new Spread(row, parameter, both, both, basis, false, false, false, at);
  }
}
