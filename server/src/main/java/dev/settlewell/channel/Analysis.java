package dev.settlewell.channel;

import dev.settlewell.sheet.Linked;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;

/**
 * All figures of one sheet.
 *
 * @param unscanned channels that no scan samples, with what can be said of them
 */
public record Analysis(
    Linked linked,
    Map<String, ConverterFigures> converters,
    Map<String, ScanFigures> scans,
    Map<String, ChannelFigures> unscanned) {

  /** Every channel in every scan that samples it, then the unscanned ones. */
  public List<ChannelFigures> channels() {
    return Stream.concat(
            scans.values().stream().flatMap(s -> s.channels().values().stream()),
            unscanned.values().stream())
        .toList();
  }

  /** The figures of one channel, once for each scan that samples it. */
  public List<ChannelFigures> of(String channel) {
    return channels().stream().filter(c -> c.channel().name().equals(channel)).toList();
  }
}
