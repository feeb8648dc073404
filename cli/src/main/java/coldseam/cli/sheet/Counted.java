package coldseam.cli.sheet;

import coldseam.solver.detail.Geometry;
import coldseam.solver.result.Result;

/**
 * What couplings and heat flows are counted for: a metre of a prism, or the whole of a body of
 * revolution.
 */
enum Counted {
  /** A metre of a prism. */
  PER_METRE(
      "L2D",
      "W/(m·K)",
      "W_per_mK",
      Units.PSI,
      Units.PSI_NAME,
      "W/m",
      "W_per_m",
      Units.FLOW,
      Units.FLOW_NAME),
  /** All of a body of revolution. */
  WHOLE(
      "L3D",
      "W/K",
      "W_per_K",
      Units.CHI,
      Units.CHI_NAME,
      "W",
      "W",
      Units.WHOLE_FLOW,
      Units.WHOLE_FLOW_NAME);

  private final String coupling;
  private final String unit;
  private final String suffix;
  private final double customary;
  private final String customaryUnit;
  private final String flowUnit;
  private final String flowSuffix;
  private final double customaryFlow;
  private final String customaryFlowUnit;

  Counted(
      String coupling,
      String unit,
      String suffix,
      double customary,
      String customaryUnit,
      String flowUnit,
      String flowSuffix,
      double customaryFlow,
      String customaryFlowUnit) {
    this.coupling = coupling;
    this.unit = unit;
    this.suffix = suffix;
    this.customary = customary;
    this.customaryUnit = customaryUnit;
    this.flowUnit = flowUnit;
    this.flowSuffix = flowSuffix;
    this.customaryFlow = customaryFlow;
    this.customaryFlowUnit = customaryFlowUnit;
  }

  static Counted of(Result result) {
    return result.detail().geometry() == Geometry.PLANE ? PER_METRE : WHOLE;
  }

  /** What a coupling coefficient is called. */
  String coupling() {
    return coupling;
  }

  /** Its unit. */
  String unit() {
    return unit;
  }

  /** Its unit at the end of a name. */
  String suffix() {
    return suffix;
  }

  /** US customary units in its unit. */
  double customary() {
    return customary;
  }

  String customaryUnit() {
    return customaryUnit;
  }

  /** The unit of a heat flow. */
  String flowUnit() {
    return flowUnit;
  }

  /** The name of a heat flow. */
  String heatFlow() {
    return "heatFlow_" + flowSuffix;
  }

  /** The name of the sum of heat flows. */
  String sum() {
    return "sum_" + flowSuffix;
  }

  /** US customary units in the unit of a heat flow. */
  double customaryFlow() {
    return customaryFlow;
  }

  String customaryFlowUnit() {
    return customaryFlowUnit;
  }
}
