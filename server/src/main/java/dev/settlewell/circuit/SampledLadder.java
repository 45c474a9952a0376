package dev.settlewell.circuit;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * A ladder sampled again and again, in its periodic steady state.
 *
 * <p>Let x be the state of the ladder at the start of a visit, in the error coordinate (final value
 * subtracted). The hold capacitor arrives h away from the open-circuit voltage, the acquisition
 * moves both, the hold capacitor leaves with the error e, and the ladder recovers on its own until
 * the next visit. One period maps x to M x + k, and in the steady state x = M x + k. I - M is
 * composed from what each phase loses, never as a difference, so that a source that hardly recovers
 * within a period costs no digits.
 *
 * <p>Worth keeping where one circuit is asked about several times: its motion is solved once. For
 * use by one thread.
 */
public final class SampledLadder {
  private final int states;
  private final boolean held;
  private final Propagator resting;
  private final Propagator acquiring;

  /** Whether the switch has no resistance and the pin and the hold capacitor become one node. */
  private final boolean merged;

  /** Of the merged node's voltage, what comes from the pin and what from the hold capacitor. */
  private final double pinShare;

  private final double holdShare;

  /** Solves the motion of the ladder with and without the hold capacitor. */
  public SampledLadder(Ladder ladder, Sampler sampler) {
    Chain rest = Chain.resting(ladder);
    Chain acquisition = Chain.acquiring(ladder, sampler);
    states = rest.states();
    held = acquisition.held();
    merged = !held && acquisition.states() == states;
    double pin = merged ? rest.farads()[rest.nodes() - 1] : 0;
    pinShare = pin / (pin + sampler.holdFarads());
    holdShare = sampler.holdFarads() / (pin + sampler.holdFarads());
    resting = states == 0 ? null : Propagator.of(rest);
    acquiring = held ? null : Propagator.of(acquisition);
  }

  /** How the acquisition moves; none where an ideal source holds the pin. */
  Optional<Propagator> acquiring() {
    return Optional.ofNullable(acquiring);
  }

  /** One acquisition and the rest after it. */
  private record Phase(double[][] lost, double[] gained, double[] heldOfState, double heldOfHold) {}

  /** See {@link Settling#residuals}. */
  public double[][] residuals(List<Visit> visits, double period) {
    int count = visits.size();
    if (held) {
      return new double[count][count];
    }
    Phase[] phases = phases(visits, period);
    double[][] start = start(phases);
    double[][] residuals = new double[count][count];
    for (int j = 0; j < count; j++) {
      double[] x = column(start, j);
      for (int i = 0; i < count; i++) {
        double hold = i == j ? 1 : 0;
        residuals[i][j] = Matrices.dot(phases[i].heldOfState, x) + phases[i].heldOfHold * hold;
        x = next(phases[i], x, hold);
      }
    }
    return residuals;
  }

  /** The steady state at the start of the first visit, one column for each visit's unit offset. */
  private double[][] start(Phase[] phases) {
    double[][] lost = new double[states][states];
    double[][] gained = new double[states][phases.length];
    for (int i = 0; i < phases.length; i++) {
      double[] x = new double[states];
      for (int after = i; after < phases.length; after++) {
        x = next(phases[after], x, after == i ? 1 : 0);
      }
      for (int row = 0; row < states; row++) {
        gained[row][i] = x[row];
      }
      lost = Matrices.composedLoss(lost, phases[i].lost);
    }
    return Matrices.solve(lost, gained);
  }

  private static double[] column(double[][] matrix, int j) {
    double[] column = new double[matrix.length];
    for (int row = 0; row < column.length; row++) {
      column[row] = matrix[row][j];
    }
    return column;
  }

  private static double[] next(Phase phase, double[] x, double hold) {
    double[] next = Matrices.times(phase.lost, x);
    for (int row = 0; row < next.length; row++) {
      next[row] = x[row] - next[row] + phase.gained[row] * hold;
    }
    return next;
  }

  private Phase[] phases(List<Visit> visits, double period) {
    Map<Double, Propagator.Motion> acquisitions = new HashMap<>();
    Phase[] phases = new Phase[visits.size()];
    for (int i = 0; i < phases.length; i++) {
      Visit visit = visits.get(i);
      double until =
          i + 1 < phases.length ? visits.get(i + 1).start() : period + visits.get(0).start();
      Propagator.Motion acquisition =
          acquisitions.computeIfAbsent(visit.acquisition(), acquiring::over);
      phases[i] = phase(acquisition, Math.max(0, until - visit.end()));
    }
    return phases;
  }

  private Phase phase(Propagator.Motion acquisition, double rest) {
    int hold = acquisition.kept().length - 1;
    double[][] lost = new double[states][states];
    double[] gained = new double[states];
    for (int i = 0; i < states; i++) {
      System.arraycopy(acquisition.lost()[i], 0, lost[i], 0, states);
      gained[i] = acquisition.kept()[i][hold];
    }
    double[] ofState = new double[states];
    System.arraycopy(acquisition.kept()[hold], 0, ofState, 0, states);
    double ofHold = acquisition.kept()[hold][hold];
    if (merged) {
      ofState[hold] *= pinShare;
      ofHold *= holdShare;
      mergeHold(acquisition, lost, gained, hold);
    }
    if (states > 0) {
      Propagator.Motion recovery = resting.over(rest);
      gained = Matrices.times(recovery.kept(), gained);
      lost = Matrices.composedLoss(lost, recovery.lost());
    }
    return new Phase(lost, gained, ofState, ofHold);
  }

  /** The pin and the hold capacitor first share their charge, then move as one node. */
  private void mergeHold(
      Propagator.Motion acquisition, double[][] lost, double[] gained, int hold) {
    for (int i = 0; i < states; i++) {
      lost[i][hold] = acquisition.lost()[i][hold] * pinShare;
      gained[i] *= holdShare;
    }
    lost[hold][hold] += holdShare;
  }
}
