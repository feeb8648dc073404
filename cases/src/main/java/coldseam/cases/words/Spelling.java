package coldseam.cases.words;

import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Finds the valid words most like a misspelt one. */
public final class Spelling {
  /** Words longer than this are compared by their beginning only. */
  private static final int LONGEST_COMPARED = 60;

  private Spelling() {}

  /**
   * The valid words most like a word.
   *
   * @param word the word as typed
   * @param valid what could have been meant
   * @param most how many to return at most
   * @return the nearest, best first; empty if none is near enough to be meant
   */
  public static List<String> nearest(String word, Collection<String> valid, int most) {
    String plain = folded(word);
    List<String> best = new ArrayList<>();
    List<Integer> scores = new ArrayList<>();
    for (String candidate : valid) {
      int score = score(plain, folded(candidate));
      if (score < 0 || best.contains(candidate)) {
        continue;
      }
      int at = best.size();
      while (at > 0 && scores.get(at - 1) > score) {
        at--;
      }
      best.add(at, candidate);
      scores.add(at, score);
      if (best.size() > most) {
        best.remove(most);
        scores.remove(most);
      }
    }
    return List.copyOf(best);
  }

  /**
   * The one valid word most like a word.
   *
   * @param word the word as typed
   * @param valid what could have been meant
   * @return the nearest, or empty if none is near enough to be meant
   */
  public static Optional<String> nearest(String word, Collection<String> valid) {
    List<String> best = nearest(word, valid, 1);
    return best.isEmpty() ? Optional.empty() : Optional.of(best.get(0));
  }

  /** Lower case, with everything but letters and digits as single spaces. */
  private static String folded(String word) {
    String lower = word.toLowerCase(Locale.ROOT);
    StringBuilder out = new StringBuilder();
    for (int i = 0; i < lower.length() && out.length() < LONGEST_COMPARED; i++) {
      char c = lower.charAt(i);
      if (Character.isLetterOrDigit(c)) {
        out.append(c);
      } else if (out.length() > 0 && out.charAt(out.length() - 1) != ' ') {
        out.append(' ');
      }
    }
    return out.toString().strip();
  }

  /** The lower the nearer; −1 if too far to be meant. */
  private static int score(String word, String candidate) {
    if (word.isEmpty() || candidate.isEmpty()) {
      return -1;
    }
    int distance = distance(word, candidate);
    int allowed = Math.max(1, Math.max(word.length(), candidate.length()) / 3);
    if (distance <= allowed && distance < candidate.length()) {
      return 4 * distance;
    }
    boolean contained = candidate.length() >= 3 && word.contains(candidate);
    if (contained || (word.length() >= 3 && candidate.contains(word))) {
      return 4 * allowed + 4 + Math.abs(candidate.length() - word.length());
    }
    return -1;
  }

  /** Insertions, deletions, changes and swaps of neighbours that turn one word into the other. */
  private static int distance(String a, String b) {
    int[] beforeLast = new int[b.length() + 1];
    int[] last = new int[b.length() + 1];
    int[] row = new int[b.length() + 1];
    for (int j = 0; j <= b.length(); j++) {
      last[j] = j;
    }
    for (int i = 1; i <= a.length(); i++) {
      row[0] = i;
      for (int j = 1; j <= b.length(); j++) {
        int change = a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1;
        row[j] = Math.min(last[j - 1] + change, 1 + Math.min(last[j], row[j - 1]));
        boolean swapped =
            i > 1
                && j > 1
                && a.charAt(i - 1) == b.charAt(j - 2)
                && a.charAt(i - 2) == b.charAt(j - 1);
        if (swapped) {
          row[j] = Math.min(row[j], beforeLast[j - 2] + 1);
        }
      }
      int[] free = beforeLast;
      beforeLast = last;
      last = row;
      row = free;
    }
    return last[b.length()];
  }
}
