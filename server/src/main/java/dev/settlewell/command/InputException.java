package dev.settlewell.command;

/** The command cannot do what was asked: the message says why, in one line. */
final class InputException extends Exception {
  private static final long serialVersionUID = 1;

  InputException(String message) {
    super(message);
  }
}
