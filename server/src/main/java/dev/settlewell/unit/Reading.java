package dev.settlewell.unit;

import java.util.List;
import java.util.Optional;

/**
 * What reading one value gave: a value (perhaps with doubts), or none with at least one flaw.
 *
 * @param value present even beside flaws where the meaning is certain enough to compute with
 */
public record Reading<T>(Optional<T> value, List<Flaw> flaws) {
  public Reading {
    flaws = List.copyOf(flaws);
  }

  public static <T> Reading<T> of(T value) {
    return new Reading<>(Optional.of(value), List.of());
  }

  public static <T> Reading<T> refused(Flaw flaw) {
    return new Reading<>(Optional.empty(), List.of(flaw));
  }
}
