package dev.settlewell.circuit;

/** The few operations on small dense matrices that the steady state needs. */
final class Matrices {
  private Matrices() {}

  static double[][] identity(int n) {
    double[][] identity = new double[n][n];
    for (int i = 0; i < n; i++) {
      identity[i][i] = 1;
    }
    return identity;
  }

  static double[][] product(double[][] a, double[][] b) {
    int columns = b.length == 0 ? 0 : b[0].length;
    double[][] product = new double[a.length][columns];
    for (int i = 0; i < a.length; i++) {
      for (int k = 0; k < b.length; k++) {
        double factor = a[i][k];
        for (int j = 0; j < columns; j++) {
          product[i][j] += factor * b[k][j];
        }
      }
    }
    return product;
  }

  /** I - (I - second)(I - first) = first + second - second first, without forming I - anything. */
  static double[][] composedLoss(double[][] first, double[][] second) {
    double[][] composed = product(second, first);
    for (int i = 0; i < first.length; i++) {
      for (int j = 0; j < first.length; j++) {
        composed[i][j] = first[i][j] + second[i][j] - composed[i][j];
      }
    }
    return composed;
  }

  static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i] * b[i];
    }
    return sum;
  }

  /** a x. */
  static double[] times(double[][] a, double[] x) {
    double[] result = new double[a.length];
    for (int i = 0; i < a.length; i++) {
      result[i] = dot(a[i], x);
    }
    return result;
  }

  /** Solves a x = b by elimination with partial pivoting; a and b are used up. */
  static double[][] solve(double[][] a, double[][] b) {
    int n = a.length;
    for (int k = 0; k < n; k++) {
      int pivot = k;
      for (int i = k + 1; i < n; i++) {
        if (Math.abs(a[i][k]) > Math.abs(a[pivot][k])) {
          pivot = i;
        }
      }
      swap(a, k, pivot);
      swap(b, k, pivot);
      for (int i = k + 1; i < n; i++) {
        subtract(a, b, i, k, a[i][k] / a[k][k]);
      }
    }
    for (int k = n - 1; k >= 0; k--) {
      for (int j = 0; j < b[k].length; j++) {
        for (int i = k + 1; i < n; i++) {
          b[k][j] -= a[k][i] * b[i][j];
        }
        b[k][j] /= a[k][k];
      }
    }
    return b;
  }

  private static void swap(double[][] rows, int i, int j) {
    double[] row = rows[i];
    rows[i] = rows[j];
    rows[j] = row;
  }

  private static void subtract(double[][] a, double[][] b, int from, int row, double factor) {
    for (int j = row; j < a.length; j++) {
      a[from][j] -= factor * a[row][j];
    }
    for (int j = 0; j < b[row].length; j++) {
      b[from][j] -= factor * b[row][j];
    }
  }
}
