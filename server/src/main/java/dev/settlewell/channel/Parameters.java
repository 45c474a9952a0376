package dev.settlewell.channel;

import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.unit.Deviation;
import dev.settlewell.unit.Dimension;
import dev.settlewell.unit.Drift;
import dev.settlewell.unit.Toleranced;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The parameters of one channel's forward model while it is being built: nominal values, and the
 * spreads that move them. A supply is one parameter however often it is used, so what is
 * ratiometric cancels by itself.
 */
final class Parameters {
  private final double statedAt;
  private final List<Double> nominals = new ArrayList<>();
  private final List<Spread> spreads = new ArrayList<>();
  private final List<Place> typicalOnly = new ArrayList<>();
  private final List<Known> known = new ArrayList<>();
  private final List<Stated> stated = new ArrayList<>();
  private final Map<String, Integer> supplies = new HashMap<>();
  private final Map<String, Integer> rowCounts = new HashMap<>();

  /**
   * @param statedAt the temperature tolerances are stated at, °C
   */
  Parameters(double statedAt) {
    this.statedAt = statedAt;
  }

  int add(double nominal) {
    nominals.add(nominal);
    return nominals.size() - 1;
  }

  /** A stated value: its tolerance is one row, its drift another. */
  int add(String row, Toleranced value, List<Place> places) {
    int index = add(value.value());
    places.forEach(place -> stated.add(new Stated(row, index, place)));
    spread(row, index, value, places);
    return index;
  }

  int add(String row, Slot.Stated<Toleranced> slot) {
    return add(row, slot.value(), List.of(slot.place()));
  }

  /** A supply, the same parameter each time it is asked for. */
  int supply(Named<Toleranced> supply, Slot.Stated<Toleranced> value) {
    Integer known = supplies.get(supply.name());
    if (known != null) {
      return known;
    }
    int index = add("supply-" + supply.name(), value.value(), List.of(value.place()));
    supplies.put(supply.name(), index);
    return index;
  }

  /** {@code resistor-1}, {@code resistor-2}: rows of one channel have different names. */
  String numbered(String kind) {
    return kind + "-" + rowCounts.merge(kind, 1, Integer::sum);
  }

  void add(Spread spread) {
    spreads.add(spread);
  }

  /** A parameter that stands in a sheet, under the name its row has. */
  record Stated(String row, int parameter, Place place) {}

  List<Stated> stated() {
    return List.copyOf(stated);
  }

  /** What varies while firmware knows it (a cold junction): it widens ranges, not errors. */
  record Known(int parameter, double low, double high) {}

  void known(int parameter, double low, double high) {
    known.add(new Known(parameter, low, high));
  }

  List<Known> known() {
    return List.copyOf(known);
  }

  void typicalOnly(Place place) {
    typicalOnly.add(place);
  }

  private void spread(String row, int index, Toleranced value, List<Place> places) {
    Deviation deviation = value.deviation();
    double nominal = value.value();
    Limits limits = Limits.of(value);
    double minus = nominal - limits.low();
    double plus = limits.high() - nominal;
    if (value.typicalOnly()) {
      typicalOnly.addAll(places);
    }
    if (minus > 0 || plus > 0) {
      add(
          new Spread(
              row,
              index,
              Extent.constant(minus),
              Extent.constant(plus),
              deviation.basis(),
              false,
              false,
              value.typicalOnly(),
              places));
    }
    deviation
        .drift()
        .ifPresent(
            drift -> {
              boolean share = drift.unit().dimension() == Dimension.RATIO;
              double scale = share ? Math.abs(nominal) : 1;
              Extent extent = drift(drift, scale);
              // A share that would take the whole value away is a slip; what is left stays a value.
              double most = share ? 0.9 * Math.max(0, scale - minus) : Double.POSITIVE_INFINITY;
              Extent bounded = (x, ambient) -> Math.min(most, extent.at(x, ambient));
              add(Spread.of(row + "-drift", index, bounded, Optional.empty(), places));
            });
  }

  /** Box: the whole excursion wherever the ambient lies. Slope: from the stated temperature. */
  Extent drift(Drift drift, double scale) {
    double perKelvin = drift.perKelvin() * scale;
    if (drift.box().isPresent()) {
      double whole = perKelvin * drift.box().get().width();
      return Extent.constant(whole);
    }
    double from = statedAt;
    return (x, ambient) -> perKelvin * Math.abs(ambient - from);
  }

  double[] nominals() {
    return nominals.stream().mapToDouble(Double::doubleValue).toArray();
  }

  List<Spread> spreads() {
    return List.copyOf(spreads);
  }

  List<Place> typicalOnly() {
    return List.copyOf(typicalOnly);
  }
}
