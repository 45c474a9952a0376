package dev.settlewell.circuit;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The steady state in 60 decimal digits, for values so far apart that no integration in double
 * precision can serve as a measure: nodal equations, e^(-A t) by its series after scaling, then
 * squaring. Every node must have a capacitor; resistances must be more than 0.
 */
final class ExactLadder {
  private static final MathContext DIGITS = new MathContext(60);
  private static final int GROUND = -1;

  private final BigDecimal[][] resting;
  private final BigDecimal[][] acquiring;
  private final int hold;

  ExactLadder(Ladder ladder, Sampler sampler) {
    List<double[]> resistors = new ArrayList<>();
    List<Double> farads = new ArrayList<>();
    int here = 0;
    farads.add(0.0);
    boolean loop = ladder.drive() instanceof Drive.ClosedLoop;
    double source =
        ladder.drive() instanceof Drive.ClosedLoop closed
            ? closed.outputOhms()
            : ((Drive.Resistive) ladder.drive()).ohms();
    resistors.add(new double[] {0, GROUND, source});
    for (Rung rung : ladder.rungs()) {
      if (rung instanceof Rung.Series series) {
        resistors.add(new double[] {here, here + 1, series.ohms()});
        here++;
        farads.add(0.0);
      } else if (rung instanceof Rung.Parallel parallel) {
        resistors.add(new double[] {here, GROUND, parallel.ohms()});
      } else if (rung instanceof Rung.Capacitor capacitor) {
        farads.set(here, farads.get(here) + capacitor.farads());
      }
    }
    hold = here + 1;
    farads.add(sampler.holdFarads());
    int size = farads.size() + (loop ? 1 : 0);
    resting = zero(size, size);
    resistors.forEach(resistor -> connect(resting, resistor));
    acquiring = copy(resting);
    connect(acquiring, new double[] {here, hold, sampler.switchOhms()});
    for (BigDecimal[][] a : List.of(resting, acquiring)) {
      divideRows(a, farads);
      if (loop) {
        addInductance(a, (Drive.ClosedLoop) ladder.drive(), farads);
      }
    }
  }

  private static void addInductance(BigDecimal[][] a, Drive.ClosedLoop loop, List<Double> farads) {
    int current = farads.size();
    // The production code's double for 2 pi: pi itself is not under test.
    BigDecimal w = exact(2 * Math.PI).multiply(exact(loop.hertz()));
    a[0][current] = BigDecimal.ONE.divide(exact(farads.get(0)), DIGITS);
    a[current][0] = w.divide(exact(loop.outputOhms()), DIGITS).negate();
  }

  private static void divideRows(BigDecimal[][] a, List<Double> farads) {
    for (int i = 0; i < farads.size(); i++) {
      for (int j = 0; j < a.length; j++) {
        a[i][j] = a[i][j].divide(exact(farads.get(i)), DIGITS);
      }
    }
  }

  private static void connect(BigDecimal[][] g, double[] resistor) {
    BigDecimal siemens = BigDecimal.ONE.divide(exact(resistor[2]), DIGITS);
    int a = (int) resistor[0];
    int b = (int) resistor[1];
    g[a][a] = g[a][a].add(siemens);
    if (b != GROUND) {
      g[b][b] = g[b][b].add(siemens);
      g[a][b] = g[a][b].subtract(siemens);
      g[b][a] = g[b][a].subtract(siemens);
    }
  }

  /** As {@link Settling#residuals} for a single visit. */
  double residual(double acquisition, double rest) {
    BigDecimal[][] acquired = exponential(acquiring, exact(acquisition));
    BigDecimal[][] rested = exponential(resting, exact(rest));
    BigDecimal[][] period = product(rested, acquired);
    int size = period.length;
    BigDecimal[][] system = zero(size, size);
    BigDecimal[][] right = zero(size, 1);
    for (int i = 0; i < size; i++) {
      for (int j = 0; j < size; j++) {
        BigDecimal mapped = j == hold ? BigDecimal.ZERO : period[i][j];
        system[i][j] = (i == j ? BigDecimal.ONE : BigDecimal.ZERO).subtract(mapped);
      }
      right[i][0] = period[i][hold];
    }
    BigDecimal[][] start = solve(system, right);
    start[hold][0] = BigDecimal.ONE;
    return product(acquired, start)[hold][0].doubleValue();
  }

