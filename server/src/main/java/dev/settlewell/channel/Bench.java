package dev.settlewell.channel;

import dev.settlewell.sheet.Linked;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.unit.Deviation;
import dev.settlewell.unit.Dimension;
import dev.settlewell.unit.Range;
import dev.settlewell.unit.Tolerance;
import dev.settlewell.unit.Toleranced;
import dev.settlewell.unit.Unit;
import java.util.List;
import java.util.Optional;
import java.util.function.ToDoubleFunction;

/**
 * Where a channel's model is put together: its parameters so far, what is missing so far, and what
 * the names in its sheet mean.
 */
final class Bench {
  private final Linked linked;
  private final Part channel;
  private final Range measures;
  final Parameters parameters;
  final Inputs inputs = new Inputs();

  Bench(Linked linked, Part channel, Range measures, double statedAt) {
    this.linked = linked;
    this.channel = channel;
    this.measures = measures;
    this.parameters = new Parameters(statedAt);
  }

  Part channel() {
    return channel;
  }

  Range measures() {
    return measures;
  }

  /** The parameter of a supply, or -1 with a note of what is missing. */
  int supply(Slot<String> name) {
    Slot.Stated<String> stated = inputs.need(name);
    return stated == null ? -1 : supply(stated.value());
  }

  int supply(String name) {
    Named<Toleranced> supply = linked.supplies().get(name);
    if (supply == null) {
      inputs.spoil();
      return -1;
    }
    Slot.Stated<Toleranced> value = inputs.need(supply.value());
    return value == null ? -1 : parameters.supply(supply, value);
  }

  /** The parameter of a stated value, or -1 with a note of what is missing. */
  int need(String row, Slot<Toleranced> slot) {
    Slot.Stated<Toleranced> stated = inputs.need(slot);
    return stated == null ? -1 : parameters.add(row, stated);
  }

  /** The parameter of a value that may be left out. */
  int optional(String row, Slot<Toleranced> slot, double otherwise) {
    Slot.Stated<Toleranced> stated = inputs.optional(slot);
    return stated == null ? parameters.add(otherwise) : parameters.add(row, stated);
  }

  /**
   * Adds the rows of an error that is stated by itself ({@code ±2 LSB}, {@code ±0.5 µV/K}) to the
   * parameter it moves.
   *
   * @param scale what one of the error's unit is in the parameter's unit
   */
  void error(
      String row,
      int parameter,
      Slot<Deviation> slot,
      ToDoubleFunction<Unit> scale,
      boolean scalesWithLsb) {
    Slot.Stated<Deviation> stated = inputs.optional(slot);
    if (stated == null) {
      return;
    }
    Deviation deviation = stated.value();
    List<Place> places = List.of(stated.place());
    double minus = 0;
    double plus = 0;
    for (Tolerance t : deviation.tolerances()) {
      minus += t.minus() * scale.applyAsDouble(t.unit());
      plus += t.plus() * scale.applyAsDouble(t.unit());
    }
    if (minus > 0 || plus > 0) {
      parameters.add(
          new Spread(
              row,
              parameter,
              atTemperature(minus, deviation),
              atTemperature(plus, deviation),
              deviation.basis(),
              false,
              scalesWithLsb,
              false,
              places));
    }
    deviation
        .drift()
        .ifPresent(
            drift ->
                parameters.add(
                    Spread.of(
                        row.endsWith("drift") ? row : row + "-drift",
                        parameter,
                        parameters.drift(drift, scale.applyAsDouble(drift.unit())),
                        Optional.empty(),
                        places)));
  }

  /**
   * A leakage stated at one temperature doubles each 10 K above it and halves below (common
   * practice for silicon junctions); without a temperature it holds over the whole ambient.
   */
  private static Extent atTemperature(double magnitude, Deviation deviation) {
    if (deviation.at().isEmpty()) {
      return Extent.constant(magnitude);
    }
    double stated = deviation.at().get().value();
    return (x, ambient) -> magnitude * StrictMath.pow(2, (ambient - stated) / 10);
  }

  /**
   * The parameter for an error stated in the measured unit: nominal 0.
   *
   * @param span what a share is of where the text does not say
   */
  int measuredError(String row, Slot<Deviation> slot, Range span) {
    Slot.Stated<Deviation> stated = inputs.optional(slot);
    int index = parameters.add(0);
    if (stated == null) {
      return index;
    }
    Deviation deviation = stated.value();
    if (!deviation.tolerances().isEmpty()) {
      Extent minus = (x, ambient) -> sum(deviation, x, span, false);
      Extent plus = (x, ambient) -> sum(deviation, x, span, true);
      parameters.add(
          new Spread(
              row,
              index,
              minus,
              plus,
              deviation.basis(),
              false,
              false,
              false,
              List.of(stated.place())));
    }
    deviation
        .drift()
        .ifPresent(
            drift -> {
              boolean share = drift.unit().dimension() == Dimension.RATIO;
              double scale = share ? Math.abs(span.width()) : 1;
              parameters.add(
                  Spread.of(
                      row + "-drift",
                      index,
                      parameters.drift(drift, scale),
                      Optional.empty(),
                      List.of(stated.place())));
            });
    return index;
  }

  private double sum(Deviation deviation, double x, Range span, boolean upward) {
    double sum = 0;
    for (Tolerance t : deviation.tolerances()) {
      double size = upward ? t.plus() : t.minus();
      sum += size * shareOf(t, x, span);
    }
    return sum;
  }

  private double shareOf(Tolerance t, double x, Range span) {
    if (!t.isShare() || isMeasuredInShares()) {
      return 1;
    }
    return switch (t.of()) {
      case READING -> Math.abs(x);
      case FULL_SCALE -> Math.max(Math.abs(span.low()), Math.abs(span.high()));
      case SPAN, UNSAID -> Math.abs(span.width());
    };
  }

  /** A quantity measured in % has its errors in %, not in shares of itself. */
  private boolean isMeasuredInShares() {
    return measures.unit().dimension() == Dimension.RATIO;
  }
}
