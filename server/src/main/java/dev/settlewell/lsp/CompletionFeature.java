package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.assist.Completion;
import dev.settlewell.assist.Completion.Proposal;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.eclipse.lsp4j.CompletionItem;
import org.eclipse.lsp4j.CompletionItemKind;
import org.eclipse.lsp4j.CompletionList;
import org.eclipse.lsp4j.CompletionOptions;
import org.eclipse.lsp4j.CompletionParams;
import org.eclipse.lsp4j.InsertTextFormat;
import org.eclipse.lsp4j.InsertTextMode;
import org.eclipse.lsp4j.ServerCapabilities;
import org.eclipse.lsp4j.TextEdit;
import org.eclipse.lsp4j.jsonrpc.CancelChecker;
import org.eclipse.lsp4j.jsonrpc.messages.Either;

/** {@code textDocument/completion}. */
final class CompletionFeature implements Feature {
  @Override
  public void register(Methods methods) {
    methods.request("textDocument/completion", CompletionParams.class, CompletionFeature::answer);
  }

  @Override
  public void announce(ServerCapabilities server, Abilities client) {
    server.setCompletionProvider(new CompletionOptions(false, List.of(" ", ":", "[", "{", ",")));
  }

  private static CompletionList answer(CompletionParams params, View view, CancelChecker cancel) {
    Optional<Checked> checked = view.checked(params.getTextDocument().getUri());
    List<CompletionItem> items = new ArrayList<>();
    checked.ifPresent(sheet -> proposals(sheet, params, view, items));
    return new CompletionList(false, items);
  }

  private static void proposals(
      Checked sheet, CompletionParams params, View view, List<CompletionItem> items) {
    int offset = view.ranges().offset(sheet.text(), params.getPosition());
    for (Proposal proposal : Completion.at(sheet, view.vocabulary(), offset)) {
      items.add(item(sheet, proposal, items.size(), view));
    }
  }

  private static CompletionItem item(Checked sheet, Proposal proposal, int rank, View view) {
    boolean snippet = view.abilities().snippets() && proposal.snippet().isPresent();
    String text = snippet ? proposal.snippet().get() : proposal.text();
    CompletionItem item = new CompletionItem(proposal.label());
    item.setKind(kind(proposal.sort()));
    item.setDetail(proposal.detail().isEmpty() ? null : proposal.detail());
    item.setSortText(String.format(Locale.ROOT, "%04d", rank));
    item.setFilterText(proposal.label());
    item.setTextEdit(
        Either.forLeft(new TextEdit(view.ranges().of(sheet.text(), proposal.span()), text)));
    item.setInsertTextFormat(snippet ? InsertTextFormat.Snippet : InsertTextFormat.PlainText);
    if (text.contains("\n")) {
      item.setInsertTextMode(InsertTextMode.AsIs);
    }
    if (!proposal.also().isEmpty()) {
      item.setAdditionalTextEdits(
          proposal.also().stream().map(edit -> view.ranges().edit(sheet.text(), edit)).toList());
    }
    if (!proposal.doc().isEmpty()) {
      item.setDocumentation(
          HoverFeature.markup(proposal.doc(), view.abilities().markdownCompletion()));
    }
    return item;
  }

  private static CompletionItemKind kind(Completion.Sort sort) {
    return switch (sort) {
      case KEY -> CompletionItemKind.Property;
      case KIND -> CompletionItemKind.Class;
      case NAME -> CompletionItemKind.Variable;
      case VALUE -> CompletionItemKind.Value;
      case FINDING -> CompletionItemKind.EnumMember;
    };
  }
}
