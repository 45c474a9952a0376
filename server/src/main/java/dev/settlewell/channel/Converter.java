package dev.settlewell.channel;

import dev.settlewell.sheet.Either;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.unit.Toleranced;
import dev.settlewell.unit.Unit;
import java.util.List;
import java.util.Optional;

/**
 * The converter as the forward model sees it: volts at the pin to a code, with its errors.
 *
 * @param reference parameter: volts of full scale
 * @param low parameter: volts of code 0 where the input is single-ended
 * @param bipolar differential or bipolar input: code 0 at minus the reference
 * @param offset parameter, LSB
 * @param gain parameter, relative
 * @param linearity parameter, LSB; of a total unadjusted error, all of it
 * @param quantization parameter, LSB
 * @param leakage parameter, A, into the pin's node
 * @param firstTransition where the code first changes, LSB above code 0's ideal voltage
 */
record Converter(
    int bits,
    int reference,
    int low,
    boolean bipolar,
    int offset,
    int gain,
    int linearity,
    int quantization,
    int leakage,
    double firstTransition) {

  static final String QUANTIZATION = "quantization";

  static Converter bind(Part part, Bench bench) {
    Slot.Stated<Double> bits = bench.inputs.need(part.number("bits"));
    Slot.Stated<Either> stated = bench.inputs.need(part.either("reference"));
    if (bits == null || stated == null) {
      return null;
    }
    int reference = voltage("reference", stated, bench);
    Slot.Stated<Either> lowStated = bench.inputs.optional(part.either("reference-low"));
    int low =
        lowStated == null ? bench.parameters.add(0) : voltage("reference-low", lowStated, bench);
    if (reference < 0 || low < 0) {
      return null;
    }
    boolean bipolar = !part.text("input").orElse("single-ended").equals("single-ended");
    double[] p = bench.parameters.nominals();
    double span = bipolar ? 2 * p[reference] : p[reference] - p[low];
    if (!(span > 0)) {
      bench.inputs.spoil();
      return null;
    }
    double codes = Math.scalb(1.0, bits.value().intValue());
    return errors(part, bench, bits.value().intValue(), reference, low, bipolar, span / codes);
  }

  private static Converter errors(
      Part part, Bench bench, int bits, int reference, int low, boolean bipolar, double lsb) {
    double codes = Math.scalb(1.0, bits);
    int offset = bench.parameters.add(0);
    int gain = bench.parameters.add(0);
    int linearity = bench.parameters.add(0);
    boolean total = part.has("total-unadjusted-error");
    if (total) {
      bench.error(
          "total-unadjusted-error",
          linearity,
          part.deviation("total-unadjusted-error"),
          unit -> inLsb(unit, codes, lsb),
          true);
    } else {
      bench.error(
          "offset", offset, part.deviation("offset-error"), unit -> inLsb(unit, codes, lsb), true);
      bench.error(
          "gain",
          gain,
          part.deviation("gain-error"),
          unit -> inLsb(unit, codes, lsb) / codes,
          true);
      bench.error(
          "nonlinearity",
          linearity,
          part.deviation("integral-nonlinearity"),
          unit -> inLsb(unit, codes, lsb),
          true);
    }
    bench.error(
        "offset-drift",
        offset,
        part.deviation("offset-drift"),
        unit -> inLsb(unit, codes, lsb),
        false);
    bench.error("gain-drift", gain, part.deviation("gain-drift"), unit -> 1, false);
    int leakage = bench.parameters.add(0);
    bench.error("leakage", leakage, part.deviation("pin-leakage"), unit -> 1, false);
    int quantization = bench.parameters.add(0);
    bench.parameters.add(
        new Spread(
            QUANTIZATION,
            quantization,
            Extent.constant(0.5),
            Extent.constant(0.5),
            Optional.empty(),
            false,
            true,
            false,
            List.of(part.number("bits").place())));
    double first = part.quantity("first-transition").stated().map(Toleranced::value).orElse(0.5);
    return new Converter(
        bits, reference, low, bipolar, offset, gain, linearity, quantization, leakage, first);
  }

  /** A share is of full scale; volts and LSB are what they are. */
  private static double inLsb(Unit unit, double codes, double lsb) {
    return switch (unit.dimension()) {
      case LSB -> 1;
      case VOLTAGE, VOLTAGE_DRIFT -> 1 / lsb;
      default -> codes;
    };
  }

  private static int voltage(String row, Slot.Stated<Either> stated, Bench bench) {
    Either either = stated.value();
    return either.word().isPresent()
        ? bench.supply(either.word().get())
        : bench.parameters.add(row, either.quantity().get(), List.of(stated.place()));
  }

  double codes() {
    return Math.scalb(1.0, bits);
  }

  double spanLow(double[] p) {
    return bipolar ? -p[reference] : p[low];
  }

  double spanHigh(double[] p) {
    return p[reference];
  }

  double lsb(double[] p) {
    return (spanHigh(p) - spanLow(p)) / codes();
  }

  /** The code, as a real number and without limits, of a voltage at the hold capacitor. */
  double code(double volts, double[] p) {
    double ideal = (volts - spanLow(p)) / lsb(p);
    double zero = bipolar ? codes() / 2 : 0;
    return ideal + (ideal - zero) * p[gain] + p[offset] + p[linearity] + p[quantization];
  }

  /** The code that is read, quantized and limited. */
  long read(double volts, double[] p) {
    double ideal = (volts - spanLow(p)) / lsb(p);
    double floor = Math.floor(ideal + 1 - firstTransition);
    return (long) Math.max(0, Math.min(codes() - 1, floor));
  }

  /** What ideal firmware takes a code for, V. */
  double volts(double code, double[] nominal) {
    return spanLow(nominal) + code * lsb(nominal);
  }
}
