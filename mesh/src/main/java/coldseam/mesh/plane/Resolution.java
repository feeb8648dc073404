package coldseam.mesh.plane;

/**
 * The lengths below which points of a drawing are the same. Nothing is rounded to a grid: points
 * within {@code snapM} of each other are joined, and gaps up to {@code closeM} are closed one by
 * one and listed.
 *
 * @param snapM points nearer than this are one point, m
 * @param closeM gaps up to this width are closed and listed, m
 */
public record Resolution(double snapM, double closeM) {
  /** 1e-5 mm for joining, 1e-3 mm for closing. */
  public static final Resolution STANDARD = new Resolution(1e-8, 1e-6);

  /**
   * Checks the order of the two lengths.
   *
   * @throws IllegalArgumentException unless 0 &lt; snapM ≤ closeM
   */
  public Resolution {
    if (!(snapM > 0) || !(closeM >= snapM)) {
      throw new IllegalArgumentException("a resolution needs 0 < snap <= close");
    }
  }
}
