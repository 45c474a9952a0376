package dev.settlewell.finding;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.channel.Analysis;
import dev.settlewell.finding.catalog.Catalog;
import dev.settlewell.text.Fix;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.function.BiConsumer;
import java.util.function.Consumer;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** What becomes of findings between the checks and the reader. */
class FindingsTest {
  private static final String TANK =
      """
      channel-sheet: 1
      supplies: {logic: 3.3 V ±2 %, ref: 2.5 V ±0.1 %}
      converters:
        adc: {bits: 12, supply: logic, reference: ref}
      scans:
        tank: {converter: adc, rate: 1 Hz, order: [level]}
      channels:
        level:
          measures: 0 m to 3 m
          sensor:
            current: {output: 0 mA to 20 mA, spans: 0 m to 3 m}
          path:
            - shunt: 120 Ω ±0.1 %
          interferers: []
      """;

  private static final String ACCEPTED =
      TANK
          + """
              accept:
                - finding: sensor-fault-hidden
                  because: the float switch shows an empty tank
                  until: 2026-06-30
          """;

  /** A check that does what the test says. */
  private record Told(String name, List<String> covers, BiConsumer<Check, Consumer<Finding>> does)
      implements Check {
    static Told finding(String name, String subject, String about, String... covers) {
      return new Told(
          name, List.of(covers), (check, report) -> report.accept(Told.at(check, subject, about)));
    }

    private static Finding at(Check check, String subject, String about) {
      return new Finding(
          check.name(),
          check.severity(),
          Judged.sheet("").text().place(0, 0),
          subject,
          about,
          "said",
          List.of(),
          List.of(),
          List.of(),
          java.util.Optional.empty());
    }

    @Override
    public Severity severity() {
      return Severity.WARNING;
    }

    @Override
    public String summary() {
      return name;
    }

    @Override
    public void run(Analysis analysis, Consumer<Finding> report) {
      does.accept(this, report);
    }
  }

  private static List<String> names(Check... checks) {
    return Findings.of(Judged.analysis(TANK), List.of(checks)).stream().map(Finding::name).toList();
  }

  @Test
  void aCheckThatFailsIsToldOnceAndTheOthersGoOn() {
    Check failing =
        new Told(
            "failing",
            List.of(),
            (check, report) -> {
              throw new IllegalStateException("no such thing");
            });
    List<Finding> findings =
        Findings.of(Judged.analysis(TANK), List.of(failing, Told.finding("sound", "level", "")));
    assertThat(findings)
        .extracting(Finding::name)
        .containsExactlyInAnyOrder(Findings.INTERNAL_FAULT, "sound");
    assertThat(findings)
        .filteredOn(f -> f.name().equals(Findings.INTERNAL_FAULT))
        .singleElement()
        .satisfies(
            f ->
                assertThat(f.message())
                    .contains("the check failing", "no such thing", "please report it"));
  }

  @Test
  void whatAGraverFindingSaysIsLeftOutForItsSubjectOnly() {
    Check never = Told.finding("never", "level", "", "small");
    Check small = Told.finding("small", "level", "", "short");
    Check tooShort = Told.finding("short", "level", "");
    Check elsewhere = Told.finding("short", "other", "");
    assertThat(names(never, small, tooShort)).containsExactly("never");
    // Followed through even where the one between does not fire.
    Check silent = new Told("small", List.of("short"), (check, report) -> {});
    assertThat(names(never, silent, tooShort)).containsExactly("never");
    assertThat(names(never, silent, elsewhere)).containsExactlyInAnyOrder("never", "short");
  }

  @Test
  void coversOnlyTheSameInterferer() {
    Check offset = Told.finding("offset", "level", "mains", "aliases");
    assertThat(names(offset, Told.finding("aliases", "level", "mains"))).containsExactly("offset");
    assertThat(names(offset, Told.finding("aliases", "level", "fan")))
        .containsExactlyInAnyOrder("offset", "aliases");
  }

