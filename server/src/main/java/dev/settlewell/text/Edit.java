package dev.settlewell.text;

/** Put {@code replacement} where {@code place} is; an empty place inserts. */
public record Edit(Place place, String replacement) {}
