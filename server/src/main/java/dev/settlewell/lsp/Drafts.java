package dev.settlewell.lsp;

import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/** All open documents, by name: immutable, so that a request reads one state of them. */
final class Drafts {
  static final Drafts NONE = new Drafts(Map.of());

  private final Map<String, Draft> byName;

  private Drafts(Map<String, Draft> byName) {
    this.byName = byName;
  }

  Optional<Draft> get(String name) {
    return Optional.ofNullable(byName.get(name));
  }

  Collection<Draft> all() {
    return byName.values();
  }

  Drafts with(Draft draft) {
    Map<String, Draft> next = new LinkedHashMap<>(byName);
    next.put(draft.name(), draft);
    return new Drafts(next);
  }

  Drafts without(String name) {
    Map<String, Draft> next = new LinkedHashMap<>(byName);
    next.remove(name);
    return new Drafts(next);
  }
}
