package dev.settlewell.unit;

import java.util.OptionalInt;

/**
 * On what a tolerance rests: a normal distribution with coverage factor {@code k}; {@code n} values
 * where it is a type A evaluation. Without a basis a tolerance is a hard limit.
 */
public record Basis(double k, OptionalInt n) {}
