package dev.settlewell.channel;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import java.util.function.UnaryOperator;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.apache.commons.math3.util.FastMath;

/**
 * Seeded random sheets without a fault: one converter, one scan of two to five channels of every
 * kind of sensor, with the values that front ends have.
 *
 * <p>The text is kept with its values marked, {@code <ohm:4700>}, so that a test can scale what it
 * likes. The same seed gives the same sheet for ever.
 */
public final class SheetGenerator {
  /** What may be scaled; an exponent of the factor for each kind of value. */
  public record Scale(double ohm, double farad, double second, double percent) {
    public static final Scale NONE = new Scale(1, 1, 1, 1);
  }

  /** A sheet: what stands before the channels, and each channel with its block. */
  public record Generated(long seed, String head, List<Block> channels) {
    /** A channel's name and its lines, indented as they stand. */
    public record Block(String name, String lines) {}

    public String text() {
      return text(Scale.NONE);
    }

    public String text(Scale scale) {
      StringBuilder text = new StringBuilder(render(head, scale));
      channels.forEach(c -> text.append(render(c.lines(), scale)));
      return text.toString();
    }

    /** The same with the entries of {@code channels} in another order. */
    public Generated permuted(Random random) {
      List<Block> other = new ArrayList<>(channels);
      Collections.shuffle(other, random);
      return new Generated(seed, head, other);
    }

    /** The same with the text changed, its marks still in place. */
    public Generated with(UnaryOperator<String> change) {
      return new Generated(
          seed,
          change.apply(head),
          channels.stream().map(c -> new Block(c.name(), change.apply(c.lines()))).toList());
    }

    /** For a failing test: what to run again. */
    public String shown() {
      return "seed " + seed + "\n" + text();
    }
  }

  private static final Pattern MARK = Pattern.compile("<(\\w+):([^>]+)>");

  private final Random random;
  private final long seed;

  private SheetGenerator(long seed) {
    this.seed = seed;
    // Spread: the first numbers of neighbouring seeds are nearly equal.
    this.random = new Random(seed * 0x9E3779B97F4A7C15L);
  }

  /** The sheet of a seed. */
  public static Generated of(long seed) {
    return new SheetGenerator(seed).sheet();
  }

  private static String render(String marked, Scale scale) {
    Matcher matcher = MARK.matcher(marked);
    StringBuilder text = new StringBuilder();
    while (matcher.find()) {
      double value = Double.parseDouble(matcher.group(2));
      double factor =
          switch (matcher.group(1)) {
            case "ohm" -> scale.ohm();
            case "farad" -> scale.farad();
            case "second" -> scale.second();
            case "hertz" -> 1 / scale.second();
            case "ampere" -> 1 / scale.ohm();
            case "percent" -> scale.percent();
            default -> throw new IllegalArgumentException(matcher.group());
          };
      matcher.appendReplacement(text, Double.toString(value * factor));
    }
    matcher.appendTail(text);
    return text.toString();
  }

  private Generated sheet() {
    List<Generated.Block> channels = new ArrayList<>();
    List<String> order = new ArrayList<>();
    int count = 2 + random.nextInt(4);
    for (int i = 0; i < count; i++) {
      String name = "channel-" + (i + 1);
      channels.add(new Generated.Block(name, channel(name)));
      order.add(name);
    }
    if (random.nextInt(3) == 0) {
      order.add(random.nextInt(order.size()), order.get(random.nextInt(order.size())));
    }
    return new Generated(seed, head(order), List.copyOf(channels));
  }

  private String head(List<String> order) {
    return """
    channel-sheet: 1
    about: made from seed %s
    ambient: %s °C to %s °C
    defaults:
      resistor: ±<percent:1> %% ±100 ppm/K
      capacitor: ±<percent:10> %%
    supplies:
      logic: 3.3 V ±<percent:2> %%
      ref: 2.5 V ±<percent:0.1> %% ±25 ppm/K
      other: 3.0 V ±<percent:1> %%
    converters:
      adc:
        bits: %s
        supply: logic
        reference: ref
        clock: <hertz:%s> Hz ±<percent:%s> %%
        conversion-cycles: %s
        hold-capacitor: {typical: <farad:%s> F, max: <farad:%s> F}
        switch-resistance: {max: <ohm:%s> Ω}
    %s    pin-leakage: ±<ampere:%s> A
        offset-error: ±2 LSB
        gain-error: ±3 LSB
        integral-nonlinearity: ±1.5 LSB
        noise: 0.4 LSB
    scans:
      round:
        converter: adc
        rate: <hertz:%s> Hz ±<percent:0.5> %%
        order: %s
        gap: <second:2E-6> s
    interferers:
      mains: {frequency: <hertz:50> Hz ±1 %%, amplitude: 5 mV, harmonics: {2: 1 mV, 3: 0.5 mV}}
      switcher: {frequency: <hertz:%s> Hz ±5 %%, amplitude: 10 mV}
    channels:
    """
        .formatted(
            seed,
            -20 + random.nextInt(30),
            40 + random.nextInt(40),
            8 + random.nextInt(9),
            rounded(logarithmic(1e6, 16e6)),
            pick("0", "1", "5"),
            10 + random.nextInt(8),
            4e-12,
            rounded(logarithmic(5e-12, 20e-12)),
            rounded(logarithmic(100, 5e3)),
            optional("    pin-capacitance: <farad:6.0E-12> F\n")
                + optional("    hold-starts-at: " + pick("0 V", "unknown", "50 % of ref") + "\n"),
            rounded(logarithmic(1e-10, 1e-7)),
            rounded(logarithmic(20, 300)),
            order,
            rounded(logarithmic(1e3, 1e6)));
  }

