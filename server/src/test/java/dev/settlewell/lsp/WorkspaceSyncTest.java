package dev.settlewell.lsp;

import static org.assertj.core.api.Assertions.assertThat;

import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import dev.settlewell.workspace.DiskReader;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

/** Sheets on disk beside the open ones, and what changes with them. */
@Timeout(60)
class WorkspaceSyncTest {
  private static final String SUPPLIES = "channel-sheet: 1\nsupplies:\n  ref: 2.5 V\n";
  private static final String USES =
      "channel-sheet: 1\nuse: [parts.channels.yaml]\nconverters:\n"
          + "  adc: {bits: 12, reference: ref}\n";

  @TempDir private Path folder;

  private FakeClient client(Object capabilities, Path... folders) {
    FakeClient client =
        new FakeClient(new SheetDesk(new DiskReader(folder), () -> LocalDate.of(2026, 12, 1)));
    List<Object> named = new ArrayList<>();
    for (Path one : folders) {
      named.add(Map.of("uri", uri(one), "name", "x"));
    }
    client.initializeWith(Map.of("capabilities", capabilities, "workspaceFolders", named));
    return client;
  }

  private static String uri(Path path) {
    return Uris.uri(path.toString());
  }

  private Path sheet(String name, String text) throws IOException {
    Path file = folder.resolve(name);
    Files.createDirectories(file.getParent());
    return Files.writeString(file, text);
  }

  private static List<String> codes(JsonArray findings) {
    List<String> codes = new ArrayList<>();
    findings.forEach(f -> codes.add(f.getAsJsonObject().get("code").getAsString()));
    return codes;
  }

  private static JsonObject publishedFor(FakeClient client, Path file) {
    return client
        .await(
            "findings of " + file,
            m ->
                m.has("params")
                    && m.getAsJsonObject("params").has("diagnostics")
                    && m.getAsJsonObject("params").get("uri").getAsString().equals(uri(file)))
        .getAsJsonObject("params");
  }

  @Test
  void sheetsThatNobodyOpenedAreChecked() throws IOException {
    sheet("one/.settlewell.yaml", "");
    sheet("two/.git/config", "");
    Path first = sheet("one/a.channels.yaml", "channel-sheet: 1\nsuplies: {}\n");
    Path second = sheet("two/deep/b.channels.yaml", "channel-sheet: 1\nsuplies: {}\n");
    sheet("two/clean.channels.yaml", SUPPLIES);
    try (FakeClient client = client(Map.of(), folder.resolve("one"), folder.resolve("two"))) {
      assertThat(codes(publishedFor(client, first).getAsJsonArray("diagnostics")))
          .contains("unknown-key");
      assertThat(codes(publishedFor(client, second).getAsJsonArray("diagnostics")))
          .contains("unknown-key");
    }
  }

  @Test
  void aFolderThatIsNotMarkedIsNotScanned() throws IOException {
    sheet("home/a.channels.yaml", "channel-sheet: 1\nsuplies: {}\n");
    try (FakeClient client = client(Map.of(), folder.resolve("home"))) {
      client.ask("workspace/symbol", Map.of("query", ""));
    }
  }

  @Test
  void aSheetThatUsesAnotherFollowsItsDraft() throws IOException {
    sheet(".git/config", "");
    Path parts = sheet("parts.channels.yaml", SUPPLIES);
    Path board = sheet("board.channels.yaml", USES);
    try (FakeClient client = client(Map.of())) {
      client.open(uri(board), USES);
      assertThat(codes(publishedFor(client, board).getAsJsonArray("diagnostics")))
          .doesNotContain("unknown-name");
      client.open(uri(parts), SUPPLIES);
      publishedFor(client, parts);
      client.change(uri(parts), 2, Map.of("text", SUPPLIES.replace("ref", "vref")));
      publishedFor(client, parts);
      assertThat(codes(publishedFor(client, board).getAsJsonArray("diagnostics")))
          .contains("unknown-name");
    }
  }

  @Test
  void filesThatChangeOnDiskAreLookedAtAgain() throws IOException {
    sheet(".git/config", "");
    Path parts = sheet("parts.channels.yaml", SUPPLIES);
    Path board = sheet("board.channels.yaml", USES);
    Object watches =
        Map.of("workspace", Map.of("didChangeWatchedFiles", Map.of("dynamicRegistration", true)));
    try (FakeClient client = client(watches)) {
      JsonObject registration = client.said("client/registerCapability");
      assertThat(registration.toString()).contains("**/*.channels.yaml");
      client.reply(registration, null);
      client.open(uri(board), USES);
      publishedFor(client, board);
      Files.writeString(parts, SUPPLIES.replace("ref", "vref"));
      client.tell(
          "workspace/didChangeWatchedFiles",
          Map.of("changes", List.of(Map.of("uri", uri(parts), "type", 2))));
      assertThat(codes(publishedFor(client, board).getAsJsonArray("diagnostics")))
          .contains("unknown-name");
    }
  }

