package dev.settlewell.workspace;

import java.util.Map;

/** Texts that stand over those of another reader: the open buffers of an editor. */
public final class Overlay implements SheetReader {
  private final Map<String, String> texts;
  private final SheetReader below;

  public Overlay(Map<String, String> texts, SheetReader below) {
    this.texts = Map.copyOf(texts);
    this.below = below;
  }

  @Override
  public Content read(String path) {
    String text = texts.get(path);
    return text != null ? Content.of(text) : below.read(path);
  }

  @Override
  public boolean exists(String path) {
    return texts.containsKey(path) || below.exists(path);
  }

  @Override
  public String real(String path) {
    return below.real(path);
  }
}
