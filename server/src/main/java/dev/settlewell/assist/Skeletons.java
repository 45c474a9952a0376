package dev.settlewell.assist;

import dev.settlewell.vocabulary.Kind;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** What is written when somebody begins a new channel, converter, scan, interferer or stage. */
final class Skeletons {
  private static final Pattern FLOW_VALUE = Pattern.compile("([a-z0-9-]+): ([^{}\\[\\],]+)");

  private static final Map<String, String> OF_NAMES =
      Map.of(
          "channels",
          """
          <1:name>:
            measures: <2:0 V to 2.5 V>
            needs: <3:±1 %>
            sensor:
              <4:voltage: {}>
            path:
              - resistor: <5:1 kΩ ±1 %>
              - capacitor: <6:100 nF>
            acquisition: <7:12 cycles>\
          """,
          "converters",
          """
          <1:adc>:
            bits: <2:12>
            supply: <3:logic>
            reference: <4:ref>
            clock: <5:8 MHz ±1 %>
            conversion-cycles: <6:14>
            hold-capacitor: <7:{typical: 5 pF, max: 7 pF}>
            switch-resistance: <8:{max: 1.5 kΩ}>\
          """,
          "scans",
          """
          <1:name>:
            converter: <2:adc>
            rate: <3:100 Hz>
            order: [<4:channel>]\
          """,
          "interferers",
          "<1:mains>: {frequency: <2:50 Hz ±1 %>, amplitude: <3:5 mV>}",
          "supplies",
          "<1:ref>: <2:2.5 V ±0.1 % ±25 ppm/K>");

  private Skeletons() {}

  static Optional<Template> named(String section) {
    return Optional.ofNullable(OF_NAMES.get(section)).map(Template::new);
  }

  /**
   * A sensor or stage as its first example in the vocabulary writes it, its values to be filled.
   */
  static Template kind(Kind kind) {
    String example =
        kind.examples().stream()
            .filter(text -> text.startsWith(kind.name() + ":"))
            .findFirst()
            .orElse("");
    if (example.isEmpty()) {
      return new Template(kind.name() + (kind.mayBeEmpty() ? ": {}" : ": "));
    }
    String value = example.substring(kind.name().length() + 1).strip();
    return new Template(kind.name() + ": " + stops(value));
  }

  private static String stops(String value) {
    if (!value.startsWith("{")) {
      return "<1:" + value + ">";
    }
    StringBuilder marked = new StringBuilder();
    Matcher values = FLOW_VALUE.matcher(value);
    int number = 0;
    while (values.find()) {
      number++;
      String stop =
          number > 9
              ? values.group()
              : values.group(1) + ": <" + number + ":" + values.group(2).strip() + ">";
      values.appendReplacement(marked, Matcher.quoteReplacement(stop));
    }
    values.appendTail(marked);
    return marked.toString();
  }
}
