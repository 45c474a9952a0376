package dev.settlewell.review;

import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Findings;
import dev.settlewell.finding.Severity;
import java.util.List;
import java.util.Optional;

/**
 * Findings as the XML that test reports are commonly exchanged in: a suite a sheet, a case a
 * finding. Findings below the level that fails, accepted ones and what could not be judged are
 * cases that were skipped.
 */
public final class FindingsJunit {
  private final Review review;
  private final Locations locations;
  private final Optional<Severity> level;
  private final StringBuilder out = new StringBuilder();

  private FindingsJunit(Review review, Optional<Severity> level) {
    this.review = review;
    this.locations = review.locations();
    this.level = level;
  }

  /**
   * @param level from which on a finding fails; empty: never
   */
  public static String render(Review review, Optional<Severity> level) {
    FindingsJunit xml = new FindingsJunit(review, level);
    xml.out.append("<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n");
    xml.out.append("<testsuites name=\"settlewell\">\n");
    review.failures().forEach(xml::failure);
    review.sheets().forEach(xml::sheet);
    xml.out.append("</testsuites>\n");
    return xml.out.toString();
  }

  private void failure(Review.Failure failure) {
    suite(failure.path(), 1, 0, 1, 0);
    out.append("    <testcase").append(attribute("classname", failure.path()));
    out.append(attribute("name", "read")).append(">\n      <error");
    out.append(attribute("message", failure.message())).append("/>\n    </testcase>\n");
    out.append("  </testsuite>\n");
  }

  private void sheet(Reviewed sheet) {
    List<Finding> findings = sheet.findings();
    int errors = (int) findings.stream().filter(FindingsJunit::isFault).count();
    int failures = (int) findings.stream().filter(this::fails).count();
    int skipped = findings.size() - errors - failures;
    suite(sheet.path(), Math.max(1, findings.size()), failures, errors, skipped);
    if (findings.isEmpty()) {
      out.append("    <testcase").append(attribute("classname", sheet.path()));
      out.append(attribute("name", "check")).append("/>\n");
    }
    findings.forEach(finding -> testCase(sheet, finding));
    out.append("  </testsuite>\n");
  }

  private void suite(String name, int tests, int failures, int errors, int skipped) {
    out.append("  <testsuite").append(attribute("name", name));
    out.append(attribute("tests", String.valueOf(tests)));
    out.append(attribute("failures", String.valueOf(failures)));
    out.append(attribute("errors", String.valueOf(errors)));
    out.append(attribute("skipped", String.valueOf(skipped))).append(">\n");
  }

  private void testCase(Reviewed sheet, Finding finding) {
    String subject = finding.subject().isEmpty() ? "" : finding.subject() + ": ";
    String kind = isFault(finding) ? "error" : fails(finding) ? "failure" : "skipped";
    String at = locations.pointer(finding.place());
    out.append("    <testcase").append(attribute("classname", sheet.path()));
    out.append(attribute("name", subject + finding.name()));
    out.append(attribute("file", sheet.path())).append(">\n      <").append(kind);
    out.append(attribute("message", at + " " + finding.message()));
    if (!kind.equals("skipped")) {
      out.append(attribute("type", finding.name()));
    }
    out.append("/>\n    </testcase>\n");
  }

  private static boolean isFault(Finding finding) {
    return finding.name().equals(Findings.INTERNAL_FAULT);
  }

  private boolean fails(Finding finding) {
    return !isFault(finding)
        && !finding.isAccepted()
        && level.map(finding.severity()::atLeast).orElse(false);
  }

  private static String attribute(String name, String value) {
    StringBuilder escaped = new StringBuilder(" ").append(name).append("=\"");
    value.codePoints().forEach(c -> escape(escaped, c));
    return escaped.append('"').toString();
  }

  private static void escape(StringBuilder out, int c) {
    switch (c) {
      case '&' -> out.append("&amp;");
      case '<' -> out.append("&lt;");
      case '>' -> out.append("&gt;");
      case '"' -> out.append("&quot;");
      case '\n' -> out.append("&#10;");
      default -> out.appendCodePoint(isXml(c) ? c : 0xFFFD);
    }
  }

  /** XML 1.0, section 2.2, less what a parser would turn into a blank in an attribute. */
  private static boolean isXml(int c) {
    return 0x20 <= c && c <= 0xD7FF || 0xE000 <= c && c <= 0xFFFD || 0x10000 <= c;
  }
}
