package dev.settlewell.syntax;

import dev.settlewell.text.Place;

/** A comment, from its {@code #} to the line's end. */
public record Comment(Place place, boolean ownLine) {}
