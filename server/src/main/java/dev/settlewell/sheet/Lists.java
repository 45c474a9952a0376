package dev.settlewell.sheet;

import dev.settlewell.syntax.Node;
import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import dev.settlewell.unit.Toleranced;
import dev.settlewell.vocabulary.Key;
import java.util.List;
import java.util.Optional;

/** What a list as a whole must keep to. */
final class Lists {
  private Lists() {}

  /** True where it does; else a problem says why not. */
  static boolean check(Key key, List<Slot<?>> slots, Node.Sequence list, Report report) {
    if (key.takes().notEmpty() && slots.isEmpty()) {
      report.add(Problem.Kind.VALUE_OUT_OF_RANGE, list.place(), "`" + key.name() + "` is empty");
      return false;
    }
    Optional<Integer> size = key.takes().size();
    if (size.isPresent() && size.get() != slots.size()) {
      report.add(
          Problem.Kind.VALUE_OUT_OF_RANGE,
          list.place(),
          "`"
              + key.name()
              + "` takes "
              + size.get()
              + " values, and here are "
              + slots.size()
              + commaHint(list));
      return false;
    }
    if (key.takes().increasing()) {
      return rises(key, slots, report);
    }
    boolean points = key.item().flatMap(Key::kind).filter("point"::equals).isPresent();
    return !points || isCurve(key, slots, list, report);
  }

  private static String commaHint(Node.Sequence list) {
    return list.flow() && list.items().size() > 1
        ? "; a decimal comma splits a number in two: write a point"
        : "";
  }

  private static boolean rises(Key key, List<Slot<?>> slots, Report report) {
    for (int i = 1; i < slots.size(); i++) {
      Optional<?> before = slots.get(i - 1).stated();
      Optional<?> here = slots.get(i).stated();
      if (before.isPresent() && here.isPresent() && (double) here.get() <= (double) before.get()) {
        Place place = slots.get(i).place();
        report.add(
            Problem.Kind.VALUE_OUT_OF_RANGE,
            place,
            "`"
                + key.name()
                + "` must rise from value to value; "
                + "a decimal comma splits a number in two: write a point");
        return false;
      }
    }
    return true;
  }

  /** At least two points, values rising, outputs of one dimension and monotone. */
  private static boolean isCurve(Key key, List<Slot<?>> slots, Node.Sequence list, Report report) {
    if (slots.stream().anyMatch(slot -> !isWhole(slot))) {
      return true; // each wrong point has its own problem
    }
    if (slots.size() < 2) {
      report.add(
          Problem.Kind.VALUE_OUT_OF_RANGE,
          list.place(),
          "`" + key.name() + "` needs at least two points");
      return false;
    }
    double direction = 0;
    for (int i = 1; i < slots.size(); i++) {
      Part before = (Part) slots.get(i - 1).stated().orElseThrow();
      Part here = (Part) slots.get(i).stated().orElseThrow();
      Toleranced last = before.quantity("output").stated().orElseThrow();
      Toleranced output = here.quantity("output").stated().orElseThrow();
      double step = output.value() - last.value();
      double rise =
          here.quantity("measured").stated().orElseThrow().value()
              - before.quantity("measured").stated().orElseThrow().value();
      String fault =
          rise <= 0
              ? "the values of the points must rise"
              : !output.unit().comparableWith(last.unit())
                  ? "the outputs of all points must have one unit"
                  : step == 0 || step * direction < 0
                      ? "the outputs must rise or fall from point to point, else one output has two"
                          + " values"
                      : null;
      if (fault != null) {
        report.add(Problem.Kind.VALUE_OUT_OF_RANGE, here.place(), fault);
        return false;
      }
      direction = step;
    }
    return true;
  }

  private static boolean isWhole(Slot<?> slot) {
    return slot.stated()
        .map(point -> ((Part) point).slots().values().stream().allMatch(Slot::isStated))
        .orElse(false);
  }
}
