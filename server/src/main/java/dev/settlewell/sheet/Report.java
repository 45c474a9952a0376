package dev.settlewell.sheet;

import dev.settlewell.syntax.Node;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import dev.settlewell.text.Related;
import dev.settlewell.text.Span;
import dev.settlewell.unit.Flaw;
import dev.settlewell.vocabulary.Nearest;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/** Gathers the problems of one sheet while it is bound. */
final class Report {
  private final List<Problem> problems = new ArrayList<>();

  void add(Problem problem) {
    problems.add(problem);
  }

  void add(Problem.Kind kind, Place place, String message, Fix... fixes) {
    problems.add(new Problem(kind, place, message, fixes));
  }

  void twice(Place second, Place first, String message, String ofFirst) {
    problems.add(
        new Problem(
            Problem.Kind.DUPLICATE_NAME,
            second,
            message,
            List.of(new Related(first, ofFirst)),
            List.of()));
  }

  /** A word that is none of {@code known}: names the nearest, or all where they are few. */
  void unknown(
      Problem.Kind kind, Place place, String written, String statement, Collection<String> known) {
    Optional<String> nearest = Nearest.of(written, known);
    if (nearest.isPresent()) {
      String word = nearest.get();
      add(kind, place, statement + "; did you mean `" + word + "`?", replace(place, word));
    } else if (!known.isEmpty() && known.size() <= 12) {
      add(kind, place, statement + "; there is `" + String.join("`, `", known) + "`");
    } else {
      add(kind, place, statement);
    }
  }

  /** A flaw of a value's text, at its exact characters where these can be told. */
  void flaw(Node.Scalar scalar, Flaw flaw) {
    Place whole = scalar.place();
    if (!scalar.exact()) {
      add(flaw.kind(), whole, flaw.message());
      return;
    }
    int start = whole.start() + scalar.inset();
    Place at = new Place(whole.sheet(), new Span(start + flaw.from(), start + flaw.to()));
    String faulty = scalar.text().substring(flaw.from(), flaw.to());
    List<Fix> fixes =
        flaw.spellings().stream()
            .map(
                spelling -> {
                  // A long form is a mapping: inside quotes it would stay a text.
                  Place mended = spelling.startsWith("{") ? whole : at;
                  String title =
                      spelling.isBlank() ? "remove `" + faulty.strip() + "`" : title(spelling);
                  return new Fix(title, List.of(new Edit(mended, spelling)), flaw.safe());
                })
            .toList();
    // An insertion has no characters of its own to mark.
    Place marked = flaw.from() == flaw.to() ? whole : at;
    problems.add(new Problem(flaw.kind(), marked, flaw.message(), List.of(), fixes));
  }

  static Fix replace(Place place, String with) {
    return new Fix(title(with), List.of(new Edit(place, with)), false);
  }

  private static String title(String written) {
    return "write `" + written.strip() + "`";
  }

  /** In the order of the text. */
  List<Problem> sorted() {
    List<Problem> sorted = new ArrayList<>(problems);
    sorted.sort(Comparator.comparingInt(problem -> problem.place().start()));
    return sorted;
  }
}
