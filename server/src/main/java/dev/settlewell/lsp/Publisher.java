package dev.settlewell.lsp;

import dev.settlewell.assist.Checked;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;
import org.eclipse.lsp4j.Diagnostic;
import org.eclipse.lsp4j.DiagnosticSeverity;
import org.eclipse.lsp4j.Position;
import org.eclipse.lsp4j.PublishDiagnosticsParams;
import org.eclipse.lsp4j.Range;

/**
 * Pushes findings to clients that do not ask for them.
 *
 * <p>A sheet waits at most once in the queue, and its turn looks at the newest version then: a
 * thousand quick edits cost as many checks as there is time for, and the last is always made.
 * Everything is published on the worker, so an older list never follows a newer one.
 */
final class Publisher {
  private final Session session;
  private final Set<String> waiting = ConcurrentHashMap.newKeySet();
  private final Set<String> shown = ConcurrentHashMap.newKeySet();

  Publisher(Session session) {
    this.session = session;
  }

  /** The sheet, or something it rests on, is not what it was; also where it was closed. */
  void changed(String uri) {
    if (session.view().abilities().pulls() || !waiting.add(Uris.name(uri))) {
      return;
    }
    session.worker().post(Worker.Rank.EDIT, () -> publish(uri));
  }

  private void publish(String uri) {
    String name = Uris.name(uri);
    waiting.remove(name);
    View view = session.view();
    Optional<Draft> draft = view.drafts().get(name);
    List<Diagnostic> diagnostics = draft.isPresent() ? diagnostics(view, uri) : List.of();
    if (isOutdated(draft)) {
      return;
    }
    boolean wasShown = !diagnostics.isEmpty() ? !shown.add(name) : shown.remove(name);
    if (draft.isPresent() || wasShown) {
      Integer version = draft.map(Draft::version).orElse(null);
      session
          .client()
          .publish(
              new PublishDiagnosticsParams(
                  draft.map(Draft::uri).orElse(uri), diagnostics, version));
    }
  }

  private List<Diagnostic> diagnostics(View view, String uri) {
    try {
      return view.checked(uri)
          .map((Checked checked) -> new DiagnosticMapper(view, checked).all())
          .orElse(List.of());
    } catch (RuntimeException | StackOverflowError fault) {
      session.faults().report("checking " + uri, fault);
      return List.of(internalFault(fault));
    }
  }

  /** So that an editor without a log still tells why a sheet has no findings. */
  private static Diagnostic internalFault(Throwable fault) {
    Position start = new Position(0, 0);
    String message =
        "Settlewell made a mistake and could not check this sheet. Please report this text together"
            + " with the sheet: "
            + Faults.describe(fault);
    return new Diagnostic(
        new Range(start, start),
        message,
        DiagnosticSeverity.Error,
        DiagnosticMapper.SOURCE,
        "internal-fault");
  }

  /** A newer version waits for its own turn: what was computed would only flicker. */
  private boolean isOutdated(Optional<Draft> draft) {
    Optional<Draft> now = draft.flatMap(d -> session.view().drafts().get(d.name()));
    return draft.isPresent()
        && now.isPresent()
        && now.get() != draft.get()
        && waiting.contains(draft.get().name());
  }
}
