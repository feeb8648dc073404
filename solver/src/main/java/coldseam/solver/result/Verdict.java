package coldseam.solver.result;

/** What can be said of a requirement, from good to bad. */
public enum Verdict {
  /** It is met. */
  MET,
  /** Its limit lies within what the number is uncertain by. */
  UNDECIDED,
  /** It is not met. */
  NOT_MET;

  /**
   * Judges by a margin.
   *
   * @param margin by how much a requirement is met, negative if it is not
   * @param error what the margin is uncertain by, same unit
   * @return the verdict
   */
  public static Verdict of(double margin, double error) {
    if (margin >= error) {
      return MET;
    }
    return margin < -error ? NOT_MET : UNDECIDED;
  }
}
