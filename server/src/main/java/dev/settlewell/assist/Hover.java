package dev.settlewell.assist;

import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.channel.Figure;
import dev.settlewell.channel.Figures;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Pages;
import dev.settlewell.finding.catalog.Catalog;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Span;
import dev.settlewell.unit.Toleranced;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Kind;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** What is told of the thing under the cursor: its meaning, its value as read, its figures. */
public final class Hover {
  /** The text, and the stretch it is about. */
  public record Told(Span span, Prose prose) {}

  /** The keys of a converter that its own figures rest on; all others act in its channels. */
  private static final Set<String> CONVERTER_TIMING =
      Set.of("clock", "clock-limits", "conversion-cycles", "acquisition-overhead");

  private final Checked checked;
  private final Prose prose = new Prose();

  private Hover(Checked checked) {
    this.checked = checked;
  }

  public static Optional<Told> at(Checked checked, Vocabulary vocabulary, int offset) {
    return Outline.of(checked.tree(), vocabulary)
        .at(offset)
        .flatMap(piece -> new Hover(checked).of(piece, offset));
  }

  private Optional<Told> of(Piece piece, int offset) {
    boolean onLabel = piece.isOnLabel(offset);
    Span span = onLabel ? piece.label().orElseThrow().place().span() : piece.value().place().span();
    if (onLabel) {
      label(piece);
    } else {
      value(piece);
    }
    findings(span);
    return prose.isEmpty() ? Optional.empty() : Optional.of(new Told(span, prose));
  }

  private void label(Piece piece) {
    switch (piece.role()) {
      case KEY -> {
        prose.heading("`" + piece.labelText() + "`");
        document(piece.key().orElseThrow(), piece.kind());
        reading(piece);
        figures(piece);
      }
      case KIND -> {
        Kind kind = piece.kind().orElseThrow();
        prose.heading("`" + piece.labelText() + "`").paragraph(kind.doc());
        reading(piece);
        figures(piece);
      }
      case NAME -> name(piece);
      default -> {}
    }
  }

  private void document(Key key, Optional<Kind> kind) {
    prose.paragraph(key.doc().isBlank() ? kind.map(Kind::doc).orElse("") : key.doc());
    if (!key.computed()) {
      prose.paragraph("Read, and not computed with yet.");
    }
    key.standard()
        .ifPresent(standard -> prose.paragraph("Where it is missing: `" + standard + "`"));
    if (!key.examples().isEmpty()) {
      prose.paragraph("Example: `" + key.examples().get(0) + "`");
    }
  }

  private void reading(Piece piece) {
    Slots.valueAt(checked.sheet().top(), piece.value().place())
        .map(Readings::lines)
        .ifPresent(lines -> lines.forEach(prose::item));
  }

  private void value(Piece piece) {
    String text = piece.valueText();
    if (refersToName(piece) && told(text)) {
      return;
    }
    if (piece.key().isPresent() && isFindingName(piece)) {
      findingPage(text);
      return;
    }
    prose.heading("`" + text + "`");
    piece.key().map(Key::doc).ifPresent(prose::paragraph);
    reading(piece);
    figures(piece);
  }

  private static boolean refersToName(Piece piece) {
    return piece.key().flatMap(Key::refersTo).isPresent();
  }

  private static boolean isFindingName(Piece piece) {
    return piece.isKey("finding") && piece.parent().map(p -> p.isKind("acceptance")).orElse(false);
  }

  private void name(Piece piece) {
    boolean isSeverity = piece.parent().map(p -> p.isKey("findings")).orElse(false);
    if (isSeverity) {
      findingPage(piece.labelText());
    } else if (!told(piece.labelText())) {
      prose.heading("`" + piece.labelText() + "`");
      piece.key().map(Key::doc).ifPresent(prose::paragraph);
      reading(piece);
    }
  }

  private void findingPage(String name) {
    prose.heading("`" + name + "`");
    Catalog.CHECKS.stream()
        .filter(check -> check.name().equals(name))
        .map(Check::summary)
        .forEach(prose::paragraph);
    Pages.of(name).map(Pages.Page::summary).ifPresent(prose::paragraph);
  }

