package dev.settlewell;

import dev.settlewell.command.Console;
import dev.settlewell.command.Tool;
import java.io.BufferedInputStream;
import java.io.BufferedOutputStream;
import java.io.FileDescriptor;
import java.io.FileInputStream;
import java.io.FileOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.Properties;

/** Takes what the machine gives, and owns the process's streams and its exit code. */
public final class Main {
  /** Set by the launcher, which can ask the system whether the output is a terminal. */
  private static final String TERMINAL = "settlewell.terminal";

  private Main() {}

  public static void main(String[] arguments) {
    // Whatever else prints, a library or a stray trace, must not land between protocol messages.
    OutputStream out = new BufferedOutputStream(new FileOutputStream(FileDescriptor.out), 1 << 16);
    System.setOut(new PrintStream(System.err, true, StandardCharsets.UTF_8));
    Console console =
        new Console(
            new BufferedInputStream(new FileInputStream(FileDescriptor.in)),
            out,
            new FileOutputStream(FileDescriptor.err),
            Path.of("").toAbsolutePath(),
            System.getenv(),
            Boolean.getBoolean(TERMINAL),
            LocalDate.now(ZoneOffset.UTC),
            version());
    System.exit(Tool.run(console, arguments));
  }

  private static String version() {
    Properties build = new Properties();
    try (InputStream stream = Main.class.getResourceAsStream("build.properties")) {
      build.load(stream);
    } catch (IOException unreadable) {
      return "unknown";
    }
    return build.getProperty("version");
  }
}
