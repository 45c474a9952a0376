package dev.settlewell.channel;

import dev.settlewell.circuit.Noise;
import java.util.List;
import java.util.Optional;

/** What one code is worth. */
final class ResolutionStudy {
  private ResolutionStudy() {}

  static List<Figure> figures(ChannelModel model) {
    double[] p = model.forward().nominal();
    Converter adc = model.forward().converter();
    double worst = 0;
    double at = model.measures().low();
    for (double x : model.points()) {
      double measured = model.lsb() / Math.abs(model.slope(x));
      if (measured > worst) {
        worst = measured;
        at = x;
      }
    }
    return List.of(
        Figure.of(
            "lsb",
            model.lsb(),
            "V",
            "(high - low) / 2^bits",
            operand("high", adc.spanHigh(p), "V"),
            operand("low", adc.spanLow(p), "V"),
            operand("bits", adc.bits(), "1")),
        Figure.of(
                "lsb-measured",
                worst,
                model.unit(),
                "lsb / slope of the pin's voltage, at its flattest",
                operand("lsb", model.lsb(), "V"))
            .at(at),
        Figure.of("full-scale", model.span(), "V", "high - low"),
        Figure.of("ideal-snr", Noise.idealSnr(adc.bits()), "dB", "20 log10(2^bits sqrt 1.5)"));
  }

  private static Figure.Operand operand(String name, double value, String unit) {
    return new Figure.Operand(name, value, unit, Optional.empty());
  }
}
