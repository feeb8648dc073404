package coldseam.cases;

import coldseam.cases.words.Spelling;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** Collects the mistakes of one file. */
final class Problems {
  /** More mistakes than this are counted, not listed. */
  static final int MOST_LISTED = 100;

  private final String file;
  private final List<Problem> found = new ArrayList<>();
  private int hidden;
  private final Set<String> known = new HashSet<>();

  /** Places with a mark of what is undecided; nothing else that is wrong there is worth a word. */
  private final Set<Long> undecided;

  /**
   * Starts with none.
   *
   * @param file the file as the user named it
   */
  Problems(String file) {
    this(file, new HashSet<>());
  }

  private Problems(String file, Set<Long> undecided) {
    this.file = file;
    this.undecided = undecided;
  }

  /** Starts with none for another way through the same file. */
  Problems another() {
    return new Problems(file, undecided);
  }

  /** Adds a mark of what is undecided; whatever else is wrong at its place is not added. */
  void undecided(Node at, String wrong, String hint) {
    add(at, wrong, hint.isEmpty() ? "write what it is" : hint);
    undecided.add(place(at.line(), at.column()));
  }

  private static long place(int line, int column) {
    return (long) line << 32 | column;
  }

  void add(Node at, String wrong, String right) {
    add(at.line(), at.column(), wrong, right);
  }

  void add(int line, int column, String wrong, String right) {
    Optional<String> hint = right.isEmpty() ? Optional.empty() : Optional.of(right);
    add(new Problem(file, line, column, wrong, hint));
  }

  /** Adds a problem unless the same is already known of the same place. */
  void add(Problem problem) {
    if (undecided.contains(place(problem.line(), problem.column()))) {
      hidden++;
    } else if (known.add(key(problem))) {
      found.add(problem);
    }
  }

  /**
   * Adds what a variant brings in beside the mistakes of the base case.
   *
   * @param variant its name
   * @param ofVariant what reading it found
   */
  void addOfVariant(String variant, Problems ofVariant) {
    for (Problem problem : ofVariant.found) {
      if (!known.contains(key(problem))) {
        String wrong = "in variant `" + variant + "`: " + problem.wrong();
        add(new Problem(file, problem.line(), problem.column(), wrong, problem.right()));
      }
    }
  }

  private static String key(Problem problem) {
    return problem.line() + ":" + problem.column() + ":" + problem.wrong();
  }

  boolean none() {
    return found.isEmpty();
  }

  /** How many there are; also grows by what is kept quiet. */
  int count() {
    return found.size() + hidden;
  }

  /** Everything in line order; beyond {@link #MOST_LISTED} only how many more there are. */
  List<Problem> inOrder() {
    List<Problem> sorted = new ArrayList<>(found);
    sorted.sort(
        (a, b) ->
            a.line() != b.line()
                ? Integer.compare(a.line(), b.line())
                : Integer.compare(a.column(), b.column()));
    if (sorted.size() <= MOST_LISTED) {
      return List.copyOf(sorted);
    }
    Problem last = sorted.get(MOST_LISTED);
    int more = sorted.size() - MOST_LISTED;
    List<Problem> listed = new ArrayList<>(sorted.subList(0, MOST_LISTED));
    listed.add(
        new Problem(
            file,
            last.line(),
            last.column(),
            "and " + more + " more mistakes from here on",
            Optional.of("mend those above first")));
    return List.copyOf(listed);
  }

  /**
   * What would be right where one of a few words is wanted.
   *
   * @param typed what stands there
   * @param valid the words
   * @return a question if one of them is near, else the list
   */
  static String suggestion(String typed, Collection<String> valid) {
    Optional<String> nearest = Spelling.nearest(typed, valid);
    if (nearest.isPresent()) {
      return "did you mean `" + nearest.get() + "`?";
    }
    return valid.isEmpty() ? "" : "known are " + listed(valid);
  }

  /** Words in a row, as in `a`, `b` and `c`. */
  static String listed(Collection<String> words) {
    StringBuilder out = new StringBuilder();
    int i = 0;
    for (String word : words) {
      if (i == 40) {
        return out.append(" and others").toString();
      }
      if (i > 0) {
        out.append(i == words.size() - 1 ? " and " : ", ");
      }
      out.append('`').append(word).append('`');
      i++;
    }
    return out.toString();
  }
}
