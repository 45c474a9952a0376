package dev.settlewell.circuit;

import java.util.ArrayList;
import java.util.List;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.MatrixUtils;
import org.apache.commons.math3.linear.RealMatrix;

/**
 * The same circuit by another way: nodal equations E x' + G x = 0 with every node and the
 * amplifier's inductance, nothing eliminated, integrated step by step with Radau IIA of order 5 (E.
 * Hairer, G. Wanner, Solving Ordinary Differential Equations II, table IV.5.6).
 */
final class IntegratedLadder {
  private static final double ROOT = Math.sqrt(6);
  private static final double[][] RADAU = {
    {(88 - 7 * ROOT) / 360, (296 - 169 * ROOT) / 1800, (-2 + 3 * ROOT) / 225},
    {(296 + 169 * ROOT) / 1800, (88 + 7 * ROOT) / 360, (-2 - 3 * ROOT) / 225},
    {(16 - ROOT) / 36, (16 + ROOT) / 36, 1.0 / 9}
  };

  private static final int GROUND = -1;

  private final List<double[]> resistors = new ArrayList<>();
  private final List<double[]> capacitors = new ArrayList<>();
  private int nodes;
  private final int pin;
  private final int hold;
  private final Drive.ClosedLoop loop;
  private final Sampler sampler;
  private double longestStep = Double.POSITIVE_INFINITY;

  IntegratedLadder(Ladder ladder, Sampler sampler) {
    this.sampler = sampler;
    this.loop = ladder.drive() instanceof Drive.ClosedLoop closed ? closed : null;
    double source = ladder.drive() instanceof Drive.Resistive resistive ? resistive.ohms() : 0;
    int here = loop == null && source == 0 ? GROUND : nodes++;
    if (loop != null) {
      resistors.add(new double[] {here, GROUND, loop.outputOhms()});
    } else if (source > 0 && Double.isFinite(source)) {
      resistors.add(new double[] {here, GROUND, source});
    }
    for (Rung rung : ladder.rungs()) {
      if (rung instanceof Rung.Series series && series.ohms() > 0) {
        resistors.add(new double[] {here, nodes, series.ohms()});
        here = nodes++;
      } else if (rung instanceof Rung.Parallel parallel) {
        resistors.add(new double[] {here, GROUND, parallel.ohms()});
      } else if (rung instanceof Rung.Capacitor capacitor) {
        capacitors.add(new double[] {here, capacitor.farads()});
      }
    }
    pin = here;
    hold = nodes++;
    capacitors.add(new double[] {hold, sampler.holdFarads()});
  }

  /** No step longer than this: for circuits that ring. */
  IntegratedLadder withLongestStep(double seconds) {
    longestStep = seconds;
    return this;
  }

  private int size() {
    return nodes + (loop == null ? 0 : 1);
  }

  private double[][] conductance(boolean connected) {
    double[][] g = new double[size()][size()];
    for (double[] resistor : resistors) {
      connect(g, (int) resistor[0], (int) resistor[1], 1 / resistor[2]);
    }
    if (connected) {
      connect(g, pin, hold, 1 / sampler.switchOhms());
    }
    if (loop != null) {
      g[0][nodes] = 1;
      g[nodes][0] = -1;
    }
    return g;
  }

  private static void connect(double[][] g, int a, int b, double siemens) {
    for (int[] pair : new int[][] {{a, b}, {b, a}}) {
      if (pair[0] != GROUND) {
        g[pair[0]][pair[0]] += siemens;
        if (pair[1] != GROUND) {
          g[pair[0]][pair[1]] -= siemens;
        }
      }
    }
  }

  private double[] storage() {
    double[] e = new double[size()];
    for (double[] capacitor : capacitors) {
      if ((int) capacitor[0] != GROUND) {
        e[(int) capacitor[0]] += capacitor[1];
      }
    }
    if (loop != null) {
      e[nodes] = loop.outputOhms() / (2 * Math.PI * loop.hertz());
    }
    return e;
  }

  /** Map of the state over a time: small steps first, longer ones once the fast parts are gone. */
  RealMatrix motion(boolean connected, double seconds) {
    RealMatrix motion = MatrixUtils.createRealIdentityMatrix(size());
    if (seconds == 0) {
      return motion;
    }
    double[][] g = conductance(connected);
    double[] e = storage();
    double step = Math.min(seconds / 128, firstStep(g, e));
    double done = 0;
    while (done < seconds) {
      int steps = 128;
      if (step * 2 > longestStep || done + steps * step >= seconds) {
        steps = (int) Math.ceil((seconds - done) / step * (1 - 1e-14));
        step = (seconds - done) / steps;
      }
      RealMatrix one = radauStep(g, e, step);
      for (int k = 0; k < steps; k++) {
        motion = one.multiply(motion);
      }
      done = done + steps * step >= seconds * (1 - 1e-14) ? seconds : done + steps * step;
      step *= 2;
    }
    return motion;
  }

