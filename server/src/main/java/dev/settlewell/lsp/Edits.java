package dev.settlewell.lsp;

import dev.settlewell.text.Edit;
import dev.settlewell.text.SourceText;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.eclipse.lsp4j.TextDocumentEdit;
import org.eclipse.lsp4j.TextEdit;
import org.eclipse.lsp4j.VersionedTextDocumentIdentifier;
import org.eclipse.lsp4j.WorkspaceEdit;
import org.eclipse.lsp4j.jsonrpc.messages.Either;

/** Edits of one or more texts, in the one of two forms that the client understands. */
final class Edits {
  private final View view;
  private final Map<String, List<TextEdit>> byName = new LinkedHashMap<>();

  Edits(View view) {
    this.view = view;
  }

  Edits add(SourceText text, List<Edit> edits) {
    for (Edit edit : edits) {
      byName
          .computeIfAbsent(text.name(), name -> new ArrayList<>())
          .add(view.ranges().edit(text, edit));
    }
    return this;
  }

  WorkspaceEdit all() {
    if (!view.abilities().documentChanges()) {
      Map<String, List<TextEdit>> byUri = new LinkedHashMap<>();
      byName.forEach((name, edits) -> byUri.put(view.uri(name), edits));
      return new WorkspaceEdit(byUri);
    }
    List<Either<TextDocumentEdit, org.eclipse.lsp4j.ResourceOperation>> changes = new ArrayList<>();
    byName.forEach(
        (name, edits) -> {
          List<Either<TextEdit, org.eclipse.lsp4j.SnippetTextEdit>> plain = new ArrayList<>();
          edits.forEach(edit -> plain.add(Either.forLeft(edit)));
          VersionedTextDocumentIdentifier document =
              new VersionedTextDocumentIdentifier(view.uri(name), view.version(name));
          changes.add(Either.forLeft(new TextDocumentEdit(document, plain)));
        });
    return new WorkspaceEdit(changes);
  }
}
