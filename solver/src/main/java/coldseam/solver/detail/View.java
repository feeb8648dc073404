package coldseam.solver.detail;

/**
 * How the section lies in the building.
 *
 * @param plan true for a horizontal section
 * @param upX x component of the unit vector that points up, 0 in a plan
 * @param upY y component of it, 0 in a plan
 * @param horizontalFlow whether every film takes the value for horizontal heat flow, as in a plan
 */
public record View(boolean plan, double upX, double upY, boolean horizontalFlow) {
  /** A horizontal section. */
  public static final View PLAN = new View(true, 0, 0, true);

  /** A vertical section with y pointing up. */
  public static final View UPRIGHT = new View(false, 0, 1, false);

  /**
   * Checks the vector.
   *
   * @throws IllegalArgumentException if a vertical view's vector is not of length 1, or heat in a
   *     plan does not flow horizontally
   */
  public View {
    if (!plan && !(Math.abs(Math.hypot(upX, upY) - 1) < 1e-9)) {
      throw new IllegalArgumentException("up must be a unit vector");
    }
    if (plan && !horizontalFlow) {
      throw new IllegalArgumentException("in a plan heat flows horizontally");
    }
  }

  /**
   * A vertical section.
   *
   * @param x x component of any vector that points up
   * @param y y component of it
   * @return the view
   */
  public static View up(double x, double y) {
    double length = Math.hypot(x, y);
    return new View(false, x / length, y / length, false);
  }

  /** The same section, with heat taken to flow horizontally whichever way surfaces face. */
  View withHorizontalFlow() {
    return new View(plan, upX, upY, true);
  }
}
