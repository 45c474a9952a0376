package dev.settlewell.lsp;

import static org.assertj.core.api.Assertions.assertThat;

import com.google.gson.Gson;
import com.google.gson.JsonArray;
import com.google.gson.JsonElement;
import com.google.gson.JsonNull;
import com.google.gson.JsonObject;
import com.google.gson.JsonParser;
import java.io.BufferedInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.channels.Channels;
import java.nio.channels.Pipe;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.TimeUnit;
import java.util.function.Predicate;

/**
 * Speaks raw messages to a server in this process, and insists that every message the server sends
 * is one that a test asked for: what is left over at the end fails it.
 */
final class FakeClient implements AutoCloseable {
  private static final Gson GSON = new Gson().newBuilder().serializeNulls().create();
  private static final int PATIENCE_SECONDS = 20;

  private final OutputStream toServer;
  private final LinkedBlockingQueue<JsonObject> inbox = new LinkedBlockingQueue<>();
  private final List<JsonObject> putBack = new ArrayList<>();
  private final CompletableFuture<Integer> exitCode = new CompletableFuture<>();
  private final List<String> uncertain = new ArrayList<>();
  private final CountDownLatch collected = new CountDownLatch(1);
  private int nextId = 1;

  FakeClient(Desk desk) {
    try {
      Pipe in = Pipe.open();
      Pipe out = Pipe.open();
      toServer = Channels.newOutputStream(in.sink());
      InputStream fromServer = new BufferedInputStream(Channels.newInputStream(out.source()));
      start("server", () -> serve(Channels.newInputStream(in.source()), out.sink(), desk));
      start("client", () -> collect(fromServer));
    } catch (IOException e) {
      throw new AssertionError(e);
    }
  }

  private void serve(InputStream in, Pipe.SinkChannel out, Desk desk) {
    int code = Server.run(in, Channels.newOutputStream(out), "test", desk);
    try {
      out.close();
    } catch (IOException e) {
      throw new AssertionError(e);
    }
    exitCode.complete(code);
  }

  private static void start(String name, Runnable work) {
    Thread thread = new Thread(work, name);
    thread.setDaemon(true);
    thread.start();
  }

  private void awaitEndOfStream() {
    try {
      assertThat(collected.await(PATIENCE_SECONDS, TimeUnit.SECONDS)).isTrue();
    } catch (InterruptedException e) {
      throw new AssertionError(e);
    }
  }

  private void collect(InputStream in) {
    try {
      while (true) {
        int length = -1;
        for (String line = line(in); !line.isEmpty(); line = line(in)) {
          length = Integer.parseInt(line.substring(line.indexOf(':') + 1).trim());
        }
        String body = new String(in.readNBytes(length), StandardCharsets.UTF_8);
        inbox.add(JsonParser.parseString(body).getAsJsonObject());
      }
    } catch (IOException | NumberFormatException ended) {
      // The server is gone; what is missing is missed where it is awaited.
    } finally {
      collected.countDown();
    }
  }

  private static String line(InputStream in) throws IOException {
    StringBuilder line = new StringBuilder();
    for (int b = in.read(); b != '\n'; b = in.read()) {
      if (b < 0) {
        throw new IOException("end");
      }
      line.append((char) b);
    }
    return line.toString().trim();
  }

  void raw(String bytes) {
    try {
      toServer.write(bytes.getBytes(StandardCharsets.UTF_8));
      toServer.flush();
    } catch (IOException e) {
      throw new AssertionError(e);
    }
  }

  void send(Object message) {
    String body = GSON.toJson(message);
    raw("Content-Length: " + body.getBytes(StandardCharsets.UTF_8).length + "\r\n\r\n" + body);
  }

  int request(String method, Object params) {
    int id = nextId++;
    send(Map.of("jsonrpc", "2.0", "id", id, "method", method, "params", params));
    return id;
  }

  void tell(String method, Object params) {
    send(Map.of("jsonrpc", "2.0", "method", method, "params", params));
  }

  void reply(JsonObject request, Object result) {
    JsonObject response = new JsonObject();
    response.addProperty("jsonrpc", "2.0");
    response.add("id", request.get("id"));
    response.add("result", GSON.toJsonTree(result));
    send(response);
  }

