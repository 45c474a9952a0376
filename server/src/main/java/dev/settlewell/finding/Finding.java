package dev.settlewell.finding;

import dev.settlewell.text.Fix;
import dev.settlewell.text.Place;
import dev.settlewell.text.Related;
import java.util.List;
import java.util.Optional;

/**
 * One thing to tell: what is wrong, with the figures, exactly where, and what would mend it.
 *
 * @param name the catalogue's name
 * @param place the exact value at fault
 * @param subject the channel, scan or converter it is about, "" for the text itself; what {@code
 *     accept} stands on
 * @param about the interferer or stage it is about, where a channel may have the finding several
 *     times; "" else
 * @param message one sentence, figures first
 * @param facts rows under it: need, have, margin
 * @param fixes ways to mend the text; of computed values only those that were shown to help
 * @param acceptance present where the sheet accepts it
 */
public record Finding(
    String name,
    Severity severity,
    Place place,
    String subject,
    String about,
    String message,
    List<Fact> facts,
    List<Related> related,
    List<Fix> fixes,
    Optional<Acceptance> acceptance) {
  public Finding {
    facts = List.copyOf(facts);
    related = List.copyOf(related);
    fixes = List.copyOf(fixes);
  }

  public Finding(
      String name,
      Severity severity,
      Place place,
      String subject,
      String message,
      List<Fact> facts,
      List<Related> related) {
    this(
        name,
        severity,
        place,
        subject,
        "",
        message,
        facts,
        related,
        List.of(),
        Optional.empty());
  }

  public boolean isAccepted() {
    return acceptance.isPresent();
  }
}
