package dev.settlewell.uncertainty;

import dev.settlewell.uncertainty.Distribution.Normal;
import dev.settlewell.uncertainty.Distribution.Rectangular;
import dev.settlewell.uncertainty.Distribution.Sine;
import dev.settlewell.uncertainty.Distribution.Student;
import dev.settlewell.uncertainty.Distribution.Triangular;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.apache.commons.math3.util.FastMath;

/**
 * The distribution of the sum X of independent contributions that are symmetric about zero.
 *
 * <p>By its characteristic function φ(t), the product of those of the contributions (sin(at)/at of
 * a rectangle, J0(at) of a sine, exp(-u²t²/2) of a normal one; JCGM 101:2008, 5.3 names the way):
 *
 * <pre>P(|X| &lt;= U) = (2/π) ∫ sin(Ut)/t φ(t) dt</pre>
 *
 * <p>Summed in steps of h, the integral is the Fourier series of the distribution repeated every
 * 2π/h: exact as soon as the repetitions do not reach into ±U. How far X reaches is bounded: every
 * one of these contributions has E[exp(sX)] &lt;= exp(s²u²/2), so that P(|X| &gt; x) &lt;= 2
 * exp(-x²/2u²) for their sum. The series ends where |φ| can no longer pass 1e-7, or after 16384
 * terms, which only few and very unequal rows need.
 */
final class SymmetricSum {
  private static final int MOST_TERMS = 1 << 14;
  private static final double NEGLIGIBLE = 1e-7;

  /**
   * Of a row smaller than this part of the combined uncertainty only the variance counts, not the
   * shape: the difference is of the fourth order.
   */
  private static final double SMALL_ROW = 1e-4;

  /**
   * All small and normal rows together change U by less than 1e-9 where they are below this part.
   */
  private static final double NO_ROW = 1e-6;

  /** P(|X| &gt; 6.7 u) is below 4e-10 whatever the rows. */
  private static final double REACH = 6.7;

  private final List<Distribution> rows;
  private final double standard;
  private final double limit;

  private SymmetricSum(List<Distribution> rows, double standard, double limit) {
    this.rows = rows;
    this.standard = standard;
    this.limit = limit;
  }

  /** The sum of the rows, type A ones taken as normal. */
  static SymmetricSum of(List<Distribution> rows) {
    double standard = Coverage.combined(rows);
    double limit = 0;
    List<Distribution> kept = new ArrayList<>();
    double normalVariance = 0;
    for (Distribution row : rows) {
      double u = row.standard();
      limit += row.limit();
      if (row instanceof Normal || row instanceof Student || u <= SMALL_ROW * standard) {
        normalVariance += u * u;
      } else {
        kept.add(row);
      }
    }
    double normal = Math.sqrt(normalVariance);
    if (normal > NO_ROW * standard) {
      kept.add(new Normal(normal));
    }
    return new SymmetricSum(kept, standard, limit);
  }

  /** The U with P(|X| &lt;= U) = p. */
  double halfWidth(double p) {
    if (rows.isEmpty()) {
      return 0;
    }
    if (rows.size() == 1) {
      return lone(rows.get(0), p);
    }
    double dominated = dominatedByRectangle(p);
    return Double.isNaN(dominated) ? bySeries(p) : dominated;
  }

  private static double lone(Distribution row, double p) {
    if (row instanceof Rectangular rectangle) {
      return p * rectangle.limit();
    }
    if (row instanceof Triangular triangle) {
      return triangle.limit() * (1 - Math.sqrt(1 - p));
    }
    if (row instanceof Sine sine) {
      return sine.amplitude() * FastMath.sin(0.5 * FastMath.PI * p);
    }
    return row.standard() * StudentT.factor(p, Double.POSITIVE_INFINITY);
  }

  /**
   * Where one rectangle ±a is so large that all others together stay within (1 - p) a, its own p a
   * is exact: whatever the others are, P(|X| &lt;= U) given them is U/a as long as U plus them
   * stays below a. NaN where it is not so.
   */
  private double dominatedByRectangle(double p) {
    for (Distribution row : rows) {
      if (row instanceof Rectangular rectangle) {
        double a = rectangle.limit();
        if (limit - a <= (1 - p) * a) {
          return p * a;
        }
      }
    }
    return Double.NaN;
  }

