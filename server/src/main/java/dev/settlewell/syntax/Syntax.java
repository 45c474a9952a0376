package dev.settlewell.syntax;

import dev.settlewell.text.SourceText;
import java.util.Set;

/** Reads the YAML of a sheet into a tree, whatever the text is. */
public final class Syntax {
  /** A text of this many characters is no sheet; reading it would only cost time. */
  static final int MAX_LENGTH = 3 * 1024 * 1024;

  /** The keys whose values are prose in the format of channel sheets. */
  private static final Set<String> TEXT_KEYS = Set.of("about", "because");

  private Syntax() {}

  /** As {@link #parse(SourceText, Set)}, with the keys that hold prose in a channel sheet. */
  public static SyntaxTree parse(SourceText text) {
    return parse(text, TEXT_KEYS);
  }

  /**
   * Never fails: what cannot be read is left out of the tree, and a problem says so at its place.
   *
   * @param textKeys keys whose values are prose. Where such a value is no legal YAML ({@code about:
   *     Rev C: x}) it is read as if it stood in quotes, and the fix is to write them.
   */
  public static SyntaxTree parse(SourceText text, Set<String> textKeys) {
    return new Reader(text, textKeys).read();
  }
}
