package dev.settlewell.channel;

import dev.settlewell.sheet.Named;
import dev.settlewell.sheet.Part;

/** A converter's figures. */
public record ConverterFigures(Named<Part> converter, Figures figures) {}
