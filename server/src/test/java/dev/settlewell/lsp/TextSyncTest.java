package dev.settlewell.lsp;

import static dev.settlewell.lsp.FakeClient.edit;
import static org.assertj.core.api.Assertions.assertThat;

import com.google.gson.JsonArray;
import com.google.gson.JsonElement;
import com.google.gson.JsonObject;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;

/** What is published after which edits, seen from outside: "BAD" is where the finding is. */
@Timeout(60)
class TextSyncTest {
  private static final String URI = "file:///board/a.channels.yaml";

  private static FakeClient client() {
    FakeClient client = new FakeClient(new StandIn());
    client.initialize(Map.of());
    return client;
  }

  /** {@code line:column} of each finding. */
  private static List<String> starts(JsonArray findings) {
    List<String> starts = new ArrayList<>();
    for (JsonElement finding : findings) {
      JsonObject start =
          finding.getAsJsonObject().getAsJsonObject("range").getAsJsonObject("start");
      starts.add(start.get("line").getAsInt() + ":" + start.get("character").getAsInt());
    }
    return starts;
  }

  @Test
  void openPublishesAndCloseClears() {
    try (FakeClient client = client()) {
      client.open(URI, "a\n BAD");
      JsonObject published = client.published();
      assertThat(published.get("uri").getAsString()).isEqualTo(URI);
      assertThat(published.get("version").getAsInt()).isEqualTo(1);
      assertThat(starts(published.getAsJsonArray("diagnostics"))).containsExactly("1:1");
      client.closeDocument(URI);
      assertThat(client.findings()).isEmpty();
      client.open(URI, "a\n BAD");
      assertThat(client.findings()).hasSize(1);
    }
  }

  @Test
  void changesOfOneNotificationApplyInSequence() {
    try (FakeClient client = client()) {
      client.open(URI, "x\n");
      assertThat(client.findings()).isEmpty();
      client.change(
          URI, 2, edit(0, 0, 0, 1, "one\ntwo\n"), edit(1, 0, 1, 3, "BAD"), edit(0, 0, 0, 0, "\n"));
      assertThat(starts(client.findings())).containsExactly("2:0");
    }
  }

  @Test
  void aWrongRangeLengthIsNotLookedAt() {
    try (FakeClient client = client()) {
      client.open(URI, "BAD");
      client.findings();
      client.change(
          URI, 2, Map.of("range", FakeClient.range(0, 0, 0, 0), "rangeLength", 77, "text", "  "));
      assertThat(starts(client.findings())).containsExactly("0:2");
    }
  }

  @Test
  void aColumnPastTheLineClamps() {
    try (FakeClient client = client()) {
      client.open(URI, "a\nb");
      client.findings();
      client.change(URI, 2, edit(0, 90, 0, 99, "BAD"));
      assertThat(starts(client.findings())).containsExactly("0:1");
      client.change(URI, 3, edit(0, 0, 99, 0, "x BAD"));
      assertThat(starts(client.findings())).containsExactly("0:2");
    }
  }

  @Test
  void anEditOutsideTheTextDropsTheDraftUntilTheTextComesWhole() {
    try (FakeClient client = client()) {
      client.open(URI, "BAD");
      client.findings();
      client.change(URI, 2, edit(7, 0, 8, 0, "BAD"));
      client.said("window/logMessage");
      assertThat(client.findings()).isEmpty();
      client.change(URI, 3, edit(0, 0, 0, 0, "BAD"));
      assertThat(client.findings()).isEmpty();
      client.change(URI, 4, Map.of("text", "  BAD"));
      assertThat(starts(client.findings())).containsExactly("0:2");
      client.change(URI, 5, edit(0, 2, 0, 1, "x"));
      client.said("window/logMessage");
      assertThat(client.findings()).isEmpty();
      client.open(URI, "BAD");
      assertThat(client.findings()).hasSize(1);
    }
  }

