package dev.settlewell.channel;

import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;

/**
 * What a computation lacks. A missing value is named; a wrong one has a finding of its own, so the
 * figure that needs it stays silent.
 */
final class Inputs {
  private final Set<Figure.Input> missing = new LinkedHashSet<>();
  private boolean wrong;

  /** The value, or null with a note of what is missing or wrong. */
  <T> Slot.Stated<T> need(Slot<T> slot) {
    if (slot instanceof Slot.Stated<T> stated) {
      return stated;
    }
    if (slot.isMissing()) {
      missing.add(new Figure.Input(slot.pointer(), slot.place()));
    } else {
      wrong = true;
    }
    return null;
  }

  /** A stated value, or null where it is not there; a wrong one spoils the computation. */
  <T> Slot.Stated<T> optional(Slot<T> slot) {
    if (slot instanceof Slot.Stated<T> stated) {
      return stated;
    }
    wrong |= slot.isWrong();
    return null;
  }

  /** Something that would have to stand in the sheet, under a key of its own. */
  void lacks(String pointer, Place parent) {
    missing.add(new Figure.Input(pointer, parent));
  }

  void spoil() {
    wrong = true;
  }

  void include(Inputs other) {
    missing.addAll(other.missing);
    wrong |= other.wrong;
  }

  boolean complete() {
    return missing.isEmpty() && !wrong;
  }

  /** Empty where something is wrong rather than missing: {@link Figure.State.Silent}. */
  List<Figure.Input> missing() {
    return wrong ? List.of() : new ArrayList<>(missing);
  }

  Figure figure(String name, String unit) {
    return Figure.missing(name, unit, missing());
  }
}
