package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.assist.Formatting;
import dev.settlewell.text.Span;
import java.util.List;
import org.eclipse.lsp4j.DocumentFormattingParams;
import org.eclipse.lsp4j.DocumentRangeFormattingParams;
import org.eclipse.lsp4j.Range;
import org.eclipse.lsp4j.ServerCapabilities;
import org.eclipse.lsp4j.TextEdit;
import org.eclipse.lsp4j.jsonrpc.CancelChecker;

/** {@code textDocument/formatting}, of a whole sheet or a range. */
final class FormattingFeature implements Feature {
  @Override
  public void register(Methods methods) {
    methods.request(
        "textDocument/formatting", DocumentFormattingParams.class, FormattingFeature::whole);
    methods.request(
        "textDocument/rangeFormatting",
        DocumentRangeFormattingParams.class,
        FormattingFeature::range);
  }

  @Override
  public void announce(ServerCapabilities server, Abilities client) {
    server.setDocumentFormattingProvider(true);
    server.setDocumentRangeFormattingProvider(true);
  }

  private static List<TextEdit> whole(
      DocumentFormattingParams params, View view, CancelChecker cancel) {
    return view.checked(params.getTextDocument().getUri())
        .map(sheet -> edits(sheet, new Span(0, sheet.text().length()), view))
        .orElse(List.of());
  }

  private static List<TextEdit> range(
      DocumentRangeFormattingParams params, View view, CancelChecker cancel) {
    Range range = params.getRange();
    return view.checked(params.getTextDocument().getUri())
        .map(sheet -> edits(sheet, view.ranges().span(sheet.text(), range), view))
        .orElse(List.of());
  }

  private static List<TextEdit> edits(Checked sheet, Span range, View view) {
    return Formatting.of(sheet, view.vocabulary()).stream()
        .filter(edit -> range.contains(edit.place().span()))
        .map(edit -> view.ranges().edit(sheet.text(), edit))
        .toList();
  }
}
