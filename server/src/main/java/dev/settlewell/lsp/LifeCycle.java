package dev.settlewell.lsp;

import com.google.gson.JsonElement;
import org.eclipse.lsp4j.InitializeParams;
import org.eclipse.lsp4j.InitializeResult;
import org.eclipse.lsp4j.InitializedParams;
import org.eclipse.lsp4j.SaveOptions;
import org.eclipse.lsp4j.ServerCapabilities;
import org.eclipse.lsp4j.ServerInfo;
import org.eclipse.lsp4j.SetTraceParams;
import org.eclipse.lsp4j.TextDocumentSyncKind;
import org.eclipse.lsp4j.TextDocumentSyncOptions;

/** Beginning and end of a session. */
final class LifeCycle {
  private final Session session;
  private final String version;
  private final Runnable onParentGone;

  LifeCycle(Session session, String version, Runnable onParentGone) {
    this.session = session;
    this.version = version;
    this.onParentGone = onParentGone;
  }

  void register(Methods methods) {
    methods.immediate("initialize", InitializeParams.class, this::initialize);
    methods.notification("initialized", InitializedParams.class, params -> {});
    methods.notification("$/setTrace", SetTraceParams.class, params -> {});
    methods.immediate("shutdown", () -> null);
  }

  private InitializeResult initialize(InitializeParams params) {
    Abilities abilities = Abilities.of(params.getCapabilities());
    Settings settings = Settings.DEFAULT;
    if (params.getInitializationOptions() instanceof JsonElement options) {
      settings = settings.with(options);
    }
    Settings chosen = settings;
    session.change(view -> view.with(abilities).with(chosen));
    if (params.getProcessId() != null) {
      watch(params.getProcessId());
    }
    return new InitializeResult(capabilities(abilities), new ServerInfo("settlewell", version));
  }

  /** An id that names no process we can see (another machine, a container) is not watched. */
  private void watch(long parent) {
    ProcessHandle.of(parent)
        .ifPresent(process -> process.onExit().thenRun(onParentGone));
  }

  private ServerCapabilities capabilities(Abilities client) {
    TextDocumentSyncOptions sync = new TextDocumentSyncOptions();
    sync.setOpenClose(true);
    sync.setChange(TextDocumentSyncKind.Incremental);
    sync.setSave(new SaveOptions(false));
    ServerCapabilities can = new ServerCapabilities();
    can.setTextDocumentSync(sync);
    can.setPositionEncoding(client.encodingName());
    return can;
  }
}
