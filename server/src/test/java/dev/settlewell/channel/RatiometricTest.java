package dev.settlewell.channel;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * What a sensor and the reference have in common cancels; what they do not have in common stays. No
 * special case makes it so: a supply is one parameter of the forward model.
 */
class RatiometricTest {

  private static Budget budget(String sensor, String path, String measures, String supply) {
    String sheet =
        """
        channel-sheet: 1
        ambient: -20 °C to 60 °C
        supplies:
          ref: 2.5 V ±1 %% ±50 ppm/K
          other: 2.5 V ±1 %% ±50 ppm/K
        converters:
          adc: {bits: 12, reference: ref, offset-error: ±2 LSB, gain-error: ±2 LSB, input: %s}
        channels:
          input:
            measures: %s
            sensor: %s
            path: [%s]
        """
            .formatted(
                sensor.contains("bridge") ? "bipolar" : "single-ended", measures, sensor, path)
            .replace("SUPPLY", supply);
    ChannelFigures channel = TestSheets.channel(sheet, "input");
    assertThat(channel.faults()).isEmpty();
    return channel.budget().orElseThrow();
  }

  /** Each line: what is measured, the sensor, its path. */
  @ParameterizedTest
  @CsvSource(
      delimiter = ';',
      value = {
        "0 °C to 50 °C; {thermistor: {r25: 10 kΩ ±1 %, beta: 3950 K ±1 %}};"
            + " pull-up: {resistor: 10 kΩ ±1 %, to: SUPPLY}",
        "0 °C to 50 °C; {thermistor: {r25: 10 kΩ ±1 %, beta: 3950 K ±1 %, from: SUPPLY}};"
            + " pull-down: 10 kΩ ±1 %",
        "10 mm to 90 mm;"
            + " {potentiometer: {resistance: 10 kΩ ±20 %, across: SUPPLY, spans: 0 mm to 100 mm}};"
            + " pull-down: 1 MΩ ±5 %",
        "0 N to 100 N;"
            + " {bridge: {sensitivity: 2 mV/V ±0.1 %, excitation: SUPPLY, resistance: 350 Ω}};"
            + " amplifier: {gain: 200, gain-error: ±0.1 %, offset: ±50 µV}",
        "0 bar to 10 bar;"
            + " {voltage: {output: 0.2 V to 2.3 V, proportional-to: SUPPLY, accuracy: ±1 %}};"
            + " divider: {upper: 1 kΩ ±1 %, lower: 100 kΩ ±1 %}",
        "-20 °C to 120 °C; {rtd: {class: B}};" + " pull-up: {resistor: 1 kΩ ±0.1 %, to: SUPPLY}",
        "0 bar to 10 bar;"
            + " {table: {points: [[0 bar, 0.2 V], [5 bar, 1.1 V], [10 bar, 2.3 V]],"
            + " proportional-to: SUPPLY}};"
            + " resistor: 1 kΩ ±1 %",
        "0 bar to 10 bar;"
            + " {current: {output: 0.1 mA to 1 mA, proportional-to: SUPPLY}}; shunt: 2 kΩ ±0.1 %"
      })
  void commonSupplyCancels(String measures, String sensor, String path) {
    Budget common = budget(sensor.strip(), path.strip(), measures.strip(), "ref");
    assertThat(common.rows()).isNotEmpty();
    assertThat(common.rows())
        .filteredOn(row -> row.name().startsWith("supply"))
        .allMatch(row -> row.limit() <= 1e-9 * common.hardLimit());

    Budget apart = budget(sensor.strip(), path.strip(), measures.strip(), "other");
    assertThat(apart.rows())
        .filteredOn(row -> row.name().startsWith("supply"))
        .extracting(BudgetRow::name)
        .contains("supply-ref", "supply-ref-drift", "supply-other", "supply-other-drift");
    assertThat(apart.rows())
        .filteredOn(row -> row.name().equals("supply-other"))
        .allMatch(row -> row.share() > 0.001);
    assertThat(apart.expanded()).isGreaterThan(common.expanded());
  }
}
