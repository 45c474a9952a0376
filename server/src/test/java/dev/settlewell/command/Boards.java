package dev.settlewell.command;

/** Small sheets of a weather mast, each with what its name says. */
final class Boards {
  /** One channel that settles, fits and meets its needs. */
  static final String CLEAN =
      """
      channel-sheet: 1
      about: Weather mast, wind sensor's heater
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
          conversion-cycles: 14
          hold-capacitor: {typical: 5 pF, max: 7 pF}
          switch-resistance: {max: 1.5 kΩ}
          noise: 0.4 LSB
      scans:
        mast: {converter: adc, rate: 10 Hz, order: [heater]}
      channels:
        heater:
          measures: 6 V to 12 V
          needs: ±0.2 V
          sensor:
            voltage: {resistance: 0.1 Ω}
          path:
            - divider: {upper: 47 kΩ ±0.1 %, lower: 10 kΩ ±0.1 %}
            - capacitor: 100 nF
          acquisition: 96 cycles
          interferers: []
      """;

  /** The same with an acquisition that is too short for its source: no capacitor at the pin. */
  static final String HASTY =
      CLEAN
          .replace("      - capacitor: 100 nF\n", "")
          .replace("acquisition: 96 cycles", "acquisition: 2 cycles");

  /** The same with a spelling that only its case keeps from being read. */
  static final String MISSPELT = CLEAN.replace("upper: 47 kΩ", "upper: 47 KΩ");

  /** The same without the capacitor that settling is computed with. */
  static final String INCOMPLETE =
      CLEAN.replace("    hold-capacitor: {typical: 5 pF, max: 7 pF}\n", "");

  private Boards() {}
}
