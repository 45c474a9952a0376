package dev.settlewell.workspace;

import java.util.HashMap;
import java.util.Map;

/** Files of a test, below {@code /}. */
final class InMemory implements SheetReader {
  final Map<String, String> files = new HashMap<>();
  int reads;

  InMemory with(String path, String text) {
    files.put(path, text);
    return this;
  }

  @Override
  public Content read(String path) {
    reads++;
    String text = files.get(real(path));
    return text == null ? Content.none("there is no such file") : Content.of(text);
  }

  @Override
  public boolean exists(String path) {
    String real = real(path);
    return files.keySet().stream().anyMatch(f -> f.equals(real) || f.startsWith(real + "/"));
  }

  @Override
  public String real(String path) {
    return Paths.resolve("/", path);
  }
}
