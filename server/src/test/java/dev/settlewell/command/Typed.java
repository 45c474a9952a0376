package dev.settlewell.command;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.Map;

/** What a command said and returned when a person typed it. */
record Typed(int code, String out, String err) {
  static final LocalDate TODAY = LocalDate.of(2026, 12, 1);

  static Typed in(Path folder, String... arguments) {
    return in(folder, "", Map.of(), false, arguments);
  }

  static Typed in(
      Path folder,
      String input,
      Map<String, String> environment,
      boolean terminal,
      String... arguments) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    int code = run(folder, input, out, err, environment, terminal, arguments);
    return new Typed(
        code, out.toString(StandardCharsets.UTF_8), err.toString(StandardCharsets.UTF_8));
  }

  static int run(
      Path folder,
      String input,
      OutputStream out,
      OutputStream err,
      Map<String, String> environment,
      boolean terminal,
      String... arguments) {
    Console console =
        new Console(
            new ByteArrayInputStream(input.getBytes(StandardCharsets.UTF_8)),
            out,
            err,
            folder,
            environment,
            terminal,
            TODAY,
            "0.1.0");
    return Tool.run(console, arguments);
  }
}
