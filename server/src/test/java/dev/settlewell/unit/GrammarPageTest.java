package dev.settlewell.unit;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** What the page on values shows its readers is what the reader of values does. */
class GrammarPageTest {
  private static final Pattern ROW =
      Pattern.compile("\\| ([a-z]+) \\| `([^`]+)` \\|(?: (?:`([^`]+)`|(-)) \\|)?.*");

  static Stream<Arguments> accepted() throws IOException {
    return rows("| at | accepted");
  }

  static Stream<Arguments> refused() throws IOException {
    return rows("| at | refused");
  }

  @ParameterizedTest
  @MethodSource("accepted")
  void accepted(String at, String text, String ignored) {
    assertThat(read(at, text).flaws()).isEmpty();
    assertThat(read(at, text).value()).isPresent();
  }

  @ParameterizedTest
  @MethodSource("refused")
  void refused(String at, String text, String write) {
    List<Flaw> flaws = read(at, text).flaws();
    assertThat(flaws).hasSize(1);
    if (write == null) {
      assertThat(flaws.get(0).spellings()).isEmpty();
    } else {
      assertThat(flaws.get(0).message()).startsWith("write " + write);
    }
  }

  private static Reading<?> read(String at, String text) {
    return switch (at) {
      case "resistor" -> Values.component(text, Keys.expected("ohm"));
      case "capacitor" -> Values.component(text, Keys.expected("farad"));
      case "voltage" -> Values.quantity(text, Keys.expected("volt"));
      case "rate" -> Values.quantity(text, Keys.expected("hertz"));
      case "temperature" -> Values.quantity(text, Keys.expected("point"));
      case "measured" -> Values.quantity(text, Keys.expected("any"));
      case "leakage" -> Values.deviation(text, Expected.of(Dimension.CURRENT));
      case "accuracy" -> Values.deviation(text, Keys.expected("metre"));
      case "needs" -> Values.need(text, Keys.expected("metre"));
      case "range" -> Values.range(text, Keys.expected("volt"));
      case "output" -> Values.outputRange(text, Keys.expected("volt"));
      default -> throw new IllegalArgumentException(at);
    };
  }

  /** The rows of every table with this head; a table without rows would be a test of nothing. */
  private static Stream<Arguments> rows(String head) throws IOException {
    List<Arguments> rows = new ArrayList<>();
    boolean inside = false;
    for (String line : Files.readAllLines(Path.of("..", "schema", "grammar.md"))) {
      inside = line.startsWith(head) || inside && line.startsWith("|");
      Matcher row = ROW.matcher(line);
      if (inside && row.matches()) {
        rows.add(Arguments.of(row.group(1), row.group(2), row.group(3)));
      }
    }
    assertThat(rows).hasSizeGreaterThan(20);
    return rows.stream();
  }
}
