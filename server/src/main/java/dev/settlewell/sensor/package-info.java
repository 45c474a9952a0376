/**
 * Sensors as curves: what a measured quantity does to a resistance or a voltage, and back.
 *
 * <p>Pure functions and small immutable types. Temperatures are in °C, everything else in SI units.
 * A curve answers inside its stated domain only; outside it says NaN and never extrapolates.
 */
package dev.settlewell.sensor;