  /** Sends a request and gives its result. */
  JsonElement ask(String method, Object params) {
    JsonObject response = response(request(method, params));
    assertThat(response.has("error")).as(response.toString()).isFalse();
    return response.has("result") ? response.get("result") : JsonNull.INSTANCE;
  }

  JsonObject response(int id) {
    return await(
        "answer " + id,
        m -> m.has("id") && !m.has("method") && m.get("id").equals(GSON.toJsonTree(id)));
  }

  int errorOf(int id) {
    return response(id).getAsJsonObject("error").get("code").getAsInt();
  }

  /** The next notification or request of this method. */
  JsonObject said(String method) {
    return await(method, m -> m.has("method") && m.get("method").getAsString().equals(method));
  }

  JsonObject await(String what, Predicate<JsonObject> wanted) {
    for (JsonObject earlier : putBack) {
      if (wanted.test(earlier)) {
        putBack.remove(earlier);
        return earlier;
      }
    }
    try {
      while (true) {
        JsonObject next = inbox.poll(PATIENCE_SECONDS, TimeUnit.SECONDS);
        if (next == null) {
          throw new AssertionError("never came: " + what + "; came: " + putBack);
        }
        if (wanted.test(next)) {
          return next;
        }
        putBack.add(next);
      }
    } catch (InterruptedException e) {
      throw new AssertionError(e);
    }
  }

  JsonObject initialize(Object capabilities) {
    return initializeWith(Map.of("capabilities", capabilities));
  }

  JsonObject initializeWith(Map<String, ?> params) {
    JsonObject result = ask("initialize", params).getAsJsonObject();
    tell("initialized", Map.of());
    return result;
  }

  void open(String uri, String text) {
    tell(
        "textDocument/didOpen",
        Map.of(
            "textDocument", Map.of("uri", uri, "languageId", "yaml", "version", 1, "text", text)));
  }

  /** Each change is {@code {range, text}} or {@code {text}}. */
  void change(String uri, int version, Object... changes) {
    tell(
        "textDocument/didChange",
        Map.of(
            "textDocument",
            Map.of("uri", uri, "version", version),
            "contentChanges",
            List.of(changes)));
  }

  void closeDocument(String uri) {
    tell("textDocument/didClose", Map.of("textDocument", Map.of("uri", uri)));
  }

  static Map<String, Object> edit(int line, int from, int toLine, int to, String text) {
    return Map.of("range", range(line, from, toLine, to), "text", text);
  }

  static Map<String, Object> range(int line, int from, int toLine, int to) {
    return Map.of(
        "start", Map.of("line", line, "character", from),
        "end", Map.of("line", toLine, "character", to));
  }

  /** The next published list: {@code uri}, {@code version}, {@code diagnostics}. */
  JsonObject published() {
    return said("textDocument/publishDiagnostics").getAsJsonObject("params");
  }

  JsonArray findings() {
    return published().getAsJsonArray("diagnostics");
  }

  int exitCode() {
    try {
      return exitCode.get(PATIENCE_SECONDS, TimeUnit.SECONDS);
    } catch (Exception e) {
      throw new AssertionError("the server does not end", e);
    }
  }

  /** Where it is not certain how often something is said. */
  void drop(String method) {
    awaitEndOfStream();
    inbox.removeIf(m -> m.has("method") && m.get("method").getAsString().equals(method));
  }

  /** Where it is not certain whether something is said before the end. */
  void drainAtEnd(String method) {
    uncertain.add(method);
  }

  void endOfStream() {
    try {
      toServer.close();
    } catch (IOException e) {
      throw new AssertionError(e);
    }
  }

  /** Ends the session as a well-behaved client does, and looks for what nobody asked for. */
  @Override
  public void close() {
    if (!exitCode.isDone()) {
      ask("shutdown", JsonNull.INSTANCE);
      tell("exit", JsonNull.INSTANCE);
      assertThat(exitCode()).isZero();
    }
    awaitEndOfStream();
    inbox.drainTo(putBack);
    putBack.removeIf(m -> m.has("method") && uncertain.contains(m.get("method").getAsString()));
    assertThat(putBack).as("messages that nobody asked for").isEmpty();
  }
}
