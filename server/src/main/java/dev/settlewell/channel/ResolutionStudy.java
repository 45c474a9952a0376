package dev.settlewell.channel;

import dev.settlewell.circuit.Noise;
import java.util.List;

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
            Figure.Operand.of("high", adc.spanHigh(p), "V"),
            Figure.Operand.of("low", adc.spanLow(p), "V"),
            Figure.Operand.of("bits", adc.bits(), "1")),
        Figure.of(
                "lsb-measured",
                worst,
                model.unit(),
                "lsb / slope of the pin's voltage, at its flattest",
                Figure.Operand.of("lsb", model.lsb(), "V"))
            .at(at),
        Figure.of("full-scale", model.span(), "V", "high - low"),
        Figure.of("ideal-snr", Noise.idealSnr(adc.bits()), "dB", "20 log10(2^bits sqrt 1.5)"));
  }
}
