package dev.settlewell.lsp;

import dev.settlewell.lsp.wire.FrameReader;
import dev.settlewell.lsp.wire.FrameWriter;
import dev.settlewell.workspace.DiskReader;
import java.io.BufferedInputStream;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.file.Path;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.List;
import java.util.concurrent.CompletableFuture;

/** The language server: one client over one pair of streams, from first to last message. */
public final class Server {
  private static final long LARGEST_MESSAGE = 64L << 20;
  private static final int DEEPEST_NESTING = 128;

  private Server() {}

  /**
   * Serves until the client says {@code exit}, closes the stream, dies or no longer reads.
   *
   * @param version what the client is told of this program
   * @return the exit code of the process: 0 after {@code shutdown}, else 1
   */
  public static int run(InputStream in, OutputStream out, String version) {
    DiskReader files = new DiskReader(Path.of("").toAbsolutePath());
    return run(in, out, version, new SheetDesk(files, () -> LocalDate.now(ZoneOffset.UTC)));
  }

  static int run(InputStream in, OutputStream out, String version, Desk desk) {
    CompletableFuture<Integer> end = new CompletableFuture<>();
    Session session = new Session(new Client(), desk);
    Publisher publisher = new Publisher(session);
    List<Feature> features = features(session);
    Methods methods = new Methods(session);
    new LifeCycle(session, features, version, () -> end.complete(1)).register(methods);
    new TextSync(session, publisher).register(methods);
    new WorkspaceSync(session, publisher).register(methods);
    features.forEach(feature -> feature.register(methods));
    Connection connection =
        new Connection(
            new FrameReader(new BufferedInputStream(in), LARGEST_MESSAGE, DEEPEST_NESTING),
            new FrameWriter(out, () -> end.complete(1)),
            methods,
            session);
    read(connection, end);
    int code = end.join();
    session.worker().close();
    return code;
  }

  /** Every feature, in the order of the protocol's pages. */
  private static List<Feature> features(Session session) {
    return List.of(
        new NavigationFeature(),
        new LinkFeature(),
        new HoverFeature(),
        new LensFeature(),
        new FoldingFeature(),
        new SelectionFeature(),
        new SymbolFeature(),
        new TokenFeature(),
        new HintFeature(),
        new CompletionFeature(),
        new PullFeature(session),
        new CodeActionFeature(),
        new FormattingFeature(),
        new RenameFeature());
  }

  private static void read(Connection connection, CompletableFuture<Integer> end) {
    Runnable work =
        () -> {
          try {
            end.complete(connection.read());
          } finally {
            end.complete(1);
          }
        };
    Thread reader = new Thread(work, "reader");
    reader.setDaemon(true);
    reader.start();
  }
}
