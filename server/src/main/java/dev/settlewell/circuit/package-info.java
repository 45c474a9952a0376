/**
 * Linear circuits between a sensor and the hold capacitor of a converter.
 *
 * <p>A path is a chain of two-ports. What is passive after the last amplifier is a {@link
 * dev.settlewell.circuit.Ladder}; {@link dev.settlewell.circuit.Settling} samples it.
 *
 * <p>{@link dev.settlewell.circuit.FrequencyResponse} and {@link dev.settlewell.circuit.Noise} take
 * the whole path; {@link dev.settlewell.circuit.Averaging}, {@link dev.settlewell.circuit.Aliasing}
 * and {@link dev.settlewell.circuit.Lines} say what sampling makes of what comes through.
 *
 * <p>Everything here is in SI units and knows nothing of sheets, files or units of measure.
 */
package dev.settlewell.circuit;
