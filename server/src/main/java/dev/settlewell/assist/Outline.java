package dev.settlewell.assist;

import dev.settlewell.syntax.Node;
import dev.settlewell.syntax.SyntaxTree;
import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Kind;
import dev.settlewell.vocabulary.Shape;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.List;
import java.util.Optional;

/** Lays the vocabulary over a tree: see {@link Piece}. */
public final class Outline {
  private final Vocabulary vocabulary;

  private Outline(Vocabulary vocabulary) {
    this.vocabulary = vocabulary;
  }

  public static Piece of(SyntaxTree tree, Vocabulary vocabulary) {
    Piece root =
        new Piece(
            Piece.Role.ROOT,
            Optional.empty(),
            tree.root(),
            Optional.empty(),
            Optional.of(vocabulary.sheet()),
            Optional.empty());
    new Outline(vocabulary).mapping(root, vocabulary.sheet(), tree.root());
    return root;
  }

  private void mapping(Piece piece, Kind kind, Node.Mapping mapping) {
    for (Node.Entry entry : mapping.entries()) {
      Optional<Key> key = kind.key(entry.key().text());
      entry(key.isPresent() ? Piece.Role.KEY : Piece.Role.UNKNOWN, entry, key, piece);
    }
  }

  private void entry(Piece.Role role, Node.Entry entry, Optional<Key> key, Piece parent) {
    Node value = entry.value();
    Piece piece =
        new Piece(
            role,
            Optional.of(entry.key()),
            value,
            key,
            key.flatMap(this::kindOf),
            Optional.of(parent));
    inside(piece, key, value);
  }

  private Optional<Kind> kindOf(Key key) {
    return key.shape() == Shape.PART ? key.kind().flatMap(vocabulary::find) : Optional.empty();
  }

  /** What stands in a value, as its key says. */
  private void inside(Piece piece, Optional<Key> key, Node value) {
    if (key.isEmpty()) {
      unknown(piece, value);
      return;
    }
    switch (key.get().shape()) {
      case PART -> part(piece, vocabulary.kind(key.get().kind().orElseThrow()), value);
      case ONE_KIND -> oneKind(piece, key.get(), value);
      case MAP -> map(piece, key.get(), value);
      case LIST -> list(piece, key.get(), value);
      default -> {
        if (value instanceof Node.Mapping mapping) {
          mapping(piece, vocabulary.longForm(), mapping);
        }
      }
    }
  }

  private void part(Piece piece, Kind kind, Node value) {
    if (value instanceof Node.Mapping mapping) {
      mapping(piece, kind, mapping);
    } else if (value instanceof Node.Sequence sequence && kind.columns().isEmpty()) {
      kind.shortKey().flatMap(kind::key).ifPresent(key -> list(piece, key, sequence));
    } else if (value instanceof Node.Sequence sequence) {
      for (int i = 0; i < sequence.items().size(); i++) {
        String column = i < kind.columns().size() ? kind.columns().get(i) : "";
        item(piece, kind.key(column), sequence.items().get(i));
      }
    }
  }

  private void oneKind(Piece piece, Key key, Node value) {
    if (!(value instanceof Node.Mapping mapping)) {
      return;
    }
    for (Node.Entry entry : mapping.entries()) {
      Optional<Kind> kind =
          Optional.of(entry.key().text()).filter(key.kinds()::contains).flatMap(vocabulary::find);
      Piece stage =
          new Piece(
              kind.isPresent() ? Piece.Role.KIND : Piece.Role.UNKNOWN,
              Optional.of(entry.key()),
              entry.value(),
              Optional.empty(),
              kind,
              Optional.of(piece));
      kind.ifPresentOrElse(k -> part(stage, k, entry.value()), () -> unknown(stage, entry.value()));
    }
  }

  private void map(Piece piece, Key key, Node value) {
    if (value instanceof Node.Mapping mapping) {
      for (Node.Entry entry : mapping.entries()) {
        entry(Piece.Role.NAME, entry, key.item(), piece);
      }
    }
  }

  private void list(Piece piece, Key key, Node value) {
    if (value instanceof Node.Sequence sequence) {
      for (Node item : sequence.items()) {
        item(piece, key.item(), item);
      }
    } else if (value instanceof Node.Mapping mapping && !key.entries().isEmpty()) {
      Optional<Kind> kind = key.item().flatMap(this::kindOf);
      for (Node.Entry entry : mapping.entries()) {
        entry(Piece.Role.NAME, entry, kind.flatMap(k -> k.key(key.entries().get(1))), piece);
      }
    } else if (value instanceof Node.Mapping mapping) {
      unknown(piece, mapping);
    }
  }

  private void item(Piece parent, Optional<Key> key, Node value) {
    Piece piece =
        new Piece(
            Piece.Role.ITEM,
            Optional.empty(),
            value,
            key,
            key.flatMap(this::kindOf),
            Optional.of(parent));
    inside(piece, key, value);
  }

  private void unknown(Piece piece, Node value) {
    if (value instanceof Node.Mapping mapping) {
      for (Node.Entry entry : mapping.entries()) {
        entry(Piece.Role.UNKNOWN, entry, Optional.empty(), piece);
      }
    } else if (value instanceof Node.Sequence sequence) {
      for (Node item : List.copyOf(sequence.items())) {
        item(piece, Optional.empty(), item);
      }
    }
  }
}
