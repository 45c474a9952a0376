package dev.settlewell.finding.catalog;

import dev.settlewell.finding.Check;
import dev.settlewell.finding.Fact;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Place;
import dev.settlewell.text.Related;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/** Puts a finding together piece by piece; what is not said stays empty. */
final class FindingBuilder {
  private static final List<String> FIRST = List.of("need", "have", "margin");

  private final Check check;
  private final Place place;
  private final String subject;
  private Severity severity;
  private String about = "";
  private String message = "";
  private final List<Fact> facts = new ArrayList<>();
  private final List<Related> related = new ArrayList<>();
  private final List<Fix> fixes = new ArrayList<>();
  private final List<Fix> candidates = new ArrayList<>();

  private FindingBuilder(Check check, Place place, String subject) {
    this.check = check;
    this.place = place;
    this.subject = subject;
    this.severity = check.severity();
  }

  static FindingBuilder of(Check check, Place place, String subject) {
    return new FindingBuilder(check, place, subject);
  }

  /** At a channel's value under {@code key}; at the channel's name where it has none. */
  static FindingBuilder of(Check check, ChannelView channel, String key) {
    return new FindingBuilder(check, channel.place(key), channel.name());
  }

  FindingBuilder severity(Severity other) {
    severity = other;
    return this;
  }

  FindingBuilder about(String interfererOrStage) {
    about = interfererOrStage;
    return this;
  }

  FindingBuilder message(String sentence) {
    message = sentence;
    return this;
  }

  FindingBuilder need(String text) {
    return fact("need", text);
  }

  FindingBuilder have(String text) {
    return fact("have", text);
  }

  FindingBuilder margin(String text) {
    return fact("margin", text);
  }

  FindingBuilder fact(String label, String text) {
    facts.add(new Fact(label, text));
    return this;
  }

  FindingBuilder related(Place other, String role) {
    if (!other.equals(place)) {
      related.add(new Related(other, role));
    }
    return this;
  }

  /** What is needed comes first, then what there is, whatever the order they were told in. */
  private static int rank(String label) {
    int rank = FIRST.indexOf(label);
    return rank < 0 ? FIRST.size() : rank;
  }

  FindingBuilder related(Optional<Place> other, String role) {
    other.ifPresent(there -> related(there, role));
    return this;
  }

  FindingBuilder fix(Fix fix) {
    fixes.add(fix);
    return this;
  }

  FindingBuilder candidate(Optional<Fix> fix) {
    fix.ifPresent(candidates::add);
    return this;
  }

  Finding build() {
    facts.sort(Comparator.comparingInt(fact -> rank(fact.label())));
    return new Finding(
        check.name(),
        severity,
        place,
        subject,
        about,
        message,
        facts,
        related,
        fixes,
        candidates,
        Optional.empty());
  }
}
