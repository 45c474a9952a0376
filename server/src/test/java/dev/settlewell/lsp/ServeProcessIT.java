package dev.settlewell.lsp;

import static org.assertj.core.api.Assertions.assertThat;

import com.google.gson.JsonObject;
import com.google.gson.JsonParser;
import java.io.BufferedInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.lang.ProcessBuilder.Redirect;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.function.Predicate;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;

/** Drives the jar that users get, as a process, the way an editor does. */
@Timeout(120)
class ServeProcessIT {
  private static final String SHEET = "file:///nowhere/board.channels.yaml";

  private Process process;
  private OutputStream in;
  private InputStream out;

  @BeforeEach
  void start() throws IOException {
    String java = Path.of(System.getProperty("java.home"), "bin", "java").toString();
    process =
        new ProcessBuilder(java, "-jar", System.getProperty("settlewell.jar"), "serve", "--stdio")
            .redirectError(Redirect.DISCARD)
            .start();
    in = process.getOutputStream();
    out = new BufferedInputStream(process.getInputStream());
  }

  @AfterEach
  void stop() {
    process.destroyForcibly();
  }

  private void send(String json) throws IOException {
    byte[] body = json.replace('\'', '"').getBytes(StandardCharsets.UTF_8);
    in.write(("Content-Length: " + body.length + "\r\n\r\n").getBytes(StandardCharsets.UTF_8));
    in.write(body);
    in.flush();
  }

  private JsonObject next(Predicate<JsonObject> wanted) throws IOException {
    while (true) {
      int length = -1;
      for (String line = line(); !line.isEmpty(); line = line()) {
        length = Integer.parseInt(line.substring("Content-Length: ".length()));
      }
      String body = new String(out.readNBytes(length), StandardCharsets.UTF_8);
      JsonObject message = JsonParser.parseString(body).getAsJsonObject();
      if (wanted.test(message)) {
        return message;
      }
    }
  }

  private String line() throws IOException {
    StringBuilder line = new StringBuilder();
    for (int b = out.read(); b != '\n'; b = out.read()) {
      assertThat(b).as("the stream goes on").isNotNegative();
      line.append((char) b);
    }
    return line.toString().trim();
  }

  private JsonObject answer(int id) throws IOException {
    return next(m -> m.has("id") && m.get("id").getAsInt() == id);
  }

  private void initialize(String processId) throws IOException {
    send(
        "{'jsonrpc':'2.0','id':1,'method':'initialize','params':{'processId':"
            + processId
            + ",'capabilities':{}}}");
    assertThat(answer(1).getAsJsonObject("result").has("capabilities")).isTrue();
    send("{'jsonrpc':'2.0','method':'initialized','params':{}}");
  }

  private int exitCode() throws InterruptedException {
    assertThat(process.waitFor(30, TimeUnit.SECONDS)).as("the process ends").isTrue();
    return process.exitValue();
  }

  @Test
  void aWholeSession() throws Exception {
    initialize("null");
    send(
        "{'jsonrpc':'2.0','method':'textDocument/didOpen','params':{'textDocument':{'uri':'"
            + SHEET
            + "','languageId':'yaml','version':0,'text':'channel-sheet: 1\\n'}}}");
    for (int version = 1; version <= 10; version++) {
      send(
          "{'jsonrpc':'2.0','method':'textDocument/didChange','params':{'textDocument':{'uri':'"
              + SHEET
              + "','version':"
              + version
              + "},'contentChanges':[{'range':{'start':{'line':1,'character':0},"
              + "'end':{'line':1,'character':0}},'text':'# more\\n'}]}}");
    }
    JsonObject published =
        next(
            m ->
                m.has("method")
                    && m.get("method").getAsString().equals("textDocument/publishDiagnostics")
                    && m.getAsJsonObject("params").get("version").getAsInt() == 10);
    assertThat(published.getAsJsonObject("params").get("uri").getAsString()).isEqualTo(SHEET);
    send(
        "{'jsonrpc':'2.0','id':2,'method':'textDocument/hover','params':{'textDocument':{'uri':'"
            + SHEET
            + "'},'position':{'line':0,'character':3}}}");
    assertThat(answer(2).has("error")).isFalse();
    send("{'jsonrpc':'2.0','id':3,'method':'shutdown'}");
    assertThat(answer(3).has("error")).isFalse();
    send("{'jsonrpc':'2.0','method':'exit'}");
    assertThat(exitCode()).isZero();
  }

  @Test
  void exitWithoutShutdownIsOne() throws Exception {
    initialize("null");
    send("{'jsonrpc':'2.0','method':'exit'}");
    assertThat(exitCode()).isOne();
  }

  @Test
  void theEndOfTheStreamEndsIt() throws Exception {
    initialize("null");
    in.close();
    assertThat(exitCode()).isOne();
  }

  @Test
  void theDeathOfTheParentEndsIt() throws Exception {
    Process parent = new ProcessBuilder(List.of("sleep", "60")).start();
    initialize(Long.toString(parent.pid()));
    parent.destroyForcibly().waitFor();
    assertThat(exitCode()).isOne();
  }

  @Test
  void aClosedOutputEndsIt() throws Exception {
    initialize("null");
    process.getInputStream().close();
    for (int i = 0; i < 100 && process.isAlive(); i++) {
      try {
        send("{'jsonrpc':'2.0','id':2,'method':'textDocument/nothing'}");
      } catch (IOException gone) {
        break;
      }
      Thread.sleep(50);
    }
    assertThat(exitCode()).isOne();
  }
}
