package dev.settlewell.sheet;

import dev.settlewell.syntax.Node;
import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import dev.settlewell.text.Related;
import dev.settlewell.unit.Deviation;
import dev.settlewell.unit.Dimension;
import dev.settlewell.unit.Expected;
import dev.settlewell.unit.Flaw;
import dev.settlewell.unit.Quantity;
import dev.settlewell.unit.Reading;
import dev.settlewell.unit.Toleranced;
import dev.settlewell.unit.Values;
import dev.settlewell.vocabulary.Key;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/**
 * A quantity written as a mapping: {@code {value, tolerance, drift}}, or the columns of a data
 * sheet {@code {min, typical, max}}.
 *
 * <p>Nominal is {@code value}, else {@code typical}, else the middle of {@code min} and {@code
 * max}, else {@code max}. Without {@code min} the range is {@code typical} to {@code max}, without
 * {@code max} it is {@code min} to {@code typical}; {@code typical} alone counts as exact and says
 * so.
 */
final class LongForm {
  private static final List<String> AMOUNTS = List.of("value", "min", "typical", "max");
  private static final List<String> COLUMNS = List.of("min", "typical", "max");

  private final ValueReader values;
  private final Report report;

  LongForm(ValueReader values, Report report) {
    this.values = values;
    this.report = report;
  }

  /**
   * @param entries those of the mapping; keys that are no piece of a long form are not looked at
   */
  Slot<Toleranced> read(
      Key key, Entries entries, Place keyPlace, Place place, String pointer, Scope scope) {
    Map<String, Toleranced> amounts = new HashMap<>();
    boolean whole = true;
    for (String name : AMOUNTS) {
      Optional<Node.Entry> entry = entries.find(name);
      if (entry.isPresent()) {
        Optional<Toleranced> amount = amount(key, entry.get(), scope);
        amount.ifPresent(quantity -> amounts.put(name, quantity));
        whole &= amount.isPresent();
      }
    }
    Optional<Deviation> tolerance = deviation(key, entries, "tolerance", scope);
    Optional<Deviation> drift = deviation(key, entries, "drift", scope);
    whole &= tolerance.isPresent() == entries.find("tolerance").isPresent();
    whole &= drift.isPresent() == entries.find("drift").isPresent();
    Slot<Toleranced> wrong = new Slot.Wrong<>(place, "", pointer);
    if (!whole || !agrees(entries, amounts, keyPlace)) {
      return wrong;
    }
    Optional<Toleranced> value = Optional.of(nominal(amounts));
    value = value.flatMap(v -> joined(v, tolerance, entries, "tolerance", keyPlace));
    value = value.flatMap(v -> joined(v, drift, entries, "drift", keyPlace));
    return value
        .map(v -> scope.filled(v, key.errorsFrom()))
        .<Slot<Toleranced>>map(v -> new Slot.Stated<>(v, keyPlace, place, "", pointer))
        .orElse(wrong);
  }

  private Optional<Toleranced> amount(Key key, Node.Entry entry, Scope scope) {
    if (!(entry.value() instanceof Node.Scalar scalar)) {
      return refuse(entry, "takes one quantity");
    }
    // The defaults fill what is missing when all pieces are known.
    Optional<Toleranced> amount =
        values.byGrammar(key, scalar, scope.with(Map.of())).map(Toleranced.class::cast);
    boolean column = COLUMNS.contains(entry.key().text());
    if (column && amount.isPresent() && !amount.get().deviation().isNone()) {
      return refuse(entry, "takes a bare quantity: its limits stand in `min` and `max`");
    }
    return amount;
  }

  private Optional<Deviation> deviation(Key key, Entries entries, String name, Scope scope) {
    Optional<Node.Entry> entry = entries.find(name);
    if (entry.isEmpty()) {
      return Optional.empty();
    }
    if (!(entry.get().value() instanceof Node.Scalar scalar)) {
      return refuse(entry.get(), "takes errors such as `±1 %` or `±100 ppm/K`");
    }
    Expected value = ValueReader.expected(key, scope);
    Set<Dimension> dimensions = new LinkedHashSet<>(value.dimensions());
    if (!dimensions.isEmpty()) {
      dimensions.add(Dimension.RATIO);
    }
    Reading<Deviation> reading =
        Values.deviation(
            scalar.text(),
            new Expected(new ArrayList<>(dimensions), value.measured(), true, false, false));
    for (Flaw flaw : reading.flaws()) {
      report.flaw(scalar, flaw);
    }
    return reading.value();
  }

