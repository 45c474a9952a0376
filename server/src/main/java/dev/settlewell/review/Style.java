package dev.settlewell.review;

import dev.settlewell.finding.Severity;

/** Colours of a terminal, or none. Nothing is said by colour alone. */
public enum Style {
  PLAIN,
  COLOURED;

  private static final String BOLD = "1";
  private static final String FAINT = "2";
  private static final String RED = "1;31";
  private static final String YELLOW = "1;33";
  private static final String BLUE = "1;34";
  private static final String GREEN = "32";

  String bold(String text) {
    return painted(BOLD, text);
  }

  String faint(String text) {
    return painted(FAINT, text);
  }

  String added(String text) {
    return painted(GREEN, text);
  }

  String severity(Severity severity, String text) {
    return switch (severity) {
      case ERROR -> painted(RED, text);
      case WARNING -> painted(YELLOW, text);
      case INFORMATION -> painted(BLUE, text);
      case HINT, OFF -> painted(FAINT, text);
    };
  }

  private String painted(String code, String text) {
    return this == PLAIN || text.isEmpty() ? text : "\u001b[" + code + "m" + text + "\u001b[0m";
  }
}
