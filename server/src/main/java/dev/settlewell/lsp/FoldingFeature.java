package dev.settlewell.lsp;

import dev.settlewell.assist.Folding;
import java.util.List;
import org.eclipse.lsp4j.FoldingRange;
import org.eclipse.lsp4j.FoldingRangeKind;
import org.eclipse.lsp4j.FoldingRangeRequestParams;
import org.eclipse.lsp4j.ServerCapabilities;
import org.eclipse.lsp4j.jsonrpc.CancelChecker;

/** {@code textDocument/foldingRange}, whole lines for every client. */
final class FoldingFeature implements Feature {
  @Override
  public void register(Methods methods) {
    methods.request(
        "textDocument/foldingRange", FoldingRangeRequestParams.class, FoldingFeature::answer);
  }

  @Override
  public void announce(ServerCapabilities server, Abilities client) {
    server.setFoldingRangeProvider(true);
  }

  private static List<FoldingRange> answer(
      FoldingRangeRequestParams params, View view, CancelChecker cancel) {
    return view.checked(params.getTextDocument().getUri())
        .map(
            sheet ->
                Folding.of(sheet, view.vocabulary()).stream().map(FoldingFeature::range).toList())
        .orElse(List.of());
  }

  private static FoldingRange range(Folding.Fold fold) {
    FoldingRange range = new FoldingRange(fold.firstLine(), fold.lastLine());
    if (fold.comment()) {
      range.setKind(FoldingRangeKind.Comment);
    }
    return range;
  }
}
