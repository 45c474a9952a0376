package dev.settlewell.unit;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.fail;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Properties that hold for every value; each failure names the seed of its case. */
class RoundTripTest {
  private static final int CASES = 2_000;
  private static final Expected ANY = Expected.of();

  private static final List<String> SYMBOLS =
      List.of(
          "Ω", "F", "V", "A", "Hz", "s", "m", "g", "Pa", "1", "LSB", "cycles", "°C", "V/K", "1/K",
          "V/√Hz", "V/s", "W/K", "m/s", "bar");

  private static final List<String> UNITS =
      List.of(
          "Ω", "kΩ", "kohm", "MOhm", "pF", "uF", "µF", "μF", "V", "mV", "nA", "MHz", "kSPS", "S/s",
          "us", "mm", "%", "ppm", "LSB", "cycles", "°C", "degC", "uV/degC", "ppm/K", "nV/rtHz",
          "V/us", "mW/K", "bar", "%RH", "m/s");

  /** A value of any size that the grammar takes, evenly spread over the decades. */
  private static double anyValue(Random random, int lowest, int highest) {
    int exponent = lowest + random.nextInt(highest - lowest);
    double mantissa = 1 + 9 * random.nextDouble();
    double sign = random.nextInt(4) == 0 ? -1 : 1;
    return sign * mantissa * Double.parseDouble("1e" + exponent);
  }

  private static double read(String text) {
    Reading<Toleranced> reading = Values.quantity(text, ANY);
    if (!reading.flaws().isEmpty()) {
      fail("%s: %s", text, reading.flaws());
    }
    return reading.value().orElseThrow().value();
  }

  @Test
  void exactNotationReadsBackToTheSameDouble() {
    for (int seed = 0; seed < CASES; seed++) {
      Random random = new Random(seed);
      String symbol = SYMBOLS.get(random.nextInt(SYMBOLS.size()));
      double value = anyValue(random, -20, 20);
      String text = Engineering.exact(value, symbol);
      assertThat(read(text)).as("seed %d: %s", seed, text).isEqualTo(value);
    }
  }

  @Test
  void roundedNotationStaysOnItsSideAndClose() {
    for (int seed = 0; seed < CASES; seed++) {
      Random random = new Random(seed);
      String symbol = SYMBOLS.get(random.nextInt(SYMBOLS.size()));
      double value = anyValue(random, -20, 20);
      double up = read(Engineering.rounded(value, 3, RoundingMode.CEILING, symbol));
      double down = read(Engineering.rounded(value, 3, RoundingMode.FLOOR, symbol));
      assertThat(up).as("seed %d up", seed).isGreaterThanOrEqualTo(value);
      assertThat(down).as("seed %d down", seed).isLessThanOrEqualTo(value);
      assertThat(up - down).as("seed %d", seed).isLessThanOrEqualTo(Math.abs(value) * 0.0101);
    }
  }

  @Test
  void messageIsWithinHalfADigit() {
    for (int seed = 0; seed < CASES; seed++) {
      Random random = new Random(seed);
      String symbol = SYMBOLS.get(random.nextInt(SYMBOLS.size()));
      double value = anyValue(random, -14, 14);
      double read = read(Engineering.message(value, symbol));
      assertThat(Math.abs(read - value))
          .as("seed %d: %s", seed, Engineering.message(value, symbol))
          .isLessThanOrEqualTo(Math.abs(value) * 0.00501);
    }
  }

  /** A number in a unit has exactly the value of that number shifted by the unit's power of ten. */
  @Test
  void valuesAreCorrectlyRounded() {
    for (int seed = 0; seed < CASES; seed++) {
      Random random = new Random(seed);
      String unit = UNITS.get(random.nextInt(UNITS.size()));
      BigDecimal number =
          new BigDecimal(random.nextInt(1_000_000)).movePointLeft(random.nextInt(6));
      double scale = UnitTable.read(unit).map(Unit::scale).orElse(1.0);
      double exact = number.multiply(new BigDecimal(Double.toString(scale))).doubleValue();
      String text = number.toPlainString() + " " + unit;
      assertThat(read(text)).as("seed %d: %s", seed, text).isEqualTo(exact);
    }
  }

  @Test
  void normalSpellingKeepsTheValueAndIsNormal() {
    for (int seed = 0; seed < CASES; seed++) {
      Random random = new Random(seed);
      String text = anyText(random);
      Reading<Toleranced> before = Values.quantity(text, ANY);
      if (!before.flaws().isEmpty()) {
        fail("seed %d: %s: %s", seed, text, before.flaws());
      }
      String normal = Spelling.normal(Form.QUANTITY, text);
      Reading<Toleranced> after = Values.quantity(normal, ANY);
      if (!after.flaws().isEmpty()) {
        fail("seed %d: %s -> %s: %s", seed, text, normal, after.flaws());
      }
      boolean same = bare(before.value().orElseThrow()).equals(bare(after.value().orElseThrow()));
      if (!same || !Spelling.normal(Form.QUANTITY, normal).equals(normal)) {
        fail("seed %d: %s -> %s", seed, text, normal);
      }
    }
  }

  /** The value without the spelling of its units. */
  private static String bare(Toleranced value) {
    return value.toString().replaceAll("written=[^,]*", "written");
  }

  private static String anyText(Random random) {
    String unit = UNITS.get(random.nextInt(UNITS.size()));
    StringBuilder text = new StringBuilder();
    text.append(pick(random, "", "-", "+")).append(pick(random, "4.7", "100", "0.5", "1e3"));
    text.append(pick(random, "", " ", "  ", "\u00A0")).append(unit);
    boolean point = unit.equals("°C") || unit.equals("degC");
    if (!point && random.nextBoolean()) {
      String sign = pick(random, " ±", "  +-", " +/- ", " ± ");
      text.append(sign).append("1").append(pick(random, "", " ")).append("%");
    } else if (!point && random.nextBoolean()) {
      text.append(" +80/-20").append(pick(random, "", " ")).append("%");
    }
    if (!point && random.nextBoolean()) {
      text.append(pick(random, " ±25ppm/K", " 25  ppm/degC box -40degC to 125 °C"));
    }
    if (text.indexOf("±1") > 0 && text.indexOf("box") < 0) {
      text.append(pick(random, "", " (k=2)", " ( k = 2 n=10 )", "  at 85°C"));
    }
    return text.toString();
  }

  private static String pick(Random random, String... from) {
    return from[random.nextInt(from.length)];
  }
}
