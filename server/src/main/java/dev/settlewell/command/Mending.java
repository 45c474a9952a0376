package dev.settlewell.command;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Severity;
import dev.settlewell.review.Reviewed;
import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Place;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * Mends one sheet: takes one fix after the other, checks the changed sheet afresh each time, and
 * keeps a fix only if its finding is gone and no graver one has come.
 */
final class Mending {
  /** Each step costs a check; a sheet that needs more is mended by running the command again. */
  private static final int MOST_STEPS = 200;

  /** A fix that was made, as it stood in the text of that moment. */
  record Step(Finding finding, Fix fix, Reviewed before) {}

  /**
   * What became of a sheet.
   *
   * @param steps the fixes made, in their order
   */
  record Result(Reviewed before, Reviewed after, List<Step> steps) {
    boolean changed() {
      return !steps.isEmpty();
    }
  }

  private final Sheets sheets;
  private final Set<String> asked;

  /**
   * @param asked findings whose computed remedies may be applied too, by name
   */
  Mending(Sheets sheets, Set<String> asked) {
    this.sheets = sheets;
    this.asked = asked;
  }

  Result mend(Reviewed sheet) {
    List<Step> steps = new ArrayList<>();
    Set<String> refused = new HashSet<>();
    Reviewed now = sheet;
    while (steps.size() + refused.size() < MOST_STEPS) {
      Optional<Step> next = next(now, refused);
      if (next.isEmpty()) {
        break;
      }
      Reviewed changed = sheets.with(now.path(), text(next.get()));
      if (helps(next.get(), changed)) {
        steps.add(next.get());
        now = changed;
      } else {
        refused.add(key(next.get().finding(), next.get().fix()));
      }
    }
    return new Result(sheet, now, steps);
  }

  private Optional<Step> next(Reviewed now, Set<String> refused) {
    for (Finding finding : now.open()) {
      List<Fix> fixes =
          asked.contains(finding.name()) ? sheets.offered(now, finding) : finding.fixes();
      for (Fix fix : fixes) {
        boolean allowed = fix.safe() || asked.contains(finding.name());
        if (allowed && staysInside(fix, now) && !refused.contains(key(finding, fix))) {
          return Optional.of(new Step(finding, fix, now));
        }
      }
    }
    return Optional.empty();
  }

  private static boolean staysInside(Fix fix, Reviewed sheet) {
    return !fix.edits().isEmpty()
        && fix.edits().stream().allMatch(edit -> edit.place().sheet().equals(sheet.path()));
  }

  private static String key(Finding finding, Fix fix) {
    return finding.name() + "\n" + finding.place() + "\n" + fix.title();
  }

  /** The text with the fix made, new lines ending as the others do. */
  private static String text(Step step) {
    String lineBreak = step.before().text().lineBreak();
    List<Edit> edits = new ArrayList<>();
    for (Edit edit : step.fix().edits()) {
      Place place = edit.place();
      edits.add(new Edit(place, edit.replacement().replaceAll("\r\n|\r|\n", lineBreak)));
    }
    return new Fix(step.fix().title(), edits, step.fix().safe()).applyTo(step.before().text());
  }

  /**
   * Fewer of this finding. What an error of the text has kept from being judged may come to light
   * once it is mended; mending anything less must not bring an error.
   */
  private static boolean helps(Step step, Reviewed after) {
    Finding finding = step.finding();
    boolean fewer = count(after, finding) < count(step.before(), finding);
    boolean graver =
        after.open().stream()
            .filter(f -> f.severity().atLeast(Severity.ERROR))
            .anyMatch(f -> count(after, f) > count(step.before(), f));
    return fewer && (finding.severity() == Severity.ERROR || !graver);
  }

  private static long count(Reviewed sheet, Finding finding) {
    return sheet.open().stream().filter(finding::sameAs).count();
  }
}
