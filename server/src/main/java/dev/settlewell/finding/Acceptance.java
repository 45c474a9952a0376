package dev.settlewell.finding;

import dev.settlewell.text.Place;

/** That a finding is known and meant. */
public record Acceptance(String because, Place place) {}
