package dev.settlewell.lsp.wire;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;

/**
 * Writes frames, one at a time whatever thread they come from. A write that fails means that nobody
 * listens any more: it is told once, and later frames are dropped.
 */
public final class FrameWriter {
  private final OutputStream out;
  private final Runnable onFailure;
  private boolean failed;

  public FrameWriter(OutputStream out, Runnable onFailure) {
    this.out = out;
    this.onFailure = onFailure;
  }

  public synchronized void write(String json) {
    if (failed) {
      return;
    }
    byte[] body = json.getBytes(StandardCharsets.UTF_8);
    String header = "Content-Length: " + body.length + "\r\n\r\n";
    try {
      out.write(header.getBytes(StandardCharsets.US_ASCII));
      out.write(body);
      out.flush();
    } catch (IOException nobodyListens) {
      failed = true;
      onFailure.run();
    }
  }
}
