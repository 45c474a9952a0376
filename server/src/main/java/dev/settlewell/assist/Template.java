package dev.settlewell.assist;

import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Text with places to fill, written as {@code <1:10 kΩ ±1 %>}: tab stops for editors that know
 * snippets, and the words as they are for the others.
 */
record Template(String marked) {
  private static final Pattern STOP = Pattern.compile("<(\\d):([^<>]*)>");

  static Template plain(String text) {
    return new Template(text);
  }

  String text() {
    return STOP.matcher(marked).replaceAll(match -> Matcher.quoteReplacement(match.group(2)));
  }

  /** The snippet grammar of the protocol; {@code $}, {@code }} and a backslash are escaped. */
  String snippet() {
    StringBuilder out = new StringBuilder();
    Matcher stops = STOP.matcher(marked);
    int from = 0;
    while (stops.find()) {
      out.append(escaped(marked.substring(from, stops.start())));
      out.append("${").append(stops.group(1)).append(':').append(escaped(stops.group(2)));
      out.append('}');
      from = stops.end();
    }
    return out.append(escaped(marked.substring(from))).toString();
  }

  boolean hasStops() {
    return STOP.matcher(marked).find();
  }

  private static String escaped(String text) {
    return text.replace("\\", "\\\\").replace("$", "\\$").replace("}", "\\}");
  }

  /** Every line but the first moved in by so many blanks. */
  Template indented(int blanks) {
    return new Template(marked.replace("\n", "\n" + " ".repeat(blanks)));
  }
}
