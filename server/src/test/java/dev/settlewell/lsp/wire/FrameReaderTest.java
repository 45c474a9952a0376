package dev.settlewell.lsp.wire;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Against "Base Protocol" of the Language Server Protocol specification, 3.17. */
class FrameReaderTest {

  private static FrameReader reader(byte[] bytes) {
    return new FrameReader(new ByteArrayInputStream(bytes), 1000, 5);
  }

  private static FrameReader reader(String text) {
    return reader(text.getBytes(StandardCharsets.UTF_8));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "Content-Length: 2\r\n\r\n{}",
        "content-length: 2\r\n\r\n{}",
        "CONTENT-LENGTH:2\r\n\r\n{}",
        "Content-Length: 2\n\n{}",
        "Content-Type: application/vscode-jsonrpc; charset=utf8\r\nContent-Length: 2\r\n\r\n{}",
        "Content-Length: 2\r\nContent-Type: a/b; charset=\"UTF-8\"\r\nX-Other: 1\r\n\r\n{}",
      })
  void readsEverySpellingOfAHeader(String frame) throws IOException {
    assertThat(reader(frame).next()).contains(new Frame.Body("{}"));
  }

  @Test
  void readsOneFrameAfterTheOther() throws IOException {
    FrameReader reader = reader("Content-Length: 2\r\n\r\n{}Content-Length: 2\r\n\r\n[]");
    assertThat(reader.next()).contains(new Frame.Body("{}"));
    assertThat(reader.next()).contains(new Frame.Body("[]"));
    assertThat(reader.next()).isEmpty();
  }

  @Test
  void countsBytesAndNotCharacters() throws IOException {
    assertThat(reader("Content-Length: 4\r\n\r\n\"Ω\"").next()).contains(new Frame.Body("\"Ω\""));
  }

  @Test
  void decodesACharsetThatIsNamed() throws IOException {
    Charset latin = StandardCharsets.ISO_8859_1;
    byte[] frame =
        "Content-Length: 3\r\nContent-Type: x; charset=latin1\r\n\r\n\"±\"".getBytes(latin);
    assertThat(reader(frame).next()).contains(new Frame.Body("\"±\""));
  }

  @Test
  void refusesWhatItCannotHoldAndGoesOn() throws IOException {
    String tooLong = "Content-Length: 1001\r\n\r\n" + " ".repeat(1001);
    String tooDeep = "Content-Length: 12\r\n\r\n[[[[[[]]]]]]";
    String unknown = "Content-Length: 2\r\nContent-Type: x; charset=klingon\r\n\r\n{}";
    FrameReader reader = reader(tooLong + tooDeep + unknown + "Content-Length: 2\r\n\r\n{}");
    assertThat(reader.next()).containsInstanceOf(Frame.Refused.class);
    assertThat(reader.next()).containsInstanceOf(Frame.Refused.class);
    assertThat(reader.next()).containsInstanceOf(Frame.Refused.class);
    assertThat(reader.next()).contains(new Frame.Body("{}"));
  }

  @Test
  void bracketsInsideStringsAreNoDepth() throws IOException {
    String body = "[\"[[[[[[[[\\\"[[[[\"]";
    assertThat(reader("Content-Length: " + body.length() + "\r\n\r\n" + body).next())
        .contains(new Frame.Body(body));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "Content-Length: two\r\n\r\n{}",
        "Content-Length: -2\r\n\r\n{}",
        "Content-Length: 99999999999999999999\r\n\r\n{}",
        "Content-Length: 2\r\nContent-Length: 3\r\n\r\n{}",
        "Content-Type: x\r\n\r\n{}",
        "\r\n\r\n{}",
        "{\"jsonrpc\":\"2.0\"}\r\n\r\n",
      })
  void aHeaderThatMakesNoSenseBreaksTheStream(String frame) {
    assertThatThrownBy(() -> reader(frame).next()).isInstanceOf(BrokenFraming.class);
  }

  @Test
  void anEndlessHeaderIsNotReadToItsEnd() {
    assertThatThrownBy(() -> reader("a".repeat(100_000)).next()).isInstanceOf(BrokenFraming.class);
    assertThatThrownBy(() -> reader("a: b\r\n".repeat(100_000)).next())
        .isInstanceOf(BrokenFraming.class);
  }

  @ParameterizedTest
  @ValueSource(strings = {"", "Content-Le", "Content-Length: 5\r\n", "Content-Length: 5\r\n\r\n{}"})
  void theStreamMayEndAnywhere(String frame) throws IOException {
    assertThat(reader(frame).next()).isEmpty();
  }
}
