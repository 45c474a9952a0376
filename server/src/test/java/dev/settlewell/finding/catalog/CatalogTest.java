package dev.settlewell.finding.catalog;

import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import dev.settlewell.finding.Check;
import dev.settlewell.finding.Severity;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;

/** Holds classes, names, severities and the list together. */
class CatalogTest {
  private static String kebab(String className) {
    return className.replaceAll("(?<!^)([A-Z])", "-$1").toLowerCase(Locale.ROOT);
  }

  @Test
  void everyCheckIsNamedAsItsClass() {
    for (Check check : Catalog.CHECKS) {
      assertThat(check.name()).isEqualTo(kebab(check.getClass().getSimpleName()));
    }
  }

  @Test
  void everyCheckOfThePackageIsListedOnce() {
    Set<String> classes =
        new ClassFileImporter()
                .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
                .importPackages("dev.settlewell.finding.catalog")
                .stream()
                .filter(c -> c.isAssignableTo(Check.class))
                .filter(c -> !c.getModifiers().toString().contains("ABSTRACT"))
                .map(JavaClass::getSimpleName)
                .collect(Collectors.toSet());
    List<String> listed =
        Catalog.CHECKS.stream().map(check -> check.getClass().getSimpleName()).toList();
    assertThat(listed).doesNotHaveDuplicates().containsExactlyInAnyOrderElementsOf(classes);
  }

  @Test
  void everyCheckSaysWhatItIsInOneLine() {
    for (Check check : Catalog.CHECKS) {
      assertThat(check.summary())
          .as(check.name())
          .isNotBlank()
          .doesNotContain("\n")
          .doesNotEndWith(".");
      assertThat(check.severity()).as(check.name()).isNotEqualTo(Severity.OFF);
    }
  }

  @Test
  void coversNameFindingsThatExistAndNeverThemselves() {
    for (Check check : Catalog.CHECKS) {
      assertThat(Catalog.NAMES).as(check.name()).containsAll(check.covers());
      assertThat(check.covers()).as(check.name()).doesNotContain(check.name());
    }
  }
}
