package dev.settlewell.lsp;

import java.util.Set;
import java.util.concurrent.CancellationException;
import java.util.concurrent.CompletionException;
import java.util.concurrent.ConcurrentHashMap;
import org.eclipse.lsp4j.MessageType;
import org.eclipse.lsp4j.jsonrpc.ResponseErrorException;
import org.eclipse.lsp4j.jsonrpc.messages.ResponseError;
import org.eclipse.lsp4j.jsonrpc.messages.ResponseErrorCode;

/** Mistakes of this program itself: each is told once, and never breaks anything else. */
final class Faults {
  private final Client client;
  private final Set<String> told = ConcurrentHashMap.newKeySet();

  Faults(Client client) {
    this.client = client;
  }

  void report(String where, Throwable thrown) {
    Throwable fault = cause(thrown);
    if (fault instanceof CancellationException) {
      return;
    }
    String what = describe(fault);
    if (!told.add(where + what)) {
      return;
    }
    System.err.println("internal fault in " + where);
    fault.printStackTrace(System.err);
    client.log(
        MessageType.Error,
        "Settlewell made a mistake in "
            + where
            + ": "
            + what
            + ". Everything else goes on. Please report this text together with the sheet.");
  }

  /** What a request that failed is answered: no stack trace, no class names of ours in the data. */
  ResponseError answer(String method, Throwable thrown) {
    Throwable fault = cause(thrown);
    if (fault instanceof ResponseErrorException refused) {
      return refused.getResponseError();
    }
    report(method, fault);
    return new ResponseError(ResponseErrorCode.InternalError, "internal fault in " + method, null);
  }

  static String describe(Throwable fault) {
    StackTraceElement[] trace = fault.getStackTrace();
    String at = trace.length == 0 ? "" : " at " + trace[0];
    return fault.getClass().getSimpleName()
        + (fault.getMessage() == null ? "" : " (" + fault.getMessage() + ")")
        + at;
  }

  private static Throwable cause(Throwable thrown) {
    return thrown instanceof CompletionException && thrown.getCause() != null
        ? cause(thrown.getCause())
        : thrown;
  }
}
