package dev.settlewell.vocabulary;

import java.util.Collection;
import java.util.Locale;
import java.util.Optional;

/** The known word that was most likely meant by an unknown one. */
public final class Nearest {
  private Nearest() {}

  /**
   * The nearest of {@code known}, the first of equals; empty where none is near enough to be a slip
   * of the keyboard: more than a third of the letters would have to change. Capitals, blanks and
   * underscores count nothing.
   */
  public static Optional<String> of(String text, Collection<String> known) {
    String written = text.toLowerCase(Locale.ROOT).replace('_', '-').replace(' ', '-');
    int limit = written.length() < 3 ? 0 : written.length() / 3;
    String best = null;
    for (String word : known) {
      if (Math.abs(word.length() - written.length()) > limit) {
        continue;
      }
      int distance = distance(written, word);
      if (distance <= limit) {
        best = word;
        limit = distance - 1;
      }
    }
    return Optional.ofNullable(best);
  }

  /**
   * The Damerau-Levenshtein distance in its restricted form (optimal string alignment): insertions,
   * deletions, replacements and swaps of neighbours, each counted as one.
   */
  static int distance(String a, String b) {
    int[][] d = new int[a.length() + 1][b.length() + 1];
    for (int i = 0; i <= a.length(); i++) {
      d[i][0] = i;
    }
    for (int j = 0; j <= b.length(); j++) {
      d[0][j] = j;
    }
    for (int i = 1; i <= a.length(); i++) {
      for (int j = 1; j <= b.length(); j++) {
        int change = a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1;
        d[i][j] = Math.min(Math.min(d[i - 1][j], d[i][j - 1]) + 1, d[i - 1][j - 1] + change);
        boolean swapped =
            i > 1
                && j > 1
                && a.charAt(i - 1) == b.charAt(j - 2)
                && a.charAt(i - 2) == b.charAt(j - 1);
        if (swapped) {
          d[i][j] = Math.min(d[i][j], d[i - 2][j - 2] + 1);
        }
      }
    }
    return d[a.length()][b.length()];
  }
}
