package dev.settlewell.review;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.channel.Figure;
import dev.settlewell.channel.Figures;
import dev.settlewell.finding.Finding;
import dev.settlewell.sheet.Named;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.stream.Stream;

/**
 * What changed in figures and findings between two revisions of the same sheets.
 *
 * @param sheets those that differ
 * @param unchanged how many do not
 */
public record Comparison(List<SheetChange> sheets, int unchanged) {

  /** Smaller changes are those of the last digits that outputs show. */
  private static final double NOTICED = 1e-9;

  /** Two revisions of one sheet; one of them may be missing. */
  public record Pair(String path, Optional<Reviewed> before, Optional<Reviewed> after) {}

  /**
   * @param gone findings of the old revision that the new one has not
   * @param come findings of the new one that the old one had not, or less gravely
   */
  public record SheetChange(
      Pair pair, List<FigureChange> figures, List<Finding> gone, List<Finding> come) {

    boolean isNone() {
      return figures.isEmpty()
          && gone.isEmpty()
          && come.isEmpty()
          && pair.before().isPresent()
          && pair.after().isPresent();
    }
  }

  /**
   * @param owner {@code scan tide, channel level}
   * @param before empty where the old revision has no such figure
   */
  public record FigureChange(
      String owner, String name, Optional<Figure> before, Optional<Figure> after) {}

  public static Comparison of(List<Pair> pairs) {
    List<SheetChange> changes =
        pairs.stream().map(Comparison::compare).filter(change -> !change.isNone()).toList();
    return new Comparison(changes, pairs.size() - changes.size());
  }

  /** Every finding that has come. */
  public List<Finding> come() {
    return sheets.stream().flatMap(sheet -> sheet.come().stream()).toList();
  }

  private static SheetChange compare(Pair pair) {
    List<Finding> before = pair.before().map(Reviewed::open).orElse(List.of());
    List<Finding> after = pair.after().map(Reviewed::open).orElse(List.of());
    return new SheetChange(pair, figures(pair), without(before, after), without(after, before));
  }

  /** Those of {@code some} that have no like, at least as grave, among the others. */
  private static List<Finding> without(List<Finding> some, List<Finding> others) {
    List<Finding> left = new ArrayList<>(others);
    List<Finding> without = new ArrayList<>();
    for (Finding finding : some) {
      Optional<Finding> like =
          left.stream()
              .filter(other -> isLike(finding, other))
              .filter(other -> other.severity().atLeast(finding.severity()))
              .findFirst();
      like.ifPresentOrElse(left::remove, () -> without.add(finding));
    }
    return without;
  }

  /** The sheets of two revisions may stand at two paths. */
  private static boolean isLike(Finding a, Finding b) {
    return a.name().equals(b.name())
        && a.subject().equals(b.subject())
        && a.about().equals(b.about())
        && (!a.subject().isEmpty() || a.message().equals(b.message()));
  }

  private static List<FigureChange> figures(Pair pair) {
    Map<String, Figures> before = owners(pair.before());
    Map<String, Figures> after = owners(pair.after());
    if (before.isEmpty() || after.isEmpty()) {
      return List.of();
    }
    Set<String> owners = new LinkedHashSet<>(before.keySet());
    owners.addAll(after.keySet());
    List<FigureChange> changes = new ArrayList<>();
    for (String owner : owners) {
      compare(
          owner,
          before.getOrDefault(owner, Figures.EMPTY),
          after.getOrDefault(owner, Figures.EMPTY),
          changes);
    }
    return changes;
  }

  private static void compare(
      String owner, Figures before, Figures after, List<FigureChange> changes) {
    Set<String> names = new LinkedHashSet<>();
    before.all().forEach(figure -> names.add(figure.name()));
    after.all().forEach(figure -> names.add(figure.name()));
    for (String name : names) {
      Optional<Figure> old = before.get(name);
      Optional<Figure> now = after.get(name);
      if (!same(old, now)) {
        changes.add(new FigureChange(owner, name, old, now));
      }
    }
  }

  private static boolean same(Optional<Figure> a, Optional<Figure> b) {
    if (a.isEmpty() || b.isEmpty()) {
      return a.isEmpty() && b.isEmpty();
    }
    OptionalDouble x = a.get().value();
    OptionalDouble y = b.get().value();
    if (x.isPresent() && y.isPresent()) {
      double size = Math.max(Math.abs(x.getAsDouble()), Math.abs(y.getAsDouble()));
      boolean near = Math.abs(x.getAsDouble() - y.getAsDouble()) <= NOTICED * size;
      boolean equal = Double.compare(x.getAsDouble(), y.getAsDouble()) == 0;
      return (near || equal) && a.get().unit().equals(b.get().unit());
    }
    return a.get().state().getClass() == b.get().state().getClass();
  }

  private static Map<String, Figures> owners(Optional<Reviewed> sheet) {
    Map<String, Figures> owners = new LinkedHashMap<>();
    sheet.map(Reviewed::analysis).ifPresent(analysis -> owners(analysis, owners));
    return owners;
  }

  private static void owners(Analysis analysis, Map<String, Figures> owners) {
    analysis.converters().forEach((name, c) -> owners.put("converter " + name, c.figures()));
    analysis.scans().forEach((name, scan) -> owners.put("scan " + name, scan.figures()));
    for (ChannelFigures channel : analysis.channels()) {
      String scan = channel.scan().map(Named::name).map(name -> ", scan " + name).orElse("");
      owners.put(
          "channel " + channel.channel().name() + scan,
          new Figures(
              Stream.concat(channel.figures().all().stream(), BudgetFigures.of(channel).stream())
                  .toList()));
    }
  }
}
