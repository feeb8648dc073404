package coldseam.solver.conduction;

import coldseam.solver.algebra.ElementSum;
import coldseam.solver.algebra.EntryList;
import coldseam.solver.algebra.SparseSymmetric;
import coldseam.solver.algebra.SymmetricSystem;
import coldseam.solver.detail.Conditions;
import java.util.Arrays;

/**
 * The conjugate problem: for each space k the stream function S_k that maximises 2F_k − R, with F_k
 * the flow in from space k and R = ∫q·λ⁻¹q + Σ∫Rs q_n²; that is, for every V,
 *
 * <p>∫∇S·(λ/det λ)∇V + Σ_film ∫Rs S′V′ = the fall of V along the outline that faces space k.
 *
 * <p>One more S carries the given flows and nothing else. A flux made of any of these S, exactly
 * solved or not, has no divergence and crosses no side it must not.
 */
final class ConjugateProblem {
  private final Discretisation d;
  private final StreamSpace space;

  /** The resistance of the triangles. */
  private final ElementSum.Entries resistance;

  private final int[] unknown;
  private final int[] jumpUnknown;
  private final int unknowns;
  private final int[] solved;
  private final double[][] load;

  /** What films add, and all of the triangles that touch a cut. */
  private final EntryList others = new EntryList();

  /** Unknowns at the nodes of the triangles that touch no cut. */
  private final int[] member;

  private ConjugateProblem(Discretisation d, StreamSpace space) {
    this.d = d;
    this.space = space;
    resistance = d.body.resistance();
    unknown = new int[d.nodeCount];
    int found = number(d, space, unknown);
    jumpUnknown = new int[space.cuts];
    for (int c = 0; c < space.cuts; c++) {
      jumpUnknown[c] = Double.isNaN(space.givenJump[c]) ? found++ : -1;
    }
    unknowns = found;
    int fields = d.spaces - 1 + (d.hasFlow ? 1 : 0);
    solved = new int[fields];
    for (int f = 0; f < fields; f++) {
      solved[f] = f < d.spaces - 1 ? f : d.spaces;
    }
    load = new double[fields][unknowns];
    member = new int[space.nodes.length];
  }

  /**
   * Numbers the unknowns at nodes in the order of the temperature problem. What stands for a whole
   * chain meets too many others to be eliminated before them and comes last.
   *
   * @return how many
   */
  private static int number(Discretisation d, StreamSpace space, int[] unknown) {
    boolean[] shared = new boolean[d.nodeCount];
    for (int n = 0; n < d.nodeCount; n++) {
      if (space.chain[n] != n) {
        shared[space.chain[n]] = true;
      }
    }
    int found = 0;
    for (boolean last : new boolean[] {false, true}) {
      for (int n : d.inOrder) {
        if (space.chain[n] != n || space.pinned[n] || space.tiedToAxis(n)) {
          unknown[n] = -1;
        } else if (shared[n] == last) {
          unknown[n] = found++;
        }
      }
    }
    return found;
  }

  /**
   * Solves for the stream functions.
   *
   * @param d the discretisation
   * @param space the space of stream functions
   * @return values at the nodes of {@code space} for each space, then for the given flows (all 0 if
   *     there are none)
   */
  static double[][] streamFunctions(Discretisation d, StreamSpace space) {
    ConjugateProblem problem = new ConjugateProblem(d, space);
    double[][] fields = new double[d.spaces + 1][space.nodeCount];
    if (problem.solved.length > 0) {
      problem.resistance();
      problem.films();
      problem.drops();
      problem.solve(fields);
    }
    double[] last = fields[d.spaces - 1];
    for (int f = 0; f < d.spaces - 1; f++) {
      for (int n = 0; n < last.length; n++) {
        last[n] -= fields[f][n];
      }
    }
    return fields;
  }

  /**
   * Prepares ∫∇φ_p·(λ/det λ)∇φ_q over the triangles: those that touch no cut are left to the sum
   * over elements.
   */
  private void resistance() {
    for (int t = 0; t < d.mesh.triangleCount(); t++) {
      int at = QuadraticElement.NODES * t;
      boolean plain = true;
      for (int p = 0; p < QuadraticElement.NODES; p++) {
        int node = space.nodes[at + p];
        plain &= !space.jumps(node);
        member[at + p] = unknown[space.chain[node]];
      }
      if (plain && !d.hasFlow) {
        continue;
      }
      for (int p = 0; p < QuadraticElement.NODES; p++) {
        for (int q = 0; q <= p; q++) {
          add(space.nodes[at + p], space.nodes[at + q], resistance.entry(t, p, q), p == q);
        }
      }
      Arrays.fill(member, at, at + QuadraticElement.NODES, -1);
    }
  }

