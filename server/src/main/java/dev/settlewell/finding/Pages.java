package dev.settlewell.finding;

import dev.settlewell.finding.catalog.Catalog;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The pages that explain the findings, one each; they are read from the program itself. */
public final class Pages {
  /** The sections of every page, in their order. */
  public static final List<String> SECTIONS =
      List.of(
          "The mistake",
          "What the readings do",
          "The computation",
          "A sheet that has it",
          "A sheet that has it not",
          "How to mend it",
          "When to accept it",
          "Sources");

  /**
   * One page.
   *
   * @param text the whole page in Markdown, without tables and HTML, so that it reads well in a
   *     terminal too
   */
  public record Page(String name, String text) {

    /** What stands under a heading, without the heading; empty where there is none. */
    public Optional<String> section(String heading) {
      return Optional.ofNullable(sections().get(heading));
    }

    /** The headings of the second level with what stands under them. */
    public Map<String, String> sections() {
      Map<String, String> sections = new LinkedHashMap<>();
      String[] parts = text.split("(?m)^## ");
      for (int i = 1; i < parts.length; i++) {
        int end = parts[i].indexOf('\n');
        sections.put(parts[i].substring(0, end).strip(), parts[i].substring(end).strip());
      }
      return sections;
    }

    /** The first paragraph of the page: enough for a hover. */
    public String summary() {
      String mistake = section(SECTIONS.get(0)).orElse("");
      int end = mistake.indexOf("\n\n");
      return (end < 0 ? mistake : mistake.substring(0, end)).replace('\n', ' ');
    }

    /** The sheet in a section, as its test reads it. */
    public Optional<String> sheet(String heading) {
      String section = section(heading).orElse("");
      int start = section.indexOf("```yaml\n");
      int end = section.indexOf("```", start + 3);
      return start < 0 || end < 0
          ? Optional.empty()
          : Optional.of(section.substring(start + "```yaml\n".length(), end));
    }
  }

  private Pages() {}

  /** The page of a finding of the catalogue; empty for a name that is none. */
  public static Optional<Page> of(String name) {
    if (!Catalog.NAMES.contains(name)) {
      return Optional.empty();
    }
    try (InputStream in =
        Pages.class.getResourceAsStream("/dev/settlewell/schema/findings/" + name + ".md")) {
      return in == null
          ? Optional.empty()
          : Optional.of(new Page(name, new String(in.readAllBytes(), StandardCharsets.UTF_8)));
    } catch (IOException e) {
      throw new UncheckedIOException("the page of " + name + " cannot be read", e);
    }
  }
}
