package coldseam.solver.conduction;

import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Material;
import java.util.ArrayList;
import java.util.List;

/**
 * What each material and each film contributes to the matrix A of the spaces.
 *
 * <p>Let part p conduct f_p times as well as stated. For temperatures x of the spaces, the field of
 * the solution is admissible whatever f is, and so is its flux; hence (Prager and Synge 1947)
 *
 * <p>Σ_p f_p xᵀE_p x ≥ xᵀA(f)x ≥ 2 xᵀFx − Σ_p xᵀR_p x / f_p,
 *
 * <p>with E_p = ∫λ∇u_i·∇u_j over the part (∫(u_i − δ_i)(u_j − δ_j)/Rs for a film), R_p =
 * ∫q_i·λ⁻¹q_j (∫Rs q_in q_jn) and F_ij = ½(F_i(q_j) + F_j(q_i)). Since the fields minimise the
 * energy, E_p is also ∂A/∂ln f_p; all E_p add up to the upper energy, since A is homogeneous of
 * degree one in f (Euler).
 */
public final class Dissipation {
  /** A material or a film. */
  public sealed interface Part {
    /**
     * All areas of a material.
     *
     * @param material the material; both its principal conductivities have one factor
     */
    record Solid(Material material) implements Part {}

    /**
     * All surfaces that face a space with one resistance.
     *
     * @param space index of the space
     * @param resistanceM2KPerW Rs, m²·K/W; the factor is on 1/Rs
     */
    record Film(int space, double resistanceM2KPerW) implements Part {}
  }

  private final List<Part> parts = new ArrayList<>();
  private final List<double[][]> dissipated = new ArrayList<>();
  private final List<double[][]> resisted = new ArrayList<>();
  private final double[][] inflow;
  private final Discretisation d;
  private final double[][] fields;
  private final TwoSidedBound bound;
  private final int last;

  /**
   * Works it out.
   *
   * @param conditions know the materials
   * @param d the discretisation
   * @param fields unit fields
   * @param bound knows the fluxes; null if there are none
   */
  Dissipation(Conditions conditions, Discretisation d, double[][] fields, TwoSidedBound bound) {
    this.d = d;
    this.fields = fields;
    this.bound = bound;
    last = d.spaces - 1;
    inflow = new double[last][last];
    solids(conditions);
    films();
    for (int part = 0; part < dissipated.size(); part++) {
      mirror(dissipated.get(part));
      mirror(resisted.get(part));
    }
    mirror(inflow);
  }

  private void solids(Conditions conditions) {
    int labels = 0;
    for (int t = 0; t < d.mesh.triangleCount(); t++) {
      labels = Math.max(labels, d.mesh.label(t) + 1);
    }
    int[] partOf = new int[labels];
    for (int t = 0; t < d.mesh.triangleCount(); t++) {
      partOf[d.mesh.label(t)] = 1;
    }
    for (int label = 0; label < labels; label++) {
      partOf[label] = partOf[label] == 1 ? begin(new Part.Solid(conditions.material(label))) : -1;
    }
    for (int t = 0; t < d.mesh.triangleCount(); t++) {
      double[][] e = dissipated.get(partOf[d.mesh.label(t)]);
      double[][] r = resisted.get(partOf[d.mesh.label(t)]);
      for (int i = 0; i < last; i++) {
        for (int j = i; j < last; j++) {
          e[i][j] += d.body.conducted(t, fields[i], fields[j]);
          r[i][j] += bound == null ? 0 : bound.resistance(t, i, j);
        }
      }
    }
  }

  private void films() {
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      int space = o.space[s];
      if (bound != null && space >= 0 && space < last) {
        for (int j = 0; j < last; j++) {
          inflow[Math.min(space, j)][Math.max(space, j)] +=
              (space == j ? 1 : 0.5) * bound.fall(s, j);
        }
      }
      if (o.kind[s] == Conditions.Kind.FILM) {
        int part = film(space, o.filmM2KPerW[s]);
        film(s, dissipated.get(part), resisted.get(part));
      }
    }
  }

  private void film(int s, double[][] e, double[][] r) {
    Outline o = d.outline;
    for (int i = 0; i < last; i++) {
      double di = o.space[s] == i ? 1 : 0;
      for (int j = i; j < last; j++) {
        double dj = o.space[s] == j ? 1 : 0;
        e[i][j] += o.filmEnergy(s, fields[i], di, fields[j], dj);
        r[i][j] += bound == null ? 0 : bound.filmResistance(s, i, j);
      }
    }
  }

  private int film(int space, double resistance) {
    for (int p = 0; p < parts.size(); p++) {
      if (parts.get(p) instanceof Part.Film known
          && known.space() == space
          && known.resistanceM2KPerW() == resistance) {
        return p;
      }
    }
    return begin(new Part.Film(space, resistance));
  }

  private int begin(Part part) {
    parts.add(part);
    dissipated.add(new double[last][last]);
    resisted.add(new double[last][last]);
    return parts.size() - 1;
  }

  private static void mirror(double[][] a) {
    for (int i = 0; i < a.length; i++) {
      for (int j = 0; j < i; j++) {
        a[i][j] = a[j][i];
      }
    }
  }

  /** Materials in the order of their labels, then films. */
  public List<Part> parts() {
    return List.copyOf(parts);
  }

  /** Whether there are fluxes, without which {@link #resisted} and {@link #inflow} are 0. */
  public boolean bounded() {
    return bound != null;
  }

  /** What rounding may do to any of the forms, in parts of the upper energy. */
  public double allowance() {
    return bound == null ? TwoSidedBound.ROUNDING : bound.allowance;
  }

  /**
   * xᵀE_p y.
   *
   * @param part index of the part
   * @param x a number for each space
   * @param y a number for each space
   * @return W/(m·K)
   */
  public double dissipated(int part, double[] x, double[] y) {
    return form(dissipated.get(part), x, y);
  }

  /**
   * xᵀR_p x.
   *
   * @param part index of the part
   * @param x a number for each space
   * @return W/(m·K)
   */
  public double resisted(int part, double[] x) {
    return form(resisted.get(part), x, x);
  }

  /**
   * xᵀFx.
   *
   * @param x a number for each space
   * @return W/(m·K)
   */
  public double inflow(double[] x) {
    return form(inflow, x, x);
  }

  /**
   * From differences to the last space: all fields add up to 1 and all fluxes to 0, so that equal
   * temperatures give exactly nothing.
   */
  private double form(double[][] a, double[] x, double[] y) {
    double sum = 0;
    for (int i = 0; i < last; i++) {
      for (int j = 0; j < last; j++) {
        sum += (x[i] - x[last]) * a[i][j] * (y[j] - y[last]);
      }
    }
    return sum;
  }
}