  @Test
  void aSheetChangesSeveritiesAndSwitchesOff() {
    assertThat(Judged.sheet(TANK).names()).contains("sensor-fault-hidden");
    String off = TANK + "findings: {sensor-fault-hidden: off, not-computed: error}\n";
    assertThat(Judged.sheet(off).names()).doesNotContain("sensor-fault-hidden");
    assertThat(Judged.sheet(off).findings())
        .filteredOn(f -> f.name().equals("not-computed"))
        .allMatch(f -> f.severity() == Severity.ERROR)
        .isNotEmpty();
  }

  @Test
  void anAcceptanceHoldsThroughItsLastDay() {
    Judged lastDay = Judged.on(LocalDate.of(2026, 6, 30), ACCEPTED);
    assertThat(lastDay.findings())
        .filteredOn(f -> f.name().equals("sensor-fault-hidden"))
        .isNotEmpty()
        .allMatch(Finding::isAccepted);
    assertThat(lastDay.names()).doesNotContain("acceptance-expired", "acceptance-unused");

    Judged dayAfter = Judged.on(LocalDate.of(2026, 7, 1), ACCEPTED);
    assertThat(dayAfter.findings())
        .filteredOn(f -> f.name().equals("sensor-fault-hidden"))
        .isNotEmpty()
        .noneMatch(Finding::isAccepted)
        .allSatisfy(
            f ->
                assertThat(f.related())
                    .anyMatch(r -> r.message().contains("accepted until 2026-06-30")));
    assertThat(dayAfter.findings())
        .filteredOn(f -> f.name().equals("acceptance-expired"))
        .singleElement()
        .satisfies(f -> assertThat(f.severity()).isEqualTo(Severity.WARNING));
  }

  @Test
  void aboutNarrowsAnAcceptance() {
    String open = ACCEPTED.replace("until: 2026-06-30", "about: open");
    assertThat(Judged.sheet(open).findings())
        .filteredOn(f -> f.name().equals("sensor-fault-hidden"))
        .allMatch(f -> f.isAccepted() == f.about().equals("open"))
        .extracting(Finding::about)
        .containsExactlyInAnyOrder("open", "short");
  }

  @Test
  void anIdleAcceptanceIsDeletedWithItsWholeLines() {
    String live = TANK.replace("0 mA to 20 mA", "4 mA to 20 mA");
    String idle = live + ACCEPTED.substring(TANK.length()) + "findings: {}\n";
    assertThat(mended(idle, "acceptance-unused")).isEqualTo(live + "findings: {}\n");
    assertThat(mended(idle.replace("\n", "\r\n"), "acceptance-unused"))
        .isEqualTo((live + "findings: {}\n").replace("\n", "\r\n"));
  }

  @Test
  void ofTwoAcceptancesOnlyTheIdleOneGoes() {
    String two =
        ACCEPTED.replace("        until: 2026-06-30\n", "")
            + "      - finding: over-range\n        because: no longer\n";
    assertThat(mended(two, "acceptance-unused"))
        .isEqualTo(two.substring(0, two.indexOf("      - finding: over-range")));
  }

  private static String mended(String sheet, String name) {
    Judged judged = Judged.sheet(sheet);
    Finding finding =
        judged.findings().stream().filter(f -> f.name().equals(name)).findFirst().orElseThrow();
    Fix fix = finding.fixes().get(0);
    assertThat(fix.safe()).isTrue();
    return fix.applyTo(judged.text());
  }

  @Test
  void whileTheTextHasErrorsNoAcceptanceIsCalledIdle() {
    String broken =
        ACCEPTED
            .replace("output: 0 mA to 20 mA", "output: 0 to 20 mA")
            .replace("2026-06-30", "2030-01-01");
    String worse = broken.replace("measures: 0 m to 3 m", "measures: 3 m to 0 m");
    assertThat(Judged.sheet(worse).names()).doesNotContain("acceptance-unused");
  }

