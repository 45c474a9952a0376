package dev.settlewell.assist;

import dev.settlewell.vocabulary.Key;
import dev.settlewell.vocabulary.Kind;
import dev.settlewell.vocabulary.Vocabulary;
import java.util.List;
import java.util.Optional;

/** What the format says may stand at a path of a sheet, whether or not anything stands there. */
sealed interface Meaning {
  /** Keys of a kind; a scalar or list in its place stands for its {@link Kind#shortKey()}. */
  record Keys(Kind kind) implements Meaning {}

  /** Names of the user's own, or of findings. */
  record Names(Key key) implements Meaning {}

  /** One key that names a kind. */
  record Kinds(Key key) implements Meaning {}

  record Items(Key key) implements Meaning {}

  record Value(Key key) implements Meaning {}

  /** Nothing the format knows. */
  record Unknown() implements Meaning {}

  static Meaning at(List<String> path, Vocabulary vocabulary) {
    Meaning here = new Keys(vocabulary.sheet());
    for (String step : path) {
      here = inside(here, step, vocabulary);
    }
    return here;
  }

  static Meaning of(Key key, Vocabulary vocabulary) {
    return switch (key.shape()) {
      case PART -> new Keys(vocabulary.kind(key.kind().orElseThrow()));
      case ONE_KIND -> new Kinds(key);
      case MAP -> new Names(key);
      case LIST -> new Items(key);
      default -> new Value(key);
    };
  }

  private static Meaning inside(Meaning outer, String step, Vocabulary vocabulary) {
    Optional<Meaning> inner = Optional.empty();
    if (outer instanceof Keys keys) {
      inner = inKind(keys.kind(), step, vocabulary);
    } else if (outer instanceof Names names) {
      inner = names.key().item().map(item -> of(item, vocabulary));
    } else if (outer instanceof Kinds kinds && kinds.key().kinds().contains(step)) {
      inner = vocabulary.find(step).map(Keys::new);
    } else if (outer instanceof Items items) {
      inner = items.key().item().map(item -> inList(items.key(), item, step, vocabulary));
    } else if (outer instanceof Value) {
      inner = vocabulary.longForm().key(step).map(key -> of(key, vocabulary));
    }
    return inner.orElse(new Unknown());
  }

  /** A number steps into {@code [A, B]}: of a kind's columns, or of the list it is short for. */
  private static Optional<Meaning> inKind(Kind kind, String step, Vocabulary vocabulary) {
    Optional<Meaning> key = kind.key(step).map(k -> of(k, vocabulary));
    if (key.isPresent() || !step.matches("[0-9]+")) {
      return key;
    }
    int index = Integer.parseInt(step);
    if (index < kind.columns().size()) {
      return kind.key(kind.columns().get(index)).map(k -> of(k, vocabulary));
    }
    return kind.shortKey().flatMap(kind::key).flatMap(Key::item).map(item -> of(item, vocabulary));
  }

  /** Where a list may be written as a mapping, a name steps to the value beside it. */
  private static Meaning inList(Key list, Key item, String step, Vocabulary vocabulary) {
    if (!step.matches("[0-9]+") && list.entries().size() == 2) {
      return item.kind()
          .flatMap(vocabulary::find)
          .flatMap(kind -> kind.key(list.entries().get(1)))
          .map(key -> of(key, vocabulary))
          .orElse(new Unknown());
    }
    return of(item, vocabulary);
  }
}