  /** Tells of whatever has this name, wherever it is defined; false where nothing has. */
  private boolean told(String name) {
    Named<Toleranced> supply = checked.linked().supplies().get(name);
    Named<Part> converter = checked.linked().converters().get(name);
    Named<Part> interferer = checked.linked().interferers().get(name);
    Named<Part> scan = checked.sheet().scans().get(name);
    Named<Part> channel = checked.sheet().channels().get(name);
    if (supply != null) {
      prose.heading("supply `" + name + "`");
      origin(supply);
      supply.value().stated().map(Readings::lines).ifPresent(l -> l.forEach(prose::item));
    } else if (converter != null) {
      prose.heading("converter `" + name + "`");
      part(converter);
      Optional.ofNullable(checked.analysis().converters().get(name))
          .ifPresent(figures -> all(figures.figures()));
    } else if (interferer != null) {
      prose.heading("interferer `" + name + "`");
      part(interferer);
    } else if (scan != null) {
      prose.heading("scan `" + name + "`");
      part(scan);
      Optional.ofNullable(checked.analysis().scans().get(name))
          .ifPresent(figures -> all(figures.figures()));
    } else if (channel != null) {
      prose.heading("channel `" + name + "`");
      part(channel);
      checked.analysis().of(name).forEach(figures -> ChannelHover.tell(figures, prose));
      findingsOf(name);
    }
    return !prose.isEmpty();
  }

  private void part(Named<Part> named) {
    origin(named);
    Optional<Part> part = named.value().stated();
    part.filter(p -> p.has("about")).ifPresent(p -> prose.paragraph(p.text("about").orElse("")));
    part.ifPresent(this::scalars);
  }

  /** The values of a part as the sheet states them. */
  private void scalars(Part part) {
    part.slots()
        .forEach(
            (key, slot) -> {
              boolean shown = slot instanceof Slot.Stated<?> stated && !stated.raw().isEmpty();
              if (shown && !key.equals("about")) {
                prose.item(key + ": `" + ((Slot.Stated<?>) slot).raw() + "`");
              }
            });
  }

  private void origin(Named<?> named) {
    String sheet = named.place().sheet();
    if (!sheet.equals(checked.text().name())) {
      prose.paragraph("defined in `" + sheet.substring(sheet.lastIndexOf('/') + 1) + "`");
    }
  }

  private void all(Figures figures) {
    figures.all().forEach(figure -> FigureWords.line(figure, "").ifPresent(prose::item));
  }

  /** Those of the channel (or scan, or converter) around the piece that rest on it. */
  private void figures(Piece piece) {
    Optional<String> channel = piece.nameAround("channel");
    if (channel.isPresent()) {
      for (ChannelFigures figures : checked.analysis().of(channel.get())) {
        if (piece.isKey("needs")) {
          figures.budget().ifPresent(budget -> BudgetWords.tell(budget, prose));
        }
        if (piece.around(p -> p.isKey("interferers")).isPresent()) {
          ChannelHover.aliases(figures, piece.valueText(), prose);
        }
        some(figures.figures(), RelatedFigures.of(piece), ChannelHover.measuredUnit(figures));
      }
      return;
    }
    piece
        .nameAround("scan")
        .map(checked.analysis().scans()::get)
        .ifPresent(scan -> all(scan.figures()));
    if (CONVERTER_TIMING.contains(piece.labelText())) {
      piece
          .nameAround("converter")
          .map(checked.analysis().converters()::get)
          .ifPresent(converter -> all(converter.figures()));
    }
  }

  private void some(Figures figures, List<String> names, String measuredUnit) {
    for (String name : names) {
      Optional<Figure> figure = figures.get(name);
      figure.flatMap(f -> FigureWords.line(f, measuredUnit)).ifPresent(prose::item);
    }
  }

  private void findings(Span span) {
    checked.findings().stream()
        .filter(finding -> finding.place().sheet().equals(checked.text().name()))
        .filter(finding -> finding.place().span().equals(span))
        .forEach(this::finding);
  }

  private void findingsOf(String channel) {
    checked.findings().stream()
        .filter(finding -> finding.subject().equals(channel))
        .forEach(this::finding);
  }

  private void finding(Finding finding) {
    String how =
        finding
            .acceptance()
            .map(a -> "accepted: " + a.because())
            .orElse(finding.severity().label());
    prose.heading("`" + finding.name() + "` (" + how + ")").paragraph(finding.message());
    finding.facts().forEach(fact -> prose.item(fact.label() + ": " + fact.text()));
    Pages.of(finding.name()).map(Pages.Page::summary).ifPresent(prose::paragraph);
  }
}
