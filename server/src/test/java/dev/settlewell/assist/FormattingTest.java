package dev.settlewell.assist;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

class FormattingTest {

  private static String format(String text) {
    Checked checked = Sample.check(text);
    return Sample.apply(checked.text(), Formatting.of(checked, Sample.VOCABULARY));
  }

  @Test
  void spellingsBecomeOne() {
    String odd =
        Sample.BOARD
            .replace("4.7 kΩ ±1 %", "4.7kohm +/-1%")
            .replace("capacitor: 100 nF", "capacitor: 100nF")
            .replace("{resistance: 100 Ω}", "{resistance: 100ohm}");
    assertThat(format(odd)).isEqualTo(Sample.BOARD);
  }

  @Test
  void whatIsRightStays() {
    assertThat(format(Sample.BOARD)).isEqualTo(Sample.BOARD);
  }

  @Test
  void aSecondRunChangesNothing() {
    String odd =
        Sample.BOARD
            .replace("bits: 12", "bits: 12 # resolution")
            .replace("supply: logic", "supply: logic      # clamps   ")
            .replace("4.7 kΩ ±1 %", "4.7kohm +/-1%   # in series")
            .replace("rate: 100 Hz", "rate: 100Hz   ");
    String once = format(odd);
    assertThat(format(once)).isEqualTo(once);
    assertThat(once).isNotEqualTo(odd).doesNotContain(" \n");
  }

  @Test
  void commentsShareAColumn() {
    String odd =
        Sample.BOARD
            .replace("bits: 12", "bits: 12 # resolution")
            .replace("supply: logic", "supply: logic      # clamps");
    assertThat(format(odd))
        .contains("    bits: 12       # resolution\n    supply: logic  # clamps\n");
  }

  @Test
  void alignedCommentsStayWhereTheyAre() {
    String far =
        Sample.BOARD
            .replace("bits: 12", "bits: 12          # resolution")
            .replace("supply: logic", "supply: logic     # clamps");
    assertThat(format(far)).isEqualTo(far);
  }

  @Test
  void aSheetThatCannotBeReadIsLeftAlone() {
    String broken = Sample.BOARD.replace("bits: 12", "bits: \"12").replace("±1 %", "+-1%");
    assertThat(format(broken)).isEqualTo(broken);
  }

  @Test
  void lineBreaksStayAsTheyAre() {
    String windows = Sample.BOARD.replace("clock: 8 MHz", "clock: 8MHz").replace("\n", "\r\n");
    assertThat(format(windows)).isEqualTo(Sample.BOARD.replace("\n", "\r\n"));
  }
}