  /** ∫Rs φ_p′ φ_q′ over the surfaces with a film. */
  private void films() {
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      if (o.kind[s] != Conditions.Kind.FILM) {
        continue;
      }
      int start = streamStart(d, space, s);
      int middle = streamMiddle(d, space, s);
      int end = streamEnd(d, space, s);
      add(start, start, o.resistance(s, 0, 0), true);
      add(end, end, o.resistance(s, 2, 2), true);
      add(middle, middle, o.resistance(s, 1, 1), true);
      add(start, end, o.resistance(s, 0, 2), false);
      add(start, middle, o.resistance(s, 0, 1), false);
      add(end, middle, o.resistance(s, 2, 1), false);
    }
  }

  /** The fall of φ_p along what faces each space. */
  private void drops() {
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      if (o.space[s] >= 0 && o.space[s] < d.spaces - 1) {
        toLoad(load[o.space[s]], streamStart(d, space, s), 1);
        toLoad(load[o.space[s]], streamEnd(d, space, s), -1);
      }
    }
  }

  /** Node of S at the start of side s of the outline, as its triangle sees it. */
  static int streamStart(Discretisation d, StreamSpace space, int s) {
    return at(d, space, s, (d.outline.sideOfTriangle[s] + 1) % 3);
  }

  /** Node of S in the middle of side s of the outline. */
  static int streamMiddle(Discretisation d, StreamSpace space, int s) {
    return at(d, space, s, 3 + d.outline.sideOfTriangle[s]);
  }

  /** Node of S at the end of side s of the outline, as its triangle sees it. */
  static int streamEnd(Discretisation d, StreamSpace space, int s) {
    return at(d, space, s, (d.outline.sideOfTriangle[s] + 2) % 3);
  }

  private static int at(Discretisation d, StreamSpace space, int s, int local) {
    return space.nodes[QuadraticElement.NODES * d.outline.triangle[s] + local];
  }

  private void toLoad(double[] b, int node, double value) {
    int i = unknown[space.chain[node]];
    if (i >= 0) {
      b[i] += value;
    }
    for (int c = 0; space.jumps(node) && c < space.cuts; c++) {
      if (jumpUnknown[c] >= 0) {
        b[jumpUnknown[c]] += space.jump(node, c) * value;
      }
    }
  }

  /** Adds value · (S_p V_q + S_q V_p), or value · S_p V_p for {@code same}. */
  private void add(int p, int q, double value, boolean same) {
    if (value == 0) {
      return;
    }
    if (!space.jumps(p) && !space.jumps(q)) {
      entry(unknown[space.chain[p]], unknown[space.chain[q]], value, same);
    } else {
      for (int a = -1; a < space.cuts; a++) {
        double ca = factor(p, a);
        for (int b = same ? a : -1; b < space.cuts && ca != 0; b++) {
          double cb = factor(q, b);
          if (cb != 0) {
            entry(place(p, a), place(q, b), ca * cb * value, same && a == b);
          }
        }
      }
    }
    if (d.hasFlow) {
      double[] b = load[solved.length - 1];
      toLoad(b, p, -value * given(q));
      if (!same) {
        toLoad(b, q, -value * given(p));
      }
    }
  }

  private double factor(int node, int term) {
    return term < 0 ? 1 : space.jumps(node) ? space.jump(node, term) : 0;
  }

  private int place(int node, int term) {
    return term < 0 ? unknown[space.chain[node]] : jumpUnknown[term];
  }

  /** What is given of a node's value in the field of the given flows. */
  private double given(int node) {
    double sum = space.given[node];
    for (int c = 0; space.jumps(node) && c < space.cuts; c++) {
      if (jumpUnknown[c] < 0) {
        sum += space.jump(node, c) * space.givenJump[c];
      }
    }
    return sum;
  }

  /** One entry stands for both of an off-diagonal pair; a pair that met on the diagonal is two. */
  private void entry(int row, int column, double value, boolean once) {
    if (row >= 0 && column >= 0) {
      others.add(row, column, row == column && !once ? 2 * value : value);
    }
  }

  private SparseSymmetric matrix() {
    return ElementSum.of(unknowns, QuadraticElement.NODES, member, resistance, others);
  }

  private void solve(double[][] fields) {
    SymmetricSystem.Solved[] done =
        unknowns == 0 ? null : SymmetricSystem.factor(matrix()).solve(load);
    for (int f = 0; f < solved.length; f++) {
      double[] x = done == null ? new double[0] : done[f].x();
      double[] field = fields[solved[f]];
      boolean flows = solved[f] == d.spaces;
      for (int n = 0; n < space.nodeCount; n++) {
        int i = unknown[space.chain[n]];
        double value = i >= 0 ? x[i] : 0;
        for (int c = 0; space.jumps(n) && c < space.cuts; c++) {
          if (jumpUnknown[c] >= 0) {
            value += space.jump(n, c) * x[jumpUnknown[c]];
          }
        }
        field[n] = flows ? value + given(n) : value;
      }
      space.followAxis(field);
    }
  }
}
