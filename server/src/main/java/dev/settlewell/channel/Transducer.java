package dev.settlewell.channel;

import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.unit.Dimension;
import dev.settlewell.unit.Range;

/**
 * The straight line between a measured quantity and a transducer's output: {@code output} over
 * {@code spans}; without {@code output} the measured quantity is the output itself.
 *
 * @param from output at {@code x0}
 * @param to output at the other end of the span
 */
record Transducer(double x0, double slope, double from, double to) {

  double output(double x) {
    return from + (x - x0) * slope;
  }

  static Range spans(Part sensor, Bench bench) {
    Slot.Stated<Range> spans = bench.inputs.optional(sensor.range("spans"));
    return spans == null ? bench.measures() : spans.value();
  }

  /** Null with a note where the output is not stated and the measured quantity is another one. */
  static Transducer of(Part sensor, Bench bench, Dimension own) {
    Slot.Stated<Range> output = bench.inputs.optional(sensor.range("output"));
    if (output == null) {
      if (bench.measures().unit().dimension() == own) {
        return new Transducer(0, 1, 0, 0);
      }
      bench.inputs.need(sensor.range("output"));
      return null;
    }
    Range from = spans(sensor, bench);
    Range to = output.value();
    return new Transducer(from.low(), (to.high() - to.low()) / from.width(), to.low(), to.high());
  }
}
