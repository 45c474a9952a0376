package dev.settlewell.vocabulary;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/**
 * The format's keys and kinds, as {@code schema/channels.schema.json} lists them: what the binder
 * reads a sheet by, and what completion and hover tell of it.
 */
public final class Vocabulary {
  /** The kind of the sheet's top level. */
  public static final String SHEET = "sheet";

  /** The kind that holds the pieces of a long form: {@code value}, {@code tolerance}, … */
  public static final String LONG_FORM = "long-form";

  private final Map<String, Kind> kinds;

  Vocabulary(Map<String, Kind> kinds) {
    this.kinds = Collections.unmodifiableMap(new LinkedHashMap<>(kinds));
  }

  /** Reads the schema that the jar holds. Immutable: load it once and pass it on. */
  public static Vocabulary load() {
    return new SchemaReader().read();
  }

  /** Every kind by name, in the schema's order, the sheet first. */
  public Map<String, Kind> kinds() {
    return kinds;
  }

  public Optional<Kind> find(String kind) {
    return Optional.ofNullable(kinds.get(kind));
  }

  /**
   * @throws IllegalArgumentException for a kind the schema does not have: a mistake in the program
   */
  public Kind kind(String name) {
    return find(name)
        .orElseThrow(() -> new IllegalArgumentException("the schema has no kind " + name));
  }

  public Kind sheet() {
    return kind(SHEET);
  }

  public Kind longForm() {
    return kind(LONG_FORM);
  }
}
