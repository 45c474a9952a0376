package dev.settlewell.channel;

import dev.settlewell.text.Place;

/**
 * What an amplifier's output must reach over the measured range, V, and what it can.
 *
 * @param place the stage's key
 * @param swingPlace where {@code swing} stands
 */
public record OutputRange(
    Place place,
    Place swingPlace,
    double nominalLow,
    double nominalHigh,
    double worstLow,
    double worstHigh,
    double swingLow,
    double swingHigh) {}
