package dev.settlewell.finding;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.finding.catalog.Catalog;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Every page has all its sections, and its two sheets are what it says they are. */
class PagesTest {
  static Stream<String> names() {
    return Catalog.CHECKS.stream().map(Check::name);
  }

  @ParameterizedTest
  @MethodSource("names")
  void hasEverySection(String name) {
    Pages.Page page = Pages.of(name).orElseThrow();
    assertThat(page.text()).startsWith("# " + name + "\n");
    assertThat(page.sections().keySet()).containsExactlyElementsOf(Pages.SECTIONS);
    assertThat(page.sections().values()).allSatisfy(text -> assertThat(text).isNotBlank());
    assertThat(page.text()).doesNotContain("<").doesNotContain("\n|");
    assertThat(page.summary()).endsWith(".").doesNotContain("\n");
  }

  @ParameterizedTest
  @MethodSource("names")
  void theFirstSheetHasIt(String name) {
    Judged judged = judged(name, "A sheet that has it");
    List<String> others =
        judged.findings().stream()
            .filter(f -> !f.isAccepted() && f.severity().atLeast(Severity.WARNING))
            .map(Finding::name)
            .filter(other -> !other.equals(name))
            .filter(other -> !isNamedOnPage(name, other))
            .toList();
    assertThat(judged.names()).as("%s", judged.shown()).contains(name);
    assertThat(others).as("%s", judged.shown()).isEmpty();
  }

  /** The sheet of a section; a page on firmware has the source file beside it. */
  private static Judged judged(String name, String heading) {
    Pages.Page page = Pages.of(name).orElseThrow();
    String sheet = page.sheet(heading).orElseThrow();
    String section = page.section(heading).orElseThrow();
    int source = section.indexOf("```c\n");
    if (source < 0) {
      return Judged.sheet(sheet);
    }
    String code = section.substring(source + "```c\n".length(), section.indexOf("```", source + 4));
    return Judged.with(sheet, "dryer.h", code);
  }

  /** A page whose sheet cannot but have another finding too says so by its name. */
  private static boolean isNamedOnPage(String name, String other) {
    return Pages.of(name)
        .flatMap(page -> page.section("A sheet that has it"))
        .map(section -> section.contains("`" + other + "`"))
        .orElse(false);
  }

  @ParameterizedTest
  @MethodSource("names")
  void theSecondSheetIsClean(String name) {
    Judged judged = judged(name, "A sheet that has it not");
    assertThat(judged.names()).as("%s", judged.shown()).doesNotContain(name);
    assertThat(judged.findings())
        .as("%s", judged.shown())
        .noneMatch(f -> !f.isAccepted() && f.severity().atLeast(Severity.WARNING));
  }
}
