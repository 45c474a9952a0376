package dev.settlewell.assist;

import dev.settlewell.syntax.Node;
import dev.settlewell.text.Place;
import dev.settlewell.text.Span;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Kind;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.function.Predicate;
import java.util.stream.Stream;

/**
 * A piece of a sheet's tree together with what the vocabulary says it is: the tree that features
 * walk, so that each of them need not find out again which keys mean what.
 *
 * <p>{@code level} of {@code channels} is a piece whose label is a {@link Role#NAME}; its child
 * {@code sensor} is one with a {@link Role#KEY}, whose child {@code thermistor} has a {@link
 * Role#KIND}; the second channel of {@code order} is an {@link Role#ITEM} without a label.
 */
public final class Piece {
  /** What a label is. */
  public enum Role {
    /** The whole sheet. */
    ROOT,
    /** A key of the format. */
    KEY,
    /** A key that names the kind of a sensor or a stage. */
    KIND,
    /** A name the user gives here, a harmonic's number, or a finding's name. */
    NAME,
    /** An item of a list: no label. */
    ITEM,
    /** A key that the format does not know here. */
    UNKNOWN
  }

  private final Role role;
  private final Optional<Node.Scalar> label;
  private final Node value;
  private final Optional<Key> key;
  private final Optional<Kind> kind;
  private final Optional<Piece> parent;
  private final List<Piece> children = new ArrayList<>();

  Piece(
      Role role,
      Optional<Node.Scalar> label,
      Node value,
      Optional<Key> key,
      Optional<Kind> kind,
      Optional<Piece> parent) {
    this.role = role;
    this.label = label;
    this.value = value;
    this.key = key;
    this.kind = kind;
    this.parent = parent;
    parent.ifPresent(above -> above.children.add(this));
  }

  public Role role() {
    return role;
  }

  public Optional<Node.Scalar> label() {
    return label;
  }

  public Node value() {
    return value;
  }

  /** What the format says of the value: of a NAME or an ITEM what its map or list holds. */
  public Optional<Key> key() {
    return key;
  }

  /** Of a value that is one mapping of the format, however it is spelled. */
  public Optional<Kind> kind() {
    return kind;
  }

  public Optional<Piece> parent() {
    return parent;
  }

  public List<Piece> children() {
    return Collections.unmodifiableList(children);
  }

  public boolean isKey(String name) {
    return role == Role.KEY && labelText().equals(name);
  }

  public boolean isKind(String name) {
    return kind.isPresent() && kind.get().name().equals(name);
  }

  /** "" for a piece without a label. */
  public String labelText() {
    return label.map(Node.Scalar::text).orElse("");
  }

  /** The text of a scalar value; "" for everything else. */
  public String valueText() {
    return value instanceof Node.Scalar scalar ? scalar.text() : "";
  }

  /** From the label to the end of the value. */
  public Span span() {
    Place last = value.place();
    int start = label.map(scalar -> scalar.place().start()).orElse(last.start());
    int end = Math.max(last.end(), label.map(scalar -> scalar.place().end()).orElse(start));
    return new Span(Math.min(start, last.start()), end);
  }

  /** The smallest piece whose label or value the offset touches. */
  public Optional<Piece> at(int offset) {
    for (Piece child : children) {
      if (child.span().touches(offset)) {
        Optional<Piece> inner = child.at(offset);
        if (inner.isPresent()) {
          return inner;
        }
      }
    }
    boolean onLabel = label.map(scalar -> scalar.place().span().touches(offset)).orElse(false);
    boolean onScalar = value instanceof Node.Scalar && value.place().span().touches(offset);
    return onLabel || onScalar ? Optional.of(this) : Optional.empty();
  }

  public boolean isOnLabel(int offset) {
    return label.map(scalar -> scalar.place().span().touches(offset)).orElse(false);
  }

  /** This piece and those around it, from the inside out. */
  public Stream<Piece> upwards() {
    return Stream.iterate(
            Optional.of(this), Optional::isPresent, piece -> piece.flatMap(Piece::parent))
        .map(Optional::get);
  }

  /** The innermost of this and those around it. */
  public Optional<Piece> around(Predicate<Piece> wanted) {
    return upwards().filter(wanted).findFirst();
  }

  /** The named thing of a kind that this is, or is part of. */
  public Optional<String> nameAround(String kindName) {
    return around(piece -> piece.role == Role.NAME && piece.isKind(kindName)).map(Piece::labelText);
  }

  public Optional<Piece> child(String labelText) {
    return children.stream().filter(c -> c.labelText().equals(labelText)).findFirst();
  }

  /** This and everything in it, in the order of the text. */
  public Stream<Piece> all() {
    return Stream.concat(Stream.of(this), children.stream().flatMap(Piece::all));
  }
}
