package dev.settlewell.lsp;

import static org.assertj.core.api.Assertions.assertThat;

import com.google.gson.JsonArray;
import com.google.gson.JsonElement;
import com.google.gson.JsonNull;
import com.google.gson.JsonObject;
import dev.settlewell.workspace.Overlay;
import dev.settlewell.workspace.SheetReader;
import java.time.LocalDate;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;

/**
 * Every feature through the protocol, for a client that can nothing and one that can everything.
 */
@Timeout(120)
class FeaturesTest {
  private static final String URI = "file:///board/a.channels.yaml";

  private static final String SHEET =
      """
      channel-sheet: 1
      supplies:
        ref: 2.5 V ±0.1 %
      converters:
        adc:
          bits: 12
          reference: ref
          clock: 8 MHz
          acquisition-cycles: [3, 6, 12]
          conversion-cycles: 14
          hold-capacitor: 5 pF
          switch-resistance: 1 kΩ
      scans:
        slow: {converter: adc, rate: 100 Hz, order: [battery]}
      channels:
        battery:
          measures: 0 V to 2.5 V
          needs: ±0.05 V
          sensor:
            voltage: {resistance: 100 Ω}
          path:
            - resistor: 4.7kohm ±1 %
          acquisition: 13 cycles
          interferers: []
      """;

  /** No capability at all. */
  static final Object NOTHING = Map.of();

  /** What a modern graphical editor says it can. */
  static Map<String, Object> everything() {
    Map<String, Object> document = new HashMap<>();
    document.put(
        "publishDiagnostics",
        Map.of(
            "relatedInformation", true,
            "codeDescriptionSupport", true,
            "dataSupport", true,
            "tagSupport", Map.of("valueSet", List.of(1, 2))));
    document.put("hover", Map.of("contentFormat", List.of("markdown", "plaintext")));
    document.put(
        "completion",
        Map.of(
            "completionItem",
            Map.of("snippetSupport", true, "documentationFormat", List.of("markdown"))));
    document.put(
        "codeAction",
        Map.of(
            "codeActionLiteralSupport",
            Map.of("codeActionKind", Map.of("valueSet", List.of("quickfix")))));
    document.put("documentSymbol", Map.of("hierarchicalDocumentSymbolSupport", true));
    document.put("rename", Map.of("prepareSupport", true));
    Map<String, Object> workspace =
        Map.of("workspaceEdit", Map.of("documentChanges", true), "workspaceFolders", true);
    return Map.of("textDocument", document, "workspace", workspace);
  }

  static Desk desk(Map<String, String> files) {
    SheetReader nothing =
        new SheetReader() {
          @Override
          public Content read(String path) {
            return Content.none("there is no such file");
          }

          @Override
          public boolean exists(String path) {
            return path.equals("/board/.git");
          }

          @Override
          public String real(String path) {
            return path;
          }
        };
    return new SheetDesk(new Overlay(files, nothing), () -> LocalDate.of(2026, 12, 1));
  }

  private static FakeClient client(Object capabilities) {
    FakeClient client = new FakeClient(desk(Map.of()));
    client.initialize(capabilities);
    client.open(URI, SHEET);
    return client;
  }

  private static Map<String, Object> document() {
    return Map.of("uri", URI);
  }

  private static Map<String, Object> at(String mark) {
    int offset = SHEET.indexOf(mark);
    int line = (int) SHEET.substring(0, offset).chars().filter(c -> c == '\n').count();
    int column = offset - (SHEET.lastIndexOf('\n', offset - 1) + 1);
    return Map.of(
        "textDocument", document(), "position", Map.of("line", line, "character", column));
  }

  private static JsonElement whole(FakeClient client, String method) {
    return client.ask(method, Map.of("textDocument", document()));
  }

  private static String text(JsonElement element) {
    return element.toString();
  }

  @Test
  void findingsCarryWhatTheClientCanShow() {
    try (FakeClient client = client(NOTHING)) {
      for (JsonElement finding : client.findings()) {
        JsonObject one = finding.getAsJsonObject();
        assertThat(one.get("source").getAsString()).isEqualTo("settlewell");
        assertThat(one.has("relatedInformation")).isFalse();
        assertThat(one.has("data")).isFalse();
        assertThat(one.has("tags")).isFalse();
        assertThat(one.has("codeDescription")).isFalse();
      }
    }
    try (FakeClient client = client(everything())) {
      JsonObject notOffered = finding(client.findings(), "acquisition-not-offered");
      assertThat(notOffered.getAsJsonObject("data").get("subject").getAsString())
          .isEqualTo("battery");
      assertThat(notOffered.get("severity").getAsInt()).isEqualTo(1);
      assertThat(notOffered.has("codeDescription")).isFalse();
    }
  }

  private static JsonObject finding(JsonArray findings, String name) {
    for (JsonElement finding : findings) {
      if (finding.getAsJsonObject().get("code").getAsString().equals(name)) {
        return finding.getAsJsonObject();
      }
    }
    throw new AssertionError("no " + name + " in " + findings);
  }

