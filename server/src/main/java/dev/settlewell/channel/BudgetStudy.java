package dev.settlewell.channel;

import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.uncertainty.Coverage;
import dev.settlewell.uncertainty.Distribution;
import dev.settlewell.uncertainty.MonteCarlo;
import dev.settlewell.unit.Basis;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.function.ToDoubleFunction;
import java.util.stream.Stream;

/**
 * The error budget of a channel: every reason moved to its limits in the one forward model, at
 * every point of the range and every ambient worth looking at; the worst is reported.
 */
final class BudgetStudy {
  static final double PROBABILITY = 0.95;

  /** Below this share of the hard limit or the range it is rounding (a supply that cancels). */
  private static final double NOTHING = 1e-12;

  private final ChannelModel model;
  private final SettlingStudy settling;
  private final FrequencyStudy frequency;
  private final NoiseStudy noise;
  private final Set<String> calibratedAway = new HashSet<>();

  /**
   * @param settling null where no scan samples the channel
   */
  BudgetStudy(
      ChannelModel model, SettlingStudy settling, FrequencyStudy frequency, NoiseStudy noise) {
    this.model = model;
    this.settling = settling;
    this.frequency = frequency;
    this.noise = noise;
    calibration();
  }

  /**
   * {@code calibrated: [offset, gain]}: those rows of the converter were removed in the factory.
   */
  private void calibration() {
    Part calibrated = model.part().part("calibrated").stated().orElse(null);
    if (calibrated == null) {
      return;
    }
    for (Slot<String> term : calibrated.list("terms", String.class).orElse(List.of())) {
      term.stated().ifPresent(calibratedAway::add);
    }
  }

  /** The budget at one point. */
  private record Case(double x, double ambient, List<Contribution> rows, double corner) {
    double offset() {
      return rows.stream().mapToDouble(Contribution::offset).sum();
    }

    double combined() {
      double sum = 0;
      for (Contribution row : rows) {
        sum += row.standard() * row.standard();
      }
      return Math.sqrt(sum);
    }

    double limits() {
      return rows.stream().mapToDouble(Contribution::limit).sum();
    }

    double hardLimit() {
      return Math.max(limits(), corner) + Math.abs(offset());
    }

    double expanded() {
      List<Distribution> parts = new ArrayList<>();
      rows.forEach(row -> parts.addAll(row.parts()));
      return Coverage.expanded(parts, PROBABILITY);
    }
  }

  Budget run() {
    return report(worst());
  }

  private Case worst() {
    Case worst = null;
    double most = Double.NEGATIVE_INFINITY;
    boolean hard = model.judgesWorstCase();
    Map<Double, Beside> beside = new HashMap<>();
    for (double ambient : model.ambients()) {
      for (double x : model.points()) {
        Case here = at(x, ambient, beside.computeIfAbsent(x, this::beside));
        double size = hard ? here.hardLimit() : 2 * here.combined() + Math.abs(here.offset());
        // Where needs is a share of the reading, the tightest point is not the largest error.
        double weight = model.needs(x).orElse(1);
        double score = weight > 0 ? size / weight : Double.POSITIVE_INFINITY;
        if (score > most) {
          most = score;
          worst = here;
        }
      }
    }
    return worst;
  }

  /** The rows that do not depend on the ambient. */
  private record Beside(List<Contribution> settling, List<Contribution> others) {
    double limits() {
      return Stream.concat(settling.stream(), others.stream())
          .mapToDouble(Contribution::limit)
          .sum();
    }
  }

  private Beside beside(double x) {
    List<Contribution> settled = new ArrayList<>();
    settlingRows(x, settled);
    List<Contribution> others = new ArrayList<>(frequency.rows(x));
    others.addAll(noise.rows(x));
    others.addAll(noise.droop());
    return new Beside(settled, others);
  }

  private Case at(double x, double ambient, Beside beside) {
    List<Contribution> rows = new ArrayList<>();
    double corner = movedRows(x, ambient, rows);
    rows.addAll(beside.settling());
    rows.addAll(beside.others());
    selfHeating(x, rows);
    return new Case(x, ambient, rows, corner + beside.limits());
  }