  private String channel(String name) {
    String[] measured = measured();
    return """
      %s:
        measures: %s
        needs: ±5 %% worst-case
        sensor: %s
        path: [%s]
        acquisition: %s cycles
    %s\
    """
        .formatted(
            name,
            measured[0],
            measured[1],
            String.join(", ", path(measured)),
            pick("3", "8", "24", "100", "200"),
            optional("    average: " + pick("2", "4", "16", "20") + "\n")
                + optional("    band: <hertz:1> Hz\n")
                + optional("    interferers: [mains" + optional(", switcher") + "]\n"));
  }

  /** What is measured, the sensor, and what its path must begin with. */
  private String[] measured() {
    return switch (random.nextInt(10)) {
      case 0 -> new String[] {"0 V to 2.4 V", "{voltage: {resistance: " + ohms(1, 1e5) + "}}", ""};
      case 1 ->
          new String[] {
            "0 V to 20 V",
            "{voltage: {}}",
            "{divider: {upper: " + ohms(5e4, 5e5) + ", lower: <ohm:6000> Ω}}"
          };
      case 2 ->
          new String[] {
            "0 bar to 10 bar",
            "{voltage: {output: 0.2 V to 2.3 V, accuracy: ±<percent:0.5> %, proportional-to: "
                + pick("ref", "other")
                + "}}",
            "{pull-down: <ohm:1.0E6> Ω}"
          };
      case 3 ->
          new String[] {
            "0 m to 6 m",
            "{current: {output: <ampere:4.0E-3> A to <ampere:20.0E-3> A, accuracy: ±0.1 %}}",
            "{shunt: <ohm:120> Ω ±<percent:0.1> %}"
          };
      case 4 ->
          new String[] {
            "0 °C to 60 °C",
            "{thermistor: {r25: <ohm:10000> Ω ±<percent:1> %, beta: 3950 K ±<percent:1> %}}",
            "{pull-up: {resistor: <ohm:10000> Ω, to: " + pick("ref", "other") + "}}"
          };
      case 5 ->
          new String[] {
            "-20 °C to 120 °C",
            "{rtd: {r0: <ohm:1000> Ω, class: B}}",
            "{pull-up: {resistor: <ohm:2000> Ω ±<percent:0.1> %, to: ref}}"
          };
      case 6 ->
          new String[] {
            "5 mm to 95 mm",
            "{potentiometer: {resistance: "
                + ohms(2e3, 5e4)
                + ", across: ref, spans: 0 mm to 100 mm}}",
            "{pull-down: <ohm:1.0E6> Ω}"
          };
      case 7 ->
          new String[] {
            "0 N to 100 N",
            "{bridge: {sensitivity: 2 mV/V ±<percent:0.1> %, excitation: ref,"
                + " resistance: <ohm:350> Ω}}",
            amplifier(400)
          };
      case 8 ->
          new String[] {
            "20 °C to 350 °C",
            "{thermocouple: {type: K, class: 1,"
                + " cold-junction: {range: 0 °C to 50 °C, accuracy: ±0.5 °C}}}",
            amplifier(150)
          };
      default ->
          new String[] {
            "0 bar to 10 bar",
            "{table: {points: [[0 bar, 0.2 V], [4 bar, 1.1 V], [10 bar, 2.3 V]],"
                + " resistance: <ohm:470> Ω}}",
            ""
          };
    };
  }

  private static String amplifier(int gain) {
    return """
    {amplifier: {gain: %s, gain-error: ±<percent:0.2> %%, level: 0.1 V, offset: ±50 µV, \
    gain-bandwidth: <hertz:2.0E7> Hz, output-resistance: <ohm:%s> Ω}}\
    """
        .formatted(gain, gain == 400 ? "0" : "100");
  }

  private List<String> path(String[] measured) {
    List<String> stages = new ArrayList<>();
    if (!measured[2].isEmpty()) {
      stages.add(measured[2]);
    }
    int sections = random.nextInt(3);
    for (int i = 0; i < sections; i++) {
      stages.add("{resistor: " + ohms(100, 2e4) + "}");
      stages.add("{capacitor: <farad:" + rounded(logarithmic(1e-11, 3e-7)) + "> F}");
    }
    return stages;
  }

  private String ohms(double low, double high) {
    return "<ohm:" + rounded(logarithmic(low, high)) + "> Ω";
  }

  private String optional(String text) {
    return random.nextBoolean() ? text : "";
  }

  private String pick(String... words) {
    return words[random.nextInt(words.length)];
  }

  private double logarithmic(double low, double high) {
    return low * FastMath.pow(high / low, random.nextDouble());
  }

  /** To three significant digits, as values on a board are. */
  private static double rounded(double value) {
    double unit = FastMath.pow(10, Math.floor(FastMath.log10(value)) - 2);
    return Double.parseDouble("%.3e".formatted(Math.rint(value / unit) * unit).replace(',', '.'));
  }
}
