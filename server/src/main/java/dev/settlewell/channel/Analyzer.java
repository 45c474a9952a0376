package dev.settlewell.channel;

import dev.settlewell.sheet.Linked;

/** Computes every figure of a sheet: a pure function of the linked sheet. */
public final class Analyzer {
  private Analyzer() {}

  public static Analysis analyze(Linked linked) {
    throw new UnsupportedOperationException();
  }
}