  /** One row a spread; gives the error with all of them moved together, the larger direction. */
  private double movedRows(double x, double ambient, List<Contribution> rows) {
    ForwardModel forward = model.forward();
    double[] one = forward.nominal().clone();
    double[] allUp = forward.nominal().clone();
    double[] allDown = forward.nominal().clone();
    List<Moved> undecided = new ArrayList<>();
    for (Spread spread : model.spreads()) {
      if (calibratedAway.contains(spread.row())) {
        continue;
      }
      double plus = reach(spread) * spread.plus().at(x, ambient);
      double minus = reach(spread) * spread.minus().at(x, ambient);
      if (plus == 0 && minus == 0) {
        continue;
      }
      int i = spread.parameter();
      double kept = one[i];
      one[i] = kept + plus;
      double up = forward.error(x, one);
      one[i] = kept - minus;
      double down = forward.error(x, one);
      one[i] = kept;
      rows.add(row(spread, up, down, x));
      if (isNothing(up) && isNothing(down)) {
        undecided.add(new Moved(i, plus, minus));
        continue;
      }
      boolean rises = up >= down;
      allUp[i] += rises ? plus : -minus;
      allDown[i] += rises ? -minus : plus;
    }
    // What does nothing by itself may do something beside the others: leakage in a resistor.
    for (Moved moved : undecided) {
      moved.further(allUp, p -> forward.error(x, p));
      moved.further(allDown, p -> -forward.error(x, p));
    }
    return Math.max(Math.abs(forward.error(x, allUp)), Math.abs(forward.error(x, allDown)));
  }

  /** Whether an error is rounding. */
  private boolean isNothing(double error) {
    return Math.abs(error) <= NOTHING * model.measures().width();
  }

  /** A parameter and how far it may move. */
  private record Moved(int parameter, double plus, double minus) {

    /** Moves it to the end where the error is larger. */
    void further(double[] p, ToDoubleFunction<double[]> error) {
      double kept = p[parameter];
      p[parameter] = kept + plus;
      double up = error.applyAsDouble(p);
      p[parameter] = kept - minus;
      double down = error.applyAsDouble(p);
      p[parameter] = up >= down ? kept + plus : kept - minus;
    }
  }

  /** A value with stated coverage is moved to three standard uncertainties. */
  private static double reach(Spread spread) {
    return spread.basis().map(b -> 3 / b.k()).orElse(1.0);
  }

  private Contribution row(Spread spread, double up, double down, double x) {
    if (spread.row().equals(Converter.QUANTIZATION)) {
      return quantization(spread, x);
    }
    double offset = spread.oneSided() ? (up + down) / 2 : 0;
    double limit =
        spread.oneSided() ? Math.abs(up - down) / 2 : Math.max(Math.abs(up), Math.abs(down));
    return new Contribution(
        spread.row(),
        offset,
        limit,
        List.of(distribution(spread, limit)),
        spread.basis().isEmpty(),
        spread.scalesWithLsb(),
        spread.typicalOnly(),
        spread.places());
  }

  private static Distribution distribution(Spread spread, double limit) {
    if (spread.basis().isEmpty()) {
      return new Distribution.Rectangular(limit);
    }
    Basis basis = spread.basis().get();
    double standard = limit / 3;
    return basis.n().isPresent()
        ? new Distribution.Student(standard, Math.max(1, basis.n().getAsInt() - 1))
        : new Distribution.Normal(standard);
  }

  /** Half an LSB at most; what noise and averaging leave of it as standard uncertainty. */
  private Contribution quantization(Spread spread, double x) {
    double lsb = model.lsb() / Math.abs(model.slope(x));
    double standard = Math.min(noise.quantization(), 1 / Math.sqrt(12)) * lsb;
    return new Contribution(
        spread.row(),
        0,
        lsb / 2,
        List.of(new Distribution.Rectangular(standard * Math.sqrt(3))),
        true,
        true,
        false,
        spread.places());
  }

  /** Settling lies between two signed extremes; their middle is a known offset. */
  private void settlingRows(double x, List<Contribution> rows) {
    if (settling == null) {
      return;
    }
    double[] volts = settling.extremes(x);
    double[] p = model.forward().nominal().clone();
    int i = model.forward().settling();
    p[i] = volts[0];
    double low = model.forward().error(x, p);
    p[i] = volts[1];
    double high = model.forward().error(x, p);
    double half = Math.abs(high - low) / 2;
    if (half == 0) {
      return;
    }
    List<Place> places = List.of(model.part().either("acquisition").place());
    rows.add(Contribution.of("settling", new Distribution.Rectangular(half), false, places));
    double middle = (high + low) / 2;
    if (Math.abs(middle) > 1e-9 * half) {
      rows.add(
          new Contribution("settling-offset", middle, 0, List.of(), true, false, false, places));
    }
  }

