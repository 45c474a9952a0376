package dev.settlewell.assist;

import dev.settlewell.sheet.Either;
import dev.settlewell.unit.Deviation;
import dev.settlewell.unit.Drift;
import dev.settlewell.unit.Engineering;
import dev.settlewell.unit.Need;
import dev.settlewell.unit.Range;
import dev.settlewell.unit.Tolerance;
import dev.settlewell.unit.Toleranced;
import dev.settlewell.unit.Unit;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;

/** Says what a value was read as, so that a person sees at once whether that was meant. */
final class Readings {
  private Readings() {}

  /** Lines, the first the value itself; empty where there is nothing to say beyond the text. */
  static List<String> lines(Object value) {
    List<String> lines = new ArrayList<>();
    if (value instanceof Toleranced toleranced) {
      toleranced(toleranced, lines);
    } else if (value instanceof Either either) {
      either.quantity().ifPresent(quantity -> toleranced(quantity, lines));
    } else if (value instanceof Range range) {
      lines.add(range(range.low(), range.high(), range.unit().symbol()));
      lines.add("width " + number(Math.abs(range.width()), range.unit().symbol()));
    } else if (value instanceof Deviation deviation) {
      deviation(deviation, lines);
    } else if (value instanceof Need need) {
      need.tolerances().forEach(tolerance -> lines.add(tolerance(tolerance)));
      lines.add(
          need.worstCase()
              ? "judges the hard limit: every error at its worst"
              : "judges the expanded uncertainty at 95 %");
    } else if (value instanceof Double number) {
      lines.add(Engineering.digits(number, 12));
    }
    return lines;
  }

  private static void toleranced(Toleranced value, List<String> lines) {
    String symbol = value.unit().symbol();
    String amplitude =
        value
            .amplitude()
            .map(a -> " " + a.name().toLowerCase(java.util.Locale.ROOT).replace('_', '-'))
            .orElse(" ");
    lines.add(
        (number(value.value(), symbol) + value.of().map(of -> " of " + of).orElse("") + amplitude)
            .strip());
    limits(value).ifPresent(lines::add);
    if (value.typicalOnly()) {
      lines.add("typical only: taken as exact, and worst cases that rest on it say so");
    }
    deviation(value.deviation(), lines);
  }

  private static java.util.Optional<String> limits(Toleranced value) {
    String symbol = value.unit().symbol();
    if (value.min().isPresent() || value.max().isPresent()) {
      OptionalDouble low = value.min().isPresent() ? value.min() : OptionalDouble.of(value.value());
      OptionalDouble high =
          value.max().isPresent() ? value.max() : OptionalDouble.of(value.value());
      return java.util.Optional.of(range(low.getAsDouble(), high.getAsDouble(), symbol));
    }
    if (value.deviation().tolerances().isEmpty() || value.of().isPresent()) {
      return java.util.Optional.empty();
    }
    double minus = 0;
    double plus = 0;
    for (Tolerance tolerance : value.deviation().tolerances()) {
      if (tolerance.of() != Tolerance.Of.UNSAID) {
        return java.util.Optional.empty();
      }
      double per = tolerance.isShare() ? Math.abs(value.value()) : 1;
      minus += tolerance.minus() * per;
      plus += tolerance.plus() * per;
    }
    return java.util.Optional.of(
        "limits " + range(value.value() - minus, value.value() + plus, symbol));
  }

  private static void deviation(Deviation deviation, List<String> lines) {
    deviation.tolerances().forEach(tolerance -> lines.add(tolerance(tolerance)));
    deviation.drift().ifPresent(drift -> lines.add(drift(drift)));
    if (!deviation.tolerances().isEmpty()) {
      lines.add(
          deviation
              .basis()
              .map(
                  basis ->
                      "a normal distribution with coverage factor "
                          + Engineering.digits(basis.k(), 3))
              .orElse("a hard limit (rectangular distribution)"));
    }
    deviation.at().ifPresent(at -> lines.add("holds at " + number(at.value(), at.unit().symbol())));
  }

  private static String tolerance(Tolerance tolerance) {
    String symbol = tolerance.unit().symbol();
    String of =
        switch (tolerance.of()) {
          case UNSAID -> "";
          case READING -> " of reading";
          case SPAN -> " of span";
          case FULL_SCALE -> " of full scale";
        };
    return tolerance.minus() == tolerance.plus()
        ? "tolerance ±" + number(tolerance.plus(), symbol) + of
        : "tolerance +"
            + number(tolerance.plus(), symbol)
            + " / -"
            + number(tolerance.minus(), symbol)
            + of;
  }

  private static String drift(Drift drift) {
    String symbol = drift.unit().symbol();
    String rate =
        symbol.equals(Unit.ONE.symbol())
            ? Engineering.message(drift.perKelvin(), "1/K")
            : Engineering.message(drift.perKelvin(), symbol) + "/K";
    return drift
        .box()
        .map(
            box ->
                "drift within a box of "
                    + rate
                    + " times "
                    + number(box.width(), box.unit().symbol()))
        .orElse("drift ±" + rate + " from the temperature where its value is stated");
  }

  private static String range(double low, double high, String symbol) {
    return number(low, symbol) + " to " + number(high, symbol);
  }

  /** Five digits: limits a tenth of a percent apart must not look alike. */
  private static String number(double value, String symbol) {
    return Engineering.rounded(value, 5, RoundingMode.HALF_UP, symbol);
  }
}
