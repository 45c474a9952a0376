package dev.settlewell.lsp;

import org.eclipse.lsp4j.ServerCapabilities;

/** One thing the server does for an editor: the methods of it, and the announcement of it. */
interface Feature {
  void register(Methods methods);

  void announce(ServerCapabilities server, Abilities client);
}
