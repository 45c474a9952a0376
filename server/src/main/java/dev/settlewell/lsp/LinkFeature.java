package dev.settlewell.lsp;

import dev.settlewell.assist.Links;
import java.util.List;
import org.eclipse.lsp4j.DocumentLink;
import org.eclipse.lsp4j.DocumentLinkOptions;
import org.eclipse.lsp4j.DocumentLinkParams;
import org.eclipse.lsp4j.ServerCapabilities;
import org.eclipse.lsp4j.jsonrpc.CancelChecker;

/** {@code textDocument/documentLink}. */
final class LinkFeature implements Feature {
  @Override
  public void register(Methods methods) {
    methods.request("textDocument/documentLink", DocumentLinkParams.class, LinkFeature::answer);
  }

  @Override
  public void announce(ServerCapabilities server, Abilities client) {
    server.setDocumentLinkProvider(new DocumentLinkOptions(false));
  }

  private static List<DocumentLink> answer(
      DocumentLinkParams params, View view, CancelChecker cancel) {
    return view.checked(params.getTextDocument().getUri())
        .map(
            sheet ->
                Links.of(sheet, view.vocabulary()).stream()
                    .map(
                        link ->
                            new DocumentLink(
                                view.ranges().of(sheet.text(), link.place().span()),
                                view.uri(link.target())))
                    .toList())
        .orElse(List.of());
  }
}