  @Test
  void aDocumentationBaseMakesLinks() {
    try (FakeClient client = new FakeClient(desk(Map.of()))) {
      client.initializeWith(
          Map.of(
              "capabilities", everything(),
              "initializationOptions", Map.of("documentation", "https://docs.example/f/")));
      client.open(URI, SHEET);
      JsonObject notOffered = finding(client.findings(), "acquisition-not-offered");
      assertThat(text(notOffered.get("codeDescription")))
          .contains("https://docs.example/f/acquisition-not-offered");
    }
  }

  @Test
  void hoverInTheFormTheClientTakes() {
    try (FakeClient client = client(NOTHING)) {
      client.published();
      JsonObject contents = contents(client.ask("textDocument/hover", at("bits: 12")));
      assertThat(contents.get("kind").getAsString()).isEqualTo("plaintext");
      assertThat(contents.get("value").getAsString()).doesNotContain("**");
      JsonElement none = client.ask("textDocument/hover", at("\n  ref: 2.5"));
      assertThat(none).isInstanceOf(JsonElement.class);
    }
    try (FakeClient client = client(everything())) {
      client.published();
      JsonObject contents = contents(client.ask("textDocument/hover", at("bits: 12")));
      assertThat(contents.get("kind").getAsString()).isEqualTo("markdown");
      assertThat(contents.get("value").getAsString()).startsWith("**`bits`**");
    }
  }

  private static JsonObject contents(JsonElement hover) {
    return hover.getAsJsonObject().getAsJsonObject("contents");
  }

  @Test
  void completionWithAndWithoutSnippets() {
    for (boolean snippets : List.of(false, true)) {
      try (FakeClient client = client(snippets ? everything() : NOTHING)) {
        client.published();
        JsonObject list =
            client.ask("textDocument/completion", at("resistor: 4.7")).getAsJsonObject();
        assertThat(text(list)).contains("\"label\":\"capacitor\"");
        JsonElement cycles = client.ask("textDocument/completion", at("13 cycles"));
        assertThat(text(cycles)).contains("\"newText\":\"12 cycles\"").doesNotContain("${");
        JsonObject first =
            cycles.getAsJsonObject().getAsJsonArray("items").get(0).getAsJsonObject();
        assertThat(first.getAsJsonObject("textEdit").has("range")).isTrue();
      }
    }
  }

  @Test
  void actionsInTheFormTheClientTakes() {
    Map<String, Object> params = new HashMap<>();
    params.put("textDocument", document());
    params.put("range", FakeClient.range(22, 19, 22, 19));
    params.put("context", Map.of("diagnostics", List.of()));
    try (FakeClient client = client(NOTHING)) {
      client.published();
      assertThat(client.ask("textDocument/codeAction", params).getAsJsonArray()).isEmpty();
    }
    try (FakeClient client = client(everything())) {
      client.published();
      String actions = text(client.ask("textDocument/codeAction", params));
      assertThat(actions).contains("12 cycles", "documentChanges", "\"version\":1", "Accept ");
      params.put("context", Map.of("diagnostics", List.of(), "only", List.of("source")));
      assertThat(text(client.ask("textDocument/codeAction", params)))
          .doesNotContain("\"quickfix\"");
    }
  }

  @Test
  void namesAreFoundAndRenamed() {
    try (FakeClient client = client(everything())) {
      client.published();
      JsonArray definition = client.ask("textDocument/definition", at("ref\n")).getAsJsonArray();
      assertThat(text(definition)).contains("\"line\":2,\"character\":2");
      Map<String, Object> references = new HashMap<>(at("ref\n"));
      references.put("context", Map.of("includeDeclaration", true));
      assertThat(client.ask("textDocument/references", references).getAsJsonArray()).hasSize(2);
      assertThat(client.ask("textDocument/documentHighlight", at("ref\n")).getAsJsonArray())
          .hasSize(2);
      assertThat(text(client.ask("textDocument/prepareRename", at("battery]"))))
          .contains("\"placeholder\":\"battery\"");
      Map<String, Object> rename = new HashMap<>(at("battery]"));
      rename.put("newName", "cell");
      JsonElement edit = client.ask("textDocument/rename", rename);
      assertThat(text(edit).split("\"newText\":\"cell\"", -1)).hasSize(3);
      rename.put("newName", "Not a name");
      JsonObject refused = client.response(client.request("textDocument/rename", rename));
      assertThat(refused.getAsJsonObject("error").get("code").getAsInt()).isEqualTo(-32803);
    }
  }

  @Test
  void changesForClientsWithoutDocumentChanges() {
    try (FakeClient client = client(NOTHING)) {
      client.published();
      Map<String, Object> rename = new HashMap<>(at("battery]"));
      rename.put("newName", "cell");
      JsonObject edit = client.ask("textDocument/rename", rename).getAsJsonObject();
      assertThat(edit.getAsJsonObject("changes").getAsJsonArray(URI)).hasSize(2);
    }
  }

