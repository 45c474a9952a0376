package dev.settlewell.assist;

import dev.settlewell.channel.Figure;
import dev.settlewell.unit.Engineering;
import java.util.Map;
import java.util.Optional;

/** Figures as a person reads them. */
final class FigureWords {
  private static final Map<String, String> NAMES =
      Map.of(
          "lsb", "LSB",
          "lsb-measured", "LSB, measured",
          "settling-error-lsb", "settling error",
          "noise-lsb", "noise",
          "ideal-snr", "ideal SNR",
          "required-acquisition", "acquisition needed",
          "required-acquisition-cycles", "cycles needed");

  private FigureWords() {}

  static String name(String figure) {
    return NAMES.getOrDefault(figure, figure.replace('-', ' '));
  }

  /**
   * {@code acquisition needed: 5.81 µs}; empty where its input has a finding of its own.
   *
   * @param measuredUnit the unit of the point a figure holds at
   */
  static Optional<String> line(Figure figure, String measuredUnit) {
    return value(figure, measuredUnit).map(value -> name(figure.name()) + ": " + value);
  }

  static Optional<String> value(Figure figure, String measuredUnit) {
    if (figure.state() instanceof Figure.State.Value value) {
      String at =
          figure.at().isPresent() ? " at " + point(figure.at().getAsDouble(), measuredUnit) : "";
      return Optional.of(number(figure.name(), value.value(), figure.unit()) + at);
    }
    if (figure.state() instanceof Figure.State.Missing missing) {
      String inputs =
          String.join(
              ", ",
              missing.inputs().stream()
                  .map(
                      input ->
                          "`"
                              + input.pointer().substring(input.pointer().lastIndexOf('/') + 1)
                              + "`")
                  .distinct()
                  .toList());
      return Optional.of("not computed, lacks " + inputs);
    }
    if (figure.state() instanceof Figure.State.None none) {
      return Optional.of("none: " + none.why());
    }
    return figure.state() instanceof Figure.State.Unlimited
        ? Optional.of("unlimited")
        : Optional.empty();
  }

  private static String point(double value, String unit) {
    return unit.isEmpty() ? Engineering.digits(value, 3) : Engineering.message(value, unit);
  }

  /** Counts, codes and plain factors are no shares, though their unit is 1 as well. */
  private static String number(String name, double value, String unit) {
    boolean share =
        name.equals("droop") || name.endsWith("utilisation") || name.equals("range-used");
    if (unit.equals("1") && !share) {
      return Engineering.digits(value, value == Math.rint(value) ? 12 : 4);
    }
    return Engineering.message(value, unit);
  }
}
