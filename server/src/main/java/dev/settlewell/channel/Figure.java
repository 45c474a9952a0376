package dev.settlewell.channel;

import dev.settlewell.text.Place;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * One computed figure with its derivation. Names are listed in {@code schema/figures.md} and stay
 * as they are from the first release on.
 *
 * @param unit coherent SI unit, {@code LSB}, {@code 1}, or the measured unit without prefix
 * @param at the point of the measured range it holds at, where it depends on it
 * @param formula in plain text, with the operands' names; empty where there is no value
 */
public record Figure(
    String name,
    State state,
    String unit,
    OptionalDouble at,
    String formula,
    List<Operand> operands) {

  private static final Set<String> SHARES =
      Set.of(
          "utilisation",
          "scan-utilisation",
          "droop",
          "range-used",
          "pin-share-worst-high",
          "pin-share-worst-low",
          "spacing-unevenness");

  /** What became of a figure. */
  public sealed interface State {
    record Value(double value) implements State {}

    /** Some inputs are not in the sheet. */
    record Missing(List<Input> inputs) implements State {
      public Missing {
        inputs = List.copyOf(inputs);
      }
    }

    /** There is none, and why: "no acquisition suffices". */
    record None(String why) implements State {}

    /** Any value will do. */
    record Unlimited() implements State {}

    /** An input is wrong and has a finding of its own: nothing more is said. */
    record Silent() implements State {}
  }

  /** A missing input: JSON Pointer, and the key it would stand under. */
  public record Input(String pointer, Place parent) {}

  /**
   * A value that entered a figure, and where it stands in a sheet (computed ones stand nowhere).
   */
  public record Operand(String name, double value, String unit, Optional<Place> place) {
    /** A computed one. */
    public static Operand of(String name, double value, String unit) {
      return new Operand(name, value, unit, Optional.empty());
    }
  }

  public Figure {
    operands = List.copyOf(operands);
  }

  /** A value that is no number (nothing limits it, or the sheet's values are absurd) is none. */
  public static Figure of(
      String name, double value, String unit, String formula, Operand... operands) {
    if (!Double.isFinite(value)) {
      return none(name, unit, "beyond what a number holds; look at the values it is made of");
    }
    return new Figure(
        name, new State.Value(value), unit, OptionalDouble.empty(), formula, List.of(operands));
  }

  public static Figure none(String name, String unit, String why) {
    return new Figure(name, new State.None(why), unit, OptionalDouble.empty(), "", List.of());
  }

  public static Figure unlimited(String name, String unit) {
    return new Figure(name, new State.Unlimited(), unit, OptionalDouble.empty(), "", List.of());
  }

  public static Figure missing(String name, String unit, List<Input> inputs) {
    State state = inputs.isEmpty() ? new State.Silent() : new State.Missing(inputs);
    return new Figure(name, state, unit, OptionalDouble.empty(), "", List.of());
  }

  public Figure at(double x) {
    return new Figure(name, state, unit, OptionalDouble.of(x), formula, operands);
  }

  /** Whether the unit 1 means a share, told in percent, and not a count, a code or a ratio. */
  public boolean isShare() {
    return unit.equals("1") && SHARES.contains(name);
  }

  public OptionalDouble value() {
    return state instanceof State.Value v ? OptionalDouble.of(v.value()) : OptionalDouble.empty();
  }
}
