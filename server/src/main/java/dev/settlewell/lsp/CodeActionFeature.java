package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.assist.CodeActions;
import dev.settlewell.assist.CodeActions.Action;
import dev.settlewell.finding.Finding;
import dev.settlewell.text.Span;
import java.util.List;
import java.util.Optional;
import java.util.function.Function;
import org.eclipse.lsp4j.CodeAction;
import org.eclipse.lsp4j.CodeActionKind;
import org.eclipse.lsp4j.CodeActionOptions;
import org.eclipse.lsp4j.CodeActionParams;
import org.eclipse.lsp4j.Diagnostic;
import org.eclipse.lsp4j.ServerCapabilities;
import org.eclipse.lsp4j.jsonrpc.CancelChecker;

/** {@code textDocument/codeAction}. Only clients that take edits with an action are served. */
final class CodeActionFeature implements Feature {
  private static final String FIX_ALL = CodeActionKind.SourceFixAll + ".settlewell";

  @Override
  public void register(Methods methods) {
    methods.request("textDocument/codeAction", CodeActionParams.class, CodeActionFeature::answer);
  }

  @Override
  public void announce(ServerCapabilities server, Abilities client) {
    server.setCodeActionProvider(
        new CodeActionOptions(
            List.of(CodeActionKind.QuickFix, CodeActionKind.RefactorExtract, FIX_ALL)));
  }

  private static List<CodeAction> answer(CodeActionParams params, View view, CancelChecker cancel) {
    Optional<Checked> checked = view.checked(params.getTextDocument().getUri());
    if (checked.isEmpty() || !view.abilities().codeActionLiterals()) {
      return List.of();
    }
    List<String> only = params.getContext() == null ? null : params.getContext().getOnly();
    return actions(checked.get(), params, view, cancel).stream()
        .filter(action -> wanted(action, only))
        .map(action -> action(action, checked.get(), view))
        .toList();
  }

  private static List<Action> actions(
      Checked sheet, CodeActionParams params, View view, CancelChecker cancel) {
    Span range = view.ranges().span(sheet.text(), params.getRange());
    Function<String, List<Finding>> trial =
        content -> {
          cancel.checkCanceled();
          return view.trial(sheet.text().name(), content);
        };
    return CodeActions.at(sheet, view.vocabulary(), range, trial);
  }

  /**
   * A kind asks for itself and for everything below it: {@code source} for {@code source.fixAll}.
   */
  private static boolean wanted(Action action, List<String> only) {
    String kind = kind(action.sort());
    return only == null
        || only.stream().anyMatch(asked -> kind.equals(asked) || kind.startsWith(asked + "."));
  }

  private static String kind(CodeActions.Sort sort) {
    return switch (sort) {
      case QUICK_FIX -> CodeActionKind.QuickFix;
      case REFACTOR -> CodeActionKind.RefactorExtract;
      case FIX_ALL -> FIX_ALL;
    };
  }

  private static boolean isCertain(Action action) {
    return action.finding().stream()
        .flatMap(finding -> finding.fixes().stream())
        .anyMatch(fix -> fix.safe() && fix.title().equals(action.title()));
  }

  private static CodeAction action(Action action, Checked sheet, View view) {
    CodeAction mapped = new CodeAction(action.title());
    mapped.setKind(kind(action.sort()));
    if (isCertain(action)) {
      // What an editor's "mend it for me" may take without asking: it changes no value.
      mapped.setIsPreferred(true);
    }
    mapped.setEdit(new Edits(view).add(sheet.text(), action.edits()).all());
    action
        .finding()
        .map(finding -> new DiagnosticMapper(view, sheet).one(finding))
        .ifPresent((Diagnostic diagnostic) -> mapped.setDiagnostics(List.of(diagnostic)));
    return mapped;
  }
}
