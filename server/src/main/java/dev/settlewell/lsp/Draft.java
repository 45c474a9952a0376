package dev.settlewell.lsp;

import dev.settlewell.text.SourceText;
import java.util.Optional;

/**
 * A document as its editor holds it. A new version is a new draft.
 *
 * @param uri as the client spells it, to be used when speaking to it
 * @param version as the client counts, null where it does not; only ever handed back
 * @param text empty once client and server no longer agree on it, until the client sends all of it
 */
record Draft(String uri, String name, Integer version, Optional<SourceText> text) {

  static Draft of(String uri, Integer version, String content) {
    String name = Uris.name(uri);
    return new Draft(uri, name, version, Optional.of(SourceText.of(name, content)));
  }
}
