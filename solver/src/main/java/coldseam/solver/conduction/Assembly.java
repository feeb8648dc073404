package coldseam.solver.conduction;

import coldseam.solver.algebra.ElementSum;
import coldseam.solver.algebra.EntryList;
import coldseam.solver.algebra.SparseSymmetric;
import coldseam.solver.algebra.SymmetricSystem;
import coldseam.solver.detail.Conditions;
import java.util.Arrays;

/**
 * Makes and solves the system of the unit fields: conduction over the triangles plus films over the
 * surface. All fields share one factorisation.
 */
final class Assembly {
  private final Discretisation d;

  /** Fields solved for: all but that of the last space, which is 1 less the other spaces'. */
  private final int[] solved;

  private final double[][] load;
  private final EntryList films = new EntryList();

  private Assembly(Discretisation d) {
    this.d = d;
    int fields = d.spaces - 1 + (d.hasFlow ? 1 : 0);
    solved = new int[fields];
    for (int f = 0; f < fields; f++) {
      solved[f] = f < d.spaces - 1 ? f : d.spaces;
    }
    load = new double[fields][d.unknowns];
  }

  /**
   * Solves for the unit fields.
   *
   * @param d the discretisation
   * @return the nodal values of each space's unit field, then of the field of the given flows (all
   *     0 if there are none)
   */
  static double[][] unitFields(Discretisation d) {
    Assembly assembly = new Assembly(d);
    double[][] fields = new double[d.spaces + 1][d.nodeCount];
    if (assembly.solved.length > 0) {
      assembly.fixedNodes();
      assembly.films();
      assembly.flows();
      assembly.solve(fields);
    }
    double[] last = fields[d.spaces - 1];
    Arrays.fill(last, 1);
    for (int f = 0; f < d.spaces - 1; f++) {
      for (int n = 0; n < last.length; n++) {
        last[n] -= fields[f][n];
      }
    }
    return fields;
  }

  /** What multiplies fixed nodes in ∫∇φ_p·λ∇φ_q over the triangles goes to the loads. */
  private void fixedNodes() {
    ElementSum.Entries conduction = d.body.conduction();
    for (int t = 0; t < d.mesh.triangleCount() && d.unknowns < d.nodeCount; t++) {
      int at = QuadraticElement.NODES * t;
      for (int p = 0; p < QuadraticElement.NODES; p++) {
        if (d.unknown[d.nodes[at + p]] >= 0) {
          continue;
        }
        for (int q = 0; q < QuadraticElement.NODES; q++) {
          int free = d.unknown[d.nodes[at + q]];
          if (free >= 0) {
            toLoads(free, d.nodes[at + p], conduction.entry(t, p, q));
          }
        }
      }
    }
  }

  /** ∫∇φ_p·λ∇φ_q over the triangles and what the films add. */
  private SparseSymmetric matrix() {
    int[] member = new int[d.nodes.length];
    for (int i = 0; i < member.length; i++) {
      member[i] = d.unknown[d.nodes[i]];
    }
    return ElementSum.of(d.unknowns, QuadraticElement.NODES, member, d.body.conduction(), films);
  }

  /** ∫φ_p φ_q/Rs over the surfaces with a film, and ∫φ_p/Rs for the space behind it. */
  private void films() {
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      if (o.kind[s] != Conditions.Kind.FILM) {
        continue;
      }
      add(o.start[s], o.start[s], o.film(s, 0, 0));
      add(o.end[s], o.end[s], o.film(s, 2, 2));
      add(o.middle[s], o.middle[s], o.film(s, 1, 1));
      add(o.start[s], o.middle[s], o.film(s, 0, 1));
      add(o.end[s], o.middle[s], o.film(s, 2, 1));
      add(o.start[s], o.end[s], o.film(s, 0, 2));
      if (o.space[s] < d.spaces - 1) {
        spread(s, load[o.space[s]], 1 / o.filmM2KPerW[s]);
      }
    }
  }

  /** ∫φ_p g over the surfaces with a given flow. */
  private void flows() {
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      if (o.kind[s] == Conditions.Kind.FLOW) {
        spread(s, load[solved.length - 1], o.flowWPerM2[s]);
      }
    }
  }

  private void spread(int s, double[] b, double density) {
    Outline o = d.outline;
    toLoad(b, o.start[s], density * o.area(s, 0));
    toLoad(b, o.middle[s], density * o.area(s, 1));
    toLoad(b, o.end[s], density * o.area(s, 2));
  }

  private void toLoad(double[] b, int node, double value) {
    if (d.unknown[node] >= 0) {
      b[d.unknown[node]] += value;
    }
  }

  /** Adds an entry; what multiplies a fixed node goes to the right-hand side. */
  private void add(int p, int q, double value) {
    int row = d.unknown[p];
    int column = d.unknown[q];
    if (row >= 0 && column >= 0) {
      films.add(row, column, value);
    } else if (row >= 0) {
      toLoads(row, q, value);
    } else if (column >= 0) {
      toLoads(column, p, value);
    }
  }

  private void toLoads(int free, int fixed, double value) {
    for (int f = 0; f < solved.length; f++) {
      if (solved[f] < d.spaces) {
        load[f][free] -= value * d.fixedValue(fixed, solved[f]);
      }
    }
  }

  private void solve(double[][] fields) {
    SymmetricSystem.Solved[] done =
        d.unknowns == 0 ? null : SymmetricSystem.factor(matrix()).solve(load);
    for (int f = 0; f < solved.length; f++) {
      double[] x = done == null ? new double[0] : done[f].x();
      double[] field = fields[solved[f]];
      for (int n = 0; n < d.nodeCount; n++) {
        if (d.unknown[n] >= 0) {
          field[n] = x[d.unknown[n]];
        } else if (solved[f] < d.spaces) {
          field[n] = d.fixedValue(n, solved[f]);
        }
      }
    }
  }
}
