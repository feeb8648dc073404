package coldseam.solver.detail;

import java.util.OptionalDouble;

/**
 * A conducting solid of constant conductivity, isotropic or orthotropic.
 *
 * @param name unique among the fills of a detail
 * @param conductivityWPerMK conductivity λ₁ along the first principal direction, W/(m·K); 0 means
 *     that the area conducts nothing
 * @param crossConductivityWPerMK conductivity λ₂ across it, W/(m·K); equal to the first for an
 *     isotropic material
 * @param angleRad angle of the first principal direction from the x axis, counter-clockwise
 * @param relativeTolerance by what part of itself the conductivity may be off, 0 if not stated
 * @param emissivity thermal emissivity of its faces, if known
 * @param vapourResistanceFactor μ, if known
 * @param source where the conductivity comes from, in words
 */
public record Material(
    String name,
    double conductivityWPerMK,
    double crossConductivityWPerMK,
    double angleRad,
    double relativeTolerance,
    OptionalDouble emissivity,
    OptionalDouble vapourResistanceFactor,
    String source)
    implements Fill {
  /**
   * Checks the figures.
   *
   * @throws IllegalArgumentException if a conductivity is negative or not finite, only one of the
   *     two is 0, or the tolerance is not in [0, 1)
   */
  public Material {
    if (name.isEmpty()) {
      throw new IllegalArgumentException("a material needs a name");
    }
    if (!(conductivityWPerMK >= 0)
        || !(crossConductivityWPerMK >= 0)
        || !Double.isFinite(conductivityWPerMK)
        || !Double.isFinite(crossConductivityWPerMK)) {
      throw new IllegalArgumentException(name + ": a conductivity is a finite number, 0 or more");
    }
    if ((conductivityWPerMK == 0) != (crossConductivityWPerMK == 0)) {
      throw new IllegalArgumentException(name + ": conductivities are both 0 or both more than 0");
    }
    if (!Double.isFinite(angleRad)) {
      throw new IllegalArgumentException(name + ": the angle must be finite");
    }
    if (!(relativeTolerance >= 0 && relativeTolerance < 1)) {
      throw new IllegalArgumentException(name + ": a tolerance lies in [0, 1)");
    }
  }

  /**
   * An isotropic material of which only the conductivity is known.
   *
   * @param name the name
   * @param conductivityWPerMK λ, W/(m·K)
   * @return the material
   */
  public static Material of(String name, double conductivityWPerMK) {
    return new Material(
        name,
        conductivityWPerMK,
        conductivityWPerMK,
        0,
        0,
        OptionalDouble.empty(),
        OptionalDouble.empty(),
        "stated in the case");
  }

  /** Whether the conductivity is the same in all directions. */
  public boolean isotropic() {
    return conductivityWPerMK == crossConductivityWPerMK;
  }

  /**
   * The density of heat flow that a temperature gradient drives, q = −Λ grad θ.
   *
   * @param gradientKPerM x and y components, K/m
   * @return x and y components, W/m²
   */
  public double[] heatFlowDensity(double[] gradientKPerM) {
    double cos = Math.cos(angleRad);
    double sin = Math.sin(angleRad);
    double along = -conductivityWPerMK * (gradientKPerM[0] * cos + gradientKPerM[1] * sin);
    double across = -crossConductivityWPerMK * (gradientKPerM[1] * cos - gradientKPerM[0] * sin);
    return new double[] {along * cos - across * sin, along * sin + across * cos};
  }
}
