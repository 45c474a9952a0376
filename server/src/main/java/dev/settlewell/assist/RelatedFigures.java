package dev.settlewell.assist;

import java.util.List;
import java.util.Map;

/** Which figures belong to a key: those that change when its value does, most telling first. */
final class RelatedFigures {
  private static final Map<String, List<String>> OF_CHANNEL_KEY =
      Map.ofEntries(
          Map.entry(
              "acquisition",
              List.of(
                  "acquisition",
                  "required-acquisition",
                  "required-acquisition-cycles",
                  "settling-error-lsb",
                  "time-constants")),
          Map.entry(
              "settle-within",
              List.of("settling-error-lsb", "settling-error-measured", "required-acquisition")),
          Map.entry("measures", List.of("code-low", "code-high", "range-used", "lsb-measured")),
          Map.entry("resolution", List.of("lsb-measured", "noise-measured", "effective-bits")),
          Map.entry("band", List.of("droop", "corner-frequency", "result-rate")),
          Map.entry("average", List.of("result-rate", "noise-lsb", "effective-bits")),
          Map.entry("digital-filter", List.of("result-rate", "noise-lsb", "effective-bits")),
          Map.entry("oversampling", List.of("result-rate", "noise-lsb", "effective-bits")),
          Map.entry("accumulator", List.of("accumulator-bits")),
          Map.entry("within", List.of("skew")),
          Map.entry("overload", List.of("overload-current", "pin-low", "pin-high")),
          Map.entry("sensor", List.of("pin-low", "pin-high", "code-open", "code-short")),
          Map.entry(
              "path",
              List.of(
                  "source-resistance",
                  "largest-source-resistance",
                  "smallest-reservoir",
                  "corner-frequency",
                  "pin-low",
                  "pin-high")),
          Map.entry("capacitor", List.of("smallest-reservoir", "corner-frequency")),
          Map.entry(
              "resistor",
              List.of("source-resistance", "largest-source-resistance", "corner-frequency")),
          Map.entry(
              "divider",
              List.of("source-resistance", "largest-source-resistance", "pin-low", "pin-high")));

  private RelatedFigures() {}

  /** For the key or kind under the cursor and those around it, the innermost that has any. */
  static List<String> of(Piece piece) {
    return piece
        .upwards()
        .map(p -> OF_CHANNEL_KEY.get(p.labelText()))
        .filter(figures -> figures != null)
        .findFirst()
        .orElse(List.of());
  }
}
