package dev.settlewell.lsp;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.CompletableFuture;
import org.eclipse.lsp4j.ClientCapabilities;
import org.eclipse.lsp4j.ProgressParams;
import org.eclipse.lsp4j.WindowClientCapabilities;
import org.eclipse.lsp4j.WorkDoneProgressBegin;
import org.eclipse.lsp4j.WorkDoneProgressNotification;
import org.eclipse.lsp4j.WorkDoneProgressReport;
import org.eclipse.lsp4j.jsonrpc.Endpoint;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

/** "Work Done Progress" of the LSP specification, 3.17: begin, report, end, each token once. */
class ProgressTest {
  private final List<String> said = new ArrayList<>();
  private final CompletableFuture<Object> created = new CompletableFuture<>();
  private Progress progress;
  private Abilities shows;

  @BeforeEach
  void connect() {
    Client client = new Client();
    client.connect(
        new Endpoint() {
          @Override
          public CompletableFuture<?> request(String method, Object parameter) {
            said.add(method);
            return created;
          }

          @Override
          public void notify(String method, Object parameter) {
            said.add(word((ProgressParams) parameter));
          }
        });
    progress = new Progress(client);
    WindowClientCapabilities window = new WindowClientCapabilities();
    window.setWorkDoneProgress(true);
    ClientCapabilities capabilities = new ClientCapabilities();
    capabilities.setWindow(window);
    shows = Abilities.of(capabilities, null);
  }

  private static String word(ProgressParams params) {
    WorkDoneProgressNotification value = params.getValue().getLeft();
    if (value instanceof WorkDoneProgressBegin begin) {
      return "begin " + begin.getPercentage();
    }
    return value instanceof WorkDoneProgressReport report
        ? "report " + report.getPercentage()
        : "end";
  }

  @Test
  void beginsOnceTheClientHasAgreed() {
    progress.start(10, shows);
    progress.step();
    created.complete(Map.of());
    progress.step();
    progress.finish();
    progress.finish();
    assertThat(said)
        .containsExactly("window/workDoneProgress/create", "begin 10", "report 20", "end");
  }

  @Test
  void saysNothingWhereAllWasDoneBefore() {
    progress.start(10, shows);
    progress.finish();
    created.complete(Map.of());
    assertThat(said).containsExactly("window/workDoneProgress/create");
  }

  @Test
  void fewSheetsAndPlainClientsHaveNone() {
    progress.start(9, shows);
    progress.start(1000, Abilities.of(null, null));
    progress.step();
    progress.finish();
    assertThat(said).isEmpty();
  }
}
