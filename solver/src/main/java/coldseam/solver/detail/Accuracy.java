package coldseam.solver.detail;

/**
 * The half-widths asked for. Of a body of revolution, L2D is L3D and per metre falls away.
 *
 * @param couplingRelative of L2D, relative to it; the smaller of this and the next counts
 * @param couplingWPerMK of L2D, W/(m·K)
 * @param psiWPerMK of ψ, W/(m·K)
 * @param transmittanceRelative of U, relative to it
 * @param pointRelative of χ, relative to it; the larger of this and the next counts
 * @param pointWPerK of χ, W/K
 * @param mostUnknowns where refinement stops, whatever is reached
 */
public record Accuracy(
    double couplingRelative,
    double couplingWPerMK,
    double psiWPerMK,
    double transmittanceRelative,
    double pointRelative,
    double pointWPerK,
    int mostUnknowns) {
  /**
   * L2D the smaller of 0.2 % and 0.001 W/(m·K); ψ 0.001 W/(m·K); U 0.2 %; χ the larger of 1 % and
   * 0.0005 W/K.
   */
  public static final Accuracy STANDARD =
      new Accuracy(0.002, 0.001, 0.001, 0.002, 0.01, 0.0005, 2_000_000);

  /** Part of an absolute half-width that is as good as none. */
  private static final double NEGLIGIBLE = 1e-6;

  /**
   * Checks the figures.
   *
   * @throws IllegalArgumentException unless every figure is more than 0
   */
  public Accuracy {
    if (!(couplingRelative > 0)
        || !(couplingWPerMK > 0)
        || !(psiWPerMK > 0)
        || !(transmittanceRelative > 0)
        || !(pointRelative >= 0)
        || !(pointWPerK >= 0)
        || !(pointRelative + pointWPerK > 0)
        || mostUnknowns <= 0) {
      throw new IllegalArgumentException("every accuracy is more than 0");
    }
  }

  /** Accuracies with the standard one of χ. */
  public Accuracy(
      double couplingRelative,
      double couplingWPerMK,
      double psiWPerMK,
      double transmittanceRelative,
      int mostUnknowns) {
    this(
        couplingRelative,
        couplingWPerMK,
        psiWPerMK,
        transmittanceRelative,
        STANDARD.pointRelative,
        STANDARD.pointWPerK,
        mostUnknowns);
  }

  /**
   * The half-width of a χ.
   *
   * @param valueWPerK χ, W/K
   * @return W/K
   */
  public double pointWPerK(double valueWPerK) {
    return Math.max(pointRelative * Math.abs(valueWPerK), pointWPerK);
  }

  /**
   * The half-width of a coupling that always does: a millionth of the smallest absolute one asked
   * for or standard. Where no heat path joins two spaces, a part of their L2D would be nothing.
   *
   * @return W/(m·K), 1e-9 or less
   */
  public double negligibleWPerMK() {
    double smallest = Math.min(couplingWPerMK, psiWPerMK);
    return NEGLIGIBLE * Math.min(smallest, STANDARD.couplingWPerMK);
  }

  /**
   * What each of several couplings has to meet whose errors add up in one ψ.
   *
   * @param couplings how many
   * @return the same but for the half-widths of ψ and χ, which they share
   */
  public Accuracy sharingPsi(int couplings) {
    return couplings == 1
        ? this
        : new Accuracy(
            couplingRelative,
            couplingWPerMK,
            psiWPerMK / couplings,
            transmittanceRelative,
            pointRelative / couplings,
            pointWPerK / couplings,
            mostUnknowns);
  }
}
