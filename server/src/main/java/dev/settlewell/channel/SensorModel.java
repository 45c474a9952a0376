package dev.settlewell.channel;

import java.util.List;
import java.util.Optional;

/** A sensor as the forward model sees it: the electrical source it is at a measured value. */
interface SensorModel {

  /**
   * @param x the measured quantity, in the measured unit
   * @param p the values of the parameters
   */
  Port port(double x, double[] p);

  /** Whether its resistance depends on the measured quantity: then no end of the range is worst. */
  default boolean resistanceVaries() {
    return false;
  }

  /** Parameters that are resistances of its source: the settling's worst case has them high. */
  default List<Integer> resistances() {
    return List.of();
  }

  /** Lowest value its curve holds for; minus infinity where it has none. */
  default double low() {
    return Double.NEGATIVE_INFINITY;
  }

  default double high() {
    return Double.POSITIVE_INFINITY;
  }

  /** What the path sees once a lead has come off: by default, nothing. */
  default Optional<Port> open(double[] p) {
    return Optional.of(Port.current(0, 0));
  }

  /** Its leads shorted together; empty where that is no fault of this sensor. */
  Optional<Port> shorted(double[] p);

  /** Whether it drives a current: an interferer then stands in series with it and its shunt. */
  default boolean drivesCurrent() {
    return false;
  }

  /** Currents at which a two-wire loop reports its own failure, A; empty where it is none. */
  default List<Double> failureCurrents() {
    return List.of();
  }

  /** Power that warms it by one kelvin, W/K; NaN where it is not stated or does not matter. */
  default double dissipationConstant() {
    return Double.NaN;
  }

  /** Current its own source drives through it, A; NaN where the path drives it. */
  default double excitationCurrent(double[] p) {
    return Double.NaN;
  }
}
