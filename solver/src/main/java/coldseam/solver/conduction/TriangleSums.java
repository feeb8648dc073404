package coldseam.solver.conduction;

import java.util.stream.IntStream;

/**
 * Sums over the triangles of a mesh, in batches whose sums are then added in order: the rounding
 * error of a long sum stays small, and many batches are done side by side with the same result.
 */
final class TriangleSums {
  private static final int BATCH = 4096;

  /** Meshes with fewer batches are summed by one thread. */
  private static final int WORTH_SHARING = 6;

  private TriangleSums() {}

  /** What is summed. */
  @FunctionalInterface
  interface Terms {
    /**
     * Adds the terms of consecutive triangles.
     *
     * @param from the first triangle
     * @param to the one after the last
     * @param sums takes them
     */
    void add(int from, int to, double[] sums);
  }

  /**
   * Sums.
   *
   * @param triangles how many triangles
   * @param count how many sums
   * @param terms what is summed; for large meshes asked from several threads
   * @return the sums
   */
  static double[] of(int triangles, int count, Terms terms) {
    double[][] parts = new double[(triangles + BATCH - 1) / BATCH][count];
    if (parts.length < WORTH_SHARING) {
      for (int b = 0; b < parts.length; b++) {
        batch(b, triangles, terms, parts);
      }
    } else {
      IntStream.range(0, parts.length).parallel().forEach(b -> batch(b, triangles, terms, parts));
    }
    double[] sums = new double[count];
    for (double[] part : parts) {
      for (int i = 0; i < count; i++) {
        sums[i] += part[i];
      }
    }
    return sums;
  }

  private static void batch(int b, int triangles, Terms terms, double[][] parts) {
    terms.add(b * BATCH, Math.min(triangles, (b + 1) * BATCH), parts[b]);
  }
}