  private double bySeries(double p) {
    double most = Math.min(limit, standard * Math.sqrt(2 * FastMath.log(2 / (1 - p))));
    double h = 2 * FastMath.PI / (most + Math.min(limit, REACH * standard));
    double[] phi = characteristic(h);
    double low = 0;
    double high = most;
    double u = Math.min(standard * StudentT.factor(p, Double.POSITIVE_INFINITY), most);
    for (int i = 0; i < 60; i++) {
      double[] probabilityAndDensity = within(u, h, phi);
      double excess = probabilityAndDensity[0] - p;
      if (excess > 0) {
        high = u;
      } else {
        low = u;
      }
      double next = u - excess / probabilityAndDensity[1];
      if (!(low <= next && next <= high)) {
        next = 0.5 * (low + high);
      }
      if (Math.abs(next - u) <= 1e-8 * standard) {
        return next;
      }
      u = next;
    }
    return u;
  }

  /** P(|X| &lt;= u) and its derivative by u. */
  private static double[] within(double u, double h, double[] phi) {
    double c1 = FastMath.cos(u * h);
    double s1 = FastMath.sin(u * h);
    double c = c1;
    double s = s1;
    double probability = 0.5 * u * h;
    double density = 0.5 * h;
    for (int k = 1; k < phi.length; k++) {
      probability += s * phi[k] / k;
      density += h * c * phi[k];
      double turned = c * c1 - s * s1;
      s = s * c1 + c * s1;
      c = turned;
    }
    return new double[] {2 / FastMath.PI * probability, 2 / FastMath.PI * density};
  }

  /** φ(0), φ(h), φ(2h), … as far as it matters. */
  private double[] characteristic(double h) {
    double[] phi = new double[terms(h)];
    Arrays.fill(phi, 1);
    for (Distribution row : rows) {
      if (row instanceof Rectangular rectangle) {
        timesSinc(phi, rectangle.limit() * h);
      } else if (row instanceof Triangular triangle) {
        timesSinc(phi, 0.5 * triangle.limit() * h);
        timesSinc(phi, 0.5 * triangle.limit() * h);
      } else if (row instanceof Sine sine) {
        timesBessel(phi, sine.amplitude() * h);
      } else {
        timesNormal(phi, row.standard() * h);
      }
    }
    return phi;
  }

  private int terms(double h) {
    double terms = 64;
    while (terms < MOST_TERMS && envelope(terms * h) > NEGLIGIBLE) {
      terms *= 1.2;
    }
    return (int) Math.min(terms, MOST_TERMS);
  }

  /** A bound of |φ| from t on. */
  private double envelope(double t) {
    double product = 1;
    for (Distribution row : rows) {
      if (row instanceof Rectangular rectangle) {
        product *= Math.min(1, 1 / (rectangle.limit() * t));
      } else if (row instanceof Triangular triangle) {
        double half = Math.min(1, 2 / (triangle.limit() * t));
        product *= half * half;
      } else if (row instanceof Sine sine) {
        product *= Math.min(1, Math.sqrt(2 / (FastMath.PI * sine.amplitude() * t)));
      } else {
        double x = row.standard() * t;
        product *= FastMath.exp(-0.5 * x * x);
      }
    }
    return product;
  }

  private static void timesSinc(double[] phi, double step) {
    double c1 = FastMath.cos(step);
    double s1 = FastMath.sin(step);
    double c = c1;
    double s = s1;
    for (int k = 1; k < phi.length; k++) {
      phi[k] *= s / (k * step);
      double turned = c * c1 - s * s1;
      s = s * c1 + c * s1;
      c = turned;
    }
  }

  private static void timesBessel(double[] phi, double step) {
    double c1 = FastMath.cos(step);
    double s1 = FastMath.sin(step);
    double c = c1;
    double s = s1;
    for (int k = 1; k < phi.length; k++) {
      double x = k * step;
      phi[k] *= x < Bessel.FAR ? Bessel.j0(x) : Bessel.j0Far(x, c, s);
      double turned = c * c1 - s * s1;
      s = s * c1 + c * s1;
      c = turned;
    }
  }

  private static void timesNormal(double[] phi, double step) {
    // exp(-k²step²/2) by its own recurrence: the ratio of neighbours falls by one constant factor.
    double value = 1;
    double ratio = FastMath.exp(-0.5 * step * step);
    double factor = ratio * ratio;
    for (int k = 1; k < phi.length; k++) {
      value *= ratio;
      ratio *= factor;
      phi[k] *= value;
    }
  }
}
