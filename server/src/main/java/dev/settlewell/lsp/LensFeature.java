package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.assist.Lenses;
import java.util.List;
import java.util.Optional;
import org.eclipse.lsp4j.CodeLens;
import org.eclipse.lsp4j.CodeLensOptions;
import org.eclipse.lsp4j.CodeLensParams;
import org.eclipse.lsp4j.Command;
import org.eclipse.lsp4j.ServerCapabilities;
import org.eclipse.lsp4j.jsonrpc.CancelChecker;

/** {@code textDocument/codeLens}: lines to read, with nothing to click. */
final class LensFeature implements Feature {
  @Override
  public void register(Methods methods) {
    methods.request("textDocument/codeLens", CodeLensParams.class, LensFeature::answer);
  }

  @Override
  public void announce(ServerCapabilities server, Abilities client) {
    server.setCodeLensProvider(new CodeLensOptions(false));
  }

  private static List<CodeLens> answer(CodeLensParams params, View view, CancelChecker cancel) {
    Optional<Checked> checked = view.checked(params.getTextDocument().getUri());
    if (checked.isEmpty() || !view.settings().codeLens()) {
      return List.of();
    }
    Checked sheet = checked.get();
    return Lenses.of(sheet).stream()
        .map(
            lens ->
                new CodeLens(
                    view.ranges().of(sheet.text(), lens.span()),
                    new Command(lens.text(), ""),
                    null))
        .toList();
  }
}
