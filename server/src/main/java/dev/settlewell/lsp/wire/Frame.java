package dev.settlewell.lsp.wire;

/** What one frame of the base protocol brought. */
public sealed interface Frame {

  /** The text of one message, within all limits. */
  record Body(String json) implements Frame {}

  /** A frame that was read to its end and thrown away, and why; the next one is intact. */
  record Refused(String why) implements Frame {}
}
