package dev.settlewell.circuit;

/** One element of a signal path, from the sensor to the pin. */
public sealed interface Element permits Rung, Amplifier, ActiveFilter {}
