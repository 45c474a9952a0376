package dev.settlewell.workspace;

import java.nio.file.Path;
import java.util.ArrayDeque;
import java.util.Deque;
import java.util.Optional;

/** Paths as text with {@code /}, the same on every system. */
final class Paths {
  private Paths() {}

  static String withSlashes(Path path) {
    return path.toString().replace('\\', '/');
  }

  /** The folder of a path: {@code ""} for a bare name, {@code "/"} for a file of the root. */
  static String folder(String path) {
    int slash = path.lastIndexOf('/');
    return slash < 0 ? "" : slash == 0 ? "/" : path.substring(0, slash);
  }

  /** {@code relative} as seen from {@code folder}, without {@code .} and {@code ..} steps. */
  static String resolve(String folder, String relative) {
    String joined = folder.isEmpty() ? relative : folder + "/" + relative;
    Deque<String> steps = new ArrayDeque<>();
    for (String step : joined.split("/")) {
      if (step.equals("..") && !steps.isEmpty() && !steps.peekLast().equals("..")) {
        steps.removeLast();
      } else if (!step.isEmpty() && !step.equals(".")) {
        steps.addLast(step);
      }
    }
    return (joined.startsWith("/") ? "/" : "") + String.join("/", steps);
  }

  static boolean isAbsolute(String path) {
    return path.startsWith("/") || path.startsWith("\\") || path.matches("[A-Za-z]:.*");
  }

  static boolean isInside(String path, String folder) {
    return folder.equals("/") || folder.isEmpty() || path.startsWith(folder + "/");
  }

  /** The folder above, or empty at the top. */
  static Optional<String> above(String folder) {
    boolean top = folder.equals("/") || folder.indexOf('/') < 0;
    return top ? Optional.empty() : Optional.of(folder(folder));
  }
}
