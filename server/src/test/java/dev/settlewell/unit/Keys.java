package dev.settlewell.unit;

import java.util.List;
import java.util.Optional;

/** What keys expect, by short names, and the reading of any form: shared by tables of values. */
final class Keys {
  private Keys() {}

  static Expected expected(String name) {
    return switch (name) {
      case "any" -> Expected.of();
      case "ohm" -> Expected.of(Dimension.RESISTANCE);
      case "farad" -> Expected.of(Dimension.CAPACITANCE);
      case "volt" -> Expected.of(Dimension.VOLTAGE);
      case "level" -> Expected.of(Dimension.VOLTAGE, Dimension.RATIO);
      case "hertz" -> Expected.of(Dimension.FREQUENCY);
      case "time" -> Expected.of(Dimension.TIME);
      case "lsb" -> Expected.of(Dimension.LSB, Dimension.RATIO, Dimension.VOLTAGE);
      case "point" -> Expected.of(Dimension.TEMPERATURE);
      case "drift" -> Expected.of(Dimension.VOLTAGE_DRIFT);
      case "difference" -> with(List.of(Dimension.TEMPERATURE), null, false);
      case "positive" -> with(List.of(Dimension.CAPACITANCE), null, true);
      case "positive-hertz" -> with(List.of(Dimension.FREQUENCY), null, true);
      case "metre" -> with(List.of(Dimension.RATIO), UnitTable.read("m").orElseThrow(), false);
      case "bar" -> with(List.of(Dimension.RATIO), UnitTable.word("bar"), false);
      default -> throw new IllegalArgumentException(name);
    };
  }

  private static Expected with(List<Dimension> dimensions, Unit measured, boolean positive) {
    return new Expected(dimensions, Optional.ofNullable(measured), !positive, positive, false);
  }

  static Reading<?> read(String form, String raw, Expected expected) {
    return switch (form) {
      case "quantity" -> Values.quantity(raw, expected);
      case "component" -> Values.component(raw, expected);
      case "deviation" -> Values.deviation(raw, expected);
      case "need" -> Values.need(raw, expected);
      case "range" -> Values.range(raw, expected);
      case "output" -> Values.outputRange(raw, expected);
      case "count" -> Values.number(Form.COUNT, raw);
      case "plain" -> Values.number(Form.PLAIN, raw);
      case "fraction" -> Values.number(Form.FRACTION, raw);
      case "ratio" -> Values.number(Form.RATIO, raw);
      default -> throw new IllegalArgumentException(form);
    };
  }
}
