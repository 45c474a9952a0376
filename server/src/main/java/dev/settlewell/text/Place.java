package dev.settlewell.text;

/**
 * A stretch of one named sheet.
 *
 * @param sheet the name its {@link SourceText} was given: a path with {@code /}, or a URI; the
 *     faces decide, everything below only passes it on
 */
public record Place(String sheet, Span span) {
  public int start() {
    return span.start();
  }

  public int end() {
    return span.end();
  }
}
