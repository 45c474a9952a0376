package dev.settlewell.sheet;

import dev.settlewell.unit.Deviation;
import dev.settlewell.unit.Toleranced;
import dev.settlewell.unit.Unit;
import java.util.Map;
import java.util.Optional;

/**
 * What a value's surroundings decide about its meaning.
 *
 * @param measured the unit of the channel that is being bound, once its {@code measures} is read
 * @param defaults the sheet's {@code defaults}: what errors a component has that states none
 */
record Scope(Optional<Unit> measured, Map<String, Deviation> defaults) {
  static final Scope EMPTY = new Scope(Optional.empty(), Map.of());

  Scope measuring(Optional<Unit> unit) {
    return new Scope(unit, defaults);
  }

  Scope with(Map<String, Deviation> newDefaults) {
    return new Scope(measured, newDefaults);
  }

  /**
   * Tolerance and drift are filled in separately. A value whose limits are given as values, or that
   * is stated as typical only, has said what there is to say of its tolerance.
   */
  Toleranced filled(Toleranced value, Optional<String> errorsFrom) {
    Deviation fill = errorsFrom.map(defaults::get).orElse(null);
    if (fill == null) {
      return value;
    }
    Deviation own = value.deviation();
    boolean saysTolerance =
        !own.tolerances().isEmpty()
            || value.min().isPresent()
            || value.max().isPresent()
            || value.typicalOnly();
    return value.with(
        new Deviation(
            saysTolerance ? own.tolerances() : fill.tolerances(),
            own.drift().or(fill::drift),
            saysTolerance ? own.basis() : fill.basis(),
            saysTolerance ? own.at() : fill.at()));
  }
}
