package dev.settlewell.lsp;

import dev.settlewell.sheet.Sheet;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;
import java.util.stream.Collectors;
import org.eclipse.lsp4j.Diagnostic;
import org.eclipse.lsp4j.PublishDiagnosticsParams;

/**
 * Pushes findings to clients that do not ask for them.
 *
 * <p>A sheet waits at most once in the queue, and its turn looks at the newest version then: a
 * thousand quick edits cost as many checks as there is time for, and the last is always made.
 * Everything is published on the worker, so an older list never follows a newer one.
 */
final class Publisher {
  /** What a client was last told of a sheet. */
  private record Shown(String uri, Integer version, List<Diagnostic> diagnostics) {}

  private final Session session;
  private final Set<String> waiting = ConcurrentHashMap.newKeySet();

  /** Sheets by name with the names of those they use. Touched on the worker alone, as the next. */
  private final Map<String, Set<String>> uses = new HashMap<>();

  private final Map<String, Shown> shown = new HashMap<>();

  private final Progress progress;

  Publisher(Session session) {
    this.session = session;
    this.progress = new Progress(session.client());
  }

  /** The sheet, or something it rests on, is not what it was; also where it was closed. */
  void changed(String name) {
    enqueue(name, Worker.Rank.EDIT);
  }

  /** Everything that is open or shown, for a reason that may concern any of it. */
  void allChanged() {
    session.worker().post(Worker.Rank.EDIT, this::enqueueAll);
  }

  private void enqueueAll() {
    Set<String> names = new LinkedHashSet<>(shown.keySet());
    View view = session.view();
    names.addAll(view.sheets());
    if (view.abilities().pulls()) {
      return;
    }
    List<String> unopened =
        names.stream().filter(name -> view.drafts().get(name).isEmpty()).toList();
    progress.start(unopened.size(), view.abilities());
    names.stream()
        .filter(name -> view.drafts().get(name).isPresent())
        .forEach(name -> enqueue(name, Worker.Rank.EDIT));
    unopened.forEach(name -> enqueue(name, Worker.Rank.BACKGROUND));
    session.worker().post(Worker.Rank.BACKGROUND, progress::finish);
  }

  private void enqueue(String name, Worker.Rank rank) {
    if (!session.view().abilities().pulls() && waiting.add(name)) {
      session.worker().post(rank, () -> publish(name));
    }
  }

  private void publish(String name) {
    waiting.remove(name);
    View view = session.view();
    Optional<Draft> draft = view.drafts().get(name);
    if (draft.isEmpty()) {
      progress.step();
    }
    boolean wanted = draft.isPresent() || view.sheets().contains(name);
    List<Diagnostic> diagnostics = wanted ? Diagnosis.of(name, view, session.faults()) : List.of();
    if (!isOutdated(draft)) {
      show(name, draft, diagnostics);
    }
    remember(name, view, wanted);
    if (draft.isPresent()) {
      dependants(name).forEach(this::changed);
    }
  }

  /** A newer version, or the end, waits for its own turn: what was computed would only flicker. */
  private boolean isOutdated(Optional<Draft> draft) {
    Optional<Draft> now = draft.flatMap(d -> session.view().drafts().get(d.name()));
    return draft.isPresent()
        && (now.isEmpty() || now.get() != draft.get())
        && waiting.contains(draft.get().name());
  }

  private void show(String name, Optional<Draft> draft, List<Diagnostic> diagnostics) {
    String uri = draft.map(Draft::uri).orElseGet(() -> Uris.uri(name));
    Shown before = shown.get(name);
    if (before != null && draft.isEmpty()) {
      uri = before.uri();
    }
    Shown now = new Shown(uri, draft.map(Draft::version).orElse(null), diagnostics);
    boolean nothingToTell = before == null && draft.isEmpty() && diagnostics.isEmpty();
    if (nothingToTell || now.equals(before)) {
      return;
    }
    if (draft.isEmpty() && diagnostics.isEmpty()) {
      shown.remove(name);
    } else {
      shown.put(name, now);
    }
    session.client().publish(new PublishDiagnosticsParams(uri, diagnostics, now.version()));
  }

  private void remember(String name, View view, boolean wanted) {
    if (!wanted) {
      uses.remove(name);
      return;
    }
    try {
      uses.put(
          name,
          view.named(name)
              .map(c -> c.linked().used().stream().map(Sheet::path).collect(Collectors.toSet()))
              .orElse(Set.of()));
    } catch (RuntimeException | StackOverflowError reported) {
      uses.remove(name);
    }
  }

  private List<String> dependants(String name) {
    return uses.entrySet().stream()
        .filter(entry -> entry.getValue().contains(name))
        .map(Map.Entry::getKey)
        .filter(dependant -> !Objects.equals(dependant, name))
        .toList();
  }
}
