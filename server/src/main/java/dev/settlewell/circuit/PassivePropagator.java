package dev.settlewell.circuit;

import java.util.Arrays;
import java.util.Optional;
import org.apache.commons.math3.util.FastMath;

/**
 * Motion of a chain of resistors and capacitors by its modes.
 *
 * <p>With conductance matrix G and capacitances C, S = C^(-1/2) G C^(-1/2) is symmetric, so its
 * modes exist whatever the values, equal time constants included. G is never formed: for a chain
 * its factors G = L D L^T follow from additions of positive numbers alone (elimination from the
 * source to the pin), and the one-sided Jacobi method finds the singular values of the bidiagonal
 * C^(-1/2) L D^(1/2), whose squares are the decay rates. So a slow mode keeps its digits beside one
 * that is many decades faster (J. Demmel, K. Veselić, Jacobi's method is more accurate than QR,
 * SIAM J. Matrix Anal. Appl. 13 (1992); for the factors J. Demmel, P. Koev, Accurate SVDs of weakly
 * diagonally dominant M-matrices, Numer. Math. 98 (2004)).
 */
final class PassivePropagator implements Propagator {
  private static final int MAX_SWEEPS = 40;
  private static final double ORTHOGONAL = 1e-16;

  /** Decay rates in 1/s. */
  private final double[] rates;

  /** modes[k] is the eigenvector of rate k. */
  private final double[][] modes;

  private final double[] rootFarads;

  PassivePropagator(Chain chain) {
    int n = chain.nodes();
    rootFarads = new double[n];
    for (int k = 0; k < n; k++) {
      rootFarads[k] = Math.sqrt(chain.farads()[k]);
    }
    double[][] factor = factor(chain);
    modes = Matrices.identity(n);
    orthogonalise(factor, modes);
    rates = new double[n];
    for (int k = 0; k < n; k++) {
      rates[k] = Matrices.dot(factor[k], factor[k]);
    }
  }

  /** The rows of C^(-1/2) L D^(1/2). */
  private double[][] factor(Chain chain) {
    int n = chain.nodes();
    double[][] rows = new double[n][n];
    double toGround = 0;
    for (int k = 0; k < n; k++) {
      toGround += chain.shunts()[k];
      double onward = k + 1 < n ? chain.series()[k] : 0;
      double pivot = Math.sqrt(toGround + onward);
      rows[k][k] = pivot / rootFarads[k];
      if (k + 1 < n) {
        rows[k + 1][k] = -(onward / pivot) / rootFarads[k + 1];
        toGround = onward * (toGround / (toGround + onward));
      }
    }
    return rows;
  }

  /** Rotates pairs of rows until all are orthogonal, and the modes along with them. */
  private static void orthogonalise(double[][] rows, double[][] modes) {
    boolean rotated = true;
    for (int sweep = 0; rotated && sweep < MAX_SWEEPS; sweep++) {
      rotated = false;
      for (int i = 0; i < rows.length; i++) {
        for (int j = i + 1; j < rows.length; j++) {
          rotated |= rotate(rows, modes, i, j);
        }
      }
    }
  }

  private static boolean rotate(double[][] rows, double[][] modes, int i, int j) {
    double a = Matrices.dot(rows[i], rows[i]);
    double b = Matrices.dot(rows[j], rows[j]);
    double c = Matrices.dot(rows[i], rows[j]);
    if (Math.abs(c) <= ORTHOGONAL * Math.sqrt(a) * Math.sqrt(b)) {
      return false;
    }
    double zeta = (b - a) / (2 * c);
    double tangent = Math.copySign(1, zeta) / (Math.abs(zeta) + Math.sqrt(1 + zeta * zeta));
    double cosine = 1 / Math.sqrt(1 + tangent * tangent);
    turn(rows[i], rows[j], cosine, cosine * tangent);
    turn(modes[i], modes[j], cosine, cosine * tangent);
    return true;
  }

  private static void turn(double[] x, double[] y, double cosine, double sine) {
    for (int k = 0; k < x.length; k++) {
      double old = x[k];
      x[k] = cosine * old - sine * y[k];
      y[k] = sine * old + cosine * y[k];
    }
  }

  @Override
  public double fastestRate() {
    return Arrays.stream(rates).max().orElse(0);
  }

  @Override
  public Optional<Ringing> ringing() {
    return Optional.empty();
  }

  @Override
  public Motion over(double seconds) {
    int n = rates.length;
    double[][] kept = new double[n][n];
    double[][] lost = new double[n][n];
    for (int k = 0; k < n; k++) {
      double left = FastMath.exp(-rates[k] * seconds);
      double gone = -FastMath.expm1(-rates[k] * seconds);
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          double weight = modes[k][i] * modes[k][j] * (rootFarads[j] / rootFarads[i]);
          kept[i][j] += weight * left;
          lost[i][j] += weight * gone;
        }
      }
    }
    return new Motion(kept, lost);
  }
}
