package dev.settlewell.command;

import dev.settlewell.review.Style;
import java.io.IOException;
import java.io.OutputStream;
import java.io.PrintWriter;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.util.Locale;

/** What a command says: results on one stream, everything about the run on the other. */
final class Output {
  private final Console console;

  Output(Console console) {
    this.console = console;
  }

  /** Writes results. A reader that has seen enough ({@code | head}) is no error; a full disk is. */
  void result(String text) throws InputException {
    try {
      write(console.out(), text);
    } catch (IOException e) {
      String reason = String.valueOf(e.getMessage());
      if (!reason.toLowerCase(Locale.ROOT).contains("pipe")) {
        throw new InputException("cannot write the output: " + reason);
      }
    }
  }

  /** One line about the run itself; what names of files hold must not command a terminal. */
  void note(String line) {
    try {
      String shown = line.replaceAll("[\\p{Cc}\\p{Cf}]", "\uFFFD");
      write(console.err(), "settlewell: " + shown + "\n");
    } catch (IOException e) {
      // Nobody is left who could be told.
    }
  }

  /** For the help and error texts of the option parser. */
  static PrintWriter printer(OutputStream stream) {
    return new PrintWriter(
        new Writer() {
          @Override
          public void write(char[] chars, int offset, int length) throws IOException {
            stream.write(new String(chars, offset, length).getBytes(StandardCharsets.UTF_8));
          }

          @Override
          public void flush() throws IOException {
            stream.flush();
          }

          @Override
          public void close() throws IOException {
            flush();
          }
        },
        true);
  }

  /**
   * NO_COLOR and FORCE_COLOR count where they are set and not empty, the first before the second.
   */
  static boolean coloured(Console console) {
    if (!console.environment().getOrDefault("NO_COLOR", "").isEmpty()) {
      return false;
    }
    String forced = console.environment().getOrDefault("FORCE_COLOR", "");
    if (!forced.isEmpty()) {
      return !forced.equals("0");
    }
    return console.terminal() && !"dumb".equals(console.environment().get("TERM"));
  }

  Style style() {
    return coloured(console) ? Style.COLOURED : Style.PLAIN;
  }

  private static void write(OutputStream stream, String text) throws IOException {
    stream.write(text.getBytes(StandardCharsets.UTF_8));
    stream.flush();
  }
}
