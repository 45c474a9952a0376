package dev.settlewell.vocabulary;

import java.util.Locale;

/** What a name of the user's own can stand for; the five share one namespace. */
public enum NameKind {
  SUPPLY,
  CONVERTER,
  SCAN,
  INTERFERER,
  CHANNEL;

  /** As messages say it: {@code supply}. */
  public String word() {
    return name().toLowerCase(Locale.ROOT);
  }

  /** {@code an interferer}. */
  public String withArticle() {
    return (this == INTERFERER ? "an " : "a ") + word();
  }

  /** The key of the top level that defines such names: {@code supplies}. */
  public String section() {
    return this == SUPPLY ? "supplies" : word() + "s";
  }
}
