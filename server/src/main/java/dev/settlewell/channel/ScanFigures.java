package dev.settlewell.channel;

import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;
import java.util.Map;

/** A scan's figures and those of its channels, in the order of first visit. */
public record ScanFigures(
    Named<Part> scan, Figures figures, Map<String, ChannelFigures> channels) {}