  private <T> Optional<T> refuse(Node.Entry entry, String takes) {
    if (!(entry.value() instanceof Node.Broken)) {
      Place place =
          entry.value() instanceof Node.Absent ? entry.key().place() : entry.value().place();
      report.add(Problem.Kind.WRONG_KIND, place, "`" + entry.key().text() + "` " + takes);
    }
    return Optional.empty();
  }

  /** Whether the pieces make one quantity; reports why not. */
  private boolean agrees(Entries entries, Map<String, Toleranced> amounts, Place keyPlace) {
    boolean columns = COLUMNS.stream().anyMatch(amounts::containsKey);
    if (amounts.containsKey("value") && columns) {
      report.add(
          Problem.Kind.WRONG_KIND,
          entries.find("value").orElseThrow().key().place(),
          "either `value`, or what the columns `min`, `typical` and `max` say");
      return false;
    }
    boolean nominal = AMOUNTS.stream().anyMatch(n -> !n.equals("min") && amounts.containsKey(n));
    if (!nominal) {
      report.add(
          Problem.Kind.MISSING_KEY,
          keyPlace,
          "the long form of a quantity lacks `value`, `typical` or `max`");
      return false;
    }
    String before = null;
    for (String column : COLUMNS) {
      if (!amounts.containsKey(column)) {
        continue;
      }
      if (before != null && amounts.get(before).value() > amounts.get(column).value()) {
        report.add(
            Problem.Kind.VALUE_OUT_OF_RANGE,
            entries.find(column).orElseThrow().value().place(),
            "`" + column + "` is below `" + before + "`");
        return false;
      }
      before = column;
    }
    return true;
  }

  private static Toleranced nominal(Map<String, Toleranced> amounts) {
    if (amounts.containsKey("value")) {
      return amounts.get("value");
    }
    Toleranced min = amounts.get("min");
    Toleranced typical = amounts.get("typical");
    Toleranced max = amounts.get("max");
    Toleranced nominal = typical != null ? typical : max;
    Quantity quantity = nominal.nominal();
    if (typical == null && min != null) {
      quantity = new Quantity((min.value() + max.value()) / 2, quantity.unit());
    }
    boolean limited = min != null || max != null;
    double low = min != null ? min.value() : quantity.value();
    double high = max != null ? max.value() : quantity.value();
    return new Toleranced(
        quantity,
        limited ? OptionalDouble.of(low) : OptionalDouble.empty(),
        limited ? OptionalDouble.of(high) : OptionalDouble.empty(),
        !limited,
        nominal.deviation(),
        nominal.amplitude(),
        nominal.of());
  }

  /** The value with what one more piece says of its errors; nothing may be said twice. */
  private Optional<Toleranced> joined(
      Toleranced value, Optional<Deviation> added, Entries entries, String name, Place keyPlace) {
    if (added.isEmpty()) {
      return Optional.of(value);
    }
    Deviation own = value.deviation();
    Deviation more = added.get();
    boolean limits = value.min().isPresent() || !own.tolerances().isEmpty();
    boolean twice =
        limits && !more.tolerances().isEmpty()
            || own.drift().isPresent() && more.drift().isPresent();
    if (twice) {
      report.add(
          new Problem(
              Problem.Kind.ERROR_STATED_TWICE,
              entries.find(name).orElseThrow().value().place(),
              "`" + name + "` says what the value says already: keep one of the two",
              List.of(new Related(keyPlace, "the value")),
              List.of()));
      return Optional.empty();
    }
    Deviation joined =
        new Deviation(
            own.tolerances().isEmpty() ? more.tolerances() : own.tolerances(),
            own.drift().or(more::drift),
            own.basis().or(more::basis),
            own.at().or(more::at));
    boolean typicalOnly = value.typicalOnly() && joined.tolerances().isEmpty();
    return Optional.of(
        new Toleranced(
            value.nominal(),
            value.min(),
            value.max(),
            typicalOnly,
            joined,
            value.amplitude(),
            value.of()));
  }
}
