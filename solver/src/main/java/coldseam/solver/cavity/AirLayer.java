package coldseam.solver.cavity;

/**
 * R = 1/(h_a + h_r): resistance of an unventilated air layer by ISO 6946, annex D.
 *
 * <p>h_a is the larger of conduction 0.025/d and convection, which depends on the direction of the
 * heat flow and, above 5 K, on the temperature difference; h_r = E · 4 σ T_m³, or with the shape of
 * the void where the layer is divided. Valid up to 0.3 m thickness; wider than ten times its
 * thickness it is a layer, narrower a small or divided void. A non-rectangular void is treated as
 * the rectangle of the same area and aspect ratio ({@link CavityBox#ofEqualArea}).
 *
 * @param thicknessM d, along the heat flow, m; 0 to 0.3
 * @param flow direction of the heat flow
 * @param faces emissivities of the two faces
 * @param differenceK temperature difference across the layer, K
 * @param meanC mean temperature of the layer, °C
 */
public record AirLayer(
    double thicknessM, LayerFlow flow, Emissivities faces, double differenceK, double meanC) {
  /** Thickest air layer the standard covers, m; ISO 6946, thermal resistance of air layers. */
  public static final double THICKEST_M = 0.3;

  /** A void narrower than this many times its thickness is a small or divided one; ISO 6946. */
  public static final double WIDTHS_OF_A_LAYER = 10;

  private static final double CELSIUS = 273.15;
  private static final double STANDARD_MEAN_C = 10;
  private static final double STANDARD_DIFFERENCE_K = 5;
  private static final double STILL_AIR_W_PER_MK = 0.025;

  /** Thicknesses of the table of resistances, m; ISO 6946, table 8. */
  private static final double[] TABLE_M = {0, 0.005, 0.007, 0.010, 0.015, 0.025, 0.05, 0.1, 0.3};

  private static final double[] TABLE_UP = {0, 0.11, 0.13, 0.15, 0.16, 0.16, 0.16, 0.16, 0.16};
  private static final double[] TABLE_HORIZONTAL = {
    0, 0.11, 0.13, 0.15, 0.17, 0.18, 0.18, 0.18, 0.18
  };
  private static final double[] TABLE_DOWN = {0, 0.11, 0.13, 0.15, 0.17, 0.19, 0.21, 0.22, 0.23};

  /**
   * Checks the figures.
   *
   * @throws IllegalArgumentException if the thickness is not in [0, 0.3] m, the difference negative
   *     or the mean not above absolute zero
   */
  public AirLayer {
    if (!(thicknessM >= 0) || Rounding.above(thicknessM, THICKEST_M)) {
      throw new IllegalArgumentException("an air layer is at most 0.3 m thick");
    }
    if (!(differenceK >= 0) || !(meanC > -CELSIUS) || !Double.isFinite(differenceK + meanC)) {
      throw new IllegalArgumentException("a difference is 0 K or more, a mean above -273.15 C");
    }
  }

  /**
   * A layer of which only thickness, direction and emissivities are known: 10 °C, at most 5 K.
   *
   * @param thicknessM d, m
   * @param flow direction of the heat flow
   * @param faces emissivities of the two faces
   * @return the layer
   */
  public static AirLayer of(double thicknessM, LayerFlow flow, Emissivities faces) {
    return new AirLayer(thicknessM, flow, faces, STANDARD_DIFFERENCE_K, STANDARD_MEAN_C);
  }

  /**
   * The rounded resistance of the standard's table, for faces of high emissivity (ISO 6946, table
   * 8; <em>from memory</em>); linear between the thicknesses of the table. An inclined layer lies,
   * by its angle, between upward and horizontal.
   *
   * @param thicknessM d, m; 0 to 0.3
   * @param flow direction of the heat flow
   * @return R, m²·K/W
   * @throws IllegalArgumentException if the thickness is not in [0, 0.3] m
   */
  public static double tabulatedM2KPerW(double thicknessM, LayerFlow flow) {
    AirLayer layer = of(thicknessM, flow, Emissivities.ORDINARY);
    return switch (flow.kind()) {
      case UP -> layer.interpolated(TABLE_UP);
      case HORIZONTAL -> layer.interpolated(TABLE_HORIZONTAL);
      case DOWN -> layer.interpolated(TABLE_DOWN);
      case INCLINED -> {
        double up = layer.interpolated(TABLE_UP);
        yield up + (layer.interpolated(TABLE_HORIZONTAL) - up) * flow.angleDeg() / 90;
      }
    };
  }

  private double interpolated(double[] resistances) {
    int above = 1;
    while (above < TABLE_M.length - 1 && thicknessM > TABLE_M[above]) {
      above++;
    }
    double part = (thicknessM - TABLE_M[above - 1]) / (TABLE_M[above] - TABLE_M[above - 1]);
    double below = resistances[above - 1];
    return below + Math.min(part, 1) * (resistances[above] - below);
  }

  /** R of the endless layer, m²·K/W; 0 without thickness. */
  public double resistanceM2KPerW() {
    return 1 / (convectionWPerM2K() + faces.exchange() * black());
  }

  /**
   * R of a small or divided void (ISO 6946:2017, annex D, and the older form).
   *
   * @param widthM b, across the heat flow, m
   * @param form edition: {@link RadiationForm#SERIES} 2017, {@link RadiationForm#PRODUCT} 2007
   * @return R, m²·K/W
   * @throws IllegalArgumentException unless the width is positive
   */
  public double dividedResistanceM2KPerW(double widthM, RadiationForm form) {
    if (!(widthM > 0)) {
      throw new IllegalArgumentException("a void has a positive width");
    }
    return 1 / (convectionWPerM2K() + black() * form.exchange(faces, thicknessM / widthM));
  }

  /**
   * Whether a void of this thickness is a small or divided one.
   *
   * @param widthM b, across the heat flow, m
   * @return true below ten times the thickness
   */
  public boolean dividedAt(double widthM) {
    return divided(thicknessM, widthM);
  }

  /**
   * Whether a void is a small or divided one.
   *
   * @param thicknessM d, along the heat flow, m
   * @param widthM b, across the heat flow, m
   * @return true below ten times the thickness
   */
  public static boolean divided(double thicknessM, double widthM) {
    return thicknessM > 0 && Rounding.below(widthM, WIDTHS_OF_A_LAYER * thicknessM);
  }

  /** h_a: conduction or convection, whichever is larger, W/(m²·K); infinite without thickness. */
  public double convectionWPerM2K() {
    return switch (flow.kind()) {
      case UP -> up();
      case HORIZONTAL -> horizontal();
      case DOWN -> down();
      case INCLINED -> inclined();
    };
  }

  /** ISO 6946, annex D: h_a = h_a,90 + (h_a,90 − h_a,0)(α − 90)/90. */
  private double inclined() {
    double vertical = horizontal();
    if (Double.isInfinite(vertical)) {
      return vertical;
    }
    return vertical + (vertical - up()) * (flow.angleDeg() - 90) / 90;
  }

  private double up() {
    return orStill(moderate() ? 1.95 : 1.14 * Math.cbrt(differenceK));
  }

  private double horizontal() {
    return orStill(moderate() ? 1.25 : 0.73 * Math.cbrt(differenceK));
  }

  private double down() {
    double factor = moderate() ? 0.12 : 0.09 * Math.pow(differenceK, 0.187);
    return orStill(factor * Math.pow(thicknessM, -0.44));
  }

  private boolean moderate() {
    return !Rounding.above(differenceK, STANDARD_DIFFERENCE_K);
  }

  private double orStill(double moving) {
    return Math.max(moving, STILL_AIR_W_PER_MK / thicknessM);
  }

  private double black() {
    return EquivalentConductivity.radiation(CELSIUS + meanC);
  }
}
