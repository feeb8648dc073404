package coldseam.cases.library;

import java.util.List;
import java.util.Optional;

/** The material library. */
public final class Library {
  private Library() {}

  /** Every entry, by name. */
  public static List<Entry> all() {
    throw new UnsupportedOperationException();
  }

  /**
   * Finds an entry by its name or one of its other names, ignoring case and white space.
   *
   * @param name the name
   * @return the entry
   */
  public static Optional<Entry> find(String name) {
    throw new UnsupportedOperationException();
  }

  /**
   * Entries in whose names every word occurs.
   *
   * @param words words in any order
   * @return matches, by name
   */
  public static List<Entry> search(List<String> words) {
    throw new UnsupportedOperationException();
  }

  /**
   * The names most like a misspelt one.
   *
   * @param name the name
   * @return up to three, best first
   */
  public static List<String> nearest(String name) {
    throw new UnsupportedOperationException();
  }
}
