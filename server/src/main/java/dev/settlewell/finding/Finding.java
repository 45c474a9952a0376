package dev.settlewell.finding;

import dev.settlewell.text.Fix;
import dev.settlewell.text.Place;
import dev.settlewell.text.Related;
import java.util.ArrayList;
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
 * @param fixes ways to mend the text that need no proof: another spelling, a nearest name
 * @param candidates computed values that may help; nobody offers one before {@link Remedies} has
 *     shown that it does
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
    List<Fix> candidates,
    Optional<Acceptance> acceptance) {
  public Finding {
    facts = List.copyOf(facts);
    related = List.copyOf(related);
    fixes = List.copyOf(fixes);
    candidates = List.copyOf(candidates);
  }

  public Finding(
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
    this(
        name,
        severity,
        place,
        subject,
        about,
        message,
        facts,
        related,
        fixes,
        List.of(),
        acceptance);
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
        List.of(),
        Optional.empty());
  }

  public boolean isAccepted() {
    return acceptance.isPresent();
  }

  /** True where both say the same thing of the same subject, whatever the figures. */
  public boolean sameAs(Finding other) {
    return name.equals(other.name)
        && subject.equals(other.subject)
        && about.equals(other.about)
        && place.sheet().equals(other.place.sheet());
  }

  public Finding with(Severity other) {
    return new Finding(
        name, other, place, subject, about, message, facts, related, fixes, candidates, acceptance);
  }

  public Finding acceptedAs(Acceptance accepted) {
    return new Finding(
        name,
        severity,
        place,
        subject,
        about,
        message,
        facts,
        related,
        fixes,
        candidates,
        Optional.of(accepted));
  }

  public Finding withFixes(List<Fix> others) {
    return new Finding(
        name,
        severity,
        place,
        subject,
        about,
        message,
        facts,
        related,
        others,
        candidates,
        acceptance);
  }

  /** The same finding at another place; the old one becomes a related place. */
  public Finding movedTo(Place other, String role) {
    List<Related> all = new ArrayList<>();
    all.add(new Related(place, role));
    all.addAll(related);
    return new Finding(
        name, severity, other, subject, about, message, facts, all, fixes, candidates, acceptance);
  }

  /** The same finding with one more row under it. */
  public Finding with(Fact more) {
    List<Fact> all = new ArrayList<>(facts);
    all.add(more);
    return new Finding(
        name,
        severity,
        place,
        subject,
        about,
        message,
        all,
        related,
        fixes,
        candidates,
        acceptance);
  }

  /** The same finding with one more related place. */
  public Finding with(Related more) {
    List<Related> all = new ArrayList<>(related);
    all.add(more);
    return new Finding(
        name, severity, place, subject, about, message, facts, all, fixes, candidates, acceptance);
  }
}
