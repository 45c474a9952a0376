package dev.settlewell.finding;

import dev.settlewell.finding.catalog.Catalog;
import dev.settlewell.sheet.Linked;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Sheet;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Place;
import dev.settlewell.text.Related;
import dev.settlewell.text.SourceText;
import dev.settlewell.text.Span;
import java.time.LocalDate;
import java.time.format.DateTimeParseException;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/** What a sheet accepts, and what became of each acceptance on the day it is judged. */
final class Acceptances {
  static final String EXPIRED = "acceptance-expired";
  static final String UNUSED = "acceptance-unused";

  /**
   * One entry of an {@code accept} list.
   *
   * @param until the last day it holds
   * @param finding the name's own stretch
   * @param item the whole entry
   * @param list the key {@code accept}, and how many entries stand under it
   */
  private record Entry(
      String subject,
      String name,
      String about,
      String because,
      Optional<LocalDate> until,
      Place untilPlace,
      Place finding,
      Place item,
      Slot.Stated<?> list,
      int count) {

    boolean accepts(Finding candidate) {
      return candidate.name().equals(name)
          && candidate.subject().equals(subject)
          && (about.isEmpty() || candidate.about().equals(about));
    }

    boolean expiredOn(LocalDate date) {
      return until.isPresent() && date.isAfter(until.get());
    }
  }

  private final Sheet sheet;
  private final LocalDate date;
  private final boolean clear;
  private final List<Entry> entries;

  Acceptances(Linked linked) {
    this.sheet = linked.sheet();
    this.date = linked.date();
    this.clear =
        Stream.of(sheet.problems(), sheet.tree().problems(), linked.problems())
            .allMatch(List::isEmpty);
    this.entries =
        Stream.of(sheet.channels(), sheet.scans(), sheet.converters())
            .flatMap(named -> entries(named).stream())
            .toList();
  }

  private static List<Entry> entries(Map<String, Named<Part>> all) {
    List<Entry> entries = new ArrayList<>();
    for (Named<Part> named : all.values()) {
      named.value().stated().ifPresent(part -> entries.addAll(entries(named.name(), part)));
    }
    return entries;
  }

  private static List<Entry> entries(String subject, Part part) {
    if (!(part.list("accept", Part.class) instanceof Slot.Stated<List<Slot<Part>>> list)) {
      return List.of();
    }
    return list.value().stream()
        .filter(item -> item.isStated())
        .filter(item -> item.stated().get().has("finding"))
        .map(item -> entry(subject, item, list))
        .toList();
  }

  private static Entry entry(String subject, Slot<Part> item, Slot.Stated<List<Slot<Part>>> list) {
    Part part = item.stated().get();
    return new Entry(
        subject,
        part.text("finding").orElse(""),
        part.text("about").orElse(""),
        part.text("because").orElse(""),
        part.text("until").stated().flatMap(Acceptances::date),
        part.text("until").place(),
        part.text("finding").place(),
        item.place(),
        list,
        list.value().size());
  }

  private static Optional<LocalDate> date(String text) {
    try {
      return Optional.of(LocalDate.parse(text));
    } catch (DateTimeParseException e) {
      return Optional.empty(); // The reader of the sheet has said so.
    }
  }

  /**
   * @param findings what is left to report
   * @param raised everything that was found, covered findings too: an acceptance of a covered
   *     finding is not idle
   */
  List<Finding> apply(List<Finding> findings, List<Finding> raised) {
    List<Finding> judged = new ArrayList<>();
    for (Finding finding : findings) {
      judged.add(judge(finding));
    }
    for (Entry entry : entries) {
      List<Finding> met = findings.stream().filter(entry::accepts).toList();
      if (!met.isEmpty() && entry.expiredOn(date)) {
        judged.add(expired(entry, met.get(0)));
      }
      if (raised.stream().noneMatch(entry::accepts) && canJudge(entry)) {
        judged.add(unused(entry));
      }
    }
    return judged;
  }

  private Finding judge(Finding finding) {
    Finding result = finding;
    for (Entry entry : entries) {
      if (!entry.accepts(finding)) {
        continue;
      }
      if (!entry.expiredOn(date)) {
        return finding.acceptedAs(new Acceptance(entry.because(), entry.finding()));
      }
      result =
          finding.with(
              new Related(
                  entry.untilPlace(), "accepted until " + entry.until().get() + ", now over"));
    }
    return result;
  }

  private static Finding expired(Entry entry, Finding finding) {
    String message =
        "accepted until "
            + entry.until().get()
            + ", and that day is over: "
            + finding.name()
            + " is reported again; mend it, or set a later day with a reason that still holds";
    return new Finding(
        EXPIRED,
        finding.severity(),
        entry.untilPlace(),
        entry.subject(),
        entry.name(),
        message,
        List.of(new Fact("because", entry.because())),
        List.of(new Related(finding.place(), finding.message())),
        List.of(),
        Optional.empty());
  }

  /**
   * Whether the absence of a finding means anything: not while the text has errors that keep
   * figures from being computed, nor for a converter whose scans stand in other sheets, nor for a
   * name that is no finding (which has an error of its own).
   */
  private boolean canJudge(Entry entry) {
    boolean converterElsewhere =
        sheet.converters().containsKey(entry.subject()) && sheet.scans().isEmpty();
    boolean known = Catalog.NAMES.contains(entry.name());
    return known && !converterElsewhere && clear;
  }

  private Finding unused(Entry entry) {
    String what = entry.about().isEmpty() ? "" : " about " + entry.about();
    String message =
        entry.subject() + " has no " + entry.name() + what + ": this acceptance can be deleted";
    return new Finding(
        UNUSED,
        Severity.INFORMATION,
        entry.finding(),
        entry.subject(),
        entry.name(),
        message,
        List.of(new Fact("because", entry.because())),
        List.of(),
        deletion(entry).stream().toList(),
        Optional.empty());
  }

  /** Deletes whole lines, and only where nothing else stands on them. */
  private Optional<Fix> deletion(Entry entry) {
    SourceText text = sheet.text();
    boolean only = entry.count() == 1;
    int first = text.lineAt(only ? entry.list().keyPlace().start() : entry.item().start());
    int last = text.lineAt(Math.max(entry.item().end() - 1, entry.item().start()));
    String head = text.slice(new Span(text.lineStart(first), entry.item().start()));
    String tail = text.slice(new Span(entry.item().end(), text.line(last).end()));
    boolean ownLines =
        only
            ? head.matches("(?s)[ \\t]*accept[ \\t]*:.*")
                && tail.matches("[ \\t]*\\]?[ \\t]*(#.*)?")
            : head.matches("[ \\t]*-[ \\t]+") && tail.matches("[ \\t]*(#.*)?");
    if (!ownLines) {
      return Optional.empty();
    }
    int end = last + 1 < text.lineCount() ? text.lineStart(last + 1) : text.length();
    Edit edit = new Edit(text.place(text.lineStart(first), end), "");
    return Optional.of(new Fix("Delete the acceptance of " + entry.name(), List.of(edit), true));
  }
}
