package dev.settlewell.lsp;

import com.google.gson.JsonElement;
import java.util.ArrayList;
import java.util.List;
import org.eclipse.lsp4j.InitializeParams;
import org.eclipse.lsp4j.InitializeResult;
import org.eclipse.lsp4j.SaveOptions;
import org.eclipse.lsp4j.ServerCapabilities;
import org.eclipse.lsp4j.ServerInfo;
import org.eclipse.lsp4j.SetTraceParams;
import org.eclipse.lsp4j.TextDocumentSyncKind;
import org.eclipse.lsp4j.TextDocumentSyncOptions;
import org.eclipse.lsp4j.WorkspaceFolder;
import org.eclipse.lsp4j.WorkspaceFoldersOptions;
import org.eclipse.lsp4j.WorkspaceServerCapabilities;

/** Beginning and end of a session. */
final class LifeCycle {
  private final Session session;
  private final List<Feature> features;
  private final String version;
  private final Runnable onParentGone;

  LifeCycle(Session session, List<Feature> features, String version, Runnable onParentGone) {
    this.session = session;
    this.features = features;
    this.version = version;
    this.onParentGone = onParentGone;
  }

  void register(Methods methods) {
    methods.immediate("initialize", InitializeParams.class, this::initialize);
    methods.notification("$/setTrace", SetTraceParams.class, params -> {});
    methods.immediate("shutdown", () -> null);
  }

  private InitializeResult initialize(InitializeParams params) {
    Abilities abilities = Abilities.of(params.getCapabilities(), params.getInitializationOptions());
    List<String> folders = folders(params);
    Settings project = folders.isEmpty() ? Settings.DEFAULT : ofProject(folders.get(0));
    Settings settings =
        params.getInitializationOptions() instanceof JsonElement options
            ? project.with(options)
            : project;
    session.change(view -> view.with(abilities).with(settings).withFolders(folders));
    if (params.getProcessId() != null) {
      watch(params.getProcessId());
    }
    return new InitializeResult(capabilities(abilities), new ServerInfo("settlewell", version));
  }

  /** What the project's file says; the editor's own settings come after it. */
  private Settings ofProject(String folder) {
    return Settings.DEFAULT.withDocumentation(
        session.view().desk().project(folder).documentation().orElse(""));
  }

  /** Folders where the client has them, else the one root of older clients. */
  @SuppressWarnings("deprecation")
  private static List<String> folders(InitializeParams params) {
    List<String> folders = new ArrayList<>();
    if (params.getWorkspaceFolders() != null) {
      for (WorkspaceFolder folder : params.getWorkspaceFolders()) {
        folders.add(Uris.name(folder.getUri()));
      }
    } else if (params.getRootUri() != null) {
      folders.add(Uris.name(params.getRootUri()));
    } else if (params.getRootPath() != null) {
      folders.add(params.getRootPath().replace('\\', '/'));
    }
    return folders.stream().map(LifeCycle::withoutSlash).toList();
  }

  private static String withoutSlash(String folder) {
    return folder.length() > 1 && folder.endsWith("/")
        ? folder.substring(0, folder.length() - 1)
        : folder;
  }

  /** An id that names no process we can see (another machine, a container) is not watched. */
  private void watch(long parent) {
    ProcessHandle.of(parent).ifPresent(process -> process.onExit().thenRun(onParentGone));
  }

  private ServerCapabilities capabilities(Abilities client) {
    TextDocumentSyncOptions sync = new TextDocumentSyncOptions();
    sync.setOpenClose(true);
    sync.setChange(TextDocumentSyncKind.Incremental);
    sync.setSave(new SaveOptions(false));
    ServerCapabilities server = new ServerCapabilities();
    server.setTextDocumentSync(sync);
    server.setPositionEncoding(client.encodingName());
    if (client.workspaceFolders()) {
      WorkspaceFoldersOptions folders = new WorkspaceFoldersOptions();
      folders.setSupported(true);
      folders.setChangeNotifications(true);
      server.setWorkspace(new WorkspaceServerCapabilities(folders));
    }
    features.forEach(feature -> feature.announce(server, client));
    return server;
  }
}
