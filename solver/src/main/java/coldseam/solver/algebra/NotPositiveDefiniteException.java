package coldseam.solver.algebra;

/** A matrix could not be factored because it is not positive definite, or not finite. */
public final class NotPositiveDefiniteException extends IllegalStateException {
  private static final long serialVersionUID = 1L;

  private final int unknown;
  private final double pivot;

  /**
   * Names the place.
   *
   * @param unknown the first unknown, in the order of elimination, that could not be eliminated
   * @param unknowns how many unknowns the matrix has
   * @param pivot its pivot: not positive, infinite or not a number
   */
  NotPositiveDefiniteException(int unknown, int unknowns, double pivot) {
    super(
        "unknown " + unknown + " of " + unknowns + " cannot be eliminated, its pivot is " + pivot);
    this.unknown = unknown;
    this.pivot = pivot;
  }

  /** The first unknown, in the order of elimination, that could not be eliminated. */
  public int unknown() {
    return unknown;
  }

  /** Its pivot: not positive, infinite or not a number. */
  public double pivot() {
    return pivot;
  }
}