  /**
   * A sensor warmed by its own current reads high: by nothing in a strong flow, by P/δ in still
   * air.
   */
  private void selfHeating(double x, List<Contribution> rows) {
    double rise = model.forward().selfHeating(x);
    if (rise > 0) {
      Part sensor = model.part().part("sensor").stated().orElseThrow();
      rows.add(
          new Contribution(
              "self-heating",
              rise / 2,
              rise / 2,
              List.of(new Distribution.Rectangular(rise / 2)),
              true,
              false,
              false,
              List.of(sensor.quantity("dissipation-constant").place())));
    }
  }

  /** The same case by random trials: every parameter drawn from its distribution at once. */
  Simulation simulate(String scan, long seed, int trials) {
    Case worst = worst();
    ForwardModel forward = model.forward();
    List<Spread> spreads =
        model.spreads().stream()
            .filter(s -> !calibratedAway.contains(s.row()))
            .filter(s -> !s.row().equals(Converter.QUANTIZATION))
            .toList();
    List<Distribution> inputs = new ArrayList<>();
    spreads.forEach(s -> inputs.add(distribution(s, reach(s))));
    Set<String> moved = new HashSet<>();
    spreads.forEach(s -> moved.add(s.row()));
    List<Contribution> beside =
        worst.rows().stream().filter(row -> !moved.contains(row.name())).toList();
    beside.forEach(row -> inputs.addAll(row.parts()));
    double offset = worst.offset();
    MonteCarlo.Result result =
        MonteCarlo.run(
            u -> {
              double[] p = forward.nominal().clone();
              for (int i = 0; i < spreads.size(); i++) {
                Spread s = spreads.get(i);
                Extent extent = u[i] >= 0 ? s.plus() : s.minus();
                p[s.parameter()] += u[i] * extent.at(worst.x(), worst.ambient());
              }
              double error = forward.error(worst.x(), p) + offset;
              for (int i = spreads.size(); i < u.length; i++) {
                error += u[i];
              }
              return error;
            },
            inputs,
            seed,
            trials,
            PROBABILITY);
    double expanded = worst.expanded() + Math.abs(offset);
    double reach = Math.max(Math.abs(result.shortestLow()), Math.abs(result.shortestHigh()));
    return new Simulation(
        model.name(),
        scan,
        model.unit(),
        seed,
        result.trials(),
        result.mean(),
        result.standard(),
        result.shortestLow(),
        result.shortestHigh(),
        expanded,
        Math.abs(reach - expanded) <= 0.05 * expanded);
  }

  private Budget report(Case worst) {
    double combined = worst.combined();
    double offset = worst.offset();
    double expanded = worst.expanded();
    List<BudgetRow> rows = new ArrayList<>();
    List<String> typicalOnly = new ArrayList<>();
    double hard = worst.hardLimit();
    for (Contribution row : worst.rows()) {
      if (row.limit() + Math.abs(row.offset()) <= NOTHING * hard) {
        continue;
      }
      double standard = row.standard();
      double share = combined == 0 ? 0 : standard * standard / (combined * combined);
      rows.add(
          new BudgetRow(
              row.name(),
              row.limit() + Math.abs(row.offset()),
              standard,
              share,
              row.parts().isEmpty() ? "offset" : row.distribution(),
              row.bounded(),
              row.scalesWithLsb(),
              row.places()));
      if (row.typicalOnly()) {
        typicalOnly.add(row.name());
      }
    }
    rows.sort(
        Comparator.comparingDouble(BudgetRow::share)
            .reversed()
            .thenComparing(Comparator.comparingDouble(BudgetRow::limit).reversed())
            .thenComparing(BudgetRow::name));
    OptionalDouble needs = model.needs(worst.x());
    return new Budget(
        worst.x(),
        worst.ambient(),
        model.unit(),
        hard,
        combined,
        expanded + Math.abs(offset),
        combined == 0 ? 0 : expanded / combined,
        offset,
        needs,
        model.judgesWorstCase(),
        typicalOnly,
        rows);
  }

  /** Figures that only a budget gives: what leakage costs. */
  List<Figure> leakage(Budget budget) {
    return budget.rows().stream()
        .filter(row -> row.name().equals("leakage"))
        .map(
            row -> {
              double slope = Math.abs(model.slope(budget.at()));
              return List.of(
                  Figure.of(
                          "leakage-error-measured",
                          row.limit(),
                          model.unit(),
                          "pin-leakage x source resistance / slope of the pin's voltage")
                      .at(budget.at()),
                  Figure.of(
                          "leakage-error-lsb",
                          row.limit() * slope / model.lsb(),
                          "LSB",
                          "leakage-error-measured x slope / lsb")
                      .at(budget.at()));
            })
        .findFirst()
        .orElse(List.of());
  }
}