  @Test
  void changesAndClosesOfUnknownDocumentsAreLoggedOrIgnored() {
    try (FakeClient client = client()) {
      client.change(URI, 2, edit(0, 0, 0, 0, "BAD"));
      client.said("window/logMessage");
      client.closeDocument(URI);
      client.open(URI, "BAD");
      assertThat(client.findings()).hasSize(1);
    }
  }

  @Test
  void aSecondOpenCountsAsTheNewestText() {
    try (FakeClient client = client()) {
      client.open(URI, "BAD");
      assertThat(client.findings()).hasSize(1);
      client.open(URI, "good");
      assertThat(client.findings()).isEmpty();
    }
  }

  @Test
  void versionsThatGoBackwardsAreOnlyHandedBack() {
    try (FakeClient client = client()) {
      client.open(URI, "BAD");
      client.findings();
      client.change(URI, -4, edit(0, 0, 0, 3, ""));
      JsonObject published = client.published();
      assertThat(published.get("version").getAsInt()).isEqualTo(-4);
      assertThat(published.getAsJsonArray("diagnostics")).isEmpty();
    }
  }

  @Test
  void otherFilesAreNotOurs() {
    try (FakeClient client = client()) {
      client.open("file:///board/docker-compose.yaml", "BAD");
      client.open(URI, "BAD");
      assertThat(client.published().get("uri").getAsString()).isEqualTo(URI);
    }
  }

  @Test
  void theClientsOwnSpellingOfAUriIsUsed() {
    try (FakeClient client = client()) {
      String odd = "file:///c%3A/my%20board/100%25/a.channels.yaml";
      client.open(odd, "BAD");
      assertThat(client.published().get("uri").getAsString()).isEqualTo(odd);
      client.change("file:///C:/my%20board/100%25/a.channels.yaml", 2, edit(0, 0, 0, 3, ""));
      JsonObject published = client.published();
      assertThat(published.get("uri").getAsString()).isEqualTo(odd);
      assertThat(published.getAsJsonArray("diagnostics")).isEmpty();
    }
  }

  @Test
  void columnsCountAsAgreed() {
    Map<String, String> columns = Map.of("utf-8", "0:7", "utf-16", "0:4", "utf-32", "0:3");
    columns.forEach(
        (encoding, column) -> {
          try (FakeClient client = new FakeClient(new StandIn())) {
            client.initialize(
                (Object) Map.of("general", Map.of("positionEncodings", List.of(encoding))));
            client.open(URI, "😀Ω BAD");
            assertThat(starts(client.findings())).containsExactly(column);
          }
        });
  }

  @Test
  void manyQuickEditsEndWithTheFindingsOfTheLast() {
    StandIn desk = new StandIn();
    try (FakeClient client = new FakeClient(desk)) {
      client.initialize(Map.of());
      client.open(URI, "");
      int edits = 20_000;
      for (int version = 2; version <= edits; version++) {
        client.change(URI, version, edit(0, 0, 0, 3, version % 2 == 0 ? "BAD" : ""));
      }
      int last = -1;
      while (last != edits) {
        JsonObject published = client.published();
        int version = published.get("version").getAsInt();
        assertThat(version).isGreaterThanOrEqualTo(last);
        assertThat(published.getAsJsonArray("diagnostics"))
            .hasSize(version % 2 == 0 && version > 1 ? 1 : 0);
        last = version;
      }
      client.ask("shutdown", Map.of());
      client.tell("exit", Map.of());
      client.exitCode();
      client.drop("textDocument/publishDiagnostics");
      assertThat(desk.checks.get()).isLessThan(edits);
    }
  }

  @Test
  void aMistakeOfTheProgramIsToldOnceAndTheNextEditIsChecked() {
    try (FakeClient client = client()) {
      client.open(URI, "CRASH");
      assertThat(client.said("window/logMessage").toString()).contains("a planted mistake");
      assertThat(client.findings().toString()).contains("internal-fault");
      client.change(URI, 2, edit(0, 0, 0, 0, " "));
      assertThat(client.findings().toString()).contains("internal-fault");
      client.change(URI, 3, Map.of("text", "BAD"));
      assertThat(client.findings()).hasSize(1);
    }
  }
}
