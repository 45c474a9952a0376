package dev.settlewell.channel;

import dev.settlewell.circuit.ActiveFilter;
import dev.settlewell.circuit.Amplifier;
import dev.settlewell.circuit.Drive;
import dev.settlewell.circuit.Element;
import dev.settlewell.circuit.LowPass;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.unit.Range;
import dev.settlewell.unit.Toleranced;
import java.util.List;
import java.util.Optional;

/**
 * An amplifier, or an active filter, which is an amplifier with a response of its own.
 *
 * @param gain parameter
 * @param gainError parameter: relative
 * @param offset parameter: V, at the input
 * @param bias parameter: A, into the input's node
 * @param level parameter: V at the output for zero input; or the supply it is a share of
 * @param levelShare the share; 1 where the level is a voltage
 */
record ActiveStage(
    String kind,
    int gain,
    int gainError,
    int offset,
    int bias,
    int level,
    double levelShare,
    Optional<LowPass> response,
    Traits traits)
    implements StageModel.Active {

  /**
   * What else a data sheet says of it; NaN where it does not say.
   *
   * @param pole closed-loop -3 dB frequency, Hz, nominal; infinite where nothing is stated
   * @param leastPole the same at the least gain-bandwidth
   * @param outputOhms open-loop output resistance
   * @param noise V/√Hz at the input
   * @param flicker V, 0.1 Hz to 10 Hz peak to peak, at the input
   */
  record Traits(
      Place place,
      Place swingPlace,
      double pole,
      double leastPole,
      double outputOhms,
      boolean loopKnown,
      double slewRate,
      double noise,
      double flicker,
      double noiseGain,
      double swingLow,
      double swingHigh,
      List<Place> noisePlaces) {}

  static StageModel amplifier(Part stage, Bench bench) {
    Slot.Stated<Double> gain = bench.inputs.need(stage.number("gain"));
    return gain == null ? null : bind(stage, bench, gain.value(), Optional.empty());
  }

  static StageModel filter(Part stage, Bench bench) {
    Slot.Stated<String> response = bench.inputs.need(stage.text("response"));
    Slot.Stated<Double> order = bench.inputs.need(stage.number("order"));
    Slot.Stated<Toleranced> corner = bench.inputs.need(stage.quantity("corner"));
    boolean ripples = response != null && response.value().equals("chebyshev");
    Slot.Stated<Toleranced> ripple = ripples ? bench.inputs.need(stage.quantity("ripple")) : null;
    if (response == null || order == null || corner == null || ripples && ripple == null) {
      return null;
    }
    int n = order.value().intValue();
    double hertz = corner.value().value();
    if (n < 1 || n > 8) {
      bench.inputs.spoil();
      return null;
    }
    LowPass shape =
        switch (response.value()) {
          case "bessel" -> LowPass.bessel(n, hertz);
          case "chebyshev" -> LowPass.chebyshev(n, hertz, ripple.value().value());
          default -> LowPass.butterworth(n, hertz);
        };
    return bind(stage, bench, stage.number("gain").orElse(1.0), Optional.of(shape));
  }

  private static StageModel bind(Part stage, Bench bench, double gain, Optional<LowPass> shape) {
    String row = bench.parameters.numbered(stage.kind());
    int gainIndex = bench.parameters.add(gain);
    int gainError = bench.parameters.add(0);
    bench.error(row + "-gain", gainError, stage.deviation("gain-error"), unit -> 1, false);
    int offset = bench.parameters.add(0);
    bench.error(row + "-offset", offset, stage.deviation("offset"), unit -> 1, false);
    bench.error(row + "-offset-drift", offset, stage.deviation("offset-drift"), unit -> 1, false);
    int bias = bench.parameters.add(0);
    bench.error(row + "-bias-current", bias, stage.deviation("bias-current"), unit -> 1, false);
    Slot.Stated<Toleranced> level = bench.inputs.optional(stage.quantity("level"));
    int levelIndex = level(row, level, bench);
    double share = level != null && level.value().of().isPresent() ? level.value().value() : 1;
    return new ActiveStage(
        stage.kind(),
        gainIndex,
        gainError,
        offset,
        bias,
        levelIndex,
        share,
        shape,
        traits(stage, bench, gain));
  }

  private static int level(String row, Slot.Stated<Toleranced> level, Bench bench) {
    if (level == null) {
      return bench.parameters.add(0);
    }
    if (level.value().of().isPresent()) {
      return Math.max(0, bench.supply(level.value().of().get()));
    }
    return bench.parameters.add(row + "-level", level);
  }

  private static Traits traits(Part stage, Bench bench, double gain) {
    double noiseGain =
        stage.number("noise-gain").orElse(gain < 0 ? 1 + Math.abs(gain) : Math.max(1, gain));
    Slot.Stated<Toleranced> product = bench.inputs.optional(stage.quantity("gain-bandwidth"));
    Slot.Stated<Toleranced> bandwidth = bench.inputs.optional(stage.quantity("bandwidth"));
    double pole = Double.POSITIVE_INFINITY;
    double least = Double.POSITIVE_INFINITY;
    if (product != null) {
      pole = product.value().value() / noiseGain;
      least = Limits.low(product.value()) / noiseGain;
    } else if (bandwidth != null) {
      pole = bandwidth.value().value();
      least = Limits.low(bandwidth.value());
    }
    Slot<Range> swing = stage.range("swing");
    Range reach = swing.orElse(null);
    return new Traits(
        stage.keyPlace(),
        swing.place(),
        pole,
        least,
        high(stage, "output-resistance", 0),
        least < Double.POSITIVE_INFINITY,
        low(stage, "slew-rate"),
        high(stage, "noise", 0),
        high(stage, "flicker-noise", 0),
        noiseGain,
        reach == null ? Double.NaN : reach.low(),
        reach == null ? Double.NaN : reach.high(),
        List.of(stage.quantity("noise").place()));
  }

  private static double high(Part stage, String key, double otherwise) {
    return stage.quantity(key).stated().map(Limits::high).orElse(otherwise);
  }

  private static double low(Part stage, String key) {
    return stage.quantity(key).stated().map(Limits::low).orElse(Double.NaN);
  }

  @Override
  public double output(Port before, double[] p) {
    double input = before.injected(p[bias]).volts() + p[offset];
    return input * p[gain] * (1 + p[gainError]) + p[level] * levelShare;
  }

  @Override
  public Port after(Port before, double[] p) {
    return Port.voltage(output(before, p), traits.loopKnown() ? 0 : traits.outputOhms());
  }

  /** Its input draws nothing but its bias current, which is a row of its own. */
  @Override
  public Port before(Port load, double[] p) {
    return Port.current(0, 0);
  }

  @Override
  public void elements(double[] p, List<Element> into) {
    if (response.isPresent()) {
      double closedLoop = traits.loopKnown() ? 0 : traits.outputOhms();
      into.add(new ActiveFilter(p[gain], response.get(), closedLoop));
    } else {
      into.add(new Amplifier(p[gain], traits.pole(), traits.outputOhms()));
    }
  }

  /** How it drives what follows: through its closed loop where the loop is known. */
  Drive drive() {
    return traits.loopKnown() && traits.outputOhms() > 0
        ? new Drive.ClosedLoop(traits.outputOhms(), traits.leastPole())
        : new Drive.Resistive(traits.loopKnown() ? 0 : traits.outputOhms());
  }
}
