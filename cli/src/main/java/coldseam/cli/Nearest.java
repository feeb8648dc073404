package coldseam.cli;

import java.util.Collection;
import java.util.Locale;
import java.util.Optional;

/** Finds the word that was probably meant. */
final class Nearest {
  private Nearest() {}

  /**
   * The word fewest changes of a letter away (Damerau 1964: insert, delete, replace, swap two
   * neighbours).
   *
   * @param typed what was typed
   * @param words what could have been meant
   * @return the nearest, empty if none is near: more than a third of its letters would change
   */
  static Optional<String> of(String typed, Collection<String> words) {
    String best = null;
    int least = Integer.MAX_VALUE;
    for (String word : words) {
      int distance = distance(typed.toLowerCase(Locale.ROOT), word.toLowerCase(Locale.ROOT));
      int allowed = Math.min(Math.max(1, word.length() / 3), word.length() - 1);
      if (distance < least && distance <= allowed) {
        best = word;
        least = distance;
      }
    }
    return Optional.ofNullable(best);
  }

  private static int distance(String a, String b) {
    int[][] d = new int[a.length() + 1][b.length() + 1];
    for (int i = 0; i <= a.length(); i++) {
      for (int j = 0; j <= b.length(); j++) {
        if (i == 0 || j == 0) {
          d[i][j] = i + j;
          continue;
        }
        int replace = a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1;
        d[i][j] = Math.min(d[i - 1][j - 1] + replace, Math.min(d[i - 1][j] + 1, d[i][j - 1] + 1));
        if (i > 1
            && j > 1
            && a.charAt(i - 1) == b.charAt(j - 2)
            && a.charAt(i - 2) == b.charAt(j - 1)) {
          d[i][j] = Math.min(d[i][j], d[i - 2][j - 2] + 1);
        }
      }
    }
    return d[a.length()][b.length()];
  }
}
