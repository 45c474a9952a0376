package dev.settlewell.review;

import dev.settlewell.channel.Figure;
import dev.settlewell.unit.Engineering;
import java.util.stream.Collectors;

/** Figures as a person reads them: three digits, prefixes, shares in percent. */
final class FigureWords {
  private static final int PLAIN_DIGITS = 6;

  private FigureWords() {}

  static String state(Figure figure) {
    Figure.State state = figure.state();
    if (state instanceof Figure.State.Value v) {
      return value(v.value(), figure.unit(), figure.isShare());
    }
    if (state instanceof Figure.State.Missing missing) {
      return "- lacks "
          + missing.inputs().stream().map(Figure.Input::pointer).collect(Collectors.joining(", "));
    }
    if (state instanceof Figure.State.None none) {
      return "none: " + none.why();
    }
    return state instanceof Figure.State.Unlimited ? "unlimited" : "- a value it rests on is wrong";
  }

  static String value(double value, String unit, boolean share) {
    return unit.equals("1") && !share
        ? Engineering.digits(value, PLAIN_DIGITS)
        : Engineering.message(value, unit);
  }
}
