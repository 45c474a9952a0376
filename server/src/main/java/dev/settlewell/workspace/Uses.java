package dev.settlewell.workspace;

import dev.settlewell.firmware.Source;
import dev.settlewell.sheet.Linked;
import dev.settlewell.sheet.Part;
import dev.settlewell.sheet.Sheet;
import dev.settlewell.sheet.Slot;
import dev.settlewell.text.Place;
import dev.settlewell.text.Problem;
import java.time.LocalDate;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Deque;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Follows {@code use} from sheet to sheet, inside the workspace only: the nearest folder above a
 * sheet with a {@code .git} or the project file, else the sheet's own folder. Each file is read
 * once.
 */
final class Uses {
  /** Sheets that one sheet may reach; more is a mistake, and would never end to be read. */
  private static final int MOST = 500;

  /** One step: the sheet that is used, or the problem of its item. */
  private record Step(Optional<String> path, Optional<Problem> problem, Place place) {}

  private final SheetReader reader;
  private final Memo memo;
  private final Map<String, SheetReader.Content> contents = new HashMap<>();

  /** By a file's one name, the path it was asked for by first: one file is one sheet. */
  private final Map<String, String> names = new HashMap<>();

  private final Map<String, String> roots = new HashMap<>();

  Uses(Collection<String> asked, SheetReader reader, Memo memo) {
    this.reader = reader;
    this.memo = memo;
    asked.forEach(path -> names.putIfAbsent(reader.real(path), path));
  }

  SheetReader.Content content(String path) {
    return contents.computeIfAbsent(path, reader::read);
  }

  Linked link(Sheet sheet, LocalDate date) {
    Map<String, Sheet> reached = new LinkedHashMap<>();
    List<Problem> problems = new ArrayList<>();
    boolean whole = true;
    Deque<Sheet> open = new ArrayDeque<>(List.of(sheet));
    while (!open.isEmpty() && reached.size() < MOST) {
      Sheet here = open.removeFirst();
      for (Step step : steps(here)) {
        whole &= step.path().isPresent();
        if (here == sheet) {
          step.problem().ifPresent(problems::add);
        }
        Optional<String> next =
            step.path().filter(path -> !path.equals(sheet.path()) && !reached.containsKey(path));
        if (next.isPresent()) {
          Sheet used = read(next.get());
          reached.put(next.get(), used);
          open.addLast(used);
        }
      }
    }
    circles(sheet, problems);
    return memo.linked(sheet, List.copyOf(reached.values()), whole, problems, sources(sheet), date);
  }

  /** The source files that the sheet's firmware constants stand in, by the path as written. */
  private Map<String, Source> sources(Sheet sheet) {
    Map<String, Source> sources = new LinkedHashMap<>();
    List<Slot<Part>> constants = sheet.top().list("firmware", Part.class).orElse(List.of());
    for (Slot<Part> constant : constants) {
      Slot<String> in = constant.stated().map(part -> part.text("in")).orElse(null);
      if (in != null && in.isStated()) {
        sources.computeIfAbsent(in.stated().orElseThrow(), path -> source(sheet, path, in.place()));
      }
    }
    return sources;
  }

  private Source source(Sheet sheet, String written, Place place) {
    Step step = step(sheet, written, place);
    if (step.path().isEmpty()) {
      boolean outside =
          step.problem()
              .filter(problem -> problem.kind() == Problem.Kind.USE_OUTSIDE_WORKSPACE)
              .isPresent();
      return Source.none(outside ? "it lies outside the workspace" : "there is no such file");
    }
    String path = step.path().get();
    return memo.source(path, content(path).text().orElseThrow());
  }

  /** For each item of {@code use} that leads back to the sheet, the way it takes. */
  private void circles(Sheet sheet, List<Problem> problems) {
    for (Step step : steps(sheet)) {
      if (step.path().isEmpty()) {
        continue;
      }
      Optional<String> way = wayBack(step.path().get(), sheet.path());
      way.ifPresent(
          names ->
              problems.add(
                  new Problem(
                      Problem.Kind.USE_CIRCLE,
                      step.place(),
                      "sheets may not use each other in a circle: "
                          + name(sheet.path())
                          + " uses "
                          + names)));
    }
  }

  private Optional<String> wayBack(String from, String to) {
    Map<String, String> cameFrom = new LinkedHashMap<>();
    cameFrom.put(from, "");
    Deque<String> open = new ArrayDeque<>(List.of(from));
    while (!open.isEmpty() && cameFrom.size() < MOST) {
      String here = open.removeFirst();
      if (here.equals(to)) {
        return Optional.of(way(cameFrom, here));
      }
      for (Step step : steps(read(here))) {
        if (step.path().isPresent() && cameFrom.putIfAbsent(step.path().get(), here) == null) {
          open.addLast(step.path().get());
        }
      }
    }
    return Optional.empty();
  }

  private static String way(Map<String, String> cameFrom, String end) {
    StringBuilder way = new StringBuilder(name(end));
    for (String step = cameFrom.get(end); !step.isEmpty(); step = cameFrom.get(step)) {
      way.insert(0, name(step) + ", which uses ");
    }
    return way.toString();
  }

  private static String name(String path) {
    return path.substring(path.lastIndexOf('/') + 1);
  }

  private Sheet read(String path) {
    return memo.sheet(path, content(path).text().orElseThrow());
  }

  private List<Step> steps(Sheet sheet) {
    List<Step> steps = new ArrayList<>();
    List<Slot<String>> items = sheet.top().list("use", String.class).orElse(List.of());
    for (Slot<String> item : items) {
      item.stated().ifPresent(written -> steps.add(step(sheet, written, item.place())));
    }
    return steps;
  }

  private Step step(Sheet sheet, String written, Place place) {
    String folder = Paths.folder(sheet.path());
    if (Paths.isAbsolute(written)) {
      return refused(
          Problem.Kind.USE_OUTSIDE_WORKSPACE, place, "`use` takes paths relative to this sheet");
    }
    if (written.indexOf('\\') >= 0) {
      return refused(Problem.Kind.USE_NOT_FOUND, place, "paths in a sheet are written with `/`");
    }
    String real = reader.real(Paths.resolve(folder, written));
    String root = roots.computeIfAbsent(reader.real(folder.isEmpty() ? "." : folder), this::root);
    if (!Paths.isInside(real, root)) {
      return refused(
          Problem.Kind.USE_OUTSIDE_WORKSPACE,
          place,
          "`"
              + written
              + "` lies outside the workspace: put a "
              + Workspace.PROJECT_FILE
              + " into the folder that holds both sheets");
    }
    String path = names.computeIfAbsent(real, asked -> Paths.resolve(folder, written));
    SheetReader.Content content = content(path);
    if (content.text().isEmpty()) {
      return refused(Problem.Kind.USE_NOT_FOUND, place, "`" + path + "`: " + content.why());
    }
    return new Step(Optional.of(path), Optional.empty(), place);
  }

  private static Step refused(Problem.Kind kind, Place place, String message) {
    return new Step(Optional.empty(), Optional.of(new Problem(kind, place, message)), place);
  }

  private String root(String folder) {
    Optional<String> here = Optional.of(folder);
    while (here.isPresent()) {
      String at = here.get();
      boolean marked =
          reader.exists(Paths.resolve(at, ".git"))
              || reader.exists(Paths.resolve(at, Workspace.PROJECT_FILE));
      if (marked) {
        return at;
      }
      here = Paths.above(at);
    }
    return folder;
  }
}
