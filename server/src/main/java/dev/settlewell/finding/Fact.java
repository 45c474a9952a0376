package dev.settlewell.finding;

/** One row under a finding's sentence: {@code need 5.81 µs = 47 cycles}. */
public record Fact(String label, String text) {}
