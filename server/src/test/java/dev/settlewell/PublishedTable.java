package dev.settlewell;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Objects;

/**
 * The published tables the tests are held against; each file names its source in its first lines.
 */
public final class PublishedTable {
  private PublishedTable() {}

  /** The cells of all rows, without remarks and the line of column names. */
  public static List<String[]> rows(String name) {
    try (InputStream in = PublishedTable.class.getResourceAsStream("published/" + name + ".csv")) {
      String text =
          new String(Objects.requireNonNull(in, name).readAllBytes(), StandardCharsets.UTF_8);
      return text.lines()
          .filter(line -> !line.startsWith("#"))
          .skip(1)
          .map(line -> line.split(",", -1))
          .toList();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
