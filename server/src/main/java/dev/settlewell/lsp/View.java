package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import dev.settlewell.text.SourceText;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/** One state of everything a request may read. It never changes, so an answer fits together. */
record View(Abilities abilities, Settings settings, Drafts drafts, Desk desk) {

  /** Empty where the client does not know the document, or both no longer agree on its text. */
  Optional<Checked> checked(String uri) {
    String name = Uris.name(uri);
    boolean lost = drafts.get(name).map(draft -> draft.text().isEmpty()).orElse(false);
    return lost || !isSheet(name) ? Optional.empty() : desk.check(name, open());
  }

  Map<String, SourceText> open() {
    Map<String, SourceText> open = new LinkedHashMap<>();
    for (Draft draft : drafts.all()) {
      draft.text().ifPresent(text -> open.put(draft.name(), text));
    }
    return open;
  }

  /** The URI of a sheet: as its client spells it where it is open. */
  String uri(String name) {
    return drafts.get(name).map(Draft::uri).orElseGet(() -> Uris.uri(name));
  }

  /** Editors attach a server to whole languages; only channel sheets are ours, by their name. */
  static boolean isSheet(String name) {
    return name.endsWith(".channels.yaml") || name.endsWith(".channels.yml");
  }

  View with(Drafts other) {
    return new View(abilities, settings, other, desk);
  }

  View with(Abilities other) {
    return new View(other, settings, drafts, desk);
  }

  View with(Settings other) {
    return new View(abilities, other, drafts, desk);
  }
}
