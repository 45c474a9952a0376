package dev.settlewell.circuit;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.apache.commons.math3.exception.MathArithmeticException;
import org.apache.commons.math3.exception.MaxCountExceededException;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.util.FastMath;

/**
 * Motion of a chain behind an amplifier's closed-loop output impedance.
 *
 * <p>The inductance L = R_o/(2 π f_cl) makes the circuit ring and its matrix A unsymmetric, at
 * critical damping even defective, so modes are no safe way. e^(-A t) is found by scaling and
 * squaring instead (C. Moler, C. Van Loan, Nineteen dubious ways to compute the exponential of a
 * matrix, SIAM Review 45 (2003), method 3). The circuit loses energy, so no square grows and
 * nothing overflows; but each square doubles the error of the slow motions, which is why the
 * squares are taken in twice the working precision. They are kept: any time is a product of a few.
 *
 * <p>State: R_o times the current of the inductance, in V, then the node voltages. With 2 π f_cl
 * written w: du/dt = w v_0, C_0 dv_0/dt = -(g_0 + s_0) v_0 + s_0 v_1 - u/R_o.
 */
final class LoopPropagator implements Propagator {
  /** Of e^x, for |x| at most 1/4: the first term left out is below 1e-32. */
  private static final int TERMS = 21;

  private final int size;

  /** Change to balanced coordinates, by powers of two: x balanced = x / balance. */
  private final double[] balance;

  private final TwofoldMatrix rates;

  /** A time in s so short that A times it is below 1/4. */
  private final double shortest;

  /** squares[k] is the motion over 2^k times the shortest time. */
  private final List<Motion> squares = new ArrayList<>();

  private TwofoldMatrix lastSquare;

  LoopPropagator(Chain chain) {
    size = chain.states();
    double[] inertia = new double[size];
    rates = rates(chain, inertia);
    balance = new double[size];
    for (int i = 0; i < size; i++) {
      // Near 1/sqrt(inertia), the coordinates in which energy is the sum of squares.
      balance[i] = FastMath.scalb(1.0, -Math.round(FastMath.getExponent(inertia[i]) / 2f));
    }
    for (int i = 0; i < size; i++) {
      for (int j = 0; j < size; j++) {
        rates.scale(i, j, balance[j] / balance[i]);
      }
    }
    shortest = 0.25 / rates.norm();
    addSquare(exponential(shortest));
  }

  /** The matrix A, and for each state the weight of its square in the stored energy. */
  private static TwofoldMatrix rates(Chain chain, double[] inertia) {
    TwofoldMatrix a = new TwofoldMatrix(inertia.length);
    double w = 2 * Math.PI * chain.loop().hertz();
    double ohms = chain.loop().outputOhms();
    inertia[0] = 1 / (w * ohms);
    int offset = chain.bareOutput() ? 0 : 1;
    if (chain.bareOutput()) {
      bareOutput(a, chain);
    } else {
      a.add(0, 1, -1 / ohms);
      a.add(1, 0, 1 / ohms);
    }
    for (int k = 1 - offset; k < chain.nodes(); k++) {
      int row = k + offset;
      inertia[row] = chain.farads()[k];
      a.add(row, row, chain.shunts()[k]);
      if (k + 1 < chain.nodes()) {
        double link = chain.series()[k];
        a.add(row, row, link);
        a.add(row, row + 1, -link);
        a.add(row + 1, row, -link);
        a.add(row + 1, row + 1, link);
      }
    }
    for (int row = 0; row < inertia.length; row++) {
      a.divideRow(row, inertia[row]);
    }
    return a;
  }

  /** Without capacitance at the output, v_0 = (s_0 v_1 - u/R_o) / (g_0 + s_0). */
  private static void bareOutput(TwofoldMatrix a, Chain chain) {
    double ohms = chain.loop().outputOhms();
    double ground = chain.shunts()[0];
    double link = chain.nodes() > 1 ? chain.series()[0] : 0;
    double total = ground + link;
    a.add(0, 0, 1 / ohms / ohms / total);
    if (chain.nodes() > 1) {
      a.add(0, 1, -link / total / ohms);
      a.add(1, 0, link / total / ohms);
      a.add(1, 1, link * (ground / total));
    }
  }

  @Override
  public double fastestRate() {
    return rates.norm();
  }

  @Override
  public Optional<Ringing> ringing() {
    EigenDecomposition eigen;
    try {
      eigen = new EigenDecomposition(new Array2DRowRealMatrix(rates.rounded(), false));
    } catch (MaxCountExceededException | MathArithmeticException noConvergence) {
      // No oscillation of this circuit is faster than its fastest rate or grows.
      return Optional.of(new Ringing(fastestRate(), 0));
    }
    for (int i = 0; i < size; i++) {
      if (eigen.getImagEigenvalue(i) > 0) {
        return Optional.of(
            new Ringing(eigen.getImagEigenvalue(i), Math.max(0, eigen.getRealEigenvalue(i))));
      }
    }
    return Optional.empty();
  }

  private TwofoldMatrix exponential(double seconds) {
    TwofoldMatrix x = rates.times(-seconds);
    TwofoldMatrix sum = TwofoldMatrix.identity(size);
    for (int k = TERMS; k >= 1; k--) {
      TwofoldMatrix term = x.times(sum);
      for (int row = 0; row < size; row++) {
        term.divideRow(row, k);
      }
      sum = TwofoldMatrix.identity(size).plus(term);
    }
    return sum;
  }

  private void addSquare(TwofoldMatrix square) {
    lastSquare = square;
    squares.add(new Motion(square.rounded(), square.roundedLoss()));
  }

  @Override
  public Motion over(double seconds) {
    while (FastMath.scalb(shortest, squares.size()) <= seconds) {
      addSquare(lastSquare.times(lastSquare));
    }
    double left = seconds;
    Motion motion = null;
    for (int k = squares.size() - 1; k >= 0; k--) {
      double step = FastMath.scalb(shortest, k);
      if (left >= step) {
        motion = motion == null ? squares.get(k) : motion.then(squares.get(k));
        left -= step;
      }
    }
    Motion rest = shortMotion(left);
    return unbalanced(motion == null ? rest : motion.then(rest));
  }

  /** The motion over less than the shortest time, by its series in plain doubles. */
  private Motion shortMotion(double seconds) {
    double[][] x = rates.times(-seconds).rounded();
    double[][] lost = new double[size][size];
    double[][] term = Matrices.identity(size);
    for (int k = 1; k <= 13; k++) {
      term = Matrices.product(x, term);
      for (int i = 0; i < size; i++) {
        for (int j = 0; j < size; j++) {
          term[i][j] /= k;
          lost[i][j] -= term[i][j];
        }
      }
    }
    double[][] kept = Matrices.identity(size);
    for (int i = 0; i < size; i++) {
      for (int j = 0; j < size; j++) {
        kept[i][j] -= lost[i][j];
      }
    }
    return new Motion(kept, lost);
  }

  private Motion unbalanced(Motion motion) {
    double[][] kept = new double[size][size];
    double[][] lost = new double[size][size];
    for (int i = 0; i < size; i++) {
      for (int j = 0; j < size; j++) {
        double scale = balance[i] / balance[j];
        kept[i][j] = motion.kept()[i][j] * scale;
        lost[i][j] = motion.lost()[i][j] * scale;
      }
    }
    return new Motion(kept, lost);
  }
}
