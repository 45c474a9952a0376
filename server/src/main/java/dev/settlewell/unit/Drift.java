package dev.settlewell.unit;

import java.util.Optional;

/**
 * A change with temperature.
 *
 * @param perKelvin magnitude, coherent: a share per kelvin (1e-4 for 100 ppm/K) or e.g. V/K
 * @param unit the unit of what changes (the numerator)
 * @param box the range over which the box method bounds the whole excursion; empty: a slope from 25
 *     °C
 */
public record Drift(double perKelvin, Unit unit, Optional<Range> box) {}
