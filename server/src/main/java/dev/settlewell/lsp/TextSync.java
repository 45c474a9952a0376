package dev.settlewell.lsp;

import dev.settlewell.text.SourceText;
import java.util.Optional;
import org.eclipse.lsp4j.DidChangeTextDocumentParams;
import org.eclipse.lsp4j.DidCloseTextDocumentParams;
import org.eclipse.lsp4j.DidOpenTextDocumentParams;
import org.eclipse.lsp4j.DidSaveTextDocumentParams;
import org.eclipse.lsp4j.MessageType;
import org.eclipse.lsp4j.TextDocumentItem;

/** Keeps the drafts as the editor has them. */
final class TextSync {
  private final Session session;
  private final Publisher publisher;

  TextSync(Session session, Publisher publisher) {
    this.session = session;
    this.publisher = publisher;
  }

  void register(Methods methods) {
    methods.notification("textDocument/didOpen", DidOpenTextDocumentParams.class, this::open);
    methods.notification("textDocument/didChange", DidChangeTextDocumentParams.class, this::change);
    methods.notification("textDocument/didClose", DidCloseTextDocumentParams.class, this::close);
    methods.notification("textDocument/didSave", DidSaveTextDocumentParams.class, this::save);
  }

  /** A second open of the same document counts as its newest text. */
  private void open(DidOpenTextDocumentParams params) {
    TextDocumentItem item = params.getTextDocument();
    keep(Draft.of(item.getUri(), item.getVersion(), item.getText()));
  }

  private void change(DidChangeTextDocumentParams params) {
    String uri = params.getTextDocument().getUri();
    Optional<Draft> known = session.view().drafts().get(Uris.name(uri));
    if (known.isEmpty()) {
      log("a change of " + uri + ", which is not open, was ignored");
      return;
    }
    Draft before = known.get();
    Integer version = params.getTextDocument().getVersion();
    Optional<SourceText> text =
        Changes.apply(
            before.text(),
            before.name(),
            params.getContentChanges(),
            session.view().abilities().encoding());
    if (text.isEmpty() && before.text().isPresent()) {
      log("a change of " + uri + " lies outside its text; it is checked again once it is reopened");
    }
    keep(new Draft(before.uri(), before.name(), version, text));
  }

  private void close(DidCloseTextDocumentParams params) {
    String name = Uris.name(params.getTextDocument().getUri());
    session.change(view -> view.with(view.drafts().without(name)));
    publisher.changed(name);
  }

  /** Clients without a watcher tell of nothing else, so files on disk are looked at now. */
  private void save(DidSaveTextDocumentParams params) {
    publisher.allChanged();
  }

  private void keep(Draft draft) {
    session.change(view -> view.with(view.drafts().with(draft)));
    if (View.isSheet(draft.name())) {
      publisher.changed(draft.name());
    }
  }

  private void log(String message) {
    session.client().log(MessageType.Warning, message);
  }
}
