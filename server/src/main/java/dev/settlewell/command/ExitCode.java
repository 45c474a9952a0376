package dev.settlewell.command;

/** What a command returns; documented in its help. */
final class ExitCode {
  static final int CLEAN = 0;
  static final int FINDINGS = 1;

  /** Wrong usage, input that cannot be read, or a fault of this program. */
  static final int ERROR = 2;

  private ExitCode() {}
}
