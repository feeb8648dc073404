package coldseam.solver.result;

import coldseam.solver.conduction.Dissipation;
import coldseam.solver.detail.Detail;
import java.util.ArrayList;
import java.util.List;

/**
 * How a conductance L depends on factors f_p on the conductivity of each material and the
 * conductance of each film. To first order dL = Σ slope_p df_p; where it is bounded,
 *
 * <p>Σ slope_p f_p ≥ L(f) ≥ 2·inflow − Σ resisted_p / f_p for every f (see {@link Dissipation}).
 *
 * @param entries one a part
 * @param inflow W/(m·K)
 * @param allowance what rounding may do to either side, W/(m·K)
 * @param unbounded why it is not bounded; empty if it is
 */
record ByPart(List<Entry> entries, double inflow, double allowance, String unbounded) {
  /**
   * What one part adds.
   *
   * @param part the part
   * @param slope ∂L/∂ln f, W/(m·K)
   * @param resisted W/(m·K)
   */
  record Entry(Part part, double slope, double resisted) {}

  /**
   * A coupling coefficient −xᵀAy of a solution.
   *
   * @param detail what was solved
   * @param dissipation of its solution
   * @param x 1 on the warm side, 0 on the cold, between for floating spaces
   * @param y the same with the sides exchanged
   * @param whole whether the two sides are all the spaces there are, so that it is xᵀAx as well
   */
  static ByPart coupling(
      Detail detail, Dissipation dissipation, double[] x, double[] y, boolean whole) {
    List<Part> parts = Part.of(detail, dissipation);
    List<Entry> entries = new ArrayList<>();
    double energy = 0;
    for (int p = 0; p < parts.size(); p++) {
      double slope = whole ? dissipation.dissipated(p, x, x) : -dissipation.dissipated(p, x, y);
      entries.add(new Entry(parts.get(p), slope, dissipation.resisted(p, x)));
      energy += Math.abs(slope);
    }
    String unbounded =
        whole
            ? dissipation.bounded() ? "" : "no bounds are computed"
            : "more than two spaces take part";
    return new ByPart(entries, dissipation.inflow(x), dissipation.allowance() * energy, unbounded);
  }

  /** U of a flank's drawn layers: 1/ΣR, of which part p has slope U²R_p (ISO 6946). */
  static ByPart layers(List<Part> parts, double[] resistancesM2KPerW) {
    double sum = 0;
    for (double resistance : resistancesM2KPerW) {
      sum += resistance;
    }
    List<Entry> entries = new ArrayList<>();
    for (int p = 0; p < resistancesM2KPerW.length; p++) {
      double slope = resistancesM2KPerW[p] / (sum * sum);
      if (slope > 0) {
        entries.add(new Entry(parts.get(p), slope, slope));
      }
    }
    return new ByPart(entries, 1 / sum, 0, "");
  }
}
