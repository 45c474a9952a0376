package dev.settlewell;

import dev.settlewell.lsp.Server;
import java.io.FileDescriptor;
import java.io.FileInputStream;
import java.io.FileOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.Properties;

/** Chooses a command, and owns the process's streams and its exit code. */
public final class Main {
  private Main() {}

  public static void main(String[] arguments) {
    // Whatever else prints, a library or a stray trace, must not land between protocol messages.
    FileOutputStream out = new FileOutputStream(FileDescriptor.out);
    System.setOut(new PrintStream(System.err, true, StandardCharsets.UTF_8));
    if (arguments.length > 0 && arguments[0].equals("serve")) {
      System.exit(Server.run(new FileInputStream(FileDescriptor.in), out, version()));
    }
    System.err.println("usage: settlewell serve");
    System.exit(2);
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
