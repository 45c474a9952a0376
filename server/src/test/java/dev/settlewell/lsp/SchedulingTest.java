package dev.settlewell.lsp;

import static org.assertj.core.api.Assertions.assertThat;

import dev.settlewell.assist.Checked;
import dev.settlewell.finding.Finding;
import dev.settlewell.text.SourceText;
import dev.settlewell.vocabulary.Vocabulary;
import dev.settlewell.workspace.ProjectFile;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.Semaphore;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;

/** What happens while a check is under way: the desk here waits to be told to go on. */
@Timeout(60)
class SchedulingTest {
  private static final String URI = "file:///board/a.channels.yaml";

  /** Stops in each check of a text that holds {@code SLOW}. */
  private static final class SlowDesk implements Desk {
    private final StandIn inner = new StandIn();
    private final CountDownLatch entered = new CountDownLatch(1);
    private final Semaphore mayLeave = new Semaphore(0);

    @Override
    public Optional<Checked> check(String name, Map<String, SourceText> open) {
      if (open.containsKey(name) && open.get(name).content().contains("SLOW")) {
        entered.countDown();
        mayLeave.acquireUninterruptibly();
      }
      return inner.check(name, open);
    }

    @Override
    public List<Finding> trial(String name, String content, Map<String, SourceText> open) {
      return inner.trial(name, content, open);
    }

    @Override
    public Vocabulary vocabulary() {
      return inner.vocabulary();
    }

    @Override
    public List<String> sheetsBelow(String folder) {
      return List.of();
    }

    @Override
    public ProjectFile project(String folder) {
      return ProjectFile.NONE;
    }
  }

  private final SlowDesk desk = new SlowDesk();

  private FakeClient slow() throws InterruptedException {
    FakeClient client = new FakeClient(desk);
    client.initialize(Map.of());
    client.open(URI, "SLOW BAD");
    desk.entered.await();
    return client;
  }

  /** An answer that needs no worker: what was sent before has been taken. */
  private static void taken(FakeClient client) {
    assertThat(client.errorOf(client.request("barrier", Map.of()))).isEqualTo(-32601);
  }

  private int hover(FakeClient client) {
    return client.request(
        "textDocument/hover",
        Map.of("textDocument", Map.of("uri", URI), "position", Map.of("line", 0, "character", 0)));
  }

  @Test
  void aCancelledRequestIsAnsweredAsCancelled() throws InterruptedException {
    try (FakeClient client = slow()) {
      int id = hover(client);
      client.tell("$/cancelRequest", Map.of("id", id));
      assertThat(client.errorOf(id)).isEqualTo(-32800);
      client.tell("$/cancelRequest", Map.of("id", id));
      client.tell("$/cancelRequest", Map.of("id", 4711));
      desk.mayLeave.release(100);
      assertThat(client.findings()).hasSize(1);
    }
  }

  @Test
  void onlyTheNewestVersionIsPublished() throws InterruptedException {
    try (FakeClient client = slow()) {
      client.change(URI, 2, Map.of("text", "BAD BAD"));
      client.change(URI, 3, Map.of("text", "good"));
      taken(client);
      desk.mayLeave.release(100);
      assertThat(client.published().get("version").getAsInt()).isEqualTo(3);
    }
  }

  @Test
  void aDocumentClosedDuringItsCheckIsNotShown() throws InterruptedException {
    try (FakeClient client = slow()) {
      client.closeDocument(URI);
      taken(client);
      desk.mayLeave.release(100);
    }
  }

  @Test
  void aDocumentReopenedDuringItsCheckShowsItsNewText() throws InterruptedException {
    try (FakeClient client = slow()) {
      client.closeDocument(URI);
      client.open(URI, "BAD BAD");
      taken(client);
      desk.mayLeave.release(100);
      assertThat(client.findings()).hasSize(2);
    }
  }

  /** A request reads the text as it was when it came in. */
  @Test
  void requestsGoBeforeFindingsAndReadTheirOwnMoment() throws InterruptedException {
    try (FakeClient client = slow()) {
      int id = client.request("workspace/symbol", Map.of("query", ""));
      client.change(URI, 2, Map.of("text", "CRASH"));
      taken(client);
      desk.mayLeave.release(100);
      assertThat(client.response(id).has("error")).isFalse();
      client.said("window/logMessage");
      assertThat(client.findings().toString()).contains("internal-fault");
    }
  }
}
