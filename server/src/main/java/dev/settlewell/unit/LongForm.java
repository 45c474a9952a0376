package dev.settlewell.unit;

import dev.settlewell.text.Problem;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Puts a value together from the readings of its long form.
 *
 * <pre>
 * {value: 4.7 kΩ, tolerance: ±1 %, drift: ±100 ppm/K}   the same as 4.7 kΩ ±1 % ±100 ppm/K
 * {min: 4 pF, typical: 5 pF, max: 8 pF}                 nominal 5 pF, limits 4 pF and 8 pF
 * {typical: 5 pF, max: 8 pF}                            limits 5 pF and 8 pF
 * {min: 4 pF, typical: 5 pF}                            limits 4 pF and 5 pF
 * {min: 4 pF, max: 8 pF}                                nominal 6 pF, the middle
 * {max: 8 pF}                                           nominal and both limits 8 pF
 * {typical: 5 pF}                                       exact, and marked as typical only
 * </pre>
 */
public final class LongForm {
  /** The entries of the map, as the sheet spells them in lower case. */
  public enum Entry {
    VALUE,
    TOLERANCE,
    DRIFT,
    MIN,
    TYPICAL,
    MAX
  }

  /** What is wrong with one entry, in one sentence. */
  public record Fault(Entry entry, Problem.Kind kind, String message) {}

  /** A value, or none with at least one fault. */
  public record Result(Optional<Toleranced> value, List<Fault> faults) {
    public Result {
      faults = List.copyOf(faults);
    }

    private static Result of(Toleranced value, List<Fault> faults) {
      return new Result(faults.isEmpty() ? Optional.of(value) : Optional.empty(), faults);
    }
  }

  private LongForm() {}

  /**
   * What {@code tolerance} and {@code drift} may be written in, beside this value.
   *
   * @param key what the key of the whole value takes
   */
  public static Expected errorsOf(Toleranced value, Expected key) {
    return Errors.ofValue(value.unit(), !key.temperatureDifference());
  }

  /** {@code {value, tolerance, drift}}; the value may bear errors of its own, but none twice. */
  public static Result of(
      Toleranced value, Optional<Deviation> tolerance, Optional<Deviation> drift) {
    List<Fault> faults = new ArrayList<>();
    Deviation own = value.deviation();
    tolerance.ifPresent(stated -> checkTolerance(stated, own, faults));
    drift.ifPresent(stated -> checkDrift(stated, own, faults));
    Deviation all =
        new Deviation(
            tolerance.map(Deviation::tolerances).orElse(own.tolerances()),
            drift.map(Deviation::drift).orElse(own.drift()),
            tolerance.flatMap(Deviation::basis).or(own::basis),
            tolerance.flatMap(Deviation::at).or(own::at));
    return Result.of(value.with(all), faults);
  }

  private static void checkTolerance(Deviation stated, Deviation own, List<Fault> faults) {
    if (stated.drift().isPresent()) {
      String message = "write the drift behind drift: this entry is the tolerance alone";
      faults.add(new Fault(Entry.TOLERANCE, Problem.Kind.NOT_ONE_VALUE, message));
    } else if (!own.tolerances().isEmpty()) {
      String message = "write one tolerance: the value bears one already";
      faults.add(new Fault(Entry.TOLERANCE, Problem.Kind.NOT_ONE_VALUE, message));
    }
  }

  private static void checkDrift(Deviation stated, Deviation own, List<Fault> faults) {
    if (!stated.tolerances().isEmpty()) {
      String message = "write a drift per kelvin, such as ±100 ppm/K: this is a tolerance";
      faults.add(new Fault(Entry.DRIFT, Problem.Kind.NOT_ONE_VALUE, message));
    } else if (own.drift().isPresent()) {
      String message = "write one drift: the value bears one already";
      faults.add(new Fault(Entry.DRIFT, Problem.Kind.NOT_ONE_VALUE, message));
    }
  }

  /** {@code {min, typical, max}} as data sheets print it; a drift may stand behind typical. */
  public static Result of(
      Optional<Toleranced> min, Optional<Toleranced> typical, Optional<Toleranced> max) {
    List<Fault> faults = new ArrayList<>();
    if (typical.isEmpty() && max.isEmpty()) {
      String message = "add typical or max: a least value alone says too little";
      return new Result(
          Optional.empty(), List.of(new Fault(Entry.MIN, Problem.Kind.MISSING_KEY, message)));
    }
    checkPlain(Entry.MIN, min, faults);
    checkPlain(Entry.TYPICAL, typical, faults);
    checkPlain(Entry.MAX, max, faults);
    checkOrder(min, Entry.TYPICAL, typical, faults);
    checkOrder(typical, Entry.MAX, max, faults);
    if (typical.isEmpty()) {
      checkOrder(min, Entry.MAX, max, faults);
    }
    return faults.isEmpty()
        ? Result.of(limited(min, typical, max), faults)
        : new Result(Optional.empty(), faults);
  }

  private static Toleranced limited(
      Optional<Toleranced> min, Optional<Toleranced> typical, Optional<Toleranced> max) {
    Toleranced stated = typical.or(() -> max).orElseThrow();
    double nominal = stated.value();
    if (typical.isEmpty() && min.isPresent()) {
      nominal = (min.get().value() + stated.value()) / 2;
    }
    boolean typicalOnly = min.isEmpty() && max.isEmpty();
    double low = min.map(Toleranced::value).orElse(nominal);
    double high = max.map(Toleranced::value).orElse(nominal);
    return new Toleranced(
        new Quantity(nominal, stated.unit()),
        typicalOnly ? OptionalDouble.empty() : OptionalDouble.of(low),
        typicalOnly ? OptionalDouble.empty() : OptionalDouble.of(high),
        typicalOnly,
        stated.deviation(),
        stated.amplitude(),
        stated.of());
  }

  private static void checkPlain(Entry entry, Optional<Toleranced> value, List<Fault> faults) {
    boolean bearsErrors =
        value.isPresent()
            && (entry == Entry.TYPICAL
                ? !value.get().deviation().tolerances().isEmpty()
                : !value.get().deviation().isNone());
    if (bearsErrors) {
      String message = "write the value alone: min and max are its limits";
      faults.add(new Fault(entry, Problem.Kind.NOT_ONE_VALUE, message));
    }
  }

  private static void checkOrder(
      Optional<Toleranced> lower, Entry entry, Optional<Toleranced> upper, List<Fault> faults) {
    if (lower.isEmpty() || upper.isEmpty()) {
      return;
    }
    if (!lower.get().unit().comparableWith(upper.get().unit())) {
      String message = "write one unit throughout: these limits are of different kinds";
      faults.add(new Fault(entry, Problem.Kind.WRONG_UNIT, message));
    } else if (lower.get().value() > upper.get().value()) {
      String message = "write min, typical and max in rising order: this one is below another";
      faults.add(new Fault(entry, Problem.Kind.VALUE_OUT_OF_RANGE, message));
    }
  }
}
