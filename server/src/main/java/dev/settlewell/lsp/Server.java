package dev.settlewell.lsp;

import dev.settlewell.lsp.wire.FrameReader;
import dev.settlewell.lsp.wire.FrameWriter;
import java.io.BufferedInputStream;
import java.io.InputStream;
import java.io.OutputStream;
import java.util.concurrent.CompletableFuture;

/** The language server: one client over one pair of streams, from first to last message. */
public final class Server {
  private static final long LARGEST_MESSAGE = 64L << 20;
  private static final int DEEPEST_NESTING = 128;

  private Server() {}

  public static int run(InputStream in, OutputStream out, String version) {
    return run(in, out, version, (name, open) -> java.util.Optional.empty());
  }

  /**
   * Serves until the client says {@code exit}, closes the stream, dies or no longer reads.
   *
   * @return the exit code of the process: 0 after {@code shutdown}, else 1
   */
  static int run(InputStream in, OutputStream out, String version, Desk desk) {
    CompletableFuture<Integer> end = new CompletableFuture<>();
    Session session = new Session(new Client(), desk);
    Publisher publisher = new Publisher(session);
    Methods methods = new Methods(session);
    new LifeCycle(session, version, () -> end.complete(1)).register(methods);
    new TextSync(session, publisher).register(methods);
    Connection connection =
        new Connection(
            new FrameReader(new BufferedInputStream(in), LARGEST_MESSAGE, DEEPEST_NESTING),
            new FrameWriter(out, () -> end.complete(1)),
            methods,
            session);
    Thread reader =
        new Thread(
            () -> {
              try {
                end.complete(connection.read());
              } finally {
                end.complete(1);
              }
            },
            "reader");
    reader.setDaemon(true);
    reader.start();
    int code = end.join();
    session.worker().close();
    return code;
  }
}
