package dev.settlewell.unit;

/**
 * A number with its unit.
 *
 * @param value in the coherent unit ({@link Unit#symbol()}): 4.7 kΩ is 4700; a temperature point is
 *     in °C, a temperature difference in kelvin
 */
public record Quantity(double value, Unit unit) {}
