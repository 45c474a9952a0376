package dev.settlewell.sheet;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.DynamicTest.dynamicTest;

import dev.settlewell.text.Edit;
import dev.settlewell.text.Fix;
import dev.settlewell.text.Problem;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.TestFactory;

/** Sheets with mistakes, what is said of each, and that every fix offered mends what it says. */
class ProblemsTest {
  private record Case(String name, String text, List<String> expected) {}

  private static List<Case> cases() {
    List<Case> cases = new ArrayList<>();
    String[] blocks = Bound.resource("problems.txt").split("(?m)^==== ");
    for (int i = 1; i < blocks.length; i++) {
      List<String> lines = blocks[i].lines().toList();
      StringBuilder text = new StringBuilder();
      List<String> expected = new ArrayList<>();
      for (String line : lines.subList(1, lines.size())) {
        if (line.startsWith(">> ")) {
          expected.add(line.substring(3));
        } else if (!line.isBlank()) {
          text.append(line).append('\n');
        }
      }
      String head = text.indexOf("channel-sheet") < 0 ? "channel-sheet: 1\n" : "";
      cases.add(new Case(lines.get(0), head + text, expected));
    }
    return cases;
  }

  private static List<Problem> problems(String text) {
    Sheet sheet = Bound.sheet(text);
    Linked linked =
        Link.link(sheet, List.of(), true, List.of(), Bound.VOCABULARY, LocalDate.of(2026, 12, 1));
    return Stream.of(sheet.tree().problems(), sheet.problems(), linked.problems())
        .flatMap(List::stream)
        .sorted(Comparator.comparingInt(problem -> problem.place().start()))
        .toList();
  }

  @TestFactory
  Stream<DynamicTest> says_what_is_wrong_at_its_exact_place() {
    return cases().stream().map(c -> dynamicTest(c.name(), () -> compare(c)));
  }

  private static void compare(Case c) {
    Sheet sheet = Bound.sheet(c.text());
    List<String> shown =
        problems(c.text()).stream().map(p -> Bound.shown(sheet.text(), p)).toList();
    assertThat(shown).hasSameSizeAs(c.expected());
    for (String expected : c.expected()) {
      assertThat(shown)
          .as(expected)
          .anyMatch(
              line -> expected.endsWith("›") ? line.startsWith(expected) : line.equals(expected));
    }
  }

  @TestFactory
  Stream<DynamicTest> every_fix_removes_its_problem_and_a_safe_one_brings_no_other() {
    return cases().stream().map(c -> dynamicTest(c.name(), () -> applyEachFix(c.text())));
  }

  private static void applyEachFix(String text) {
    List<Problem> before = problems(text);
    for (Problem problem : before) {
      for (Fix fix : problem.fixes()) {
        List<Problem> after = problems(applied(text, fix));
        assertThat(after.stream().filter(p -> p.message().equals(problem.message())).count())
            .as("%s mends: %s", fix.title(), problem.message())
            .isLessThan(before.stream().filter(p -> p.message().equals(problem.message())).count());
        if (fix.safe()) {
          assertThat(after).as(fix.title()).hasSizeLessThan(before.size());
        }
      }
    }
  }

  private static String applied(String text, Fix fix) {
    StringBuilder changed = new StringBuilder(text);
    fix.edits().stream()
        .sorted(Comparator.comparingInt((Edit edit) -> edit.place().start()).reversed())
        .forEach(
            edit -> changed.replace(edit.place().start(), edit.place().end(), edit.replacement()));
    return changed.toString();
  }
}
