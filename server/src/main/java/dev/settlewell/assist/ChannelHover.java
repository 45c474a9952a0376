package dev.settlewell.assist;

import dev.settlewell.channel.Alias;
import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.unit.Engineering;
import java.util.List;

/** A channel at a glance: its resolution, its settling, its error. */
final class ChannelHover {
  private static final List<String> AT_A_GLANCE =
      List.of(
          "lsb",
          "lsb-measured",
          "code-low",
          "code-high",
          "range-used",
          "acquisition",
          "required-acquisition",
          "settling-error-lsb",
          "source-resistance",
          "corner-frequency",
          "result-rate",
          "noise-lsb",
          "effective-bits");

  private ChannelHover() {}

  static void tell(ChannelFigures channel, Prose prose) {
    channel
        .scan()
        .ifPresentOrElse(
            scan -> prose.paragraph("in scan `" + scan.name() + "`"),
            () -> prose.paragraph("in no scan"));
    for (String name : AT_A_GLANCE) {
      channel
          .figures()
          .get(name)
          .flatMap(figure -> FigureWords.line(figure, measuredUnit(channel)))
          .ifPresent(prose::item);
    }
    channel.budget().ifPresent(budget -> BudgetWords.tell(budget, prose));
  }

  /** The unit of what the channel measures, without prefix; "" where the sheet does not say. */
  static String measuredUnit(ChannelFigures channel) {
    return channel
        .channel()
        .value()
        .stated()
        .flatMap(part -> part.range("measures").stated())
        .map(range -> range.unit().symbol())
        .orElse("");
  }

  /** Where lines land in the results: all of them, or those of one interferer. */
  static void aliases(ChannelFigures channel, String interferer, Prose prose) {
    for (Alias alias : channel.aliases()) {
      if (interferer.isEmpty() || alias.interferer().equals(interferer)) {
        prose.item(line(alias));
      }
    }
  }

  private static String line(Alias alias) {
    String which = alias.harmonic() == 1 ? "" : " harmonic " + alias.harmonic();
    String lands =
        alias.landsHigh() > alias.landsLow()
            ? hertz(alias.landsLow()) + " to " + hertz(alias.landsHigh())
            : hertz(alias.landsLow());
    return alias.interferer()
        + which
        + ", "
        + hertz(alias.frequency())
        + (alias.aliased() ? ": lands at " : ": stays at ")
        + lands
        + ", "
        + Engineering.message(alias.amplitudeLsb(), "LSB")
        + (alias.readsAsOffset() ? ", reads as an offset" : alias.inBand() ? ", in band" : "");
  }

  private static String hertz(double frequency) {
    return Engineering.message(frequency, "Hz");
  }
}
