package dev.settlewell.assist;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.Analyzer;
import dev.settlewell.finding.Finding;
import dev.settlewell.finding.Findings;
import dev.settlewell.sheet.Linked;
import dev.settlewell.text.Edit;
import dev.settlewell.text.SourceText;
import dev.settlewell.vocabulary.Vocabulary;
import dev.settlewell.workspace.Memo;
import dev.settlewell.workspace.SheetReader;
import dev.settlewell.workspace.Workspace;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;

/** Sheets for tests: a text, checked, with the place that {@code ‸} marks. */
record Sample(Checked checked, int offset) {
  static final Vocabulary VOCABULARY = Vocabulary.load();
  static final String NAME = "/board/a.channels.yaml";

  /** One thermostat board; its figures are easy to work out by hand. */
  static final String BOARD =
      """
      channel-sheet: 1
      ambient: 0 °C to 50 °C

      supplies:
        logic: 3.3 V ±2 %
        ref: 2.5 V ±0.1 %

      converters:
        adc:
          bits: 12
          supply: logic
          reference: ref
          clock: 8 MHz
          acquisition-cycles: [3, 6, 12, 24, 48]
          conversion-cycles: 14
          hold-capacitor: 5 pF
          switch-resistance: 1 kΩ
          hold-starts-at: previous-channel

      scans:
        slow:
          converter: adc
          rate: 100 Hz
          order: [boiler, battery]

      interferers:
        mains: {frequency: 50 Hz ±1 %, amplitude: 1 mV}

      channels:
        boiler:
          about: sensor in the boiler's pocket
          measures: 0 °C to 90 °C
          needs: ±2 °C
          sensor:
            thermistor: {r25: 10 kΩ ±1 %, beta: 3435 K ±1 %}
          path:
            - pull-up: {resistor: 10 kΩ ±1 %, to: ref}
            - capacitor: 100 nF
          acquisition: 12 cycles
          interferers: [mains]
        battery:
          measures: 0 V to 2.5 V
          needs: ±0.05 V
          sensor:
            voltage: {resistance: 100 Ω}
          path:
            - resistor: 4.7 kΩ ±1 %
          acquisition: 24 cycles
          interferers: []
      """;

  static Sample of(String marked) {
    int offset = marked.indexOf('‸');
    String text = marked.replace("‸", "");
    return new Sample(check(text), offset);
  }

  /** The board with the first {@code before} replaced; {@code ‸} may stand in what replaces it. */
  static Sample board(String before, String after) {
    int at = BOARD.indexOf(before);
    if (at < 0) {
      throw new IllegalArgumentException("the board has no " + before);
    }
    return of(BOARD.substring(0, at) + after + BOARD.substring(at + before.length()));
  }

  static Checked check(String text) {
    return check(NAME, Map.of(NAME, text));
  }

  static Checked check(String name, Map<String, String> files) {
    Linked linked =
        Workspace.read(
                List.of(name), reader(files), LocalDate.of(2026, 12, 1), new Memo(VOCABULARY))
            .find(name)
            .orElseThrow();
    Analysis analysis = Analyzer.analyze(linked);
    return new Checked(analysis, Findings.of(analysis));
  }

  private static SheetReader reader(Map<String, String> files) {
    return new SheetReader() {
      @Override
      public Content read(String path) {
        String text = files.get(path);
        return text == null ? Content.none("there is no such file") : Content.of(text);
      }

      @Override
      public boolean exists(String path) {
        return files.containsKey(path) || path.equals("/board/.git");
      }

      @Override
      public String real(String path) {
        return path;
      }
    };
  }

  static List<Finding> findings(String text) {
    return check(text).findings();
  }

  static String apply(SourceText text, List<Edit> edits) {
    List<Edit> fromBehind = new ArrayList<>(edits);
    fromBehind.sort(Comparator.comparingInt((Edit edit) -> edit.place().start()).reversed());
    StringBuilder content = new StringBuilder(text.content());
    for (Edit edit : fromBehind) {
      content.replace(edit.place().start(), edit.place().end(), edit.replacement());
    }
    return content.toString();
  }
}
