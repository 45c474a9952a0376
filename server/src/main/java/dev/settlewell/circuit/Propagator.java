package dev.settlewell.circuit;

import java.util.Optional;

/** Free motion of a chain's state (error coordinate): x(t) = e^(-A t) x(0). */
interface Propagator {

  /** The motion over a time, in s, 0 or more. */
  Motion over(double seconds);

  /** An upper bound for the magnitude of all rates of this motion, in 1/s. */
  double fastestRate();

  /** The oscillation in this motion, where there is one; a chain has at most one. */
  Optional<Ringing> ringing();

  /**
   * A damped oscillation e^(-decay t) cos(angular t).
   *
   * @param angular in rad/s
   * @param decay in 1/s
   */
  record Ringing(double angular, double decay) {}

  /**
   * The motion over some time, kept twice so that neither what is left nor what is lost suffers
   * from a difference of nearly equal numbers.
   *
   * @param kept e^(-A t)
   * @param lost I - e^(-A t)
   */
  record Motion(double[][] kept, double[][] lost) {

    /** This motion, then another of the same circuit. */
    Motion then(Motion other) {
      return new Motion(
          Matrices.product(other.kept, kept), Matrices.composedLoss(lost, other.lost));
    }
  }

  /** The propagator that suits a chain; the chain has at least one state. */
  static Propagator of(Chain chain) {
    return chain.loop() == null ? new PassivePropagator(chain) : new LoopPropagator(chain);
  }
}
