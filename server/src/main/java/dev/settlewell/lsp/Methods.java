package dev.settlewell.lsp;

import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Set;
import java.util.concurrent.CancellationException;
import java.util.concurrent.CompletableFuture;
import java.util.function.Consumer;
import java.util.function.Function;
import org.eclipse.lsp4j.jsonrpc.CancelChecker;
import org.eclipse.lsp4j.jsonrpc.Endpoint;
import org.eclipse.lsp4j.jsonrpc.ResponseErrorException;
import org.eclipse.lsp4j.jsonrpc.json.JsonRpcMethod;
import org.eclipse.lsp4j.jsonrpc.messages.ResponseError;
import org.eclipse.lsp4j.jsonrpc.messages.ResponseErrorCode;

/** The methods this server has: an explicit table, so that what is not in it is known not to be. */
final class Methods implements Endpoint {

  /** Answers one request from the state of things at the moment the request came in. */
  interface Answer<P, R> {
    R answer(P params, View view, CancelChecker cancel);
  }

  private final Map<String, JsonRpcMethod> signatures = new LinkedHashMap<>();
  private final Map<String, Function<Object, CompletableFuture<?>>> requests = new HashMap<>();
  private final Map<String, Consumer<Object>> notifications = new HashMap<>();
  private final Session session;

  Methods(Session session) {
    this.session = session;
  }

  /** A request that is computed on the worker. */
  <P, R> void request(String method, Class<P> params, Answer<P, R> answer) {
    signatures.put(method, JsonRpcMethod.request(method, Object.class, params));
    requests.put(
        method,
        given -> {
          P typed = present(method, params.cast(given));
          View view = session.view();
          return session.worker().submit(cancel -> guarded(method, answer, typed, view, cancel));
        });
  }

  private <P, R> R guarded(
      String method, Answer<P, R> answer, P params, View view, CancelChecker cancel) {
    try {
      return answer.answer(params, view, cancel);
    } catch (CancellationException | ResponseErrorException meant) {
      throw meant;
    } catch (RuntimeException | StackOverflowError fault) {
      session.faults().report(method, fault);
      throw new ResponseErrorException(
          new ResponseError(ResponseErrorCode.InternalError, "internal fault in " + method, null));
    }
  }

  private static <P> P present(String method, P params) {
    if (params == null) {
      throw new ResponseErrorException(
          new ResponseError(ResponseErrorCode.InvalidParams, method + " has parameters", null));
    }
    return params;
  }

  /** A request that is answered at once, in the order of the stream. */
  <P, R> void immediate(String method, Class<P> params, Function<P, R> answer) {
    signatures.put(method, JsonRpcMethod.request(method, Object.class, params));
    requests.put(
        method,
        given ->
            CompletableFuture.completedFuture(answer.apply(present(method, params.cast(given)))));
  }

  /** A request without parameters that is answered at once. */
  <R> void immediate(String method, java.util.function.Supplier<R> answer) {
    signatures.put(method, JsonRpcMethod.request(method, Object.class));
    requests.put(method, given -> CompletableFuture.completedFuture(answer.get()));
  }

  /** A notification; all are taken in the order of the stream. */
  <P> void notification(String method, Class<P> params, Consumer<P> taker) {
    signatures.put(method, JsonRpcMethod.notification(method, params));
    notifications.put(
        method,
        given -> {
          if (given != null) {
            taker.accept(params.cast(given));
          }
        });
  }

  void notification(String method, Runnable taker) {
    signatures.put(method, JsonRpcMethod.notification(method));
    notifications.put(method, given -> taker.run());
  }

  Map<String, JsonRpcMethod> signatures() {
    return signatures;
  }

  Set<String> requests() {
    return requests.keySet();
  }

  @Override
  public CompletableFuture<?> request(String method, Object params) {
    return requests.get(method).apply(params);
  }

  @Override
  public void notify(String method, Object params) {
    Consumer<Object> taker = notifications.get(method);
    if (taker == null) {
      return;
    }
    try {
      taker.accept(params);
    } catch (RuntimeException fault) {
      session.faults().report(method, fault);
    }
  }
}
