package dev.settlewell.syntax;

import dev.settlewell.text.Place;
import java.util.List;

/** A piece of the tree of a sheet. Every piece knows the stretch of text it was read from. */
public sealed interface Node {
  Place place();

  /**
   * One scalar.
   *
   * @param text its value as YAML gives it, before any typing
   * @param exact true where the characters of {@code text} stand one to one in the source from
   *     {@code place.start() + inset}; false for escapes and folded lines, where a message about a
   *     part of it must mark the whole
   * @param inset 1 inside quotes, else 0
   */
  record Scalar(String text, Place place, boolean exact, int inset) implements Node {}

  /** Keys in the order of the text; a key may stand twice, the sheet decides. */
  record Mapping(List<Entry> entries, Place place, boolean flow) implements Node {
    public Mapping {
      entries = List.copyOf(entries);
    }
  }

  record Sequence(List<Node> items, Place place, boolean flow) implements Node {
    public Sequence {
      items = List.copyOf(items);
    }
  }

  /**
   * Nothing stands where a value belongs: {@code key:} alone. The place is empty, behind the colon.
   */
  record Absent(Place place) implements Node {}

  /** Something stands here that could not be read; a problem says why. */
  record Broken(Place place) implements Node {}

  /** A key and its value. */
  record Entry(Scalar key, Node value) {
    /** From the key's first to the value's last character. */
    public Place place() {
      return new Place(
          key.place().sheet(),
          new dev.settlewell.text.Span(
              key.place().start(), Math.max(key.place().end(), value.place().end())));
    }
  }
}
