package coldseam.solver.result;

import coldseam.solver.detail.Wanted;

/**
 * Rules of ISO 6946:2017 for a U that is known: corrections, and tapered layers (clauses 6.9 and
 * annexes E, F; *from memory*, the formulas after a public transcription). R in m²·K/W, U in
 * W/(m²·K).
 */
public final class TransmittanceRules {
  /** R'T/R''T above which the mean of the two limits may not be used. */
  public static final double MOST_RATIO = 1.5;

  /** Corrections below this part of U need not be counted. */
  public static final double NEGLIGIBLE = 0.03;

  /** Part of a fastener that counts where it goes all through the insulation. */
  private static final double FASTENER = 0.8;

  private static final double[] VOIDS = {0, 0.01, 0.04};

  private TransmittanceRules() {}

  /** Relative error of the mean of the two limits: (R'T − R''T)/(2 RT), RT their mean. */
  public static double error(double upperR, double lowerR) {
    return (upperR - lowerR) / (upperR + lowerR);
  }

  private static double square(double layerR, double totalR) {
    return layerR / totalR * (layerR / totalR);
  }

  /**
   * Air voids in the insulation.
   *
   * @param level 0: none bridges it; 1: some do, without circulation on the warm side; 2: with it
   * @param layerR of the insulation
   * @param totalR of the whole
   * @return ΔU_g
   */
  public static double airVoids(int level, double layerR, double totalR) {
    return VOIDS[level] * square(layerR, totalR);
  }

  /**
   * Fasteners through the insulation.
   *
   * @param perM2 how many, 1/m²
   * @param conductivityWPerMK of the fastener
   * @param sectionM2 its cross-section
   * @param insulationM thickness of the insulation d₀
   * @param throughM length of the fastener in it d₁, at most d₀ unless it runs obliquely
   * @param layerR of the insulation
   * @param totalR of the whole
   * @return ΔU_f
   */
  public static double fasteners(
      double perM2,
      double conductivityWPerMK,
      double sectionM2,
      double insulationM,
      double throughM,
      double layerR,
      double totalR) {
    double part = throughM < insulationM ? FASTENER * throughM / insulationM : FASTENER;
    return part * conductivityWPerMK * sectionM2 * perM2 / throughM * square(layerR, totalR);
  }

  /**
   * Rain water below the insulation of an inverted roof.
   *
   * @param rainMmPerDay mean precipitation in the heating season
   * @param fx share that drains times its effect, W·day/(m²·K·mm); 0.04 for one layer of
   *     butt-jointed boards
   * @param layerR of the insulation above the waterproofing
   * @param totalR of the whole
   * @return ΔU_r
   */
  public static double invertedRoof(double rainMmPerDay, double fx, double layerR, double totalR) {
    return rainMmPerDay * fx * square(layerR, totalR);
  }

  /**
   * U of a part of a roof whose tapered layer begins with no thickness.
   *
   * @param taper its shape
   * @param mostR R₂ of the tapered layer where it is thickest
   * @param restR R₀ of everything else, films included
   * @return U
   */
  public static double tapered(Wanted.Framing.Taper taper, double mostR, double restR) {
    double log = Math.log1p(mostR / restR);
    return switch (taper) {
      case RECTANGLE -> log / mostR;
      case THICKEST_AT_APEX -> 2 / mostR * ((1 + restR / mostR) * log - 1);
      case THINNEST_AT_APEX -> 2 / mostR * (1 - restR / mostR * log);
    };
  }
}
