package dev.settlewell.channel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import dev.settlewell.channel.SheetGenerator.Generated;
import dev.settlewell.channel.SheetGenerator.Scale;
import dev.settlewell.sheet.Linked;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import java.util.Set;
import java.util.stream.LongStream;
import org.apache.commons.math3.util.FastMath;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** What must hold of every sheet, tried on random ones; a failure prints its seed and its sheet. */
class ChannelPropertiesTest {

  /** More of them on demand: {@code -Dsettlewell.seeds=2000}. */
  static LongStream seeds() {
    return LongStream.rangeClosed(1, Long.getLong("settlewell.seeds", 20));
  }

  private static List<ChannelFigures> channels(Generated sheet, String text) {
    Analysis analysis = TestSheets.analyze(text);
    assertThat(analysis.linked().sheet().problems()).as(sheet.shown()).isEmpty();
    List<ChannelFigures> channels = analysis.channels();
    assertThat(channels).as(sheet.shown()).hasSameSizeAs(sheet.channels());
    assertThat(channels)
        .as(sheet.shown())
        .allSatisfy(c -> assertThat(c.faults()).as(c.channel().name()).isEmpty());
    return channels;
  }

  private static List<ChannelFigures> channels(Generated sheet) {
    return channels(sheet, sheet.text());
  }

  private static double value(ChannelFigures channel, String name) {
    return channel.figures().value(name).orElse(Double.NaN);
  }

  private static void close(Generated sheet, String what, double expected, double actual) {
    boolean neither = Double.isNaN(expected) && Double.isNaN(actual);
    if (!neither && !(Math.abs(actual - expected) <= 1e-6 * Math.abs(expected) + 1e-12)) {
      assertThat(actual).as(what + "\n" + sheet.shown()).isEqualTo(expected);
    }
  }

  /** Every figure, row and alias is a number, and the uncertainties keep their order. */
  @ParameterizedTest
  @MethodSource("seeds")
  void everyFigureIsANumber(long seed) {
    Generated sheet = SheetGenerator.of(seed);
    for (ChannelFigures channel : channels(sheet)) {
      String name = channel.channel().name() + "\n" + sheet.shown();
      for (Figure figure : channel.figures().all()) {
        figure.value().ifPresent(v -> assertThat(v).as(figure.name() + " of " + name).isFinite());
        assertThat(figure.state())
            .as(figure.name() + " of " + name)
            .isNotInstanceOfAny(Figure.State.Missing.class, Figure.State.Silent.class);
      }
      Budget budget = channel.budget().orElseThrow();
      assertThat(budget.expanded()).as(name).isPositive().isFinite();
      assertThat(budget.hardLimit()).as(name).isFinite();
      assertThat(budget.coverageFactor()).as(name).isBetween(0.9, 2.1);
      assertThat(budget.rows().stream().mapToDouble(BudgetRow::share).sum())
          .as(name)
          .isCloseTo(1, within(1e-9));
      for (BudgetRow row : budget.rows()) {
        assertThat(row.limit()).as(row.name() + " of " + name).isFinite().isNotNegative();
        assertThat(row.standard()).as(row.name() + " of " + name).isFinite().isNotNegative();
      }
      for (Alias alias : channel.aliases()) {
        assertThat(alias.landsLow()).as(name).isBetween(0.0, alias.landsHigh());
        assertThat(alias.gain()).as(name).isFinite().isNotNegative();
        assertThat(alias.amplitudeMeasured()).as(name).isFinite().isNotNegative();
      }
    }
  }

  /** Resistances and times k times as large: a circuit in slow motion, with the same errors. */
  @ParameterizedTest
  @MethodSource("seeds")
  void resistancesAndTimesScaleTogether(long seed) {
    double k = 1 + seed % 7;
    scaled(SheetGenerator.of(seed), new Scale(k, 1, k, 1), k);
  }

  /** Resistances k times as large, capacitances a k-th: every time constant is the same. */
  @ParameterizedTest
  @MethodSource("seeds")
  void resistancesAndCapacitancesScaleAgainstEachOther(long seed) {
    double k = 1 + seed % 7;
    scaled(SheetGenerator.of(seed), new Scale(k, 1 / k, 1, 1), 1);
  }

