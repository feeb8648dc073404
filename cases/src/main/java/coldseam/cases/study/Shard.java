package coldseam.cases.study;

import java.util.ArrayList;
import java.util.List;

/**
 * One of several equal parts of a list of jobs. Part k takes every n-th job from the k-th on, so
 * that parts take about as long as each other.
 *
 * @param number which part, from 1
 * @param of how many parts there are
 */
public record Shard(int number, int of) {
  /** Everything in one part. */
  public static final Shard WHOLE = new Shard(1, 1);

  private static final int MOST = 1_000_000;

  /**
   * Checks the numbers.
   *
   * @throws IllegalArgumentException unless 1 ≤ number ≤ of
   */
  public Shard {
    if (number < 1 || number > of) {
      throw new IllegalArgumentException("a part counts from 1 to the count of parts");
    }
  }

  /**
   * Reads {@code k/n}.
   *
   * @param typed as typed
   * @return the part
   * @throws StudyException unless k and n are whole numbers, 1 ≤ k ≤ n
   */
  public static Shard read(String typed) throws StudyException {
    int slash = typed.indexOf('/');
    int number = slash < 0 ? -1 : whole(typed.substring(0, slash).strip());
    int of = slash < 0 ? -1 : whole(typed.substring(slash + 1).strip());
    if (number < 0 || of < 1) {
      throw new StudyException(
          "a shard is k/n, the k-th of n parts, e.g. --shard 2/10; \"" + typed + "\" is none");
    }
    if (number < 1 || number > of) {
      throw new StudyException(
          "shards count from 1 to n; there is no shard " + number + " of " + of);
    }
    return new Shard(number, of);
  }

  private static int whole(String typed) {
    try {
      int number = Integer.parseInt(typed);
      return number >= 0 && number <= MOST ? number : -1;
    } catch (NumberFormatException e) {
      return -1;
    }
  }

  /** Whether this is everything. */
  public boolean whole() {
    return of == 1;
  }

  /**
   * The jobs of this part.
   *
   * @param all every job, in order
   * @param <T> a job
   * @return those of this part, in order
   */
  public <T> List<T> part(List<T> all) {
    List<T> part = new ArrayList<>();
    for (int i = number - 1; i < all.size(); i += of) {
      part.add(all.get(i));
    }
    return part;
  }
}
