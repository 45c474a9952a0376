package dev.settlewell.lsp.wire;

import java.io.IOException;

/** The stream no longer tells where a message begins: nothing after it can be trusted. */
public final class BrokenFraming extends IOException {
  BrokenFraming(String message) {
    super(message);
  }
}
