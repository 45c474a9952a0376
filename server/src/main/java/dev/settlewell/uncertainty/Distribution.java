package dev.settlewell.uncertainty;

import org.apache.commons.math3.random.RandomGenerator;
import org.apache.commons.math3.util.FastMath;

/**
 * The distribution of one contribution: symmetric about zero, known by its hard limit a or by its
 * standard uncertainty u.
 *
 * <pre>
 * Rectangular   anywhere within ±a, equally likely            u = a / √3
 * Triangular    within ±a, likeliest in the middle            u = a / √6
 * Sine          a sine of amplitude a at an unknown instant   u = a / √2
 * Normal        u stated, or a / k of a stated coverage       a = ∞
 * Student       u from n readings, n - 1 degrees of freedom   a = ∞
 * </pre>
 *
 * <p>Source: JCGM 100:2008, 4.3.7, 4.3.9, H.1.3.4; JCGM 101:2008, table 1. For {@code Student}, u
 * is the standard uncertainty of a type A evaluation (JCGM 100, 4.2.3), not the standard deviation
 * of the t-distribution, which is larger and not finite below three degrees of freedom.
 *
 * <p>Limits and uncertainties are finite and not negative; the constructors throw {@link
 * IllegalArgumentException} otherwise.
 */
public sealed interface Distribution {
  /** The standard uncertainty u. */
  double standard();

  /** The hard limit a: no value lies farther out. Infinite where there is none. */
  double limit();

  /** A random value. */
  double sample(RandomGenerator random);

  /** Anywhere within ±limit, equally likely: a tolerance. */
  record Rectangular(double limit) implements Distribution {
    public Rectangular {
      requireSize(limit);
    }

    @Override
    public double standard() {
      return limit / Math.sqrt(3);
    }

    @Override
    public double sample(RandomGenerator random) {
      return limit * (2 * random.nextDouble() - 1);
    }
  }

  /** Within ±limit, falling off linearly: the sum of two equal rectangles. */
  record Triangular(double limit) implements Distribution {
    public Triangular {
      requireSize(limit);
    }

    @Override
    public double standard() {
      return limit / Math.sqrt(6);
    }

    @Override
    public double sample(RandomGenerator random) {
      return limit * (random.nextDouble() - random.nextDouble());
    }
  }

  /** A sine caught at an instant unrelated to it (arcsine distribution). */
  record Sine(double amplitude) implements Distribution {
    public Sine {
      requireSize(amplitude);
    }

    @Override
    public double standard() {
      return amplitude / Math.sqrt(2);
    }

    @Override
    public double limit() {
      return amplitude;
    }

    @Override
    public double sample(RandomGenerator random) {
      return amplitude * FastMath.sin(2 * FastMath.PI * random.nextDouble());
    }
  }

  /** Normal: random noise, or a figure stated with a coverage factor. */
  record Normal(double standard) implements Distribution {
    public Normal {
      requireSize(standard);
    }

    @Override
    public double limit() {
      return standard == 0 ? 0 : Double.POSITIVE_INFINITY;
    }

    @Override
    public double sample(RandomGenerator random) {
      return standard * random.nextGaussian();
    }
  }

  /**
   * A type A evaluation.
   *
   * @param degreesOfFreedom at least 1, may be infinite
   */
  record Student(double standard, double degreesOfFreedom) implements Distribution {
    public Student {
      requireSize(standard);
      if (!(degreesOfFreedom >= 1)) {
        throw new IllegalArgumentException("degrees of freedom below 1: " + degreesOfFreedom);
      }
    }

    @Override
    public double limit() {
      return standard == 0 ? 0 : Double.POSITIVE_INFINITY;
    }

    @Override
    public double sample(RandomGenerator random) {
      return standard * StudentT.sample(degreesOfFreedom, random);
    }
  }

  private static void requireSize(double size) {
    if (!(size >= 0 && size < Double.POSITIVE_INFINITY)) {
      throw new IllegalArgumentException("neither zero nor a finite size: " + size);
    }
  }
}
