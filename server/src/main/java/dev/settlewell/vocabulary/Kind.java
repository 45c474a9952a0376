package dev.settlewell.vocabulary;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * One kind of mapping: the sheet itself, a converter, a thermistor, a stage of a path.
 *
 * @param keys in the schema's order, by name
 * @param shortKey the key that a scalar (or a list) in the mapping's place stands for: {@code
 *     thermocouple: K} is {@code thermocouple: {type: K}}
 * @param columns the keys that the items of a list in the mapping's place stand for
 * @param computed false for a kind that is read and not computed with yet
 */
public record Kind(
    String name,
    Map<String, Key> keys,
    Optional<String> shortKey,
    List<String> columns,
    boolean computed,
    String doc,
    List<String> examples) {
  public Kind {
    keys = Collections.unmodifiableMap(new LinkedHashMap<>(keys));
    columns = List.copyOf(columns);
    examples = List.copyOf(examples);
  }

  public Optional<Key> key(String name) {
    return Optional.ofNullable(keys.get(name));
  }

  /** True where nothing has to be said: {@code voltage:} alone is a whole sensor. */
  public boolean mayBeEmpty() {
    return shortKey.isEmpty()
        && columns.isEmpty()
        && keys.values().stream().noneMatch(Key::required);
  }
}
