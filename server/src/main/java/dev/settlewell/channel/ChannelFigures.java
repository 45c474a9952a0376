package dev.settlewell.channel;

import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import dev.settlewell.text.Place;
import java.util.List;
import java.util.Optional;

/**
 * Everything computed for one channel in one scan, or for a channel that no scan samples.
 *
 * @param scan empty where no scan samples it
 * @param visits how often the scan's order visits it
 * @param typicalOnly places of typical figures that a worst case rests on
 * @param faults internal faults: what was not computed and why; empty when all is well
 */
public record ChannelFigures(
    Named<Part> channel,
    Optional<Named<Part>> scan,
    Optional<Named<Part>> converter,
    int visits,
    Figures figures,
    List<Alias> aliases,
    Optional<Budget> budget,
    List<OutputRange> outputs,
    List<Place> typicalOnly,
    List<String> faults) {
  public ChannelFigures {
    aliases = List.copyOf(aliases);
    outputs = List.copyOf(outputs);
    typicalOnly = List.copyOf(typicalOnly);
    faults = List.copyOf(faults);
  }
}