  @Test
  void theOutlineAsTreeOrList() {
    try (FakeClient client = client(NOTHING)) {
      client.published();
      assertThat(text(whole(client, "textDocument/documentSymbol")))
          .contains("\"name\":\"battery\"", "\"containerName\":\"channels\"");
      assertThat(text(client.ask("workspace/symbol", Map.of("query", "BATT"))))
          .contains("\"name\":\"battery\"");
      assertThat(client.ask("workspace/symbol", Map.of("query", "zzz")).getAsJsonArray()).isEmpty();
    }
    try (FakeClient client = client(everything())) {
      client.published();
      assertThat(text(whole(client, "textDocument/documentSymbol")))
          .contains("\"selectionRange\"", "\"children\"");
    }
  }

  @Test
  void hintsLensesFoldsLinksTokensAndSelections() {
    try (FakeClient client = client(NOTHING)) {
      client.published();
      Map<String, Object> range = new HashMap<>(Map.of("textDocument", document()));
      range.put("range", FakeClient.range(0, 0, 99, 0));
      assertThat(text(client.ask("textDocument/inlayHint", range)))
          .contains("needs ", "LSB 610 µV");
      assertThat(text(whole(client, "textDocument/codeLens"))).contains("within the needed");
      assertThat(whole(client, "textDocument/foldingRange").getAsJsonArray()).isNotEmpty();
      assertThat(whole(client, "textDocument/documentLink").getAsJsonArray()).isEmpty();
      JsonArray data =
          whole(client, "textDocument/semanticTokens/full")
              .getAsJsonObject()
              .getAsJsonArray("data");
      assertThat(data.size() % 5).isZero();
      assertThat(data.size()).isGreaterThan(100);
      assertThat(client.ask("textDocument/semanticTokens/range", range).getAsJsonObject())
          .isEqualTo(whole(client, "textDocument/semanticTokens/full"));
      JsonArray selections =
          client
              .ask(
                  "textDocument/selectionRange",
                  Map.of(
                      "textDocument",
                      document(),
                      "positions",
                      List.of(
                          Map.of("line", 5, "character", 5), Map.of("line", 9, "character", 99))))
              .getAsJsonArray();
      assertThat(selections).hasSize(2);
    }
  }

  @Test
  void hintsAndLensesCanBeSwitchedOff() {
    try (FakeClient client = new FakeClient(desk(Map.of()))) {
      client.initializeWith(
          Map.of(
              "capabilities",
              Map.of(),
              "initializationOptions",
              Map.of(
                  "settlewell",
                  Map.of(
                      "codeLens", false, "inlayHints", Map.of("values", false, "resolution", 7)))));
      client.open(URI, SHEET);
      client.published();
      Map<String, Object> range = new HashMap<>(Map.of("textDocument", document()));
      range.put("range", FakeClient.range(0, 0, 99, 0));
      assertThat(text(client.ask("textDocument/inlayHint", range)))
          .contains("LSB ")
          .doesNotContain("has ±");
      assertThat(whole(client, "textDocument/codeLens").getAsJsonArray()).isEmpty();
    }
  }

  @Test
  void formattingOfAllAndOfARange() {
    try (FakeClient client = client(NOTHING)) {
      client.published();
      Map<String, Object> params = new HashMap<>(Map.of("textDocument", document()));
      params.put("options", Map.of("tabSize", 2, "insertSpaces", true));
      assertThat(text(client.ask("textDocument/formatting", params))).contains("4.7 kΩ ±1 %");
      params.put("range", FakeClient.range(0, 0, 9, 0));
      assertThat(client.ask("textDocument/rangeFormatting", params).getAsJsonArray()).isEmpty();
    }
  }

  /** Unknown, other and lost documents, and positions far outside, give empty answers. */
  @Test
  void nothingIsAnsweredWithAnError() {
    List<String> uris =
        List.of("file:///nowhere.channels.yaml", "file:///a.yaml", "untitled:x", "");
    try (FakeClient client = client(everything())) {
      client.published();
      for (String uri : uris) {
        for (String method :
            List.of(
                "hover",
                "completion",
                "definition",
                "documentSymbol",
                "foldingRange",
                "codeLens",
                "documentLink",
                "documentHighlight",
                "prepareRename")) {
          client.ask(
              "textDocument/" + method,
              Map.of(
                  "textDocument", Map.of("uri", uri),
                  "position", Map.of("line", 3, "character", 3),
                  "newName", "x"));
        }
      }
      client.ask(
          "textDocument/hover",
          Map.of(
              "textDocument", document(),
              "position", Map.of("line", 99999, "character", 99999)));
      int unfit = client.request("textDocument/hover", Map.of("textDocument", 7));
      assertThat(client.errorOf(unfit)).isEqualTo(-32602);
      int empty = client.request("textDocument/hover", Map.of());
      assertThat(client.errorOf(empty)).isEqualTo(-32602);
      int none = client.request("textDocument/hover", JsonNull.INSTANCE);
      assertThat(client.errorOf(none)).isEqualTo(-32602);
    }
  }
}
