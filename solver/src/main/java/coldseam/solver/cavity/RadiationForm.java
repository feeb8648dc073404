package coldseam.solver.cavity;

/**
 * How the emissivities and the shape of a box of air make one radiation coefficient h_r = 4 σ T_m³
 * · (grey exchange factor). Editions of the standards differ; the form is named in every result.
 */
public enum RadiationForm {
  /**
   * Product E·F with E = 1/(1/ε₁ + 1/ε₂ − 1): ISO 10077-2:2003 and 2012, ISO 6946:2007. <em>From
   * memory</em>.
   */
  PRODUCT("ISO 10077-2:2012", "ISO 6946:2007, annex B", "4 sigma Tm^3 E F"),
  /**
   * Resistances in series, 1/(1/ε₁ + 1/ε₂ − 2 + 1/F): ISO 6946:2017, annex D, and, <em>from
   * memory</em>, ISO 10077-2:2017.
   */
  SERIES(
      "ISO 10077-2:2017", "ISO 6946:2017, annex D", "4 sigma Tm^3 / (1/eps1 + 1/eps2 - 2 + 1/F)"),
  /**
   * Face by face with view factors, {@link Radiosity}; ISO 10077-2:2017 allows it (<em>from
   * memory</em>). As long as no temperatures of faces are known it counts as {@link #SERIES}.
   */
  RADIOSITY(
      "ISO 10077-2:2017",
      "ISO 10077-2:2017",
      "net radiation of grey faces, view factors by crossed strings");

  private final String ofFrames;
  private final String ofLayers;
  private final String formula;

  RadiationForm(String ofFrames, String ofLayers, String formula) {
    this.ofFrames = ofFrames;
    this.ofLayers = ofLayers;
    this.formula = formula;
  }

  /** The edition of the standard of frames and the formula, for lists of assumptions. */
  public String words() {
    return ofFrames + ": " + formula;
  }

  /** The edition of the standard of air layers and the formula, for small or divided voids. */
  public String wordsForLayers() {
    return ofLayers + ": " + formula;
  }

  /**
   * The grey exchange factor between the two faces of a box that heat flows between.
   *
   * @param faces emissivities of the two
   * @param depthOverWidth d/b, depth along the heat flow over width across it; 0 for a layer
   * @return factor of 4 σ T_m³, from 0 to 1
   */
  double exchange(Emissivities faces, double depthOverWidth) {
    double viewed = viewFactor(depthOverWidth);
    return switch (this) {
      case PRODUCT -> faces.exchange() * viewed;
      case SERIES, RADIOSITY -> 1 / (1 / faces.first() + 1 / faces.second() - 2 + 1 / viewed);
    };
  }

  /**
   * F = ½ (1 + √(1 + (d/b)²) − d/b): what one face of a box sees of the other, half of the rest
   * counted to each.
   *
   * @param depthOverWidth d/b
   * @return F, from ½ to 1
   */
  static double viewFactor(double depthOverWidth) {
    // √(1 + r²) − r as 1/(√(1 + r²) + r): no cancellation in deep slots.
    return 0.5 * (1 + 1 / (Math.sqrt(1 + depthOverWidth * depthOverWidth) + depthOverWidth));
  }
}
