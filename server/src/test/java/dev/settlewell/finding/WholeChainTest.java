package dev.settlewell.finding;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.channel.Analysis;
import dev.settlewell.channel.Analyzer;
import dev.settlewell.channel.ChannelFigures;
import dev.settlewell.channel.Figure;
import dev.settlewell.channel.TestSheets;
import dev.settlewell.text.Place;
import dev.settlewell.text.Position;
import dev.settlewell.text.PositionEncoding;
import dev.settlewell.text.SourceText;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.Set;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * From the text to the findings, over whole samples and what is left of them while somebody types:
 * nothing is thrown, nothing is told outside the text, and damage costs only what it touches.
 */
class WholeChainTest {
  private static final Path SAMPLES = Path.of("..", "samples");

  /**
   * An ordinary run looks at one text in so many; {@code -Dsettlewell.stride=1} at all of them. The
   * stride has no common divisor with the lengths of lines.
   */
  private static int stride(int ordinary) {
    return Integer.getInteger("settlewell.stride", ordinary);
  }

  static Stream<Path> samples() {
    try (Stream<Path> files = Files.walk(SAMPLES)) {
      return files.filter(f -> f.toString().endsWith(".channels.yaml")).sorted().toList().stream();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static String read(Path sample) {
    try {
      return Files.readString(sample);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** The findings, held to be no fault of ours and to stand inside the text. */
  private static List<Finding> findings(String text) {
    Analysis analysis = Analyzer.analyze(TestSheets.link(text));
    for (ChannelFigures channel : analysis.channels()) {
      for (Figure figure : channel.figures().all()) {
        figure.value().ifPresent(v -> assertThat(v).as(figure.name() + "\n" + text).isFinite());
      }
    }
    List<Finding> findings = Findings.of(analysis);
    for (Finding finding : findings) {
      assertThat(finding.name())
          .as(finding.message() + "\n" + text)
          .isNotEqualTo(Findings.INTERNAL_FAULT);
      List<Place> places = new ArrayList<>();
      places.add(finding.place());
      finding.related().forEach(r -> places.add(r.place()));
      for (Place place : places) {
        assertThat(
                0 <= place.start() && place.start() <= place.end() && place.end() <= text.length())
            .as(finding.name() + " at " + place + " of " + text.length() + "\n" + text)
            .isTrue();
      }
    }
    return findings;
  }

  @ParameterizedTest
  @MethodSource("samples")
  void everyPrefix(Path sample) {
    String text = read(sample);
    int stride = stride(101);
    for (int length = 0; length <= text.length(); length += stride) {
      findings(text.substring(0, length));
    }
    findings(text);
  }

  /** What slips in while somebody edits. */
  private static final List<String> SLIPS =
      List.of(
          "0", "-", ":", "{", "]", "\n", "\t", "  ", "#", "'", "k", " ±", "1e30 ", "0 ", "~", "*x",
          "1000000", "min", "ref", "- ", "to", "V", "Ω");

  /** Lines doubled, exchanged, shifted; stretches lost; values made absurd: several at a time. */
  @ParameterizedTest
  @MethodSource("samples")
  void damagedAtRandom(Path sample) {
    String whole = read(sample);
    int texts = 300 / stride(10);
    for (int seed = 1; seed <= texts; seed++) {
      Random random = new Random(seed * 0x9E3779B97F4A7C15L);
      StringBuilder text = new StringBuilder(whole);
      for (int edits = 1 + random.nextInt(4); edits > 0; edits--) {
        damage(text, random);
      }
      findings(text.toString());
    }
  }

  private static void damage(StringBuilder text, Random random) {
    int at = random.nextInt(text.length());
    int lineStart = text.lastIndexOf("\n", at) + 1;
    int lineEnd = text.indexOf("\n", at) + 1;
    switch (random.nextInt(5)) {
      case 0 -> text.delete(at, Math.min(text.length(), at + 1 + random.nextInt(30)));
      case 1 -> text.insert(at, SLIPS.get(random.nextInt(SLIPS.size())));
      case 2 -> text.insert(lineStart, text.substring(lineStart, Math.max(lineStart, lineEnd)));
      case 3 -> {
        // A number becomes another one: nought, negative, huge.
        Matcher number = Pattern.compile("\\d+(\\.\\d+)?").matcher(text);
        if (number.find(at)) {
          List<String> values = List.of("0", "-1", "1e-30", "1e30", "999999999", "0.5");
          text.replace(number.start(), number.end(), values.get(random.nextInt(values.size())));
        }
      }
      default -> text.insert(lineStart, "  ");
    }
  }

  /** A line that is gone costs its own channel and whoever is settled after it, no other. */
  @ParameterizedTest
  @MethodSource("samples")
  void everyLineDeleted(Path sample) {
    List<String> lines = read(sample).lines().toList();
    Map<String, List<String>> whole = byChannel(String.join("\n", lines) + "\n");
    Map<Integer, String> owners = owners(lines);
    int stride = stride(5);
    for (int i = 0; i < lines.size(); i += stride) {
      List<String> left = new ArrayList<>(lines);
      left.remove(i);
      String text = String.join("\n", left) + "\n";
      Map<String, List<String>> damaged = byChannel(text);
      if (owners.containsKey(i)) {
        Set<String> touched = touched(lines, owners, i);
        boolean unnamed = lines.get(i).startsWith("  " + owners.get(i) + ":");
        for (String channel : Set.copyOf(owners.values())) {
          if (!touched.contains(channel)) {
            assertThat(said(damaged, channel, unnamed))
                .as("%s without line %s: %s", channel, i + 1, lines.get(i))
                .isEqualTo(said(whole, channel, unnamed));
          }
        }
      }
    }
  }

  /** While an order names a channel that is gone, nobody knows which one is meant there. */
  private static List<String> said(
      Map<String, List<String>> byChannel, String channel, boolean unnamed) {
    return byChannel.getOrDefault(channel, List.of()).stream()
        .filter(line -> !unnamed || !line.contains(" not-scanned "))
        .toList();
  }

  /** What is said of each channel, in words that do not move with the text. */
  private static Map<String, List<String>> byChannel(String text) {
    Map<String, List<String>> said = new TreeMap<>();
    for (Finding finding : findings(text)) {
      said.computeIfAbsent(finding.subject(), s -> new ArrayList<>())
          .add(
              "%s %s ‹%s› %s"
                  .formatted(
                      finding.severity(),
                      finding.name(),
                      text.substring(finding.place().start(), finding.place().end()),
                      finding.message()));
    }
    return said;
  }

  /** The channel whose entry each line is part of. */
  private static Map<Integer, String> owners(List<String> lines) {
    Map<Integer, String> owners = new LinkedHashMap<>();
    boolean inChannels = false;
    String channel = null;
    for (int i = 0; i < lines.size(); i++) {
      String line = lines.get(i);
      if (line.matches("\\S.*")) {
        inChannels = line.startsWith("channels:");
        channel = null;
      } else if (inChannels && line.matches("  [a-z].*")) {
        channel = line.strip().replaceAll(":.*", "");
      }
      if (channel != null) {
        owners.put(i, channel);
      }
    }
    return owners;
  }

  /** The channel of the line, those sampled after it, and the entry before it if its key goes. */
  private static Set<String> touched(List<String> lines, Map<Integer, String> owners, int line) {
    Set<String> touched = new LinkedHashSet<>();
    String own = owners.get(line);
    touched.add(own);
    if (lines.get(line - 1).startsWith("channels:")) {
      // Without the first key its lines set the depth of all entries, and the others are too far
      // out.
      touched.addAll(owners.values());
    }
    if (lines.get(line).startsWith("  " + own + ":")) {
      owners.forEach(
          (at, name) -> {
            if (at < line && !name.equals(own)) {
              touched.add(name);
            }
          });
    }
    Matcher order = Pattern.compile("order: \\[(.*)]").matcher(String.join("\n", lines));
    while (order.find()) {
      String[] names = order.group(1).split(",\\s*");
      for (int i = 0; i < names.length; i++) {
        if (touched.contains(names[i])) {
          touched.add("after " + names[(i + 1) % names.length]);
        }
      }
    }
    touched.addAll(
        touched.stream()
            .filter(name -> name.startsWith("after "))
            .map(name -> name.substring("after ".length()))
            .toList());
    return touched;
  }

  private static List<String> shown(String text) {
    SourceText source = SourceText.of("test.channels.yaml", text);
    return findings(text).stream()
        .map(
            f ->
                "%s %s line %s ‹%s› %s"
                    .formatted(
                        f.severity(),
                        f.name(),
                        source.lineAt(f.place().start()),
                        source.slice(f.place().span()),
                        f.message()))
        .toList();
  }

  @ParameterizedTest
  @MethodSource("samples")
  void lineBreaksMeanNothing(Path sample) {
    String text = read(sample);
    assertThat(shown(text.replace("\n", "\r\n"))).isEqualTo(shown(text));
  }

  /** The ohm sign is the letter omega, the letter mu the micro sign; nothing is said of either. */
  @ParameterizedTest
  @MethodSource("samples")
  void spellingsOfOhmAndMicroMeanTheSame(Path sample) {
    String text = read(sample).replace("\u03bc", "\u00b5");
    List<String> other =
        shown(text.replace("\u03a9", "\u2126").replace("\u00b5", "\u03bc")).stream()
            .map(line -> line.replace("\u2126", "\u03a9").replace("\u03bc", "\u00b5"))
            .toList();
    assertThat(other).isEqualTo(shown(text));
  }

  /** Columns of a finding behind an emoji and an ohm sign, against a count by hand. */
  @Test
  void columnsBehindWideCharacters() {
    String text =
        """
        channel-sheet: 1
        about: "🦆 duck pond"
        converters:
          adc: {bits: 12, reference: 2.5 V}
        channels:
          pond: {about: "🦆🦆 4.7 kΩ, 10 µs", measures: 0 V to 2 V, sensor: {voltage: {}}, neds: ±1 V}
        """;
    Finding unknown =
        findings(text).stream()
            .filter(f -> f.name().equals("unknown-key"))
            .findFirst()
            .orElseThrow();
    SourceText source = SourceText.of("test.channels.yaml", text);
    int start = unknown.place().start();
    assertThat(text.substring(start, unknown.place().end())).isEqualTo("neds");
    String before = text.substring(text.lastIndexOf('\n', start) + 1, start);
    Map<PositionEncoding, Integer> expected =
        Map.of(
            PositionEncoding.UTF_8, before.getBytes(StandardCharsets.UTF_8).length,
            PositionEncoding.UTF_16, before.length(),
            PositionEncoding.UTF_32, before.codePointCount(0, before.length()));
    expected.forEach(
        (encoding, column) -> {
          Position position = source.position(start, encoding);
          assertThat(position).as(encoding.name()).isEqualTo(new Position(5, column));
          assertThat(source.offset(position, encoding)).isEqualTo(start);
        });
    assertThat(Set.copyOf(expected.values())).hasSize(3);
  }
}
