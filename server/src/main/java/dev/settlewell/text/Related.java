package dev.settlewell.text;

/** Another place that takes part in what a message says, and in which role. */
public record Related(Place place, String message) {}
