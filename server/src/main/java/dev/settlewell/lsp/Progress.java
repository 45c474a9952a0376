package dev.settlewell.lsp;

import java.util.UUID;
import org.eclipse.lsp4j.WorkDoneProgressBegin;
import org.eclipse.lsp4j.WorkDoneProgressEnd;
import org.eclipse.lsp4j.WorkDoneProgressNotification;
import org.eclipse.lsp4j.WorkDoneProgressReport;

/** Tells how far the check of many sheets has come, where the client can show it. */
final class Progress {
  /** Fewer are done before anybody could read it. */
  private static final int FEWEST = 10;

  private final Client client;
  private String token = "";
  private boolean begun;
  private int total;
  private int done;

  Progress(Client client) {
    this.client = client;
  }

  /** Counts anew; what was shown before ends. */
  synchronized void start(int sheets, Abilities can) {
    end();
    if (!can.progress() || sheets < FEWEST) {
      return;
    }
    total = sheets;
    done = 0;
    token = UUID.randomUUID().toString();
    String mine = token;
    client.createProgress(mine).thenRun(() -> begin(mine));
  }

  private synchronized void begin(String created) {
    if (!created.equals(token)) {
      return;
    }
    WorkDoneProgressBegin begin = new WorkDoneProgressBegin();
    begin.setTitle("Settlewell checks " + total + " sheets");
    begin.setPercentage(percentage());
    begun = true;
    client.progress(token, begin);
  }

  /** One more sheet is done. */
  synchronized void step() {
    if (token.isEmpty()) {
      return;
    }
    int before = percentage();
    done++;
    if (begun && done < total && percentage() > before) {
      WorkDoneProgressReport report = new WorkDoneProgressReport();
      report.setPercentage(percentage());
      client.progress(token, report);
    }
  }

  /** All that were counted are done, or somebody else has done them. */
  synchronized void finish() {
    end();
  }

  private int percentage() {
    return 100 * done / total;
  }

  private void end() {
    if (begun) {
      WorkDoneProgressNotification end = new WorkDoneProgressEnd();
      client.progress(token, end);
    }
    token = "";
    begun = false;
  }
}