  @Test
  void namesOfFindingsAreCheckedAgainstTheCatalogue() {
    String slip = ACCEPTED.replace("sensor-fault-hidden", "sensor-fault-hiden");
    assertThat(Judged.sheet(slip).findings())
        .filteredOn(f -> f.name().equals("unknown-name"))
        .singleElement()
        .satisfies(
            f -> {
              assertThat(f.message()).contains("sensor-fault-hidden");
              assertThat(f.fixes().get(0).applyTo(Judged.sheet(slip).text())).isEqualTo(ACCEPTED);
            });
    assertThat(Judged.sheet(TANK + "findings: {over-rang: off}\n").shown())
        .anyMatch(said -> said.contains("unknown-name ‹over-rang›") && said.contains("over-range"));
  }

  @Test
  void aValueOfAUsedSheetIsToldAtHome() {
    String parts =
        """
        channel-sheet: 1
        supplies: {logic: 3.3 V ±2 %, ref: {typical: 2.5 V}}
        unknown-here: 1
        converters:
          adc: {bits: 12, supply: logic, reference: ref, differential-nonlinearity: ±2 LSB}
        """;
    String own =
        TANK.replaceAll("supplies: .*\n", "use: [parts.channels.yaml]\n")
            .replaceAll("converters:\n.*\n", "");
    Judged judged = Judged.with(own, "parts.channels.yaml", parts);
    assertThat(judged.findings()).allMatch(f -> f.place().sheet().equals(judged.text().name()));
    // The used sheet's own text and converter are judged there.
    assertThat(judged.names())
        .contains("typical-only")
        .doesNotContain("unknown-key", "missing-codes");
    assertThat(judged.findings())
        .filteredOn(f -> f.name().equals("typical-only"))
        .allMatch(f -> f.related().get(0).place().sheet().endsWith("parts.channels.yaml"));
  }

  @Test
  void whatIsReadAndNotComputedYetIsSaid() {
    String sheet = TANK + "    digital-filter: {moving-average: 8}\n";
    assertThat(Judged.sheet(sheet).shown())
        .anyMatch(line -> line.contains("hint not-computed ‹digital-filter›"));
  }

  @Test
  void everyFindingMarksAValueOrAKeyAndNeverABlock() {
    for (Check check : Catalog.CHECKS) {
      String sheet =
          Pages.of(check.name()).orElseThrow().sheet("A sheet that has it").orElseThrow();
      Judged judged = Judged.sheet(sheet);
      for (Finding finding : judged.findings()) {
        assertThat(judged.text().slice(finding.place().span()))
            .as(finding.name())
            .doesNotContain("\n")
            .isNotBlank();
        assertThat(finding.message()).as(finding.name()).doesNotEndWith(".").doesNotContain("NaN");
      }
    }
  }

  @Test
  void theOrderIsThatOfTheText() {
    Comparator<Finding> byPlace =
        Comparator.comparing((Finding f) -> f.place().start()).thenComparing(Finding::name);
    for (Check check : Catalog.CHECKS) {
      List<Finding> findings =
          Judged.sheet(
                  Pages.of(check.name()).orElseThrow().sheet("A sheet that has it").orElseThrow())
              .findings();
      List<Finding> sorted = new ArrayList<>(findings);
      sorted.sort(byPlace);
      assertThat(findings)
          .extracting(Finding::name)
          .containsExactlyElementsOf(sorted.stream().map(Finding::name).toList());
    }
  }

  @Test
  void anyTextHasFindingsAndNoFaults() {
    String whole =
        Pages.of("acquisition-too-short").orElseThrow().sheet("A sheet that has it").orElseThrow();
    Stream.iterate(0, at -> at < whole.length(), at -> at + 23)
        .map(at -> whole.substring(0, at))
        .forEach(
            cut ->
                assertThat(Judged.sheet(cut).shown())
                    .as(cut)
                    .noneMatch(line -> line.contains(Findings.INTERNAL_FAULT)));
  }
}
