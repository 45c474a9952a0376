package dev.settlewell.channel;

import java.util.Collection;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Figures by name, in the order they are reported. */
public final class Figures {
  public static final Figures EMPTY = new Figures(List.of());

  private final Map<String, Figure> byName;

  public Figures(Collection<Figure> figures) {
    Map<String, Figure> map = new LinkedHashMap<>();
    for (Figure figure : figures) {
      map.put(figure.name(), figure);
    }
    this.byName = Collections.unmodifiableMap(map);
  }

  public Optional<Figure> get(String name) {
    return Optional.ofNullable(byName.get(name));
  }

  /** The value, where the figure exists and has one. */
  public OptionalDouble value(String name) {
    Figure figure = byName.get(name);
    return figure == null ? OptionalDouble.empty() : figure.value();
  }

  public Collection<Figure> all() {
    return byName.values();
  }
}
