package dev.settlewell.lsp;

import static org.assertj.core.api.Assertions.assertThat;

import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;

/** "Pull Diagnostics" of the LSP specification, 3.17. */
@Timeout(60)
class PullTest {
  private static final String URI = "file:///board/a.channels.yaml";

  private static FakeClient client() {
    FakeClient client = new FakeClient(new StandIn());
    client.initialize((Object) Map.of("textDocument", Map.of("diagnostic", Map.of())));
    return client;
  }

  private static JsonObject pull(FakeClient client, String previous) {
    Map<String, Object> document = Map.of("uri", URI);
    return client
        .ask(
            "textDocument/diagnostic",
            previous == null
                ? Map.of("textDocument", document)
                : Map.of("textDocument", document, "previousResultId", previous))
        .getAsJsonObject();
  }

  @Test
  void nothingIsEverPushedToAClientThatPulls() {
    try (FakeClient client = client()) {
      client.open(URI, "BAD");
      assertThat(pull(client, null).getAsJsonArray("items")).hasSize(1);
      client.change(URI, 2, FakeClient.edit(0, 0, 0, 0, "BAD "));
      assertThat(pull(client, null).getAsJsonArray("items")).hasSize(2);
      client.closeDocument(URI);
    }
  }

  @Test
  void whatTheClientHasIsNotSentAgain() {
    try (FakeClient client = client()) {
      client.open(URI, "BAD");
      JsonObject first = pull(client, null);
      assertThat(first.get("kind").getAsString()).isEqualTo("full");
      String id = first.get("resultId").getAsString();
      JsonObject second = pull(client, id);
      assertThat(second.get("kind").getAsString()).isEqualTo("unchanged");
      assertThat(second.has("items")).isFalse();
      client.change(URI, 2, FakeClient.edit(0, 0, 0, 0, " "));
      JsonObject third = pull(client, id);
      assertThat(third.get("kind").getAsString()).isEqualTo("full");
      assertThat(third.get("resultId").getAsString()).isNotEqualTo(id);
    }
  }

  @Test
  void theWholeWorkspaceAtOnce() {
    try (FakeClient client = client()) {
      client.open(URI, "BAD");
      client.open("file:///board/b.channels.yaml", "good");
      JsonArray items = workspace(client, List.of());
      assertThat(items).hasSize(2);
      String id = items.get(0).getAsJsonObject().get("resultId").getAsString();
      JsonArray again = workspace(client, List.of(Map.of("uri", URI, "value", id)));
      assertThat(again.get(0).getAsJsonObject().get("kind").getAsString()).isEqualTo("unchanged");
      assertThat(again.get(1).getAsJsonObject().get("kind").getAsString()).isEqualTo("full");
    }
  }

  private static JsonArray workspace(FakeClient client, List<?> previous) {
    return client
        .ask("workspace/diagnostic", Map.of("previousResultIds", previous))
        .getAsJsonObject()
        .getAsJsonArray("items");
  }

  @Test
  void aMistakeOfTheProgramIsAFindingHereToo() {
    try (FakeClient client = client()) {
      client.open(URI, "CRASH");
      assertThat(pull(client, null).toString()).contains("internal-fault");
      client.said("window/logMessage");
    }
  }
}
