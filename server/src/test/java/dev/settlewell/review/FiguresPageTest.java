package dev.settlewell.review;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.Analyzer;
import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.channel.Figure;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.vocabulary.Vocabulary;
import dev.settlewell.workspace.Discovery;
import dev.settlewell.workspace.DiskReader;
import dev.settlewell.workspace.Memo;
import dev.settlewell.workspace.Workspace;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;

/** The page that lists the figures lists each one that is computed, with its unit. */
class FiguresPageTest {
  private static final Path ROOT = Path.of("..").toAbsolutePath().normalize();
  private static final Pattern ROW = Pattern.compile("^\\| (`[^|]+`) \\| ([^|]+) \\|.*");
  private static final Pattern NAME = Pattern.compile("`([a-z0-9-]+)`");

  @Test
  void listsEveryFigureWithItsUnit() throws IOException {
    Map<String, String> listed = listed();
    Map<String, String> computed = computed();
    List<String> unlisted =
        computed.keySet().stream().filter(name -> !listed.containsKey(name)).toList();
    assertThat(unlisted).as("figures that schema/figures.md does not list").isEmpty();
    assertThat(computed).hasSizeGreaterThan(50);
    computed.forEach((name, unit) -> assertThat(unit).as(name).isEqualTo(listed.get(name)));
  }

  private static Map<String, String> listed() throws IOException {
    Map<String, String> units = new LinkedHashMap<>();
    for (String line : Files.readAllLines(ROOT.resolve("schema/figures.md"))) {
      Matcher row = ROW.matcher(line.replace("\\|", "/"));
      if (row.matches()) {
        Matcher name = NAME.matcher(row.group(1));
        while (name.find()) {
          assertThat(units.put(name.group(1), row.group(2).strip())).as(name.group(1)).isNull();
        }
      }
    }
    return units;
  }

  /** Of all samples, and of the sheet that uses every key. */
  private static Map<String, String> computed() {
    List<Path> folders =
        List.of(ROOT.resolve("samples"), Path.of("src/test/resources/dev/settlewell/sheet"));
    List<String> sheets = Discovery.below(folders).sheets().stream().map(Path::toString).toList();
    Workspace workspace =
        Workspace.read(
            sheets, new DiskReader(ROOT), LocalDate.of(2026, 12, 1), new Memo(Vocabulary.load()));
    Map<String, String> units = new LinkedHashMap<>();
    workspace.sheets().values().forEach(linked -> add(Analyzer.analyze(linked), units));
    return units;
  }

  private static void add(Analysis analysis, Map<String, String> units) {
    analysis.converters().values().forEach(c -> add(c.figures().all(), "", units));
    analysis.scans().values().forEach(scan -> add(scan.figures().all(), "", units));
    for (ChannelFigures channel : analysis.channels()) {
      Slot<Part> part = channel.channel().value();
      String measured =
          part.stated()
              .flatMap(p -> p.range("measures").stated())
              .map(range -> range.unit().symbol())
              .orElse("");
      add(channel.figures().all(), measured, units);
    }
  }

  private static void add(Iterable<Figure> figures, String measured, Map<String, String> units) {
    List<String> always =
        new ArrayList<>(List.of("V", "s", "Hz", "Ω", "F", "A", "LSB", "cycles", "dB", "1"));
    for (Figure figure : figures) {
      boolean ofTheSensor = figure.unit().equals(measured) && !always.contains(measured);
      if (ofTheSensor) {
        units.put(figure.name(), "measured");
      } else if (!figure.unit().equals(measured)) {
        units.putIfAbsent(figure.name(), figure.unit());
      }
    }
  }
}
