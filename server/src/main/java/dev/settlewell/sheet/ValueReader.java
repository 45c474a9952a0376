package dev.settlewell.sheet;

import dev.settlewell.syntax.Node;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import dev.settlewell.unit.Dimension;
import dev.settlewell.unit.Expected;
import dev.settlewell.unit.Flaw;
import dev.settlewell.unit.Form;
import dev.settlewell.unit.Reading;
import dev.settlewell.unit.Toleranced;
import dev.settlewell.unit.Unit;
import dev.settlewell.unit.Values;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Shape;
import java.time.LocalDate;
import java.time.format.DateTimeParseException;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Pattern;

/** Reads one scalar as what its key takes. */
final class ValueReader {
  /** Wider than the names' own pattern, so that {@code Ref} is met as an unknown name. */
  private static final Pattern WORD = Pattern.compile("[A-Za-z][A-Za-z_ -]*[A-Za-z0-9_-]*");

  private static final String VERSION_KEY = "channel-sheet";
  private static final Pattern DATE = Pattern.compile("\\d{4}-\\d{2}-\\d{2}");

  private static final Map<String, String> FLAGS =
      Map.of("yes", "true", "on", "true", "no", "false", "off", "false", "y", "true", "n", "false");

  private final Report report;

  ValueReader(Report report) {
    this.report = report;
  }

  Slot<?> read(Key key, Node.Scalar scalar, Place keyPlace, String pointer, Scope scope) {
    String raw = scalar.text();
    Optional<?> value =
        switch (key.shape()) {
          case TEXT, NAME -> Optional.of(raw);
          case CHOICE -> choice(key, scalar);
          case FLAG -> flag(key, scalar);
          case DATE -> date(key, scalar);
          case QUANTITY ->
              key.takesWordOrQuantity()
                  ? either(key, scalar, scope)
                  : byGrammar(key, scalar, scope);
          case COMPONENT, DEVIATION, NEED, RANGE, OUTPUT_RANGE, COUNT, PLAIN, FRACTION, RATIO ->
              byGrammar(key, scalar, scope);
          case PART, ONE_KIND, LIST, MAP ->
              throw new IllegalArgumentException(key.name() + " is no scalar");
        };
    return value
        .<Slot<?>>map(v -> new Slot.Stated<Object>(v, keyPlace, scalar.place(), raw, pointer))
        .orElseGet(() -> new Slot.Wrong<>(scalar.place(), raw, pointer));
  }

  private Optional<Either> either(Key key, Node.Scalar scalar, Scope scope) {
    String raw = scalar.text();
    if (!WORD.matcher(raw).matches()) {
      return byGrammar(key, scalar, scope).map(v -> Either.quantity((Toleranced) v));
    }
    if (key.words().contains(raw) || key.refersTo().isPresent()) {
      return Optional.of(Either.word(raw));
    }
    report.unknown(
        Problem.Kind.WRONG_KIND,
        scalar.place(),
        raw,
        "`" + key.name() + "` takes a quantity or a word of its own, and `" + raw + "` is neither",
        key.words());
    return Optional.empty();
  }

  /** The value with its bounds checked, or empty with at least one problem reported. */
  Optional<Object> byGrammar(Key key, Node.Scalar scalar, Scope scope) {
    Reading<?> reading = grammar(key, scalar.text(), expected(key, scope));
    reading.flaws().forEach(flaw -> report.flaw(scalar, flaw));
    if (reading.value().isEmpty()) {
      return Optional.empty();
    }
    Object value = reading.value().get();
    Optional<String> fault = Bounds.fault(key, value, scope);
    boolean known =
        reading.flaws().stream().map(Flaw::kind).anyMatch(Problem.Kind.VALUE_OUT_OF_RANGE::equals);
    if (fault.isPresent() && key.name().equals(VERSION_KEY)) {
      report.add(
          Problem.Kind.FORMAT_VERSION,
          scalar.place(),
          "this tool reads version 1 of the format",
          Report.replace(scalar.place(), "1"));
    } else if (fault.isPresent() && !known) {
      report.add(Problem.Kind.VALUE_OUT_OF_RANGE, scalar.place(), fault.get());
    }
    if (fault.isPresent() || known) {
      return Optional.empty();
    }
    return Optional.of(
        value instanceof Toleranced quantity ? scope.filled(quantity, key.errorsFrom()) : value);
  }

  private static Reading<?> grammar(Key key, String raw, Expected expected) {
    return switch (key.shape()) {
      case QUANTITY -> Values.quantity(raw, expected);
      case COMPONENT -> Values.component(raw, expected);
      case DEVIATION -> Values.deviation(raw, expected);
      case NEED -> Values.need(raw, expected);
      case RANGE -> Values.range(raw, expected);
      case OUTPUT_RANGE -> Values.outputRange(raw, expected);
      default -> Values.number(Form.valueOf(key.shape().name()), raw);
    };
  }

  /** A key of the channel's own unit takes any unit while {@code measures} could not be read. */
  static Expected expected(Key key, Scope scope) {
    Key.Takes takes = key.takes();
    Optional<Unit> measured =
        takes.measured() == Key.Measured.YES ? scope.measured() : Optional.empty();
    boolean any = takes.measured() != Key.Measured.NO && measured.isEmpty();
    List<Dimension> dimensions = any ? List.of() : takes.dimensions();
    boolean difference =
        takes.difference() || key.shape() == Shape.DEVIATION || key.shape() == Shape.NEED;
    return new Expected(dimensions, measured, difference, takes.positive(), takes.shuntSized());
  }

  private Optional<String> choice(Key key, Node.Scalar scalar) {
    if (key.words().contains(scalar.text())) {
      return Optional.of(scalar.text());
    }
    report.unknown(
        Problem.Kind.WRONG_KIND,
        scalar.place(),
        scalar.text(),
        "`" + scalar.text() + "` is none of the words that `" + key.name() + "` takes",
        key.words());
    return Optional.empty();
  }

  private Optional<Boolean> flag(Key key, Node.Scalar scalar) {
    String raw = scalar.text();
    if (raw.equals("true") || raw.equals("false")) {
      return Optional.of(raw.equals("true"));
    }
    String lower = raw.toLowerCase(Locale.ROOT);
    String meant = FLAGS.getOrDefault(lower, lower);
    boolean clear = meant.equals("true") || meant.equals("false");
    report.add(
        Problem.Kind.WRONG_KIND,
        scalar.place(),
        "`" + key.name() + "` takes `true` or `false`",
        clear
            ? new Fix[] {
              new Fix("write `" + meant + "`", List.of(new Edit(scalar.place(), meant)), true)
            }
            : new Fix[0]);
    return Optional.empty();
  }

  private Optional<String> date(Key key, Node.Scalar scalar) {
    String raw = scalar.text();
    if (!DATE.matcher(raw).matches()) {
      report.add(
          Problem.Kind.WRONG_KIND,
          scalar.place(),
          "`" + key.name() + "` takes a date written year-month-day, such as `2027-06-30`");
      return Optional.empty();
    }
    try {
      LocalDate.parse(raw);
      return Optional.of(raw);
    } catch (DateTimeParseException e) {
      report.add(Problem.Kind.VALUE_OUT_OF_RANGE, scalar.place(), "no calendar has the day " + raw);
      return Optional.empty();
    }
  }
}
