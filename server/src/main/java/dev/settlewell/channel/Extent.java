package dev.settlewell.channel;

/** How far a value may lie from its nominal: a magnitude that may depend on where and how warm. */
@FunctionalInterface
interface Extent {
  Extent NONE = (x, ambient) -> 0;

  /**
   * @param x the measured quantity
   * @param ambient °C
   */
  double at(double x, double ambient);

  static Extent constant(double magnitude) {
    return (x, ambient) -> magnitude;
  }
}
