package coldseam.cases.drafting;

import coldseam.cases.library.Entry;
import coldseam.cases.library.Library;
import coldseam.cases.words.Spelling;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The materials of the library whose names are most like the name of a layer. */
final class MaterialGuess {
  private static final int MOST = 3;

  /** A shorter word says nothing by its beginning. */
  private static final int SHORTEST = 4;

  private MaterialGuess() {}

  /** A material and how like it is. */
  private record Scored(String name, double score) {}

  /**
   * Looks a name up.
   *
   * @param layer the name of a layer or of a fill
   * @return names of the library, the likeliest first; none if nothing is like it
   */
  static List<String> of(String layer) {
    Optional<Entry> exact = Library.find(layer);
    if (exact.isPresent()) {
      return List.of(exact.get().name());
    }
    List<String> words = LayerNames.words(layer);
    List<Scored> scored = new ArrayList<>();
    for (Entry entry : Library.all()) {
      double best = score(words, entry.name());
      for (String other : entry.otherNames()) {
        best = Math.max(best, score(words, other));
      }
      if (best > 0) {
        scored.add(new Scored(entry.name(), best));
      }
    }
    scored.sort(
        (a, b) ->
            a.score() != b.score()
                ? Double.compare(b.score(), a.score())
                : a.name().compareTo(b.name()));
    List<String> names = new ArrayList<>();
    for (Scored one : scored.subList(0, Math.min(MOST, scored.size()))) {
      names.add(one.name());
    }
    return names;
  }

  /**
   * Letters of the material's name that the layer's has too, less a little for those it has not.
   */
  private static double score(List<String> words, String candidate) {
    double common = 0;
    double rest = 0;
    for (String of : LayerNames.words(candidate)) {
      double match = 0;
      for (String word : words) {
        match = Math.max(match, alike(word, of));
      }
      common += match * of.length();
      rest += (1 - match) * of.length();
    }
    return common <= 2 ? 0 : common - 0.1 * rest;
  }

  private static double alike(String word, String of) {
    if (word.equals(of)) {
      return 1;
    }
    boolean letters = Character.isLetter(word.charAt(0)) && Character.isLetter(of.charAt(0));
    int shorter = Math.min(word.length(), of.length());
    if (!letters || shorter < SHORTEST) {
      return 0;
    }
    if (word.startsWith(of) || of.startsWith(word)) {
      return 0.8;
    }
    return Spelling.nearest(word, List.of(of)).isPresent()
            && word.regionMatches(0, of, 0, SHORTEST - 1)
        ? 0.6
        : 0;
  }
}
