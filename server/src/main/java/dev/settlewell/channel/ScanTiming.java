package dev.settlewell.channel;

import dev.settlewell.circuit.Visit;
import dev.settlewell.sheet.Either;
import dev.settlewell.sheet.Linked;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.unit.Dimension;
import dev.settlewell.unit.Toleranced;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * When a scan does what: its order, its clock, and how long each acquisition and conversion lasts.
 *
 * @param rateInputs what the rate lacks; where it is not complete no period may be asked for
 * @param inputs what the frame lacks (rate, order, clock, conversion); where it is not complete no
 *     time within the scan may be asked for
 * @param acquisitionInputs which acquisitions are not known
 * @param order names of the channels, in the multiplexer's order
 * @param rate scans per second; null where the scan runs without a pause
 * @param offered cycles the hardware offers, rising; empty where any time can be set
 * @param acquisitions by channel; absent where it is not stated or wrong
 */
record ScanTiming(
    Named<Part> scan,
    Named<Part> converter,
    Inputs rateInputs,
    Inputs inputs,
    Inputs acquisitionInputs,
    List<String> order,
    Limits clock,
    double conversionCycles,
    double gap,
    Limits rate,
    double jitter,
    double overhead,
    double[] offered,
    Map<String, Acquisition> acquisitions) {

  /** How an acquisition is set. */
  sealed interface Acquisition {
    record Cycles(double count) implements Acquisition {}

    record Time(double seconds) implements Acquisition {}

    /** All that the period leaves. */
    record UntilTrigger() implements Acquisition {}
  }

  static ScanTiming bind(Linked linked, Named<Part> scan, Named<Part> converter) {
    Part part = scan.value().stated().orElseThrow();
    Part adc = converter.value().stated().orElseThrow();
    Inputs rateInputs = new Inputs();
    List<String> order = order(part, rateInputs);
    Slot.Stated<Either> rateStated = rateInputs.need(part.either("rate"));
    Inputs inputs = new Inputs();
    Inputs acquisitionInputs = new Inputs();
    Slot.Stated<Toleranced> clockStated = inputs.need(adc.quantity("clock"));
    Slot.Stated<Double> conversion = inputs.need(adc.number("conversion-cycles"));
    inputs.include(rateInputs);
    Limits clock = clockStated == null ? null : Limits.of(clockStated.value());
    Limits rate =
        rateStated == null ? null : rateStated.value().quantity().map(Limits::of).orElse(null);
    if (rateStated != null && rate == null) {
      // It runs without a pause: only the whole of its times says how often.
      rateInputs = inputs;
    }
    double[] offered = offered(adc, inputs);
    Map<String, Acquisition> acquisitions = new HashMap<>();
    for (String name : order) {
      Named<Part> channel = linked.sheet().channels().get(name);
      Slot.Stated<Either> stated =
          channel == null || !channel.value().isStated()
              ? null
              : acquisitionInputs.need(
                  channel.value().stated().orElseThrow().either("acquisition"));
      if (channel == null || !channel.value().isStated()) {
        acquisitionInputs.spoil();
      }
      if (stated != null) {
        acquisitions.put(name, acquisition(stated.value(), clock, offered));
      }
    }
    if (rateInputs == inputs) {
      inputs.include(acquisitionInputs);
    }
    return new ScanTiming(
        scan,
        converter,
        rateInputs,
        inputs,
        acquisitionInputs,
        order,
        clock,
        conversion == null ? Double.NaN : conversion.value(),
        seconds(part, "gap", inputs),
        rate,
        seconds(part, "jitter", inputs),
        seconds(adc, "acquisition-overhead", inputs),
        offered,
        Map.copyOf(acquisitions));
  }

  private static List<String> order(Part part, Inputs inputs) {
    List<String> names = new ArrayList<>();
    Slot.Stated<List<Slot<String>>> order = inputs.need(part.list("order", String.class));
    if (order != null) {
      for (Slot<String> item : order.value()) {
        Slot.Stated<String> name = inputs.optional(item);
        if (name != null) {
          names.add(name.value());
        }
      }
    }
    return List.copyOf(names);
  }

  private static double[] offered(Part adc, Inputs inputs) {
    Slot.Stated<List<Slot<Double>>> list =
        inputs.optional(adc.list("acquisition-cycles", Double.class));
    if (list == null) {
      return new double[0];
    }
    return list.value().stream()
        .mapToDouble(s -> s.orElse(Double.NaN))
        .filter(v -> v > 0)
        .toArray();
  }

  private static double seconds(Part part, String key, Inputs inputs) {
    Slot.Stated<Toleranced> stated = inputs.optional(part.quantity(key));
    return stated == null ? 0 : Limits.high(stated.value());
  }

  /** A time on a converter that lists cycles means the next offered count not below it. */
  private static Acquisition acquisition(Either stated, Limits clock, double[] offered) {
    if (stated.word().isPresent()) {
      return new Acquisition.UntilTrigger();
    }
    Toleranced value = stated.quantity().orElseThrow();
    if (value.unit().dimension() == Dimension.CYCLES) {
      return new Acquisition.Cycles(value.value());
    }
    if (offered.length == 0 || clock == null) {
      return new Acquisition.Time(value.value());
    }
    double needed = cycles(value.value(), clock.high());
    for (double count : offered) {
      if (count >= needed) {
        return new Acquisition.Cycles(count);
      }
    }
    return new Acquisition.Cycles(offered[offered.length - 1]);
  }

  /** Whole cycles that last at least so long; 54.000000001 is 54. */
  static double cycles(double seconds, double hertz) {
    return Math.ceil(seconds * hertz - 1e-6);
  }

  /** Whether every time within the scan is known. */
  boolean complete() {
    return inputs.complete() && acquisitionInputs.complete();
  }

  /** What a time within the scan lacks. */
  Inputs allInputs() {
    Inputs all = new Inputs();
    all.include(inputs);
    all.include(acquisitionInputs);
    return all;
  }

  double conversion(double hertz) {
    return conversionCycles / hertz;
  }

  /** One pass through the order at a clock; what waits for a trigger counts nothing. */
  double scanTime(double hertz) {
    double sum = 0;
    for (String name : order) {
      sum += fixed(name, hertz) + conversion(hertz);
    }
    return sum + gap * (order.size() - 1);
  }

  private double fixed(String name, double hertz) {
    Acquisition acquisition = acquisitions.get(name);
    if (acquisition instanceof Acquisition.Cycles c) {
      return c.count() / hertz;
    }
    return acquisition instanceof Acquisition.Time t ? t.seconds() : 0;
  }

  double shortestPeriod() {
    return rate == null ? scanTime(clock.high()) : 1 / rate.high();
  }

  double longestPeriod() {
    return rate == null ? scanTime(clock.low()) : 1 / rate.low();
  }

  double nominalPeriod() {
    return rate == null ? scanTime(clock.nominal()) : 1 / rate.nominal();
  }

  /** The whole acquisition of a channel, overhead included. */
  double acquisition(String name, double hertz, double period) {
    if (acquisitions.get(name) instanceof Acquisition.UntilTrigger) {
      long waiting =
          order.stream()
              .filter(n -> acquisitions.get(n) instanceof Acquisition.UntilTrigger)
              .count();
      return Math.max(0, (period - scanTime(hertz)) / waiting);
    }
    return fixed(name, hertz);
  }

  /**
   * The longest acquisition one channel could have in the shortest period, at the slowest clock.
   */
  double available(String name) {
    if (rate == null) {
      return Double.POSITIVE_INFINITY;
    }
    double others = scanTime(clock.low());
    int visits = visits(name);
    others -= visits * fixed(name, clock.low());
    return Math.max(0, (shortestPeriod() - others) / visits);
  }

  int visits(String name) {
    return (int) order.stream().filter(name::equals).count();
  }

  /**
   * The visits of a channel within one period: from where the hold capacitor is connected and the
   * dead time is over.
   */
  List<Visit> visits(String name, double hertz, double period) {
    List<Visit> visits = new ArrayList<>();
    double time = 0;
    for (String at : order) {
      double acquisition = acquisition(at, hertz, period);
      if (at.equals(name)) {
        visits.add(new Visit(time + overhead, Math.max(0, acquisition - overhead)));
      }
      time += acquisition + conversion(hertz) + gap;
    }
    return visits;
  }

  /** Ends of acquisition of a channel within one period: when it is sampled. */
  double[] instants(String name, double hertz, double period) {
    return visits(name, hertz, period).stream()
        .mapToDouble(v -> v.start() + v.acquisition())
        .toArray();
  }

  /** Who is sampled before each visit of a channel; the first of the order follows the last. */
  List<String> predecessors(String name) {
    List<String> before = new ArrayList<>();
    for (int i = 0; i < order.size(); i++) {
      if (order.get(i).equals(name)) {
        before.add(order.get((i + order.size() - 1) % order.size()));
      }
    }
    return before;
  }

  /** Samples of a channel per second. */
  double sampleRate(String name, double period) {
    return visits(name) / period;
  }
}
