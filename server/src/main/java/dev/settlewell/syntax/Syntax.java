package dev.settlewell.syntax;

import dev.settlewell.text.SourceText;

/** Reads the YAML of a sheet into a tree, whatever the text is. */
public final class Syntax {
  private Syntax() {}

  public static SyntaxTree parse(SourceText text) {
    throw new UnsupportedOperationException();
  }
}
