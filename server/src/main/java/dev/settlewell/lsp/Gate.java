package dev.settlewell.lsp;

import java.util.Optional;
import java.util.Set;
import org.eclipse.lsp4j.jsonrpc.messages.ResponseError;
import org.eclipse.lsp4j.jsonrpc.messages.ResponseErrorCode;

/** What may be said when: the life of a server as the protocol lays it down. */
final class Gate {
  private static final int NOT_INITIALIZED = -32002;

  private enum Stage {
    NEW,
    RUNNING,
    SHUT_DOWN
  }

  private final Set<String> requests;
  private Stage stage = Stage.NEW;

  Gate(Set<String> requests) {
    this.requests = requests;
  }

  /** Why this request is not answered now; empty where it is. */
  Optional<ResponseError> refuse(String method) {
    if (stage == Stage.SHUT_DOWN) {
      return error(ResponseErrorCode.InvalidRequest.getValue(), "after shutdown only exit follows");
    }
    if (method.equals("initialize")) {
      if (stage == Stage.RUNNING) {
        return error(ResponseErrorCode.InvalidRequest.getValue(), "initialize came before");
      }
      stage = Stage.RUNNING;
      return Optional.empty();
    }
    if (stage == Stage.NEW) {
      return error(NOT_INITIALIZED, "initialize comes first");
    }
    if (!requests.contains(method)) {
      return error(ResponseErrorCode.MethodNotFound.getValue(), "no such method: " + method);
    }
    if (method.equals("shutdown")) {
      stage = Stage.SHUT_DOWN;
    }
    return Optional.empty();
  }

  boolean passesNotifications() {
    return stage == Stage.RUNNING;
  }

  boolean isShutDown() {
    return stage == Stage.SHUT_DOWN;
  }

  private static Optional<ResponseError> error(int code, String message) {
    return Optional.of(new ResponseError(code, message, null));
  }
}
