package dev.settlewell.sheet;

import dev.settlewell.syntax.Node;
import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import dev.settlewell.text.Related;
import dev.settlewell.vocabulary.NameKind;
import dev.settlewell.vocabulary.Vocabulary;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Collections;
import java.util.EnumSet;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/** Puts a sheet together with the sheets it uses: what its names mean, and whether they mean it. */
public final class Link {
  /** A name with what defines it. */
  private record Meaning(NameKind kind, Place place) {}

  /** What other sheets bring in. */
  private static final Set<NameKind> SHARED =
      EnumSet.of(NameKind.SUPPLY, NameKind.CONVERTER, NameKind.INTERFERER);

  private final Sheet sheet;
  private final List<Sheet> used;
  private final Vocabulary vocabulary;
  private final Map<String, Meaning> meanings = new LinkedHashMap<>();
  private final Report report = new Report();

  private Link(Sheet sheet, List<Sheet> used, Vocabulary vocabulary) {
    this.sheet = sheet;
    this.used = used;
    this.vocabulary = vocabulary;
  }

  /**
   * @param used every sheet that {@code sheet} reaches by {@code use}, nearest first, each once
   * @param whole false where a sheet could not be reached: names that it may define are then not
   *     called unknown
   * @param problems of this sheet's own {@code use}
   */
  public static Linked link(
      Sheet sheet,
      List<Sheet> used,
      boolean whole,
      List<Problem> problems,
      Vocabulary vocabulary,
      LocalDate date) {
    Link link = new Link(sheet, used, vocabulary);
    problems.forEach(link.report::add);
    link.gatherMeanings();
    link.checkReferences(!whole);
    return new Linked(
        sheet,
        List.copyOf(used),
        link.merged(Sheet::supplies),
        link.merged(Sheet::converters),
        link.merged(Sheet::interferers),
        link.report.sorted(),
        date);
  }

  private interface Section<T> {
    Map<String, Named<T>> of(Sheet sheet);
  }

  private <T> Map<String, Named<T>> merged(Section<T> section) {
    Map<String, Named<T>> merged = new LinkedHashMap<>(section.of(sheet));
    used.forEach(other -> section.of(other).forEach(merged::putIfAbsent));
    return Collections.unmodifiableMap(merged);
  }

  private void gatherMeanings() {
    for (NameKind kind : NameKind.values()) {
      named(sheet, kind)
          .forEach((name, place) -> meanings.putIfAbsent(name, new Meaning(kind, place)));
    }
    for (Sheet other : used) {
      for (NameKind kind : SHARED) {
        named(other, kind).forEach((name, place) -> takeOver(name, new Meaning(kind, place)));
      }
    }
  }

  /** A name that a used sheet defines may be defined nowhere else. */
  private void takeOver(String name, Meaning theirs) {
    Meaning before = meanings.putIfAbsent(name, theirs);
    if (before == null) {
      return;
    }
    boolean here = before.place().sheet().equals(sheet.path());
    Place place = here ? before.place() : useKey();
    String message =
        "the name `"
            + name
            + "` is defined twice: as "
            + before.kind().withArticle()
            + " in "
            + before.place().sheet()
            + " and as "
            + theirs.kind().withArticle()
            + " in "
            + theirs.place().sheet();
    report.add(
        new Problem(
            Problem.Kind.DUPLICATE_NAME,
            place,
            message,
            List.of(
                new Related(before.place(), "one `" + name + "`"),
                new Related(theirs.place(), "the other `" + name + "`")),
            List.of()));
  }

  private Place useKey() {
    Slot<?> use = sheet.top().slot("use");
    return use instanceof Slot.Stated<?> stated ? stated.keyPlace() : use.place();
  }

  private static Map<String, Place> named(Sheet sheet, NameKind kind) {
    Map<String, ? extends Named<?>> section =
        switch (kind) {
          case SUPPLY -> sheet.supplies();
          case CONVERTER -> sheet.converters();
          case SCAN -> sheet.scans();
          case INTERFERER -> sheet.interferers();
          case CHANNEL -> sheet.channels();
        };
    Map<String, Place> places = new LinkedHashMap<>();
    section.forEach((name, named) -> places.put(name, named.place()));
    return places;
  }

  private void checkReferences(boolean someUnreached) {
    Set<NameKind> doubtful = EnumSet.noneOf(NameKind.class);
    for (NameKind kind : NameKind.values()) {
      if (isBroken(kind) || someUnreached && SHARED.contains(kind)) {
        doubtful.add(kind);
      }
    }
    for (Reference reference : References.of(sheet, vocabulary)) {
      Meaning meaning = meanings.get(reference.name());
      if (meaning == null && reference.kinds().stream().noneMatch(doubtful::contains)) {
        unknown(reference);
      } else if (meaning != null && !reference.kinds().contains(meaning.kind())) {
        otherKind(reference, meaning);
      }
    }
  }

  private void unknown(Reference reference) {
    List<String> known = new ArrayList<>();
    meanings.forEach(
        (name, meaning) -> {
          if (reference.kinds().contains(meaning.kind())) {
            known.add(name);
          }
        });
    report.unknown(
        Problem.Kind.UNKNOWN_NAME,
        reference.place(),
        reference.name(),
        "no " + words(reference) + " is named `" + reference.name() + "`",
        known);
  }

  private void otherKind(Reference reference, Meaning meaning) {
    report.add(
        new Problem(
            Problem.Kind.UNKNOWN_NAME,
            reference.place(),
            "`"
                + reference.name()
                + "` names "
                + meaning.kind().withArticle()
                + "; no "
                + words(reference)
                + " is named so",
            List.of(new Related(meaning.place(), "the " + meaning.kind().word())),
            List.of()));
  }

  private static String words(Reference reference) {
    Set<String> words = new LinkedHashSet<>();
    for (NameKind kind : NameKind.values()) {
      if (reference.kinds().contains(kind)) {
        words.add(kind.word());
      }
    }
    return String.join(", ", words).replaceFirst(", ([^,]*)$", " or $1");
  }

  /**
   * True where the section that defines such names could not be read whole: a name that seems
   * missing may stand in the broken line.
   */
  private boolean isBroken(NameKind kind) {
    if (sheet.top().slot(kind.section()).isWrong()) {
      return true;
    }
    List<Node.Entry> sections = sheet.tree().root().entries();
    for (int i = 0; i < sections.size(); i++) {
      if (sections.get(i).key().text().equals(kind.section())) {
        int from = sections.get(i).key().place().start();
        int to =
            i + 1 < sections.size()
                ? sections.get(i + 1).key().place().start()
                : sheet.text().length() + 1;
        return sheet.tree().problems().stream()
            .filter(problem -> problem.kind() == Problem.Kind.SYNTAX)
            .anyMatch(problem -> from <= problem.place().start() && problem.place().start() < to);
      }
    }
    // The section's own key may be what could not be read.
    return sheet.tree().problems().stream().anyMatch(p -> p.kind() == Problem.Kind.SYNTAX);
  }
}
