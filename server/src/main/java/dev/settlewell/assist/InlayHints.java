package dev.settlewell.assist;

import dev.settlewell.channel.Budget;
import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.channel.Figures;
import dev.settlewell.channel.ScanFigures;
import dev.settlewell.text.Span;
import dev.settlewell.unit.Engineering;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.ArrayList;
import java.util.List;
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
    VALUES
  }

  /**
   * @param offset behind which it stands
   */
  public record Hint(int offset, String text, Sort sort) {}

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
    return "has ±" + Engineering.message(budget.judged(), budget.unit());
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