  private double firstStep(double[][] g, double[] e) {
    double fastest = 0;
    for (int i = 0; i < e.length; i++) {
      if (e[i] > 0) {
        for (int j = 0; j < e.length; j++) {
          double scale = e[j] > 0 ? Math.sqrt(e[i] * e[j]) : e[i];
          fastest = Math.max(fastest, Math.abs(g[i][j]) / scale);
        }
      }
    }
    return 0.005 / fastest;
  }

  /** Stage equations for the stage slopes k: E k_i + G (x + h sum a_ij k_j) = 0. */
  private RealMatrix radauStep(double[][] g, double[] e, double h) {
    int n = size();
    double[][] system = new double[3 * n][3 * n];
    double[][] right = new double[3 * n][n];
    for (int stage = 0; stage < 3; stage++) {
      for (int i = 0; i < n; i++) {
        int row = stage * n + i;
        double scale = e[i];
        for (int j = 0; j < n; j++) {
          scale = Math.max(scale, h * Math.abs(g[i][j]));
        }
        system[row][row] += e[i] / scale;
        for (int j = 0; j < n; j++) {
          right[row][j] = -h * g[i][j] / scale;
          for (int other = 0; other < 3; other++) {
            system[row][other * n + j] += h * RADAU[stage][other] * g[i][j] / scale;
          }
        }
      }
    }
    RealMatrix slopes =
        new LUDecomposition(new Array2DRowRealMatrix(system, false), 0)
            .getSolver()
            .solve(new Array2DRowRealMatrix(right, false));
    RealMatrix next = MatrixUtils.createRealIdentityMatrix(n);
    for (int stage = 0; stage < 3; stage++) {
      next =
          next.add(
              slopes
                  .getSubMatrix(stage * n, stage * n + n - 1, 0, n - 1)
                  .scalarMultiply(RADAU[2][stage]));
    }
    return next;
  }

  /** Voltage of the drive's node some time after a hold capacitor at one volt was connected. */
  double outputAfterConnection(double seconds) {
    return motion(true, seconds).getEntry(0, hold);
  }

  /** As {@link Settling#residuals}. */
  double[][] residuals(List<Visit> visits, double period) {
    int n = size();
    int count = visits.size();
    RealMatrix[] acquisitions = new RealMatrix[count];
    RealMatrix[] rests = new RealMatrix[count];
    for (int i = 0; i < count; i++) {
      Visit visit = visits.get(i);
      double until = i + 1 < count ? visits.get(i + 1).start() : period + visits.get(0).start();
      acquisitions[i] = motion(true, visit.acquisition());
      rests[i] = motion(false, until - visit.start() - visit.acquisition());
    }
    RealMatrix map = MatrixUtils.createRealIdentityMatrix(n);
    for (int i = 0; i < count; i++) {
      map = rests[i].multiply(acquisitions[i]).multiply(emptied()).multiply(map);
    }
    RealMatrix gained = new Array2DRowRealMatrix(n, count);
    for (int j = 0; j < count; j++) {
      RealMatrix x = new Array2DRowRealMatrix(n, 1);
      for (int i = 0; i < count; i++) {
        x.setEntry(hold, 0, i == j ? 1 : 0);
        x = rests[i].multiply(acquisitions[i]).multiply(x);
      }
      gained.setColumnMatrix(j, x);
    }
    RealMatrix start =
        new LUDecomposition(MatrixUtils.createRealIdentityMatrix(n).subtract(map), 0)
            .getSolver()
            .solve(gained);
    double[][] residuals = new double[count][count];
    for (int j = 0; j < count; j++) {
      RealMatrix x = start.getColumnMatrix(j);
      for (int i = 0; i < count; i++) {
        x.setEntry(hold, 0, i == j ? 1 : 0);
        x = acquisitions[i].multiply(x);
        residuals[i][j] = x.getEntry(hold, 0);
        x = rests[i].multiply(x);
      }
    }
    return residuals;
  }

  private RealMatrix emptied() {
    RealMatrix emptied = MatrixUtils.createRealIdentityMatrix(size());
    emptied.setEntry(hold, hold, 0);
    return emptied;
  }
}
