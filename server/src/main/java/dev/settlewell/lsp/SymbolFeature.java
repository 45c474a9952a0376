package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.assist.Symbols;
import dev.settlewell.assist.Symbols.Symbol;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.eclipse.lsp4j.DocumentSymbol;
import org.eclipse.lsp4j.DocumentSymbolParams;
import org.eclipse.lsp4j.Location;
import org.eclipse.lsp4j.ServerCapabilities;
import org.eclipse.lsp4j.SymbolInformation;
import org.eclipse.lsp4j.SymbolKind;
import org.eclipse.lsp4j.WorkspaceSymbolParams;
import org.eclipse.lsp4j.jsonrpc.CancelChecker;

/** The outline of a sheet, and the search for names in all of them. */
final class SymbolFeature implements Feature {
  @Override
  public void register(Methods methods) {
    methods.request(
        "textDocument/documentSymbol", DocumentSymbolParams.class, SymbolFeature::outline);
    methods.request("workspace/symbol", WorkspaceSymbolParams.class, SymbolFeature::search);
  }

  @Override
  public void announce(ServerCapabilities server, Abilities client) {
    server.setDocumentSymbolProvider(true);
    server.setWorkspaceSymbolProvider(true);
  }

  private static List<?> outline(DocumentSymbolParams params, View view, CancelChecker cancel) {
    Optional<Checked> checked = view.checked(params.getTextDocument().getUri());
    if (checked.isEmpty()) {
      return List.of();
    }
    Checked sheet = checked.get();
    return view.abilities().symbolTree()
        ? tree(Symbols.of(sheet, view.vocabulary()), sheet, view)
        : flat(sheet, view, "");
  }

  private static List<DocumentSymbol> tree(List<Symbol> symbols, Checked sheet, View view) {
    return symbols.stream()
        .map(
            symbol ->
                new DocumentSymbol(
                    symbol.name(),
                    kind(symbol.sort()),
                    view.ranges().of(sheet.text(), symbol.span()),
                    view.ranges().of(sheet.text(), symbol.label()),
                    symbol.detail(),
                    tree(symbol.children(), sheet, view)))
        .toList();
  }

  private static SymbolKind kind(Symbols.Sort sort) {
    return switch (sort) {
      case SECTION -> SymbolKind.Namespace;
      case NAME -> SymbolKind.Class;
      case PART -> SymbolKind.Object;
      case VALUE -> SymbolKind.Property;
    };
  }

  @SuppressWarnings("deprecation") // What clients without trees of symbols still ask for.
  private static List<SymbolInformation> flat(Checked sheet, View view, String query) {
    String wanted = query.toLowerCase(Locale.ROOT);
    List<SymbolInformation> found = new ArrayList<>();
    for (Symbol section : Symbols.of(sheet, view.vocabulary())) {
      for (Symbol symbol : section.children()) {
        if (symbol.sort() == Symbols.Sort.NAME && symbol.name().contains(wanted)) {
          found.add(
              new SymbolInformation(
                  symbol.name(),
                  kind(symbol.sort()),
                  new Location(
                      view.uri(sheet.text().name()),
                      view.ranges().of(sheet.text(), symbol.label())),
                  section.name()));
        }
      }
    }
    return found;
  }

  private static List<SymbolInformation> search(
      WorkspaceSymbolParams params, View view, CancelChecker cancel) {
    return view.all()
        .peek(sheet -> cancel.checkCanceled())
        .flatMap(sheet -> flat(sheet, view, params.getQuery()).stream())
        .toList();
  }
}
