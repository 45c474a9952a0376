package dev.settlewell.channel;

import dev.settlewell.text.Place;

/**
 * Where one line (an interferer or a harmonic of it) lands in a channel's results, and how large.
 *
 * @param harmonic 1 for the interferer itself
 * @param frequency nominal, Hz
 * @param low least frequency of the line within its tolerance, Hz
 * @param high greatest
 * @param landsLow lowest frequency it may land at in the results, Hz, tolerances of line and rate
 *     counted
 * @param landsHigh highest
 * @param gain worst gain from the sensor to the result: path and averaging
 * @param amplitudeVolts peak, at the hold capacitor after averaging
 * @param amplitudeLsb the same in LSB
 * @param amplitudeMeasured the same in the measured unit, at the worst point of the range
 * @param inBand whether it may land inside the wanted band (false without {@code band})
 * @param readsAsOffset whether it lands so near 0 Hz that it reads as a constant
 * @param aliased whether the line lies above half the result rate
 * @param place the interferer as this channel names it
 */
public record Alias(
    String interferer,
    int harmonic,
    double frequency,
    double low,
    double high,
    double landsLow,
    double landsHigh,
    double gain,
    double amplitudeVolts,
    double amplitudeLsb,
    double amplitudeMeasured,
    boolean inBand,
    boolean readsAsOffset,
    boolean aliased,
    Place place) {}
