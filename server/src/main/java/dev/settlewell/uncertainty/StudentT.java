package dev.settlewell.uncertainty;

import org.apache.commons.math3.distribution.GammaDistribution;
import org.apache.commons.math3.distribution.TDistribution;
import org.apache.commons.math3.random.RandomGenerator;
import org.apache.commons.math3.special.Erf;

/** The t-distribution, and the normal one it becomes with infinite degrees of freedom. */
final class StudentT {
  private StudentT() {}

  /** The t with P(|T| &lt;= t) = p. */
  static double factor(double p, double nu) {
    if (nu == Double.POSITIVE_INFINITY) {
      return Math.sqrt(2) * Erf.erfInv(p);
    }
    return new TDistribution(null, nu).inverseCumulativeProbability(0.5 + 0.5 * p);
  }

  /** A random t: a normal value over the root of a chi-squared one by its degrees of freedom. */
  static double sample(double nu, RandomGenerator random) {
    double z = random.nextGaussian();
    if (nu == Double.POSITIVE_INFINITY) {
      return z;
    }
    return z / Math.sqrt(new GammaDistribution(random, nu / 2, 2).sample() / nu);
  }
}
