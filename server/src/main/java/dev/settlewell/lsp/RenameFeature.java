package dev.settlewell.lsp;

import dev.settlewell.assist.Navigation;
import dev.settlewell.text.Edit;
import java.util.Optional;
import org.eclipse.lsp4j.PrepareRenameParams;
import org.eclipse.lsp4j.PrepareRenameResult;
import org.eclipse.lsp4j.RenameOptions;
import org.eclipse.lsp4j.RenameParams;
import org.eclipse.lsp4j.ServerCapabilities;
import org.eclipse.lsp4j.WorkspaceEdit;
import org.eclipse.lsp4j.jsonrpc.CancelChecker;
import org.eclipse.lsp4j.jsonrpc.ResponseErrorException;
import org.eclipse.lsp4j.jsonrpc.messages.ResponseError;

/** {@code textDocument/rename}, in every sheet that means the same thing by the name. */
final class RenameFeature implements Feature {
  private static final int REQUEST_FAILED = -32803;

  @Override
  public void register(Methods methods) {
    methods.request("textDocument/rename", RenameParams.class, RenameFeature::rename);
    methods.request(
        "textDocument/prepareRename", PrepareRenameParams.class, RenameFeature::prepare);
  }

  @Override
  public void announce(ServerCapabilities server, Abilities client) {
    if (client.preparesRename()) {
      server.setRenameProvider(new RenameOptions(true));
    } else {
      server.setRenameProvider(true);
    }
  }

  private static PrepareRenameResult prepare(
      PrepareRenameParams params, View view, CancelChecker cancel) {
    return NavigationFeature.find(params.getTextDocument(), params.getPosition(), view)
        .filter(found -> Navigation.definition(found.sheet(), found.name().name()).isPresent())
        .map(
            found ->
                new PrepareRenameResult(
                    view.ranges().of(found.sheet().text(), found.name().place().span()),
                    found.name().name()))
        .orElse(null);
  }

  private static WorkspaceEdit rename(RenameParams params, View view, CancelChecker cancel) {
    Optional<NavigationFeature.Found> found =
        NavigationFeature.find(params.getTextDocument(), params.getPosition(), view);
    if (found.isEmpty()) {
      throw refusal("there is no name here");
    }
    Navigation.refusal(found.get().sheet(), params.getNewName())
        .ifPresent(
            why -> {
              throw refusal(why);
            });
    Edits edits = new Edits(view);
    NavigationFeature.everywhere(found.get(), view, true)
        .forEach(
            (text, places) ->
                edits.add(
                    text,
                    places.stream().map(place -> new Edit(place, params.getNewName())).toList()));
    return edits.all();
  }

  private static ResponseErrorException refusal(String why) {
    return new ResponseErrorException(new ResponseError(REQUEST_FAILED, why, null));
  }
}
