package coldseam.solver.algebra;

/** A triangular factor of a symmetric positive definite matrix. */
sealed interface Factor permits UpLookingCholesky, MultifrontalCholesky {
  /**
   * Solves by substitution alone.
   *
   * @param b right-hand sides
   * @return the solutions, in the same order
   */
  double[][] substitute(double[]... b);

  /** Entries of the factor. */
  long factorEntries();
}
