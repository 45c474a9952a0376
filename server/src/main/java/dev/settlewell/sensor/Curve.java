package dev.settlewell.sensor;

/**
 * A strictly monotone curve between a measured quantity x and an electrical one y.
 *
 * <p>The domain is {@code low() <= x <= high()}; the range is what lies between the values at its
 * two ends. Outside either, and for NaN, the answer is NaN: a curve never extrapolates.
 */
public interface Curve {
  /** The electrical quantity at {@code x}. */
  double at(double x);

  /** The measured quantity whose electrical one is {@code y}. */
  double inverse(double y);

  /** The low end of the domain, in x. */
  double low();

  /** The high end of the domain, in x. */
  double high();
}
