package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.assist.Selections;
import dev.settlewell.text.Span;
import java.util.List;
import org.eclipse.lsp4j.Position;
import org.eclipse.lsp4j.Range;
import org.eclipse.lsp4j.SelectionRange;
import org.eclipse.lsp4j.SelectionRangeParams;
import org.eclipse.lsp4j.ServerCapabilities;
import org.eclipse.lsp4j.jsonrpc.CancelChecker;

/** {@code textDocument/selectionRange}: exactly one answer for each position. */
final class SelectionFeature implements Feature {
  @Override
  public void register(Methods methods) {
    methods.request(
        "textDocument/selectionRange", SelectionRangeParams.class, SelectionFeature::answer);
  }

  @Override
  public void announce(ServerCapabilities server, Abilities client) {
    server.setSelectionRangeProvider(true);
  }

  private static List<SelectionRange> answer(
      SelectionRangeParams params, View view, CancelChecker cancel) {
    return view.checked(params.getTextDocument().getUri())
        .map(sheet -> params.getPositions().stream().map(p -> around(sheet, p, view)).toList())
        .orElse(null);
  }

  private static SelectionRange around(Checked sheet, Position position, View view) {
    int offset = view.ranges().offset(sheet.text(), position);
    List<Span> spans = Selections.around(sheet, view.vocabulary(), offset);
    SelectionRange outer = null;
    for (int i = spans.size() - 1; i >= 0; i--) {
      outer = new SelectionRange(view.ranges().of(sheet.text(), spans.get(i)), outer);
    }
    return outer == null ? new SelectionRange(new Range(position, position), null) : outer;
  }
}