  private static void scaled(Generated sheet, Scale scale, double time) {
    List<ChannelFigures> before = channels(sheet);
    List<ChannelFigures> after = channels(sheet, sheet.text(scale));
    for (int i = 0; i < before.size(); i++) {
      ChannelFigures a = before.get(i);
      ChannelFigures b = after.get(i);
      for (String name :
          List.of(
              "settling-error",
              "settling-error-lsb",
              "settling-error-measured",
              "settling-error-neighbour-fault",
              "pin-low",
              "pin-high",
              "droop",
              "range-used")) {
        close(sheet, name, value(a, name), value(b, name));
      }
      close(
          sheet,
          "source-resistance",
          scale.ohm() * value(a, "source-resistance"),
          value(b, "source-resistance"));
      double required = value(a, "required-acquisition");
      if (Double.isNaN(required)) {
        assertThat(value(b, "required-acquisition")).as(sheet.shown()).isNaN();
      } else {
        close(sheet, "required", time * required, value(b, "required-acquisition"));
      }
      close(sheet, "hard limit", withoutNoise(a), withoutNoise(b));
      for (int j = 0; j < a.aliases().size(); j++) {
        close(sheet, "alias", a.aliases().get(j).gain(), b.aliases().get(j).gain());
        close(
            sheet, "lands", a.aliases().get(j).landsHigh() / time, b.aliases().get(j).landsHigh());
      }
    }
  }

  /** The hard limit less what does not scale: thermal noise before an amplifier. */
  private static double withoutNoise(ChannelFigures channel) {
    Budget budget = channel.budget().orElseThrow();
    double noise =
        budget.rows().stream()
            .filter(row -> row.name().equals("noise"))
            .mapToDouble(BudgetRow::limit)
            .sum();
    return budget.hardLimit() - noise;
  }

  /** Half as much tolerance again on everything: no hard limit may shrink. */
  @ParameterizedTest
  @MethodSource("seeds")
  void moreToleranceNeverShrinksAHardLimit(long seed) {
    Generated sheet = SheetGenerator.of(seed);
    List<ChannelFigures> before = channels(sheet);
    List<ChannelFigures> after = channels(sheet, sheet.text(new Scale(1, 1, 1, 1.5)));
    for (int i = 0; i < before.size(); i++) {
      double tight = before.get(i).budget().orElseThrow().hardLimit();
      assertThat(after.get(i).budget().orElseThrow().hardLimit())
          .as(before.get(i).channel().name() + "\n" + sheet.shown())
          .isGreaterThanOrEqualTo(tight * (1 - 1e-9));
      assertThat(value(after.get(i), "pin-high"))
          .as(sheet.shown())
          .isGreaterThanOrEqualTo(value(before.get(i), "pin-high") - 1e-12);
    }
  }

  /** What is said of each channel, without the places where its values stand. */
  private static Map<String, List<String>> said(List<ChannelFigures> channels) {
    Map<String, List<String>> said = new LinkedHashMap<>();
    for (ChannelFigures channel : channels) {
      List<String> lines = new ArrayList<>();
      channel.figures().all().forEach(f -> lines.add(f.name() + " " + f.state() + " " + f.at()));
      channel.aliases().forEach(a -> lines.add(a.interferer() + a.harmonic() + " " + a.gain()));
      channel
          .budget()
          .ifPresent(
              b -> b.rows().forEach(r -> lines.add(r.name() + r.limit() + " " + r.standard())));
      said.put(channel.channel().name(), lines);
    }
    return said;
  }

  /** The order of entries says nothing; the scan's {@code order} does. */
  @ParameterizedTest
  @MethodSource("seeds")
  void orderOfEntriesMeansNothing(long seed) {
    Generated sheet = SheetGenerator.of(seed);
    Generated other = sheet.permuted(new Random(seed));
    assertThat(said(channels(other))).as(sheet.shown()).isEqualTo(said(channels(sheet)));
  }

  /** A comment anywhere changes no figure. */
  @ParameterizedTest
  @MethodSource("seeds")
  void commentsMeanNothing(long seed) {
    Generated sheet = SheetGenerator.of(seed);
    Random random = new Random(seed);
    List<String> lines = new ArrayList<>(sheet.text().lines().toList());
    lines.replaceAll(line -> random.nextInt(4) == 0 ? line + "   # 4.7 kΩ: as built" : line);
    lines.add(random.nextInt(lines.size()), "# another remark, {with: [brackets");
    String commented = String.join("\n", lines) + "\n";
    assertThat(said(channels(sheet, commented))).as(sheet.shown()).isEqualTo(said(channels(sheet)));
  }

  /**
   * Boards drawn at random from the tolerances: their error stays within the hard limit and their
   * pin within its worst range. Limits are taken at points of the range, between which a bent curve
   * may bulge a little.
   */
  @ParameterizedTest
  @MethodSource("seeds")
  void limitsHoldForEveryBoard(long seed) {
    Generated sheet = SheetGenerator.of(seed);
    Random random = new Random(seed);
    for (ChannelFigures channel : channels(sheet)) {
      ChannelModel model = model(sheet, channel);
      double slack = model.isStraight() ? 1e-9 : 0.03;
      double hard = channel.budget().orElseThrow().hardLimit();
      double pinLow = value(channel, "pin-low");
      double pinHigh = value(channel, "pin-high");
      double width = pinHigh - pinLow;
      for (int board = 0; board < 100; board++) {
        double x = model.measures().low() + random.nextDouble() * model.measures().width();
        double ambient = ambient(model, random);
        double[] p = board(model, x, ambient, random);
        String shown = "%s at %s, board %s\n%s".formatted(model.name(), x, board, sheet.shown());
        assertThat(Math.abs(model.forward().error(x, p)))
            .as(shown)
            .isLessThanOrEqualTo(hard * (1 + slack));
        assertThat(model.forward().volts(x, p))
            .as(shown)
            .isBetween(pinLow - slack * width, pinHigh + slack * width);
      }
    }
  }

