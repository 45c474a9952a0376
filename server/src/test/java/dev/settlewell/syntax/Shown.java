package dev.settlewell.syntax;

import dev.settlewell.text.Place;
import dev.settlewell.text.SourceText;

/** A tree as one line of text, with the stretch each piece claims: what tests compare. */
final class Shown {
  private Shown() {}

  /** Keys and values only: {@code {a: x, b: [y, z], c: ?, d: !}}; absent ?, broken !. */
  static String values(Node node) {
    StringBuilder out = new StringBuilder();
    show(node, out, null);
    return out.toString();
  }

  /** As {@link #values}, each value with the text its place covers, in {@code ‹›}. */
  static String places(SourceText text, Node node) {
    StringBuilder out = new StringBuilder();
    show(node, out, text);
    return out.toString();
  }

  private static void show(Node node, StringBuilder out, SourceText text) {
    if (node instanceof Node.Scalar scalar) {
      out.append(scalar.text());
    } else if (node instanceof Node.Absent) {
      out.append('?');
    } else if (node instanceof Node.Broken) {
      out.append('!');
    } else if (node instanceof Node.Sequence sequence) {
      out.append('[');
      String gap = "";
      for (Node item : sequence.items()) {
        out.append(gap);
        show(item, out, text);
        gap = ", ";
      }
      out.append(']');
    } else if (node instanceof Node.Mapping mapping) {
      out.append('{');
      String gap = "";
      for (Node.Entry entry : mapping.entries()) {
        out.append(gap);
        show(entry.key(), out, text);
        out.append(": ");
        show(entry.value(), out, text);
        gap = ", ";
      }
      out.append('}');
    }
    if (text != null) {
      Place place = node.place();
      out.append('‹').append(text.slice(place.span())).append('›');
    }
  }
}
