package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.assist.InlayHints;
import java.util.List;
import java.util.Optional;
import org.eclipse.lsp4j.InlayHint;
import org.eclipse.lsp4j.InlayHintParams;
import org.eclipse.lsp4j.ServerCapabilities;
import org.eclipse.lsp4j.jsonrpc.CancelChecker;
import org.eclipse.lsp4j.jsonrpc.messages.Either;

/** {@code textDocument/inlayHint}. */
final class HintFeature implements Feature {
  @Override
  public void register(Methods methods) {
    methods.request("textDocument/inlayHint", InlayHintParams.class, HintFeature::answer);
  }

  @Override
  public void announce(ServerCapabilities server, Abilities client) {
    server.setInlayHintProvider(true);
  }

  private static List<InlayHint> answer(InlayHintParams params, View view, CancelChecker cancel) {
    Optional<Checked> checked = view.checked(params.getTextDocument().getUri());
    return checked.map(sheet -> hints(sheet, params, view)).orElse(List.of());
  }

  private static List<InlayHint> hints(Checked sheet, InlayHintParams params, View view) {
    return InlayHints.of(
            sheet, view.vocabulary(), view.ranges().span(sheet.text(), params.getRange()))
        .stream()
        .filter(hint -> isOn(view.settings(), hint.sort()))
        .map(hint -> hint(sheet, hint, view))
        .toList();
  }

  private static boolean isOn(Settings settings, InlayHints.Sort sort) {
    return switch (sort) {
      case RESOLUTION -> settings.hintResolution();
      case ACQUISITION -> settings.hintAcquisition();
      case VALUES -> settings.hintValues();
      case INTERFERERS -> settings.hintInterferers();
      case SHARES -> settings.hintShares();
    };
  }

  private static InlayHint hint(Checked sheet, InlayHints.Hint hint, View view) {
    InlayHint mapped =
        new InlayHint(
            view.ranges().position(sheet.text(), hint.offset()), Either.forLeft(hint.text()));
    mapped.setPaddingLeft(true);
    return mapped;
  }
}
