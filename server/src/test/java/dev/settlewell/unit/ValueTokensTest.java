package dev.settlewell.unit;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.unit.ValueTokens.Kind;
import dev.settlewell.unit.ValueTokens.Part;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What a cursor stands in. */
class ValueTokensTest {

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "QUANTITY | 4.7 kΩ ±1 % | NUMBER/VALUE UNIT/VALUE SIGN/TOLERANCE NUMBER/TOLERANCE"
            + " UNIT/TOLERANCE",
        "COMPONENT | 4k7 ±100 ppm/K | CODE/VALUE SIGN/DRIFT NUMBER/DRIFT UNIT/DRIFT",
        "COMPONENT | R47 | CODE/VALUE",
        "COMPONENT | 100nF | NUMBER/VALUE UNIT/VALUE",
        "QUANTITY | 1 V 25 ppm/K box -40 °C to 85 °C | NUMBER/VALUE UNIT/VALUE NUMBER/DRIFT"
            + " UNIT/DRIFT KEYWORD/BOX NUMBER/BOX UNIT/BOX KEYWORD/BOX NUMBER/BOX UNIT/BOX",
        "DEVIATION | +80/-20 % (k=2) | SIGN/TOLERANCE NUMBER/TOLERANCE SIGN/TOLERANCE"
            + " NUMBER/TOLERANCE UNIT/TOLERANCE PUNCTUATION/BASIS KEYWORD/BASIS"
            + " PUNCTUATION/BASIS NUMBER/BASIS PUNCTUATION/BASIS",
        "DEVIATION | ±80 nA at 85 °C | SIGN/TOLERANCE NUMBER/TOLERANCE UNIT/TOLERANCE KEYWORD/AT"
            + " NUMBER/AT UNIT/AT",
        "NEED | ±0.1 m worst-case | SIGN/TOLERANCE NUMBER/TOLERANCE UNIT/TOLERANCE"
            + " KEYWORD/TOLERANCE",
        "RANGE | 0 to 6 m | NUMBER/VALUE KEYWORD/UPPER NUMBER/UPPER UNIT/UPPER",
        "QUANTITY | 50 % of ref | NUMBER/VALUE UNIT/VALUE KEYWORD/VALUE NAME/VALUE",
        "DEVIATION | ±1 % of full scale | SIGN/TOLERANCE NUMBER/TOLERANCE UNIT/TOLERANCE"
            + " KEYWORD/TOLERANCE KEYWORD/TOLERANCE KEYWORD/TOLERANCE",
        "FRACTION | 1/8 | NUMBER/VALUE PUNCTUATION/VALUE NUMBER/VALUE",
        "QUANTITY | 4.7 kΩ ± | NUMBER/VALUE UNIT/VALUE SIGN/TOLERANCE",
        "QUANTITY | 5 V @ bananas | NUMBER/VALUE UNIT/VALUE UNKNOWN/VALUE UNKNOWN/VALUE",
      })
  void pieces(Form form, String text, String expected) {
    String pieces =
        ValueTokens.of(form, text).stream()
            .map(piece -> piece.kind() + "/" + piece.part())
            .collect(Collectors.joining(" "));
    assertThat(pieces).isEqualTo(expected);
  }

  @Test
  void theCursorStandsInAPieceOrAtItsEnd() {
    String text = "4.7 kΩ ±1";
    assertThat(kindAt(text, 0)).isEqualTo(Kind.NUMBER);
    assertThat(kindAt(text, 3)).isEqualTo(Kind.NUMBER);
    assertThat(kindAt(text, 4)).isEqualTo(Kind.UNIT);
    assertThat(kindAt(text, 6)).isEqualTo(Kind.UNIT);
    assertThat(kindAt(text, 9)).isEqualTo(Kind.NUMBER);
    assertThat(ValueTokens.at(Form.QUANTITY, text, 9).orElseThrow().part())
        .isEqualTo(Part.TOLERANCE);
    assertThat(ValueTokens.at(Form.QUANTITY, "5  V", 2)).isEmpty();
    assertThat(ValueTokens.at(Form.QUANTITY, "", 0)).isEmpty();
  }

  private static Kind kindAt(String text, int offset) {
    return ValueTokens.at(Form.QUANTITY, text, offset).orElseThrow().kind();
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "QUANTITY | 100nF | 100 nF",
        "QUANTITY | 4.7 kohm +/-1% | 4.7 kΩ ±1 %",
        "QUANTITY | 4.7 k\u2126  ± 1 % | 4.7 kΩ ±1 %",
        "QUANTITY | 4.7 uF +80/-20% | 4.7 µF +80/-20 %",
        "QUANTITY | 2.5V ±0.1% 25ppm/degC box -40degC to 125degC"
            + "| 2.5 V ±0.1 % 25 ppm/°C box -40 °C to 125 °C",
        "COMPONENT | 1u0 ±10% | 1µ0 ±10 %",
        "COMPONENT | 4K7 | 4K7",
        "DEVIATION | ±0.1% of  reading ±2mm ( k=2  n = 10 ) | ±0.1 % of reading ±2 mm (k=2 n=10)",
        "RANGE | \u221240°C  to 85degC | -40 °C to 85 °C",
        "RANGE | 0 to 6m | 0 to 6 m",
        "FRACTION | 1/8 | 1/8",
        "NEED | ±1%  worst-case | ±1 % worst-case",
        "QUANTITY | 5 V, 6 bananas | 5 V, 6 bananas",
      })
  void normalSpelling(Form form, String text, String normal) {
    assertThat(Spelling.normal(form, text)).isEqualTo(normal);
  }
}
