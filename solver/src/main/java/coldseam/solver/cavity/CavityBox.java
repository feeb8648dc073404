package coldseam.solver.cavity;

/**
 * The rectangle of air by which ISO 10077-2 treats a cavity.
 *
 * @param depthM d, along the heat flow, m
 * @param widthM b, across the heat flow, m
 */
public record CavityBox(double depthM, double widthM) {
  /**
   * Checks the sizes.
   *
   * @throws IllegalArgumentException unless both are positive and finite
   */
  public CavityBox {
    if (!(depthM > 0 && widthM > 0 && Double.isFinite(depthM) && Double.isFinite(widthM))) {
      throw new IllegalArgumentException("a cavity has a positive depth and width");
    }
  }

  /**
   * The rectangle of the same area as a cavity of any shape, and of the aspect ratio of the
   * smallest rectangle around it (ISO 10077-2, non-rectangular cavities): d' = √(A d/b), b' = √(A
   * b/d).
   *
   * @param areaM2 area A of the cavity, m²; at most that of the rectangle around it
   * @param depthAroundM d of the rectangle around it, m
   * @param widthAroundM b of the rectangle around it, m
   * @return the rectangle
   * @throws IllegalArgumentException unless all are positive, and the area fits
   */
  public static CavityBox ofEqualArea(double areaM2, double depthAroundM, double widthAroundM) {
    CavityBox around = new CavityBox(depthAroundM, widthAroundM);
    if (!(areaM2 > 0) || Rounding.above(areaM2, depthAroundM * widthAroundM)) {
      throw new IllegalArgumentException("a cavity is not larger than the rectangle around it");
    }
    return new CavityBox(
        Math.sqrt(areaM2 * around.depthOverWidth()), Math.sqrt(areaM2 / around.depthOverWidth()));
  }

  /** d/b. */
  double depthOverWidth() {
    return depthM / widthM;
  }
}
