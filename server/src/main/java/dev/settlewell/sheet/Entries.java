package dev.settlewell.sheet;

import dev.settlewell.syntax.Node;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/** The entries of one mapping by key: the first of each, the others reported. */
record Entries(Map<String, Node.Entry> byKey) {

  static Entries of(Node.Mapping mapping, Report report) {
    Map<String, Node.Entry> byKey = new LinkedHashMap<>();
    for (Node.Entry entry : mapping.entries()) {
      String name = entry.key().text();
      Node.Entry first = byKey.putIfAbsent(name, entry);
      if (first != null) {
        report.twice(
            entry.key().place(),
            first.key().place(),
            "`" + name + "` stands twice here; only the first counts: remove one of them",
            "the first `" + name + "`");
      }
    }
    return new Entries(byKey);
  }

  Optional<Node.Entry> find(String key) {
    return Optional.ofNullable(byKey.get(key));
  }
}
