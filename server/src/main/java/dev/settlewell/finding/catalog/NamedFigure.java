package dev.settlewell.finding.catalog;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.channel.Figure;
import dev.settlewell.channel.Figures;
import dev.settlewell.sheet.Either;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.unit.Toleranced;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * What {@code equals: level.acquisition-cycles} names: a figure the tool computes or a value the
 * sheet states, of a channel, a scan or a converter; {@code SCAN.CHANNEL.FIGURE} where a channel
 * stands in several scans.
 */
final class NamedFigure {
  /**
   * What came of a name.
   *
   * @param values coherent, one for each scan that the name does not tell apart
   * @param known false where nothing of that name can ever be computed or stated
   */
  record Found(List<Double> values, String unit, boolean known) {
    static final Found NOTHING_YET = new Found(List.of(), "", true);
    static final Found UNKNOWN = new Found(List.of(), "", false);
  }

  private NamedFigure() {}

  static Found find(Analysis analysis, String path) {
    String[] steps = path.split("\\.", -1);
    if (steps.length == 3) {
      List<ChannelFigures> channels =
          analysis.of(steps[1]).stream()
              .filter(c -> c.scan().filter(scan -> scan.name().equals(steps[0])).isPresent())
              .toList();
      return ofChannels(channels, steps[2]);
    }
    if (steps.length != 2) {
      return Found.UNKNOWN;
    }
    List<ChannelFigures> channels = analysis.of(steps[0]);
    if (!channels.isEmpty()) {
      return ofChannels(channels, steps[1]);
    }
    if (analysis.scans().containsKey(steps[0])) {
      var scan = analysis.scans().get(steps[0]);
      return of(scan.figures(), scan.scan().value(), steps[1]);
    }
    if (analysis.converters().containsKey(steps[0])) {
      var converter = analysis.converters().get(steps[0]);
      return of(converter.figures(), converter.converter().value(), steps[1]);
    }
    return Found.NOTHING_YET; // a name that is unknown or wrong has its own finding
  }

  private static Found ofChannels(List<ChannelFigures> channels, String name) {
    List<Double> values = new ArrayList<>();
    String unit = "";
    boolean known = channels.isEmpty();
    for (ChannelFigures channel : channels) {
      Found found = of(channel.figures(), channel.channel().value(), name);
      values.addAll(found.values());
      unit = found.unit().isEmpty() ? unit : found.unit();
      known |= found.known();
    }
    return new Found(values.stream().distinct().toList(), unit, known);
  }

  private static Found of(Figures figures, Slot<Part> slot, String name) {
    Optional<Figure> figure = figures.get(name);
    if (figure.isPresent()) {
      return figure.get().value().isPresent()
          ? new Found(List.of(figure.get().value().getAsDouble()), figure.get().unit(), true)
          : Found.NOTHING_YET;
    }
    Part part = slot.stated().orElse(null);
    if (part == null) {
      return Found.NOTHING_YET;
    }
    return part.slots().containsKey(name) ? stated(part.slot(name)) : Found.UNKNOWN;
  }

  private static Found stated(Slot<?> slot) {
    Object value = slot.stated().orElse(null);
    if (value instanceof Either either) {
      value = either.quantity().orElse(null);
    }
    if (value instanceof Toleranced quantity) {
      return new Found(List.of(quantity.value()), quantity.unit().symbol(), true);
    }
    if (value instanceof Double number) {
      return new Found(List.of(number), "1", true);
    }
    return value == null ? Found.NOTHING_YET : Found.UNKNOWN;
  }
}
