package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.assist.Navigation;
import dev.settlewell.assist.Navigation.NameAt;
import dev.settlewell.sheet.Sheet;
import dev.settlewell.text.Place;
import dev.settlewell.text.SourceText;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.eclipse.lsp4j.DefinitionParams;
import org.eclipse.lsp4j.DocumentHighlight;
import org.eclipse.lsp4j.DocumentHighlightKind;
import org.eclipse.lsp4j.DocumentHighlightParams;
import org.eclipse.lsp4j.Location;
import org.eclipse.lsp4j.Position;
import org.eclipse.lsp4j.ReferenceParams;
import org.eclipse.lsp4j.ServerCapabilities;
import org.eclipse.lsp4j.TextDocumentIdentifier;
import org.eclipse.lsp4j.jsonrpc.CancelChecker;

/** Definition, references and highlights of names. */
final class NavigationFeature implements Feature {
  @Override
  public void register(Methods methods) {
    methods.request(
        "textDocument/definition", DefinitionParams.class, NavigationFeature::definition);
    methods.request(
        "textDocument/references", ReferenceParams.class, NavigationFeature::references);
    methods.request(
        "textDocument/documentHighlight",
        DocumentHighlightParams.class,
        NavigationFeature::highlights);
  }

  @Override
  public void announce(ServerCapabilities server, Abilities client) {
    server.setDefinitionProvider(true);
    server.setReferencesProvider(true);
    server.setDocumentHighlightProvider(true);
  }

  /** A name together with the sheet it was asked in. */
  record Found(Checked sheet, NameAt name) {}

  static Optional<Found> find(TextDocumentIdentifier document, Position position, View view) {
    return view.checked(document.getUri())
        .flatMap(
            sheet ->
                Navigation.nameAt(
                        sheet, view.vocabulary(), view.ranges().offset(sheet.text(), position))
                    .map(name -> new Found(sheet, name)));
  }

  private static List<Location> definition(
      DefinitionParams params, View view, CancelChecker cancel) {
    return find(params.getTextDocument(), params.getPosition(), view)
        .flatMap(
            found ->
                Navigation.definition(found.sheet(), found.name().name())
                    .flatMap(place -> location(found.sheet(), place, view)))
        .map(List::of)
        .orElse(List.of());
  }

  private static Optional<Location> location(Checked sheet, Place place, View view) {
    return sheet.text(place.sheet()).map(text -> location(text, place, view));
  }

  private static Location location(SourceText text, Place place, View view) {
    return new Location(view.uri(text.name()), view.ranges().of(text, place.span()));
  }

  private static List<Location> references(
      ReferenceParams params, View view, CancelChecker cancel) {
    boolean withDefinition =
        params.getContext() != null && params.getContext().isIncludeDeclaration();
    return find(params.getTextDocument(), params.getPosition(), view)
        .map(
            found ->
                everywhere(found, view, withDefinition).entrySet().stream()
                    .flatMap(
                        sheet ->
                            sheet.getValue().stream()
                                .map(place -> location(sheet.getKey(), place, view)))
                    .toList())
        .orElse(List.of());
  }

  /** In every sheet that means the same thing by the name: it shares its definition. */
  static Map<SourceText, List<Place>> everywhere(Found found, View view, boolean withDefinition) {
    String name = found.name().name();
    Optional<Place> definition = Navigation.definition(found.sheet(), name);
    Map<String, Sheet> sheets = new LinkedHashMap<>();
    sheets.put(found.sheet().text().name(), found.sheet().sheet());
    found.sheet().linked().used().stream()
        .filter(used -> definition.isPresent() && definition.get().sheet().equals(used.path()))
        .forEach(used -> sheets.put(used.path(), used));
    view.all()
        .filter(
            other ->
                definition.isPresent() && Navigation.definition(other, name).equals(definition))
        .forEach(other -> sheets.putIfAbsent(other.text().name(), other.sheet()));
    Map<SourceText, List<Place>> places = new LinkedHashMap<>();
    for (Sheet sheet : sheets.values()) {
      List<Place> here = Navigation.occurrences(sheet, view.vocabulary(), name, withDefinition);
      if (!here.isEmpty()) {
        places.put(sheet.text(), here);
      }
    }
    return places;
  }

  private static List<DocumentHighlight> highlights(
      DocumentHighlightParams params, View view, CancelChecker cancel) {
    return find(params.getTextDocument(), params.getPosition(), view)
        .map(found -> highlights(found, view))
        .orElse(List.of());
  }

  private static List<DocumentHighlight> highlights(Found found, View view) {
    Checked sheet = found.sheet();
    String name = found.name().name();
    Optional<Place> definition = Navigation.definition(sheet, name);
    return Navigation.occurrences(sheet.sheet(), view.vocabulary(), name, true).stream()
        .map(
            place ->
                new DocumentHighlight(
                    view.ranges().of(sheet.text(), place.span()),
                    definition.equals(Optional.of(place))
                        ? DocumentHighlightKind.Write
                        : DocumentHighlightKind.Read))
        .toList();
  }
}
