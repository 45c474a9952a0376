package dev.settlewell.assist;

import dev.settlewell.channel.Alias;
import dev.settlewell.channel.Budget;
import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.channel.Figures;
import dev.settlewell.channel.ScanFigures;
import dev.settlewell.text.Place;
import dev.settlewell.text.Span;
import dev.settlewell.unit.Engineering;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Computed figures beside the values they follow from. Each kind can be switched off. */
public final class InlayHints {
  /** What a hint tells of. */
  public enum Sort {
    /** The LSB in the measured unit, beside {@code measures}. */
    RESOLUTION,
    /** What is needed, beside {@code acquisition}; a scan's load beside its {@code rate}. */
    ACQUISITION,
    /** The error, beside {@code needs}; the voltage, beside the name of a supply. */
    VALUES,
    /** Where the strongest line of an interferer lands, beside its name in a channel. */
    INTERFERERS,
    /** The share of the error budget, beside each value of a channel that has a part in it. */
    SHARES
  }

  /**
   * @param offset behind which it stands
   */
  public record Hint(int offset, String text, Sort sort) {}

  /** A smaller share is not worth the room beside a value. */
  private static final double LEAST_SHARE = 0.01;

  private final Checked checked;
  private final List<Hint> hints = new ArrayList<>();

  private InlayHints(Checked checked) {
    this.checked = checked;
  }

  public static List<Hint> of(Checked checked, Vocabulary vocabulary, Span range) {
    InlayHints all = new InlayHints(checked);
    Outline.of(checked.tree(), vocabulary)
        .all()
        .filter(piece -> piece.span().start() <= range.end() && range.start() <= piece.span().end())
        .forEach(all::piece);
    checked.linked().sheet().channels().keySet().stream()
        .map(name -> checked.analysis().of(name))
        .filter(figures -> figures.size() == 1)
        .forEach(figures -> all.parts(figures.get(0)));
    return all.hints.stream().filter(hint -> range.touches(hint.offset())).toList();
  }

  private void piece(Piece piece) {
    Optional<Piece> parent = piece.parent();
    if (parent.map(p -> p.isKind("channel")).orElse(false)) {
      List<ChannelFigures> figures = checked.analysis().of(parent.get().labelText());
      if (figures.size() == 1) {
        channel(piece, figures.get(0));
      }
    } else if (piece.isKey("rate") && parent.map(p -> p.isKind("scan")).orElse(false)) {
      Optional.ofNullable(checked.analysis().scans().get(parent.get().labelText()))
          .ifPresent(scan -> scan(piece, scan));
    }
    if (piece.key().flatMap(Key::refersTo).isPresent()) {
      supply(piece);
    }
  }

  private void channel(Piece piece, ChannelFigures channel) {
    Figures figures = channel.figures();
    if (piece.isKey("measures")) {
      figures
          .get("lsb-measured")
          .filter(figure -> figure.value().isPresent())
          .flatMap(figure -> FigureWords.value(figure, ChannelHover.measuredUnit(channel)))
          .ifPresent(value -> add(piece, "LSB " + value, Sort.RESOLUTION));
    } else if (piece.isKey("acquisition")) {
      OptionalDouble needed = figures.value("required-acquisition");
      if (needed.isPresent()) {
        add(piece, "needs " + seconds(needed.getAsDouble()), Sort.ACQUISITION);
      }
    } else if (piece.isKey("needs")) {
      channel.budget().ifPresent(budget -> add(piece, budget(budget), Sort.VALUES));
    }
  }

  private static String budget(Budget budget) {
    String has = "has ±" + Engineering.message(budget.judged(), budget.unit());
    OptionalDouble margin = budget.margin();
    return margin.isPresent()
        ? has + ", margin " + Engineering.message(margin.getAsDouble(), budget.unit())
        : has;
  }

  /** What the parts of a channel do to its readings. */
  private void parts(ChannelFigures channel) {
    Map<Place, Alias> strongest = new LinkedHashMap<>();
    for (Alias alias : channel.aliases()) {
      strongest.merge(alias.place(), alias, (a, b) -> a.amplitudeLsb() >= b.amplitudeLsb() ? a : b);
    }
    strongest.forEach((place, alias) -> add(channel, place, landing(alias), Sort.INTERFERERS));
    Map<Place, Double> shares = new LinkedHashMap<>();
    channel.budget().stream()
        .flatMap(budget -> budget.rows().stream())
        .filter(row -> !row.name().startsWith("interferer-") && !row.name().equals("settling"))
        .forEach(
            row -> row.places().forEach(place -> shares.merge(place, row.share(), Double::sum)));
    shares.forEach(
        (place, share) -> {
          if (share >= LEAST_SHARE) {
            String text = Engineering.message(share, "1") + " of the error";
            add(channel, place, text, Sort.SHARES);
          }
        });
  }

  private static String landing(Alias alias) {
    String where =
        alias.landsHigh() - alias.landsLow() < 1e-9 * alias.landsHigh()
            ? Engineering.message(alias.landsHigh(), "Hz")
            : Engineering.message(alias.landsLow(), "Hz")
                + " to "
                + Engineering.message(alias.landsHigh(), "Hz");
    return "lands at " + where + ", " + Engineering.message(alias.amplitudeLsb(), "LSB");
  }

  /** Only values of the channel's own block: those of a converter serve several channels. */
  private void add(ChannelFigures channel, Place place, String text, Sort sort) {
    Place block = channel.channel().value().place();
    if (place.sheet().equals(block.sheet()) && block.span().contains(place.span())) {
      hints.add(new Hint(place.end(), text, sort));
    }
  }

  private void scan(Piece piece, ScanFigures scan) {
    OptionalDouble time = scan.figures().value("scan-time");
    OptionalDouble use = scan.figures().value("scan-utilisation");
    if (time.isPresent()) {
      String load = use.isPresent() ? ", " + Engineering.message(use.getAsDouble(), "1") : "";
      add(piece, "scan " + seconds(time.getAsDouble()) + load, Sort.ACQUISITION);
    }
  }

  private void supply(Piece piece) {
    Optional.ofNullable(checked.linked().supplies().get(piece.valueText()))
        .flatMap(supply -> supply.value().stated())
        .ifPresent(
            voltage ->
                add(
                    piece,
                    Engineering.exact(voltage.value(), voltage.unit().symbol()),
                    Sort.VALUES));
  }

  private void add(Piece piece, String text, Sort sort) {
    hints.add(new Hint(piece.value().place().end(), text, sort));
  }

  private static String seconds(double time) {
    return Engineering.message(time, "s");
  }
}
