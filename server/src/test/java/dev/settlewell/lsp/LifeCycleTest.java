package dev.settlewell.lsp;

import static org.assertj.core.api.Assertions.assertThat;

import com.google.gson.JsonObject;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;

/** "Lifecycle Messages" and "Base Protocol" of the LSP specification, 3.17. */
@Timeout(60)
class LifeCycleTest {

  @Test
  void requestsBeforeInitializeAreRefusedAndNotificationsDropped() {
    try (FakeClient client = new FakeClient(new StandIn())) {
      client.open("file:///a.channels.yaml", "BAD");
      assertThat(client.errorOf(client.request("textDocument/hover", Map.of()))).isEqualTo(-32002);
      assertThat(client.errorOf(client.request("shutdown", Map.of()))).isEqualTo(-32002);
      client.initialize(Map.of());
    }
  }

  @Test
  void aSecondInitializeIsRefused() {
    try (FakeClient client = new FakeClient(new StandIn())) {
      client.initialize(Map.of());
      assertThat(client.errorOf(client.request("initialize", Map.of("capabilities", Map.of()))))
          .isEqualTo(-32600);
    }
  }

  @Test
  void unknownRequestsAreAnsweredAndUnknownNotificationsIgnored() {
    try (FakeClient client = new FakeClient(new StandIn())) {
      client.initialize(Map.of());
      client.tell("$/whatever", Map.of());
      client.tell("window/whatever", Map.of());
      assertThat(client.errorOf(client.request("textDocument/whatever", Map.of())))
          .isEqualTo(-32601);
      assertThat(client.errorOf(client.request("$/whatever", Map.of()))).isEqualTo(-32601);
    }
  }

  @Test
  void afterShutdownOnlyExitFollows() {
    FakeClient client = new FakeClient(new StandIn());
    client.initialize(Map.of());
    client.ask("shutdown", Map.of());
    assertThat(client.errorOf(client.request("shutdown", Map.of()))).isEqualTo(-32600);
    assertThat(client.errorOf(client.request("textDocument/hover", Map.of()))).isEqualTo(-32600);
    client.open("file:///a.channels.yaml", "BAD");
    client.tell("exit", Map.of());
    assertThat(client.exitCode()).isZero();
    client.close();
  }

  @Test
  void exitWithoutShutdownIsOne() {
    FakeClient client = new FakeClient(new StandIn());
    client.initialize(Map.of());
    client.tell("exit", Map.of());
    assertThat(client.exitCode()).isOne();
    client.close();
  }

  @Test
  void theEndOfTheStreamEndsTheServer() {
    FakeClient client = new FakeClient(new StandIn());
    client.initialize(Map.of());
    client.endOfStream();
    assertThat(client.exitCode()).isOne();
    client.close();
  }

  @Test
  void brokenFramingEndsTheServer() {
    FakeClient client = new FakeClient(new StandIn());
    client.initialize(Map.of());
    client.raw("this is no header\r\n\r\n");
    assertThat(client.exitCode()).isOne();
    client.close();
  }

  @Test
  void textThatIsNoMessageIsAnsweredAndTheNextIsTaken() {
    try (FakeClient client = new FakeClient(new StandIn())) {
      client.initialize(Map.of());
      for (String body : List.of("{", "[]", "17", "\"x\"", "{} {}", "")) {
        client.raw("Content-Length: " + body.length() + "\r\n\r\n" + body);
        JsonObject answer = client.await("an error for " + body, m -> m.has("error"));
        assertThat(answer.getAsJsonObject("error").get("code").getAsInt()).isLessThan(-32000);
      }
    }
  }

  @Test
  void aMessageNestedTooDeepIsAnsweredAndTheNextIsTaken() {
    try (FakeClient client = new FakeClient(new StandIn())) {
      client.initialize(Map.of());
      String body = "[".repeat(100_000) + "]".repeat(100_000);
      client.raw("Content-Length: " + body.length() + "\r\n\r\n" + body);
      JsonObject answer = client.await("an error", m -> m.has("error"));
      assertThat(answer.getAsJsonObject("error").get("code").getAsInt()).isEqualTo(-32600);
    }
  }

  @Test
  void parametersThatDoNotFitAreAnswered() {
    try (FakeClient client = new FakeClient(new StandIn())) {
      assertThat(client.errorOf(client.request("initialize", List.of(1, 2)))).isEqualTo(-32602);
    }
  }

  @Test
  void theFirstPositionEncodingWeKnowIsTaken() {
    for (String encoding : List.of("utf-8", "utf-16", "utf-32")) {
      try (FakeClient client = new FakeClient(new StandIn())) {
        JsonObject result =
            client.initialize(
                (Object)
                    Map.of("general", Map.of("positionEncodings", List.of("utf-7", encoding))));
        assertThat(positionEncoding(result)).isEqualTo(encoding);
      }
    }
    try (FakeClient client = new FakeClient(new StandIn())) {
      assertThat(positionEncoding(client.initialize(Map.of()))).isEqualTo("utf-16");
    }
  }

  /** ALE for Vim counts bytes and says nothing of it; a word of the client's own goes before. */
  @Test
  void optionsMaySayThePositionEncodingWhereCapabilitiesDoNot() {
    Map<String, ?> options = Map.of("positionEncoding", "utf-8");
    try (FakeClient client = new FakeClient(new StandIn())) {
      JsonObject result =
          client.initializeWith(Map.of("capabilities", Map.of(), "initializationOptions", options));
      assertThat(positionEncoding(result)).isEqualTo("utf-8");
    }
    try (FakeClient client = new FakeClient(new StandIn())) {
      Map<String, ?> own = Map.of("general", Map.of("positionEncodings", List.of("utf-16")));
      JsonObject result =
          client.initializeWith(Map.of("capabilities", own, "initializationOptions", options));
      assertThat(positionEncoding(result)).isEqualTo("utf-16");
    }
  }

  private static String positionEncoding(JsonObject result) {
    return result.getAsJsonObject("capabilities").get("positionEncoding").getAsString();
  }
}