  @Test
  void withoutAWatcherFilesAreLookedAtOnSave() throws IOException {
    sheet(".git/config", "");
    Path parts = sheet("parts.channels.yaml", SUPPLIES);
    Path board = sheet("board.channels.yaml", USES);
    try (FakeClient client = client(Map.of())) {
      client.open(uri(board), USES);
      publishedFor(client, board);
      Files.writeString(parts, SUPPLIES.replace("ref", "vref"));
      client.tell("textDocument/didSave", Map.of("textDocument", Map.of("uri", uri(board))));
      assertThat(codes(publishedFor(client, board).getAsJsonArray("diagnostics")))
          .contains("unknown-name");
    }
  }

  @Test
  void renamingReachesTheSheetsThatUseTheName() throws IOException {
    sheet(".git/config", "");
    Path parts = sheet("parts.channels.yaml", SUPPLIES);
    Path board = sheet("board.channels.yaml", USES);
    try (FakeClient client = client(Map.of(), folder)) {
      client.open(uri(parts), SUPPLIES);
      publishedFor(client, parts);
      JsonObject edit =
          client
              .ask(
                  "textDocument/rename",
                  Map.of(
                      "textDocument", Map.of("uri", uri(parts)),
                      "position", Map.of("line", 2, "character", 3),
                      "newName", "vref"))
              .getAsJsonObject();
      assertThat(edit.getAsJsonObject("changes").keySet())
          .containsExactlyInAnyOrder(uri(parts), uri(board));
      client.drainAtEnd("textDocument/publishDiagnostics");
    }
  }

  @Test
  void foldersComeAndGo() throws IOException {
    sheet("one/.git/config", "");
    Path file = sheet("one/a.channels.yaml", "channel-sheet: 1\nsuplies: {}\n");
    try (FakeClient client = client(Map.of("workspace", Map.of("workspaceFolders", true)))) {
      Object one = Map.of("uri", uri(folder.resolve("one")), "name", "one");
      client.tell(
          "workspace/didChangeWorkspaceFolders",
          Map.of("event", Map.of("added", List.of(one), "removed", List.of())));
      assertThat(publishedFor(client, file).getAsJsonArray("diagnostics")).isNotEmpty();
      client.tell(
          "workspace/didChangeWorkspaceFolders",
          Map.of("event", Map.of("added", List.of(), "removed", List.of(one))));
      assertThat(publishedFor(client, file).getAsJsonArray("diagnostics")).isEmpty();
    }
  }

  /** Settings are asked for where the client can be asked; one of them answers with an array. */
  @Test
  void settingsAreAskedFor() throws IOException {
    sheet(".git/config", "");
    Path file = sheet("a.channels.yaml", "channel-sheet: 1\nsuplies: {}\n");
    Object configures = Map.of("workspace", Map.of("configuration", true));
    try (FakeClient client = client(configures, folder)) {
      JsonObject asked = client.said("workspace/configuration");
      assertThat(asked.toString()).contains("\"section\":\"settlewell\"");
      publishedFor(client, file);
      client.reply(asked, List.of(Map.of("unopenedSheets", false)));
      assertThat(publishedFor(client, file).getAsJsonArray("diagnostics")).isEmpty();
      client.tell("workspace/didChangeConfiguration", Map.of("settings", List.of()));
      client.reply(client.said("workspace/configuration"), List.of(List.of()));
    }
  }

  /** A client that shows progress is told of many sheets, from beginning to end. */
  @Test
  void progressOfManySheets() throws IOException {
    sheet(".git/config", "");
    for (int i = 0; i < 12; i++) {
      sheet("s" + i + ".channels.yaml", SUPPLIES);
    }
    Object shows = Map.of("window", Map.of("workDoneProgress", true));
    try (FakeClient client = client(shows, folder)) {
      JsonObject create = client.said("window/workDoneProgress/create");
      client.reply(create, null);
      client.ask("workspace/symbol", Map.of("query", ""));
      client.drainAtEnd("$/progress");
    }
  }
}
