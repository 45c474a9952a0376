package dev.settlewell.lsp;

import com.google.gson.reflect.TypeToken;
import java.util.List;
import java.util.Map;
import java.util.concurrent.CompletableFuture;
import org.eclipse.lsp4j.ConfigurationItem;
import org.eclipse.lsp4j.ConfigurationParams;
import org.eclipse.lsp4j.MessageParams;
import org.eclipse.lsp4j.MessageType;
import org.eclipse.lsp4j.ProgressParams;
import org.eclipse.lsp4j.PublishDiagnosticsParams;
import org.eclipse.lsp4j.Registration;
import org.eclipse.lsp4j.RegistrationParams;
import org.eclipse.lsp4j.WorkDoneProgressCreateParams;
import org.eclipse.lsp4j.WorkDoneProgressNotification;
import org.eclipse.lsp4j.jsonrpc.Endpoint;
import org.eclipse.lsp4j.jsonrpc.json.JsonRpcMethod;
import org.eclipse.lsp4j.jsonrpc.messages.Either;

/** What this server says to a client of its own accord. */
final class Client {
  /** The answers whose type matters; of all others only that they came. */
  static final Map<String, JsonRpcMethod> SIGNATURES =
      Map.of(
          "workspace/configuration",
          JsonRpcMethod.request(
              "workspace/configuration",
              new TypeToken<List<Object>>() {}.getType(),
              ConfigurationParams.class));

  private volatile Endpoint endpoint;

  void connect(Endpoint remote) {
    this.endpoint = remote;
  }

  void publish(PublishDiagnosticsParams params) {
    endpoint.notify("textDocument/publishDiagnostics", params);
  }

  void log(MessageType type, String message) {
    endpoint.notify("window/logMessage", new MessageParams(type, message));
  }

  @SuppressWarnings("unchecked")
  CompletableFuture<List<Object>> configuration(String section) {
    ConfigurationItem item = new ConfigurationItem();
    item.setSection(section);
    return (CompletableFuture<List<Object>>)
        endpoint.request("workspace/configuration", new ConfigurationParams(List.of(item)));
  }

  CompletableFuture<?> register(Registration registration) {
    return endpoint.request(
        "client/registerCapability", new RegistrationParams(List.of(registration)));
  }

  CompletableFuture<?> createProgress(String token) {
    return endpoint.request(
        "window/workDoneProgress/create", new WorkDoneProgressCreateParams(Either.forLeft(token)));
  }

  void progress(String token, WorkDoneProgressNotification value) {
    endpoint.notify("$/progress", new ProgressParams(Either.forLeft(token), Either.forLeft(value)));
  }

  /** Asks the client to ask again: {@code diagnostic}, {@code inlayHint}, {@code codeLens}. */
  CompletableFuture<?> refresh(String what) {
    return endpoint.request("workspace/" + what + "/refresh", null);
  }
}
