package coldseam.solver.conduction;

/**
 * Whether going on can meet what is asked before the unknowns run out. Quadratic elements on meshes
 * that suit the solution lose error like unknowns^−2; where good conductors touch in one point the
 * rate is so poor that no affordable mesh would do.
 */
final class Outlook {
  /** Passes with fewer unknowns than this are quick whatever comes of them. */
  private static final int QUICK = 10_000;

  /** So many passes in a row have to promise nothing. */
  private static final int PATIENCE = 2;

  private final int mostUnknowns;
  private double lastReached = Double.NaN;
  private int lastUnknowns;
  private int poorPasses;

  /**
   * Starts.
   *
   * @param mostUnknowns where refinement stops in any case
   */
  Outlook(int mostUnknowns) {
    this.mostUnknowns = mostUnknowns;
  }

  /**
   * Looks ahead after a pass.
   *
   * @param unknowns its unknowns
   * @param reached the worst error over what it may be
   * @return whether another pass makes sense
   */
  boolean worthwhile(int unknowns, double reached) {
    double growth = Math.log(unknowns / (double) lastUnknowns);
    double rate = Math.log(lastReached / reached) / growth;
    // reached · (n / unknowns)^−rate = 1 at the unknowns n that are needed
    boolean poor =
        !(rate > 0 && Math.log(reached) / rate < Math.log(mostUnknowns / (double) unknowns));
    poorPasses = lastUnknowns > 0 && poor ? poorPasses + 1 : 0;
    lastReached = reached;
    lastUnknowns = unknowns;
    return poorPasses < PATIENCE || unknowns < QUICK;
  }
}
