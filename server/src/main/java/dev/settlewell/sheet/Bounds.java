package dev.settlewell.sheet;

import dev.settlewell.unit.Dimension;
import dev.settlewell.unit.Range;
import dev.settlewell.unit.Tolerance;
import dev.settlewell.unit.Toleranced;
import dev.settlewell.unit.Unit;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Shape;
import java.math.BigDecimal;
import java.util.Optional;

/** Values that can be read and cannot be meant. */
final class Bounds {
  private static final double ABSOLUTE_ZERO_CELSIUS = -273.15;

  private Bounds() {}

  /** What is wrong with a value of a key, or empty. */
  static Optional<String> fault(Key key, Object value, Scope scope) {
    if (value instanceof Toleranced quantity) {
      Optional<String> fault = ofNumber(key, quantity.value(), quantity.unit().symbol());
      return fault
          .or(() -> ofTolerance(key, quantity))
          .or(() -> ofTemperature(key, quantity.value(), quantity.unit()))
          .or(() -> ofRate(key, quantity.unit(), scope));
    }
    if (value instanceof Range range) {
      double least = Math.min(range.low(), range.high());
      return ofTemperature(key, least, range.unit());
    }
    if (value instanceof Double number) {
      return ofNumber(key, number, "");
    }
    return Optional.empty();
  }

  private static Optional<String> ofNumber(Key key, double value, String unit) {
    Key.Takes takes = key.takes();
    if (takes.positive() && !(value > 0)) {
      return Optional.of("`" + key.name() + "` must be above zero");
    }
    if (takes.least().isPresent() && value < takes.least().get()) {
      return Optional.of(
          "`" + key.name() + "` must be at least " + plain(takes.least().get(), unit));
    }
    if (takes.most().isPresent() && value > takes.most().get()) {
      return Optional.of("`" + key.name() + "` must be at most " + plain(takes.most().get(), unit));
    }
    if (value == Math.rint(value)
        && isWordedNumber(key)
        && !key.words().contains(plain(value, ""))) {
      return Optional.of(
          "`" + key.name() + "` takes " + String.join(", ", key.words()) + " and nothing else");
    }
    return Optional.empty();
  }

  /** A resistance of ±120 % would have no sign. */
  private static Optional<String> ofTolerance(Key key, Toleranced quantity) {
    double low = quantity.min().orElse(quantity.value());
    for (Tolerance t : quantity.deviation().tolerances()) {
      low -= t.minus() * (t.isShare() ? Math.abs(quantity.value()) : 1);
    }
    boolean fromZero = key.takes().least().filter(least -> least == 0).isPresent();
    boolean gone = key.takes().positive() ? low <= 0 : fromZero && low < 0;
    return gone
        ? Optional.of("its tolerance takes `" + key.name() + "` to zero or below; it must be less")
        : Optional.empty();
  }

  /** A count of which only some values exist, such as the wires of a thermometer. */
  private static boolean isWordedNumber(Key key) {
    return key.shape() == Shape.COUNT && !key.words().isEmpty();
  }

  private static Optional<String> ofTemperature(Key key, double value, Unit unit) {
    boolean point = unit.dimension() == Dimension.TEMPERATURE && !key.takes().difference();
    return point && value < ABSOLUTE_ZERO_CELSIUS
        ? Optional.of("below absolute zero, -273.15 °C")
        : Optional.empty();
  }

  private static Optional<String> ofRate(Key key, Unit unit, Scope scope) {
    if (key.takes().measured() != Key.Measured.PER_SECOND || scope.measured().isEmpty()) {
      return Optional.empty();
    }
    String measured = scope.measured().get().symbol();
    boolean kelvin = measured.equals("°C") && unit.symbol().equals("K/s");
    return unit.symbol().equals(measured + "/s") || kelvin
        ? Optional.empty()
        : Optional.of("`" + key.name() + "` takes " + measured + "/s, the channel's unit");
  }

  private static String plain(double value, String unit) {
    String number = BigDecimal.valueOf(value).stripTrailingZeros().toPlainString();
    return unit.isEmpty() || unit.equals("1") ? number : number + " " + unit;
  }
}
