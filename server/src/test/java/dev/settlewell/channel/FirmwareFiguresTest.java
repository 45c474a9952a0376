package dev.settlewell.channel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

/** What firmware is told: scale and offset, and the codes of faults. */
class FirmwareFiguresTest {
  private static final String HEAD =
      """
      channel-sheet: 1
      supplies:
        ref: 2.5 V
      converters:
        adc: {bits: 12, reference: ref}
      channels:
      """;

  private static ChannelFigures channel(String body) {
    return TestSheets.channel(HEAD + body.indent(2), "a");
  }

  @Test
  void anUnloadedPotentiometerIsAStraightLineOfTheCode() {
    ChannelFigures a =
        channel(
            """
            a:
              measures: 0 mm to 100 mm
              sensor:
                potentiometer: {resistance: 10 kΩ, across: ref, spans: 0 mm to 100 mm}
            """);
    // x = code x 100 mm / 4096 by the definition of the code.
    assertThat(a.figures().value("scale").orElseThrow()).isEqualTo(0.1 / 4096, within(1e-15));
    assertThat(a.figures().value("offset").orElseThrow()).isEqualTo(0, within(1e-12));
  }

  @Test
  void aLoadedPotentiometerIsNone() {
    ChannelFigures a =
        channel(
            """
            a:
              measures: 0 mm to 100 mm
              sensor:
                potentiometer: {resistance: 10 kΩ, across: ref, spans: 0 mm to 100 mm}
              path:
                - pull-down: 22 kΩ
            """);
    assertThat(a.figures().get("scale").orElseThrow().state())
        .isInstanceOf(Figure.State.None.class);
  }

  @Test
  void theFixedPointPairReproducesEveryCodeWithinItsError() {
    ChannelFigures a =
        channel(
            """
            a:
              measures: 0 bar to 10 bar
              resolution: 0.01 bar
              sensor:
                voltage: {output: 0.25 V to 2.25 V, spans: 0 bar to 10 bar}
            """);
    double scale = a.figures().value("scale").orElseThrow();
    double multiplier = a.figures().value("scale-multiplier").orElseThrow();
    double shift = a.figures().value("scale-shift").orElseThrow();
    double error = a.figures().value("scale-error").orElseThrow();
    for (int code = 0; code < 4096; code++) {
      double fixed = code * multiplier / Math.scalb(1.0, (int) shift) * 0.01;
      assertThat(Math.abs(fixed - code * scale)).isLessThanOrEqualTo(error * (1 + 1e-9) + 1e-12);
    }
    assertThat(multiplier).isLessThanOrEqualTo(32767);
  }

  /**
   * NAMUR NE 43 (common practice): failure at or below 3.6 mA and at or above 21 mA; 0.9 V and 5.25
   * V across 250 ohm.
   */
  @Test
  void loopFailureCodesFollowNe43() {
    ChannelFigures a =
        TestSheets.channel(
            HEAD.replace("2.5 V", "6 V")
                + """
                a:
                  measures: 0 bar to 10 bar
                  sensor:
                    current: {output: 4 mA to 20 mA, spans: 0 bar to 10 bar}
                  path:
                    - shunt: 250 Ω
                """
                    .indent(2),
            "a");
    double lsb = 6.0 / 4096;
    assertThat(a.figures().value("code-loop-low").orElseThrow())
        .isEqualTo(Math.floor(0.9 / lsb + 0.5));
    assertThat(a.figures().value("code-loop-high").orElseThrow())
        .isEqualTo(Math.floor(5.25 / lsb + 0.5));
  }
}
