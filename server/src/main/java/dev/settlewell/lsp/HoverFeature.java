package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.assist.Prose;
import java.util.Optional;
import org.eclipse.lsp4j.Hover;
import org.eclipse.lsp4j.HoverParams;
import org.eclipse.lsp4j.MarkupContent;
import org.eclipse.lsp4j.MarkupKind;
import org.eclipse.lsp4j.ServerCapabilities;
import org.eclipse.lsp4j.jsonrpc.CancelChecker;

/** {@code textDocument/hover}. */
final class HoverFeature implements Feature {
  @Override
  public void register(Methods methods) {
    methods.request("textDocument/hover", HoverParams.class, HoverFeature::answer);
  }

  @Override
  public void announce(ServerCapabilities server, Abilities client) {
    server.setHoverProvider(true);
  }

  private static Hover answer(HoverParams params, View view, CancelChecker cancel) {
    Optional<Checked> checked = view.checked(params.getTextDocument().getUri());
    return checked.flatMap(sheet -> hover(sheet, params, view)).orElse(null);
  }

  private static Optional<Hover> hover(Checked sheet, HoverParams params, View view) {
    int offset = view.ranges().offset(sheet.text(), params.getPosition());
    return dev.settlewell.assist.Hover.at(sheet, view.vocabulary(), offset)
        .map(
            told ->
                new Hover(
                    markup(told.prose(), view.abilities().markdownHover()),
                    view.ranges().of(sheet.text(), told.span())));
  }

  static MarkupContent markup(Prose prose, boolean markdown) {
    return markdown
        ? new MarkupContent(MarkupKind.MARKDOWN, prose.markdown())
        : new MarkupContent(MarkupKind.PLAINTEXT, prose.plain());
  }
}
