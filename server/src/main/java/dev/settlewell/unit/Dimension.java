package dev.settlewell.unit;

/** What a unit measures. Two values compare only where their dimensions are the same. */
public enum Dimension {
  RESISTANCE,
  CAPACITANCE,
  VOLTAGE,
  CURRENT,
  POWER,
  FREQUENCY,
  TIME,
  LENGTH,
  MASS,
  FORCE,
  PRESSURE,
  /** A point on a temperature scale, coherent in °C; differences are kelvin. */
  TEMPERATURE,
  /** A plain share: %, ppm, V/V; coherent unit 1. */
  RATIO,
  DECIBEL,
  LSB,
  CYCLES,
  BITS,
  SLEW_RATE,
  VOLTAGE_NOISE_DENSITY,
  CURRENT_NOISE_DENSITY,
  VOLTAGE_DRIFT,
  CURRENT_DRIFT,
  RATIO_DRIFT,
  POWER_PER_KELVIN,
  /** A word of the user's own (bar, rpm, %RH), compared by its spelling. */
  WORD,
  /** A composite the format has no name for (m/s); compared by its coherent spelling. */
  OTHER
}
