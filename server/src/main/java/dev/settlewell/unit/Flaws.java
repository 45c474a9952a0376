package dev.settlewell.unit;

import dev.settlewell.text.Problem;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/** Collects what is wrong with one value, and says it with the spelling that mends it. */
final class Flaws {
  /** A longer text is not repeated in a message: the mended place alone says enough. */
  private static final int QUOTABLE = 60;

  private final String raw;
  private final List<Flaw> found = new ArrayList<>();

  Flaws(String raw) {
    this.raw = raw;
  }

  /** Adds a flaw; its message holds the reason alone until {@link #finished()}. */
  void add(Flaw flaw) {
    int to = Math.min(flaw.to(), raw.length());
    int from = Math.min(flaw.from(), to);
    if (from == to && from > 0 && flaw.spellings().isEmpty()) {
      from--; // What is missing at the end is shown at the last character.
    }
    boolean safe = flaw.safe() && !flaw.spellings().isEmpty();
    Flaw noted = new Flaw(flaw.kind(), from, to, flaw.message(), flaw.spellings(), safe);
    found.add(safe ? withCovered(noted) : noted);
  }

  /**
   * A spelling that is certain is made from what was meant, so it mends the slips inside it as well
   * and takes their place: no two certain edits overlap.
   */
  private Flaw withCovered(Flaw flaw) {
    Flaw whole = flaw;
    for (Flaw inner : List.copyOf(found)) {
      if (flaw.from() <= inner.from() && inner.to() <= flaw.to()) {
        found.remove(inner);
        String both = inner.message() + ", and " + whole.message();
        boolean safe = whole.safe() && inner.safe();
        whole = new Flaw(flaw.kind(), flaw.from(), flaw.to(), both, flaw.spellings(), safe);
      }
    }
    return whole;
  }

  /** True where the meaning is certain in spite of all that was found. */
  boolean leaveMeaning() {
    return found.stream().allMatch(f -> f.safe() || f.kind() == Problem.Kind.AMBIGUOUS_TEXT);
  }

  /** The flaws in the order of the text, with whole sentences for messages. */
  List<Flaw> finished() {
    found.sort(Comparator.comparingInt(Flaw::from));
    return found.stream().map(this::sentence).toList();
  }

  private Flaw sentence(Flaw flaw) {
    if (flaw.spellings().isEmpty() || flaw.kind() == Problem.Kind.AMBIGUOUS_TEXT) {
      return flaw;
    }
    List<String> whole = flaw.spellings().stream().map(s -> mended(flaw, s)).distinct().toList();
    String message = "write " + alternatives(whole) + ": " + flaw.message();
    return new Flaw(flaw.kind(), flaw.from(), flaw.to(), message, flaw.spellings(), flaw.safe());
  }

  /** The whole value with this spelling, and the first spelling of every other flaw. */
  private String mended(Flaw flaw, String spelling) {
    if (raw.length() > QUOTABLE) {
      return spelling;
    }
    StringBuilder text = new StringBuilder();
    int copied = 0;
    for (Flaw each : found) {
      boolean overlaps = each != flaw && each.from() < flaw.to() && flaw.from() < each.to();
      if (each.spellings().isEmpty() || each.from() < copied || overlaps) {
        continue;
      }
      text.append(raw, copied, each.from());
      text.append(each == flaw ? spelling : each.spellings().get(0));
      copied = each.to();
    }
    return text.append(raw.substring(copied)).toString().trim();
  }

  private static String alternatives(List<String> texts) {
    int last = texts.size() - 1;
    return last == 0
        ? texts.get(0)
        : String.join(", ", texts.subList(0, last)) + " or " + texts.get(last);
  }
}
