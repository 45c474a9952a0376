package dev.settlewell.channel;

import dev.settlewell.sheet.Slot;
import dev.settlewell.unit.Toleranced;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** What firmware needs to turn codes into values, and what its integers must hold. */
final class FirmwareStudy {
  /** A multiplier that fits a signed 16-bit integer. */
  private static final double LARGEST_MULTIPLIER = 32767;

  private static final int LARGEST_SHIFT = 31;

  private FirmwareStudy() {}

  static List<Figure> figures(ChannelModel model, Optional<Budget> budget) {
    List<Figure> figures = new ArrayList<>();
    if (model.isStraight()) {
      scale(model, figures);
    } else {
      String why = "the value is no straight line of the code: firmware needs its curve";
      figures.add(Figure.none("scale", model.unit(), why));
      figures.add(Figure.none("offset", model.unit(), why));
      figures.add(Figure.none("scale-multiplier", "1", why));
      figures.add(Figure.none("scale-shift", "1", why));
    }
    accumulator(model, figures);
    step(model, figures);
    budget.ifPresent(b -> limits(model, b, figures));
    return figures;
  }

  private static void scale(ChannelModel model, List<Figure> figures) {
    ForwardModel forward = model.forward();
    Converter adc = forward.converter();
    double[] p = forward.nominal();
    // The voltage in the middle of a code: half an LSB above its first transition.
    double shift = adc.firstTransition() - 0.5;
    // The line through the ends of the range, carried on to code 0 and to full scale.
    double from = forward.volts(model.measures().low(), p);
    double perVolt = model.measures().width() / (forward.volts(model.measures().high(), p) - from);
    double low = model.measures().low() + (adc.volts(shift, p) - from) * perVolt;
    double high = low + adc.codes() * adc.lsb(p) * perVolt;
    double scale = (high - low) / adc.codes();
    figures.add(
        Figure.of(
            "scale",
            scale,
            model.unit(),
            "(value of code 2^bits - value of code 0) / 2^bits",
            Figure.Operand.of("value of code 2^bits", high, model.unit()),
            Figure.Operand.of("value of code 0", low, model.unit())));
    figures.add(Figure.of("offset", low, model.unit(), "value of code 0"));
    fixedPoint(model, scale, figures);
  }

  /** value / unit = (code x multiplier) >> shift, the unit being one step of {@code resolution}. */
  private static void fixedPoint(ChannelModel model, double scale, List<Figure> figures) {
    Slot<Toleranced> resolution = model.part().quantity("resolution");
    double unit = resolution.stated().map(Toleranced::value).orElse(1.0);
    double steps = Math.abs(scale) / unit;
    int shift = 0;
    while (shift < LARGEST_SHIFT && steps * Math.scalb(1.0, shift + 1) <= LARGEST_MULTIPLIER) {
      shift++;
    }
    double multiplier = Math.rint(steps * Math.scalb(1.0, shift));
    if (multiplier > LARGEST_MULTIPLIER || multiplier == 0) {
      String why = "no 16-bit multiplier holds it; state a resolution to count in";
      figures.add(Figure.none("scale-multiplier", "1", why));
      figures.add(Figure.none("scale-shift", "1", why));
      return;
    }
    double error =
        Math.abs(multiplier / Math.scalb(1.0, shift) - steps) * model.converterCodes() * unit;
    double signed = Math.signum(scale) * multiplier;
    figures.add(
        Figure.of(
            "scale-multiplier",
            signed,
            "1",
            "scale / unit x 2^scale-shift, rounded",
            Figure.Operand.of("scale", scale, model.unit()),
            Figure.Operand.of("unit", unit, model.unit())));
    figures.add(
        Figure.of("scale-shift", shift, "1", "largest with a multiplier within 16 bits, signed"));
    figures.add(
        Figure.of(
            "scale-error",
            error,
            model.unit(),
            "largest error of the pair over all codes, beside half a unit of rounding"));
  }

  private static void accumulator(ChannelModel model, List<Figure> figures) {
    double sum = model.average() * (model.converterCodes() - 1);
    double bits = Math.ceil(StrictMath.log(sum + 1) / StrictMath.log(2) - 1e-12);
    figures.add(
        Figure.of(
            "accumulator-bits",
            bits,
            "1",
            "bits that hold average x (2^bits - 1)",
            Figure.Operand.of("average", model.average(), "1"),
            Figure.Operand.of("largest sum", sum, "1")));
  }

  /** A mean of M codes steps by 1/M LSB only where noise carries it over the codes' edges. */
  private static void step(ChannelModel model, List<Figure> figures) {
    double worst = 0;
    double at = model.measures().low();
    for (double x : model.points()) {
      double measured = model.lsb() / Math.abs(model.slope(x));
      if (measured > worst) {
        worst = measured;
        at = x;
      }
    }
    figures.add(Figure.of("resolution-step", worst, model.unit(), "lsb-measured, one code").at(at));
  }

  private static void limits(ChannelModel model, Budget budget, List<Figure> figures) {
    ForwardModel forward = model.forward();
    Converter adc = forward.converter();
    double[] p = forward.nominal();
    double first = forward.volts(model.measures().low(), p);
    double second = forward.volts(model.measures().high(), p);
    double low = Math.min(first, second) - widest(model, budget);
    double high = Math.max(first, second) + widest(model, budget);
    figures.add(
        Figure.of(
            "code-limit-low", adc.read(low, p), "1", "lowest code of the range - hard limit"));
    figures.add(
        Figure.of(
            "code-limit-high", adc.read(high, p), "1", "highest code of the range + hard limit"));
  }

  /** The hard limit in volts at the pin. */
  private static double widest(ChannelModel model, Budget budget) {
    return budget.hardLimit() * Math.abs(model.slope(budget.at()));
  }
}
