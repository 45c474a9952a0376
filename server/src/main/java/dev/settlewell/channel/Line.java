package dev.settlewell.channel;

import dev.settlewell.sheet.Linked;
import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.unit.Toleranced;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * One sine in series with a channel's sensor: an interferer or a harmonic of it.
 *
 * @param amplitude peak, V, at its largest
 * @param place the interferer as the channel names it
 */
record Line(String interferer, int harmonic, Limits frequency, double amplitude, Place place) {

  /** The lines a channel names; those that cannot be read are left out, they have findings. */
  static List<Line> of(Part channel, Linked linked) {
    List<Line> lines = new ArrayList<>();
    List<Slot<Part>> couplings = channel.list("interferers", Part.class).orElse(List.of());
    for (Slot<Part> coupling : couplings) {
      if (!(coupling instanceof Slot.Stated<Part> stated)) {
        continue;
      }
      Slot<String> name = stated.value().text("interferer");
      Named<Part> interferer = name.stated().map(linked.interferers()::get).orElse(null);
      if (interferer != null && interferer.value().isStated()) {
        add(stated.value(), interferer, name.place(), lines);
      }
    }
    return lines;
  }

  private static void add(Part coupling, Named<Part> interferer, Place place, List<Line> into) {
    Part part = interferer.value().stated().orElseThrow();
    if (!part.quantity("frequency").isStated()) {
      return;
    }
    Limits frequency = Limits.of(part.quantity("frequency").stated().orElseThrow());
    double own = part.quantity("amplitude").stated().map(Line::peak).orElse(Double.NaN);
    double here = coupling.quantity("amplitude").stated().map(Line::peak).orElse(own);
    if (Double.isNaN(here)) {
      return;
    }
    // Harmonics keep their proportion to the amplitude at this sensor.
    double share = Double.isNaN(own) || own == 0 ? 1 : here / own;
    into.add(new Line(interferer.name(), 1, frequency, here, place));
    Map<String, Slot<Toleranced>> harmonics =
        part.map("harmonics", Toleranced.class).orElse(Map.of());
    harmonics.forEach(
        (order, amplitude) ->
            amplitude
                .stated()
                .ifPresent(
                    a ->
                        into.add(
                            harmonic(
                                interferer.name(),
                                Integer.parseInt(order),
                                frequency,
                                peak(a) * share,
                                place))));
  }

  private static Line harmonic(
      String name, int order, Limits frequency, double amplitude, Place place) {
    Limits multiplied =
        new Limits(frequency.low() * order, frequency.nominal() * order, frequency.high() * order);
    return new Line(name, order, multiplied, amplitude, place);
  }

  private static double peak(Toleranced amplitude) {
    double high = Limits.high(amplitude);
    if (amplitude.amplitude().isEmpty()) {
      return high;
    }
    return switch (amplitude.amplitude().get()) {
      case RMS -> high * Math.sqrt(2);
      case PEAK_TO_PEAK -> high / 2;
    };
  }
}
