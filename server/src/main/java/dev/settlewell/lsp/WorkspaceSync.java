package dev.settlewell.lsp;

import com.google.gson.JsonElement;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.CompletableFuture;
import org.eclipse.lsp4j.DidChangeConfigurationParams;
import org.eclipse.lsp4j.DidChangeWatchedFilesParams;
import org.eclipse.lsp4j.DidChangeWatchedFilesRegistrationOptions;
import org.eclipse.lsp4j.DidChangeWorkspaceFoldersParams;
import org.eclipse.lsp4j.FileSystemWatcher;
import org.eclipse.lsp4j.InitializedParams;
import org.eclipse.lsp4j.Registration;
import org.eclipse.lsp4j.WorkspaceFolder;
import org.eclipse.lsp4j.jsonrpc.messages.Either;

/** Folders, files on disk and settings: what changes beside the open documents. */
final class WorkspaceSync {
  private static final String WATCH = "workspace/didChangeWatchedFiles";

  /** Sheets, what marks a workspace, and the sources that firmware constants stand in. */
  private static final List<String> WATCHED =
      List.of("**/*.channels.yaml", "**/.settlewell.yaml", "**/*.{h,hh,hpp,hxx,c,cc,cpp,cxx,ino}");

  private static final String CONFIGURE = "workspace/didChangeConfiguration";

  private final Session session;
  private final Publisher publisher;

  WorkspaceSync(Session session, Publisher publisher) {
    this.session = session;
    this.publisher = publisher;
  }

  void register(Methods methods) {
    methods.notification("initialized", InitializedParams.class, params -> begin());
    methods.notification(
        "workspace/didChangeWorkspaceFolders",
        DidChangeWorkspaceFoldersParams.class,
        params -> folders(params));
    methods.notification(WATCH, DidChangeWatchedFilesParams.class, params -> lookAgain());
    methods.notification(CONFIGURE, DidChangeConfigurationParams.class, this::configure);
  }

  private void begin() {
    Abilities can = session.view().abilities();
    if (can.watchesFiles()) {
      FileSystemWatcher sheets = new FileSystemWatcher(Either.forLeft("**/*.channels.yaml"));
      FileSystemWatcher project = new FileSystemWatcher(Either.forLeft("**/.settlewell.yaml"));
      FileSystemWatcher sources =
          new FileSystemWatcher(Either.forLeft("**/*.{c,h,cc,cpp,cxx,hh,hpp,hxx,inc}"));
      session
          .client()
          .register(
              new Registration(
                  "files",
                  WATCH,
                  new DidChangeWatchedFilesRegistrationOptions(List.of(sheets, project, sources))));
    }
    if (can.registersConfiguration()) {
      session.client().register(new Registration("settings", CONFIGURE));
    }
    if (can.configuration()) {
      askForSettings();
    }
    lookAgain();
  }

  /** Finds the sheets on disk anew and checks whatever may have changed with them. */
  private void lookAgain() {
    session
        .worker()
        .post(
            Worker.Rank.BACKGROUND,
            () -> {
              find();
              publisher.allChanged();
              refresh();
            });
  }

  private void find() {
    View view = session.view();
    List<String> found = new ArrayList<>();
    if (view.settings().unopenedSheets()) {
      view.folders().forEach(folder -> found.addAll(view.desk().sheetsBelow(folder)));
    }
    session.change(v -> v.withFound(found.stream().distinct().toList()));
  }

  private void folders(DidChangeWorkspaceFoldersParams params) {
    List<String> folders = new ArrayList<>(session.view().folders());
    for (WorkspaceFolder gone : params.getEvent().getRemoved()) {
      folders.remove(Uris.name(gone.getUri()));
    }
    for (WorkspaceFolder added : params.getEvent().getAdded()) {
      folders.add(Uris.name(added.getUri()));
    }
    session.change(view -> view.withFolders(folders));
    lookAgain();
  }

  /** Some clients send the settings with the message, others want to be asked. */
  private void configure(DidChangeConfigurationParams params) {
    if (session.view().abilities().configuration()) {
      askForSettings();
    } else if (params.getSettings() instanceof JsonElement json) {
      session.change(
          view ->
              view.with(
                  Settings.DEFAULT.withDocumentation(view.settings().documentation()).with(json)));
      lookAgain();
    }
  }

  private void askForSettings() {
    CompletableFuture<List<Object>> answer = session.client().configuration(Settings.SECTION);
    answer.thenAccept(
        items -> {
          Optional<JsonElement> json =
              items == null || items.isEmpty() || !(items.get(0) instanceof JsonElement first)
                  ? Optional.empty()
                  : Optional.of(first);
          json.ifPresent(
              settings -> session.change(view -> view.with(view.settings().with(settings))));
          lookAgain();
        });
  }

  /** Asks the client to ask again for what it only asks for when a document changes. */
  private void refresh() {
    Abilities can = session.view().abilities();
    if (session.view().drafts().all().isEmpty()) {
      return;
    }
    if (can.pulls() && can.refreshesDiagnostics()) {
      session.client().refresh("diagnostic");
    }
    if (can.refreshesHints()) {
      session.client().refresh("inlayHint");
    }
    if (can.refreshesLenses()) {
      session.client().refresh("codeLens");
    }
    if (can.refreshesTokens()) {
      session.client().refresh("semanticTokens");
    }
  }
}
