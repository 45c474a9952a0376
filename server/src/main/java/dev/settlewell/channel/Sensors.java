package dev.settlewell.channel;

import dev.settlewell.sheet.Part;
import java.util.Map;
import java.util.Set;
import java.util.function.BiFunction;

/** The kinds of sensor, by the schema's names. */
final class Sensors {
  private static final Map<String, BiFunction<Part, Bench, SensorModel>> KINDS =
      Map.of(
          "voltage", VoltageSensor::bind,
          "current", CurrentSensor::bind,
          "thermistor", ThermistorSensor::bind,
          "rtd", ResistanceThermometer::bind,
          "thermocouple", ThermocoupleSensor::bind,
          "bridge", BridgeSensor::bind,
          "potentiometer", PotentiometerSensor::bind,
          "table", TableSensor::bind);

  private Sensors() {}

  static Set<String> kinds() {
    return KINDS.keySet();
  }

  /** Null with a note on the bench where something it needs is missing or wrong. */
  static SensorModel bind(Part sensor, Bench bench) {
    return KINDS.get(sensor.kind()).apply(sensor, bench);
  }
}
