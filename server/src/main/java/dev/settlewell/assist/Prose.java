package dev.settlewell.assist;

import java.util.ArrayList;
import java.util.List;

/**
 * Text for a person, in Markdown or plain: headings, lines and lists and nothing else, for editors
 * in terminals draw no tables and no HTML.
 */
public final class Prose {
  private record Line(boolean heading, boolean item, String markdown) {}

  private final List<Line> lines = new ArrayList<>();

  public Prose heading(String text) {
    lines.add(new Line(true, false, text));
    return this;
  }

  public Prose paragraph(String text) {
    if (!text.isBlank()) {
      lines.add(new Line(false, false, text.strip()));
    }
    return this;
  }

  public Prose item(String text) {
    lines.add(new Line(false, true, text));
    return this;
  }

  public boolean isEmpty() {
    return lines.isEmpty();
  }

  public String markdown() {
    StringBuilder out = new StringBuilder();
    boolean inList = false;
    for (Line line : lines) {
      if (!out.isEmpty()) {
        out.append(inList && line.item() ? "\n" : "\n\n");
      }
      String text = line.heading() ? "**" + line.markdown() + "**" : line.markdown();
      out.append(line.item() ? "- " : "").append(text);
      inList = line.item();
    }
    return out.toString();
  }

  public String plain() {
    StringBuilder out = new StringBuilder();
    boolean inList = false;
    for (Line line : lines) {
      if (!out.isEmpty()) {
        out.append(inList && line.item() ? "\n" : "\n\n");
      }
      out.append(line.item() ? "  " : "").append(plain(line.markdown()));
      inList = line.item();
    }
    return out.toString();
  }

  /** Takes the marks out of the little Markdown that documentation uses. */
  static String plain(String markdown) {
    return markdown
        .replaceAll("```[a-z]*\\n?", "")
        .replaceAll("\\[([^\\]]*)\\]\\([^)]*\\)", "$1")
        .replace("`", "")
        .replace("**", "")
        .replaceAll("(?<![\\w*])\\*([^*\\n]+)\\*(?![\\w*])", "$1");
  }
}
