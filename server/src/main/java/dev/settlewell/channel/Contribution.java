package dev.settlewell.channel;

import dev.settlewell.text.Place;
import dev.settlewell.uncertainty.Distribution;
import java.util.List;

/**
 * One row of a budget while it is being made, in the measured unit.
 *
 * @param offset known, one-signed part
 * @param limit of the rest; three standard uncertainties where there is no hard limit
 * @param parts the distributions it is made of; several for lines that land apart
 */
record Contribution(
    String name,
    double offset,
    double limit,
    List<Distribution> parts,
    boolean bounded,
    boolean scalesWithLsb,
    boolean typicalOnly,
    List<Place> places) {

  static Contribution of(String name, Distribution part, boolean scalesWithLsb, List<Place> at) {
    boolean bounded = Double.isFinite(part.limit());
    double limit = bounded ? part.limit() : 3 * part.standard();
    return new Contribution(name, 0, limit, List.of(part), bounded, scalesWithLsb, false, at);
  }

  /**
   * Lines of one interferer: a sine of the same RMS value, and the sum of the amplitudes as limit.
   */
  static Contribution lines(String name, double limit, double rms, List<Place> at) {
    Distribution sine = new Distribution.Sine(rms * Math.sqrt(2));
    return new Contribution(name, 0, limit, List.of(sine), true, false, false, at);
  }

  double standard() {
    double sum = 0;
    for (Distribution part : parts) {
      sum += part.standard() * part.standard();
    }
    return Math.sqrt(sum);
  }

  String distribution() {
    Distribution first = parts.isEmpty() ? null : parts.get(0);
    if (first instanceof Distribution.Normal) {
      return "normal";
    }
    if (first instanceof Distribution.Sine) {
      return "sine";
    }
    return first instanceof Distribution.Student ? "student" : "rectangular";
  }
}
