package dev.settlewell;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.DisabledOnOs;
import org.junit.jupiter.api.condition.OS;
import org.junit.jupiter.api.io.TempDir;

/** The launcher and the packaged jar, as a person starts them. */
@DisabledOnOs(OS.WINDOWS)
class LauncherIT {
  private static final Path ROOT =
      Path.of(System.getProperty("settlewell.root")).toAbsolutePath().normalize();

  @TempDir private Path folder;

  /** What a process said and returned. */
  private record Ended(int code, String out, String err) {}

  private Ended start(Map<String, String> environment, String... words)
      throws IOException, InterruptedException {
    Path out = Files.createTempFile(folder, "out", "");
    Path err = Files.createTempFile(folder, "err", "");
    ProcessBuilder builder =
        new ProcessBuilder(new ArrayList<>(List.of(words)))
            .directory(folder.toFile())
            .redirectOutput(out.toFile())
            .redirectError(err.toFile());
    builder.environment().putAll(environment);
    Process process = builder.start();
    process.getOutputStream().close();
    assertThat(process.waitFor(60, TimeUnit.SECONDS)).as("ends in time").isTrue();
    return new Ended(process.exitValue(), read(out), read(err));
  }

  private static String read(Path file) throws IOException {
    return Files.readString(file, StandardCharsets.UTF_8);
  }

  @Test
  void startsThroughALinkFromAnotherFolder() throws Exception {
    Path bin = Files.createDirectories(folder.resolve("my tools"));
    Path first = bin.resolve("first");
    Files.createSymbolicLink(first, ROOT.resolve("server/bin/settlewell"));
    Path link = Files.createSymbolicLink(bin.resolve("settlewell"), Path.of("first"));
    Ended ended = start(Map.of(), link.toString(), "--version");
    assertThat(ended).isEqualTo(new Ended(0, "settlewell 0.1.0\n", ""));
  }

  @Test
  void checksASheetUnderAForeignLocale() throws Exception {
    Files.copy(
        ROOT.resolve("samples/river-gauge/river-gauge.channels.yaml"),
        folder.resolve("river-gauge.channels.yaml"));
    Map<String, String> environment =
        Map.of("JAVA_TOOL_OPTIONS", "-Duser.language=tr -Duser.country=TR", "LC_ALL", "C");
    Ended ended = start(environment, launcher(), "check");
    assertThat(ended.out()).isEqualTo(start(Map.of(), launcher(), "check").out());
    assertThat(ended.code()).isZero();
  }

  @Test
  void saysInOneLineThatThereIsNoJava() throws Exception {
    Path copy = Files.createDirectories(folder.resolve("bin")).resolve("settlewell");
    Files.copy(ROOT.resolve("server/bin/settlewell"), copy);
    Files.createFile(copy.resolveSibling("settlewell.jar"));
    Path old = Files.createDirectories(folder.resolve("old/bin"));
    Files.createFile(old.resolve("java")).toFile().setExecutable(true);
    Files.writeString(folder.resolve("old/release"), "JAVA_VERSION=\"1.8.0_402\"\n");
    String script = read(copy).replace("/usr/lib/jvm/*", folder + "/none/*");
    Files.writeString(copy, script);
    copy.toFile().setExecutable(true);
    Path tools = Files.createDirectories(folder.resolve("tools"));
    for (String tool : List.of("sh", "dirname", "readlink")) {
      Files.createSymbolicLink(tools.resolve(tool), Path.of("/usr/bin/" + tool));
    }
    Ended ended =
        start(Map.of("JAVA_HOME", folder + "/old", "PATH", tools.toString()), copy.toString());
    assertThat(ended.code()).isEqualTo(2);
    assertThat(ended.err())
        .isEqualTo(
            "settlewell: no Java 17 or newer was found; install one, or set JAVA_HOME to it\n");
  }

  @Test
  void aBrokenPipeIsNoError() throws Exception {
    String sheet = ROOT.resolve("samples/river-gauge").toString();
    Ended ended =
        start(
            Map.of("PATH", System.getenv("PATH")),
            "bash",
            "-c",
            "'" + launcher() + "' figures '" + sheet + "' | true; exit ${PIPESTATUS[0]}");
    assertThat(ended.code()).isZero();
    assertThat(ended.err()).isEmpty();
  }

  private static String launcher() {
    return ROOT.resolve("server/bin/settlewell").toString();
  }
}