  private static ChannelModel model(Generated sheet, ChannelFigures channel) {
    Linked linked = TestSheets.link(sheet.text());
    return ChannelModel.bind(
        linked,
        linked.sheet().channels().get(channel.channel().name()),
        Optional.of(linked.converters().get("adc")));
  }

  private static double ambient(ChannelModel model, Random random) {
    double low = model.ambients().get(0);
    double high = model.ambients().get(model.ambients().size() - 1);
    return low + random.nextDouble() * (high - low);
  }

  /** Every parameter somewhere within its limits, often at an end. */
  private static double[] board(ChannelModel model, double x, double ambient, Random random) {
    double[] p = model.forward().nominal().clone();
    for (Spread spread : model.spreads()) {
      boolean up = random.nextBoolean();
      double part = random.nextInt(3) == 0 ? random.nextDouble() : 1;
      Extent extent = up ? spread.plus() : spread.minus();
      p[spread.parameter()] += (up ? part : -part) * extent.at(x, ambient);
    }
    return p;
  }

  /**
   * A reservoir a hundred thousand times the hold capacitor shares its charge and recovers:
   * C_hold/C x step / (1 - e^(-T/RC)), a geometric series. For T far below RC that is the mean
   * current through R, for T far above it the capacitive divider.
   */
  @ParameterizedTest
  @ValueSource(doubles = {1e-3, 1e-2, 0.1, 1, 10, 100})
  void largeReservoirSharesAndRecovers(double periodsPerTimeConstant) {
    Random random = new Random((long) (1e6 * periodsPerTimeConstant));
    for (int i = 0; i < 10; i++) {
      double hold = 1e-12 * (1 + random.nextInt(20));
      double farads = hold * 1e5;
      double ohms = 1e3 * (1 + random.nextInt(100));
      double period = periodsPerTimeConstant * ohms * farads;
      String sheet =
          """
          channel-sheet: 1
          converters:
            adc:
              bits: 12
              reference: 1 V
              clock: %s Hz
              conversion-cycles: 10
              hold-capacitor: %s F
              switch-resistance: 1 Ω
              hold-starts-at: 0 V
          scans:
            only: {converter: adc, rate: %s Hz, order: [input]}
          channels:
            input:
              measures: 0 V to 1 V
              sensor: {voltage: {resistance: %s Ω}}
              path:
                - capacitor: %s F
              acquisition: %s s
          """
              .formatted(1e3 / period, hold, 1 / period, ohms, farads, ohms * farads * 1e-5);
      double error =
          -TestSheets.channel(sheet, "input").figures().value("settling-error").orElseThrow();
      double expected = 1e-5 / -FastMath.expm1(-periodsPerTimeConstant);
      // The pin itself stands lower by the error.
      assertThat(error / (1 - error))
          .as(sheet)
          .isCloseTo(expected, within(3e-5 * expected + expected * expected));
    }
  }

  /**
   * Without other noise a passive path gives kT/C of the hold capacitor, whatever it is made of.
   */
  @ParameterizedTest
  @MethodSource("seeds")
  void passivePathsGiveTheNoiseOfTheHoldCapacitor(long seed) {
    Generated sheet = SheetGenerator.of(seed).with(t -> t.replace("    noise: 0.4 LSB\n", ""));
    for (ChannelFigures channel : channels(sheet)) {
      ChannelModel model = model(sheet, channel);
      if (model.lastActive().isPresent()) {
        continue;
      }
      double kelvin = model.ambients().get(model.ambients().size() - 1) + 273.15;
      double volts = Math.sqrt(1.380649e-23 * kelvin / 4e-12);
      assertThat(value(channel, "noise")).as(sheet.shown()).isCloseTo(volts, within(1e-9 * volts));
    }
  }

  /** Rows of the budget carry names of their own: nothing is counted twice by accident. */
  @ParameterizedTest
  @MethodSource("seeds")
  void rowsHaveDifferentNames(long seed) {
    Generated sheet = SheetGenerator.of(seed);
    for (ChannelFigures channel : channels(sheet)) {
      List<String> names =
          channel.budget().orElseThrow().rows().stream().map(BudgetRow::name).toList();
      assertThat(Set.copyOf(names)).as(names + "\n" + sheet.shown()).hasSameSizeAs(names);
    }
  }
}