  private static BigDecimal[][] exponential(BigDecimal[][] a, BigDecimal seconds) {
    int size = a.length;
    double norm = 0;
    for (BigDecimal[] row : a) {
      for (BigDecimal entry : row) {
        norm = Math.max(norm, Math.abs(entry.doubleValue()) * size);
      }
    }
    int squares =
        (int) Math.max(0, Math.ceil(Math.log(norm * seconds.doubleValue() * 4) / Math.log(2)));
    BigDecimal scale = seconds.negate().divide(BigDecimal.valueOf(2).pow(squares), DIGITS);
    BigDecimal[][] x = zero(size, size);
    for (int i = 0; i < size; i++) {
      for (int j = 0; j < size; j++) {
        x[i][j] = a[i][j].multiply(scale, DIGITS);
      }
    }
    BigDecimal[][] sum = identity(size);
    BigDecimal[][] term = identity(size);
    for (int k = 1; k <= 45; k++) {
      term = product(term, x);
      for (int i = 0; i < size; i++) {
        for (int j = 0; j < size; j++) {
          term[i][j] = term[i][j].divide(BigDecimal.valueOf(k), DIGITS);
          sum[i][j] = sum[i][j].add(term[i][j], DIGITS);
        }
      }
    }
    for (int k = 0; k < squares; k++) {
      sum = product(sum, sum);
    }
    return sum;
  }

  private static BigDecimal[][] solve(BigDecimal[][] a, BigDecimal[][] b) {
    int n = a.length;
    for (int k = 0; k < n; k++) {
      int pivot = k;
      for (int i = k + 1; i < n; i++) {
        pivot = a[i][k].abs().compareTo(a[pivot][k].abs()) > 0 ? i : pivot;
      }
      BigDecimal[] row = a[k];
      a[k] = a[pivot];
      a[pivot] = row;
      row = b[k];
      b[k] = b[pivot];
      b[pivot] = row;
      for (int i = 0; i < n; i++) {
        if (i != k) {
          BigDecimal factor = a[i][k].divide(a[k][k], DIGITS);
          for (int j = k; j < n; j++) {
            a[i][j] = a[i][j].subtract(factor.multiply(a[k][j], DIGITS), DIGITS);
          }
          b[i][0] = b[i][0].subtract(factor.multiply(b[k][0], DIGITS), DIGITS);
        }
      }
    }
    for (int k = 0; k < n; k++) {
      b[k][0] = b[k][0].divide(a[k][k], DIGITS);
    }
    return b;
  }

  private static BigDecimal[][] product(BigDecimal[][] a, BigDecimal[][] b) {
    BigDecimal[][] product = zero(a.length, b[0].length);
    for (int i = 0; i < a.length; i++) {
      for (int j = 0; j < b[0].length; j++) {
        for (int k = 0; k < b.length; k++) {
          product[i][j] = product[i][j].add(a[i][k].multiply(b[k][j], DIGITS), DIGITS);
        }
        if (product[i][j].precision() - product[i][j].scale() < -300) {
          product[i][j] = BigDecimal.ZERO; // what has decayed so far would only grow exponents
        }
      }
    }
    return product;
  }

  private static BigDecimal[][] identity(int size) {
    BigDecimal[][] identity = zero(size, size);
    for (int i = 0; i < size; i++) {
      identity[i][i] = BigDecimal.ONE;
    }
    return identity;
  }

  private static BigDecimal[][] copy(BigDecimal[][] a) {
    BigDecimal[][] copy = new BigDecimal[a.length][];
    for (int i = 0; i < a.length; i++) {
      copy[i] = a[i].clone();
    }
    return copy;
  }

  private static BigDecimal[][] zero(int rows, int columns) {
    BigDecimal[][] zero = new BigDecimal[rows][columns];
    for (BigDecimal[] row : zero) {
      Arrays.fill(row, BigDecimal.ZERO);
    }
    return zero;
  }

  private static BigDecimal exact(double value) {
    return new BigDecimal(value);
  }
}
