package dev.settlewell.lsp;

import com.google.gson.JsonObject;
import com.google.gson.JsonPrimitive;
import dev.settlewell.text.PositionEncoding;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import org.eclipse.lsp4j.ClientCapabilities;
import org.eclipse.lsp4j.CodeActionCapabilities;
import org.eclipse.lsp4j.CompletionItemCapabilities;
import org.eclipse.lsp4j.DiagnosticTag;
import org.eclipse.lsp4j.GeneralClientCapabilities;
import org.eclipse.lsp4j.MarkupKind;
import org.eclipse.lsp4j.PublishDiagnosticsCapabilities;
import org.eclipse.lsp4j.TextDocumentClientCapabilities;
import org.eclipse.lsp4j.WorkspaceClientCapabilities;

/**
 * What a client can do, read once from its first request; whatever it leaves out it cannot.
 *
 * @param pulls asks for diagnostics itself: then nothing is ever pushed to it
 */
record Abilities(
    PositionEncoding encoding,
    boolean relatedInformation,
    boolean codeDescription,
    boolean diagnosticData,
    boolean diagnosticTags,
    boolean pulls,
    boolean refreshesDiagnostics,
    boolean refreshesHints,
    boolean refreshesLenses,
    boolean refreshesTokens,
    boolean markdownHover,
    boolean markdownCompletion,
    boolean snippets,
    boolean codeActionLiterals,
    boolean disabledActions,
    boolean resolvesActions,
    boolean documentChanges,
    boolean symbolTree,
    boolean linkDefinitions,
    boolean foldsLinesOnly,
    boolean configuration,
    boolean watchesFiles,
    boolean registersConfiguration,
    boolean workspaceFolders,
    boolean progress,
    boolean preparesRename) {

  /**
   * @param options the client's initialization options. Older clients count columns in bytes and
   *     cannot say so in their capabilities: then {@code {"positionEncoding": "utf-8"}} there does.
   */
  static Abilities of(ClientCapabilities client, Object options) {
    Optional<ClientCapabilities> all = Optional.ofNullable(client);
    Optional<WorkspaceClientCapabilities> workspace = all.map(ClientCapabilities::getWorkspace);
    Optional<TextDocumentClientCapabilities> document =
        all.map(ClientCapabilities::getTextDocument);
    Optional<PublishDiagnosticsCapabilities> publish =
        document.map(TextDocumentClientCapabilities::getPublishDiagnostics);
    Optional<CompletionItemCapabilities> item =
        document.map(TextDocumentClientCapabilities::getCompletion).map(c -> c.getCompletionItem());
    Optional<CodeActionCapabilities> action =
        document.map(TextDocumentClientCapabilities::getCodeAction);
    return new Abilities(
        encoding(liked(all.map(ClientCapabilities::getGeneral), options)),
        is(publish, PublishDiagnosticsCapabilities::getRelatedInformation),
        is(publish, PublishDiagnosticsCapabilities::getCodeDescriptionSupport),
        is(publish, PublishDiagnosticsCapabilities::getDataSupport),
        publish
            .map(PublishDiagnosticsCapabilities::getTagSupport)
            .map(Abilities::hasTags)
            .orElse(false),
        document.map(TextDocumentClientCapabilities::getDiagnostic).isPresent(),
        is(workspace.map(WorkspaceClientCapabilities::getDiagnostics), d -> d.getRefreshSupport()),
        is(workspace.map(WorkspaceClientCapabilities::getInlayHint), h -> h.getRefreshSupport()),
        is(workspace.map(WorkspaceClientCapabilities::getCodeLens), l -> l.getRefreshSupport()),
        is(
            workspace.map(WorkspaceClientCapabilities::getSemanticTokens),
            t -> t.getRefreshSupport()),
        markdown(
            document
                .map(TextDocumentClientCapabilities::getHover)
                .map(hover -> hover.getContentFormat())),
        markdown(item.map(CompletionItemCapabilities::getDocumentationFormat)),
        is(item, CompletionItemCapabilities::getSnippetSupport),
        action.map(CodeActionCapabilities::getCodeActionLiteralSupport).isPresent(),
        is(action, CodeActionCapabilities::getDisabledSupport),
        action
            .map(CodeActionCapabilities::getResolveSupport)
            .map(resolve -> resolve.getProperties())
            .map(properties -> properties.contains("edit"))
            .orElse(false),
        is(
            workspace.map(WorkspaceClientCapabilities::getWorkspaceEdit),
            edit -> edit.getDocumentChanges()),
        is(
            document.map(TextDocumentClientCapabilities::getDocumentSymbol),
            symbol -> symbol.getHierarchicalDocumentSymbolSupport()),
        is(
            document.map(TextDocumentClientCapabilities::getDefinition),
            definition -> definition.getLinkSupport()),
        is(
            document.map(TextDocumentClientCapabilities::getFoldingRange),
            folding -> folding.getLineFoldingOnly()),
        is(workspace, WorkspaceClientCapabilities::getConfiguration),
        is(
            workspace.map(WorkspaceClientCapabilities::getDidChangeWatchedFiles),
            watch -> watch.getDynamicRegistration()),
        is(
            workspace.map(WorkspaceClientCapabilities::getDidChangeConfiguration),
            change -> change.getDynamicRegistration()),
        is(workspace, WorkspaceClientCapabilities::getWorkspaceFolders),
        is(all.map(ClientCapabilities::getWindow), window -> window.getWorkDoneProgress()),
        is(
            document.map(TextDocumentClientCapabilities::getRename),
            rename -> rename.getPrepareSupport()));
  }

  private static <T> boolean is(Optional<T> capability, Function<T, Boolean> property) {
    return capability.map(property).orElse(false);
  }

  private static boolean hasTags(
      org.eclipse.lsp4j.jsonrpc.messages.Either<Boolean, org.eclipse.lsp4j.DiagnosticsTagSupport>
          support) {
    return support.isLeft()
        ? support.getLeft()
        : support.getRight().getValueSet().contains(DiagnosticTag.Unnecessary);
  }

  private static boolean markdown(Optional<List<String>> formats) {
    return formats.map(f -> f.contains(MarkupKind.MARKDOWN)).orElse(false);
  }

  private static List<String> liked(Optional<GeneralClientCapabilities> general, Object options) {
    return general
        .map(GeneralClientCapabilities::getPositionEncodings)
        .orElseGet(
            () ->
                options instanceof JsonObject object
                        && object.get("positionEncoding") instanceof JsonPrimitive encoding
                    ? List.of(encoding.getAsString())
                    : List.of());
  }

  /** The first the client likes that we know; UTF-16 where it does not say. */
  private static PositionEncoding encoding(List<String> liked) {
    for (String encoding : liked) {
      switch (encoding) {
        case "utf-8":
          return PositionEncoding.UTF_8;
        case "utf-16":
          return PositionEncoding.UTF_16;
        case "utf-32":
          return PositionEncoding.UTF_32;
        default:
          break;
      }
    }
    return PositionEncoding.UTF_16;
  }

  String encodingName() {
    return switch (encoding) {
      case UTF_8 -> "utf-8";
      case UTF_16 -> "utf-16";
      case UTF_32 -> "utf-32";
    };
  }
}
