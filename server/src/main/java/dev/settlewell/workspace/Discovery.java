package dev.settlewell.workspace;

import java.io.IOException;
import java.nio.file.FileVisitResult;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.SimpleFileVisitor;
import java.nio.file.attribute.BasicFileAttributes;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Set;

/**
 * Finds the sheets below folders.
 *
 * @param sheets sorted, as the folders were given
 * @param complete false where a bound was met and more may be there
 */
public record Discovery(List<Path> sheets, boolean complete) {
  /** What a file must end with to be a sheet. */
  public static final String SUFFIX = ".channels.yaml";

  private static final int DEEPEST = 24;
  private static final int MOST_FILES = 200_000;

  /** Folders that hold what was built or fetched, never a source. */
  private static final Set<String> SKIPPED = Set.of("target", "node_modules");

  public static boolean isSheet(String name) {
    return name.endsWith(SUFFIX) && !name.substring(name.lastIndexOf('/') + 1).equals(SUFFIX);
  }

  /** A path that is a file is taken as a sheet whatever its name. */
  public static Discovery below(List<Path> paths) {
    Walk walk = new Walk();
    for (Path path : paths) {
      if (Files.isDirectory(path)) {
        walk.below(path);
      } else {
        walk.found.add(path);
      }
    }
    Collections.sort(walk.found);
    return new Discovery(walk.found.stream().distinct().toList(), walk.complete);
  }

  private static final class Walk extends SimpleFileVisitor<Path> {
    private final List<Path> found = new ArrayList<>();
    private boolean complete = true;
    private int files;
    private Path start;

    void below(Path folder) {
      start = folder;
      try {
        Files.walkFileTree(folder, Set.of(), DEEPEST, this);
      } catch (IOException e) {
        complete = false;
      }
    }

    @Override
    public FileVisitResult preVisitDirectory(Path folder, BasicFileAttributes attributes) {
      if (folder.equals(start)) {
        return FileVisitResult.CONTINUE;
      }
      String name = String.valueOf(folder.getFileName());
      boolean skipped = name.startsWith(".") || SKIPPED.contains(name);
      return skipped ? FileVisitResult.SKIP_SUBTREE : FileVisitResult.CONTINUE;
    }

    @Override
    public FileVisitResult visitFile(Path file, BasicFileAttributes attributes) {
      if (++files > MOST_FILES) {
        complete = false;
        return FileVisitResult.TERMINATE;
      }
      if (attributes.isDirectory()) {
        complete = false; // the deepest level: not gone into
      } else if (isSheet(file.getFileName().toString())) {
        found.add(file);
      }
      return FileVisitResult.CONTINUE;
    }

    @Override
    public FileVisitResult visitFileFailed(Path file, IOException e) {
      complete = false;
      return FileVisitResult.CONTINUE;
    }
  }
}
