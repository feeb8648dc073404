package coldseam.solver.cavity;

/**
 * λ_eq = d (h_a + h_r): the conductivity of a solid that lets through a rectangular cavity of a
 * frame what air and radiation do (ISO 10077-2, unventilated and slightly ventilated air cavities).
 *
 * <p>h_a is conduction or convection, h_r = 4 σ T_m³ times the grey exchange factor of the {@link
 * RadiationForm}. Valid for frame cavities with heat flowing horizontally; larger ones are air
 * layers ({@link AirLayer}).
 *
 * @param box the cavity, or the rectangle taken in its place
 * @param form how emissivities and shape make the radiation coefficient
 * @param convectionWPerM2K h_a, W/(m²·K)
 * @param radiationWPerM2K h_r, W/(m²·K)
 * @param ventilation unventilated, or slightly ventilated: the conductivity is doubled
 */
public record EquivalentConductivity(
    CavityBox box,
    RadiationForm form,
    double convectionWPerM2K,
    double radiationWPerM2K,
    Ventilation ventilation) {
  /** Stefan-Boltzmann constant, W/(m²·K⁴), as the standards round it. */
  static final double SIGMA = 5.67e-8;

  /** C₁, conductivity of still air, W/(m·K); ISO 10077-2. */
  private static final double C1 = 0.025;

  /** C₂ of h_a = C₂ ΔT^⅓, W/(m²·K^(4/3)); ISO 10077-2, <em>from memory</em>. */
  private static final double C2 = 0.73;

  /** C₃, h_a where ΔT is not known and taken as 10 K, W/(m²·K); ISO 10077-2. */
  private static final double C3 = 1.57;

  /** C₄ of h_r = C₄ (1 + √(1 + (d/b)²) − d/b) for ε = 0.9 on both faces, W/(m²·K); ISO 10077-2. */
  private static final double C4 = 2.11;

  /** T_m where it is not known, K; ISO 10077-2, <em>from memory</em>. */
  private static final double STANDARD_MEAN_K = 283;

  /** Narrower cavities have no convection, m; ISO 10077-2. */
  private static final double NO_CONVECTION_BELOW_M = 0.005;

  /**
   * Checks the figures.
   *
   * @throws IllegalArgumentException if a coefficient is negative or not finite, or the cavity is
   *     well ventilated, which makes it part of a space and no cavity
   */
  public EquivalentConductivity {
    if (!(convectionWPerM2K >= 0 && radiationWPerM2K >= 0)
        || !Double.isFinite(convectionWPerM2K + radiationWPerM2K)) {
      throw new IllegalArgumentException("coefficients of a cavity are finite and not negative");
    }
    if (ventilation == Ventilation.WELL_VENTILATED) {
      throw new IllegalArgumentException("a well ventilated cavity is part of a space");
    }
  }

  /**
   * The fixed form, of temperatures not known: ΔT = 10 K and T_m = 283 K. h_a is the larger of C₁/d
   * and C₃ = 1.57; with the product form and ε = 0.9 on both faces h_r has the constant C₄ = 2.11
   * of the standard, which differs by 0.3 % from its own formula.
   *
   * @param box the cavity
   * @param faces emissivities of its faces
   * @param form radiation form
   * @return its conductivity, unventilated
   */
  public static EquivalentConductivity fixed(
      CavityBox box, Emissivities faces, RadiationForm form) {
    double ratio = box.depthOverWidth();
    double radiation =
        form == RadiationForm.PRODUCT && faces.equals(Emissivities.ORDINARY)
            ? C4 * 2 * RadiationForm.viewFactor(ratio)
            : radiation(STANDARD_MEAN_K) * form.exchange(faces, ratio);
    return new EquivalentConductivity(
        box, form, convection(box, C3), radiation, Ventilation.UNVENTILATED);
  }

  /**
   * The form for known temperatures: h_a is the larger of C₁/d and C₂ ΔT^⅓.
   *
   * @param box the cavity
   * @param faces emissivities of its faces
   * @param form radiation form
   * @param differenceK largest difference ΔT of surface temperatures in the cavity, K
   * @param meanK mean temperature T_m, K above absolute zero
   * @return its conductivity, unventilated
   * @throws IllegalArgumentException if the difference is negative or the mean not above 0 K
   */
  public static EquivalentConductivity at(
      CavityBox box, Emissivities faces, RadiationForm form, double differenceK, double meanK) {
    if (!(differenceK >= 0 && meanK > 0)) {
      throw new IllegalArgumentException("a difference is 0 K or more, a mean above 0 K");
    }
    return new EquivalentConductivity(
        box,
        form,
        convection(box, C2 * Math.cbrt(differenceK)),
        radiation(meanK) * form.exchange(faces, box.depthOverWidth()),
        Ventilation.UNVENTILATED);
  }

  /** The same cavity slightly ventilated: twice the conductivity (ISO 10077-2). */
  public EquivalentConductivity slightlyVentilated() {
    return new EquivalentConductivity(
        box, form, convectionWPerM2K, radiationWPerM2K, Ventilation.SLIGHTLY_VENTILATED);
  }

  /** λ_eq, W/(m·K). */
  public double conductivityWPerMK() {
    return factor() * box.depthM() * (convectionWPerM2K + radiationWPerM2K);
  }

  /**
   * λ of the gas alone, d h_a, W/(m·K): what is left when radiation is worked out face by face
   * ({@link Radiosity}).
   */
  public double gasConductivityWPerMK() {
    return factor() * box.depthM() * convectionWPerM2K;
  }

  private double factor() {
    return ventilation == Ventilation.SLIGHTLY_VENTILATED ? 2 : 1;
  }

  private static double convection(CavityBox box, double moving) {
    double still = C1 / box.depthM();
    return Rounding.below(box.widthM(), NO_CONVECTION_BELOW_M) ? still : Math.max(still, moving);
  }

  /**
   * Radiation coefficient of black surfaces.
   *
   * @param meanK mean temperature, K above absolute zero
   * @return 4 σ T_m³, W/(m²·K)
   */
  static double radiation(double meanK) {
    return 4 * SIGMA * meanK * meanK * meanK;
  }
}
