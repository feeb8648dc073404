package coldseam.solver.conduction;

import coldseam.solver.detail.Conditions;
import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;

/**
 * Flow into the detail through each stretch for each unit field. Through films it is the integral
 * of (θ_space − θ)/Rs; at fixed temperatures the reactions of the nodes, so that the stretches that
 * cover the surface of a space add up to the flow of the space. The reaction of a vertex between
 * two sides is divided between them as the flux of the adjacent triangles would be.
 */
final class StretchFlows {
  private final Discretisation d;
  private final int[] fixedSideFrom;
  private final int[] fixedSideTo;
  private final Map<Integer, double[]> flows = new HashMap<>();
  private final Map<Integer, Integer> spaces = new HashMap<>();

  /**
   * Evaluates all stretches.
   *
   * @param d the discretisation
   * @param conditions knows which stretches lie on an edge
   * @param fields nodal values of each space's unit field, then of the field of the given flows
   * @param bound bounds whose stream functions give each flow a second time, or null; the mean of
   *     both counts, so that stretches add up to the middle of the bounds
   */
  StretchFlows(Discretisation d, Conditions conditions, double[][] fields, TwoSidedBound bound) {
    this.d = d;
    fixedSideFrom = new int[d.mesh.vertexCount()];
    fixedSideTo = new int[d.mesh.vertexCount()];
    Arrays.fill(fixedSideFrom, -1);
    Arrays.fill(fixedSideTo, -1);
    for (int s = 0; s < d.outline.count; s++) {
      if (d.outline.kind[s] == Conditions.Kind.FIXED) {
        fixedSideFrom[d.outline.start[s]] = s;
        fixedSideTo[d.outline.end[s]] = s;
      }
    }
    for (int f = 0; f < fields.length; f++) {
      double[] inflow = inflows(fields[f], f);
      for (int s = 0; bound != null && s < inflow.length; s++) {
        inflow[s] = (inflow[s] + bound.fall(s, f)) / 2;
      }
      for (int s = 0; s < d.outline.count; s++) {
        for (int stretch : conditions.stretches(d.outline.partitionEdge[s])) {
          double[] flow = flows.get(stretch);
          if (flow == null) {
            flow = new double[fields.length];
            flows.put(stretch, flow);
          }
          flow[f] += inflow[s];
          if (d.outline.space[s] >= 0) {
            spaces.putIfAbsent(stretch, d.outline.space[s]);
          }
        }
      }
    }
  }

  /**
   * Flow into the detail through a stretch.
   *
   * @param stretch its index
   * @param temperaturesC temperature of every space, °C
   * @return W/m
   */
  double flow(int stretch, double[] temperaturesC) {
    double[] unit = flows.get(stretch);
    if (unit == null) {
      return 0;
    }
    double sum = unit[d.spaces];
    // the unit flows add up to 0: differences keep equal temperatures exactly without flow
    double reference = temperaturesC[spaces.getOrDefault(stretch, 0)];
    for (int i = 0; i < d.spaces; i++) {
      sum += unit[i] * (temperaturesC[i] - reference);
    }
    return sum;
  }

  private double[] inflows(double[] u, int field) {
    Outline o = d.outline;
    double[] inflow = new double[o.count];
    double[] reaction = null;
    for (int s = 0; s < o.count; s++) {
      double ambient = o.space[s] == field ? 1 : 0;
      switch (o.kind[s]) {
        case FILM -> inflow[s] = o.areaM2[s] / o.filmM2KPerW[s] * (ambient - o.mean(s, u));
        case FLOW -> inflow[s] = field == d.spaces ? o.areaM2[s] * o.flowWPerM2[s] : 0;
        default -> {
          if (reaction == null) {
            reaction = reactions(u, field);
          }
          inflow[s] =
              reaction[o.middle[s]]
                  + part(o.start[s], s, reaction, u)
                  + part(o.end[s], s, reaction, u);
        }
      }
    }
    return inflow;
  }

  /** Flow that enters at each fixed node beside what films and given flows bring. */
  private double[] reactions(double[] u, int field) {
    double[] reaction = new double[d.nodeCount];
    for (int t = 0; t < d.mesh.triangleCount(); t++) {
      for (int p = 0; p < QuadraticElement.NODES; p++) {
        int node = d.nodes[QuadraticElement.NODES * t + p];
        if (d.fixed(node)) {
          reaction[node] += d.body.residual(d.nodes, t, p, u);
        }
      }
    }
    Outline o = d.outline;
    for (int s = 0; s < o.count; s++) {
      if (o.kind[s] == Conditions.Kind.FLOW && field == d.spaces) {
        reaction[o.start[s]] -= o.area(s, 0) * o.flowWPerM2[s];
        reaction[o.end[s]] -= o.area(s, 2) * o.flowWPerM2[s];
      } else if (o.kind[s] == Conditions.Kind.FILM) {
        double ambient = o.space[s] == field ? 1 : 0;
        double a = ambient - u[o.start[s]];
        double m = ambient - u[o.middle[s]];
        double b = ambient - u[o.end[s]];
        reaction[o.start[s]] -= o.film(s, 0, 0) * a + o.film(s, 0, 1) * m + o.film(s, 0, 2) * b;
        reaction[o.end[s]] -= o.film(s, 2, 0) * a + o.film(s, 2, 1) * m + o.film(s, 2, 2) * b;
      }
    }
    return reaction;
  }

  /** What part of a vertex's reaction belongs to one of the sides that meet there. */
  private double part(int vertex, int side, double[] reaction, double[] u) {
    int from = fixedSideFrom[vertex];
    int to = fixedSideTo[vertex];
    int other = from == side ? to : from;
    if (other < 0) {
      return reaction[vertex];
    }
    double own = adjacentFlux(side, vertex, u);
    double others = adjacentFlux(other, vertex, u);
    double size = Math.abs(own) + Math.abs(others);
    double share = size > 0 ? Math.abs(own) / size : 0.5;
    return own + share * (reaction[vertex] - own - others);
  }

  /** ∫φ n·λ∇u along a side for the shape function of one of its vertices. */
  private double adjacentFlux(int side, int vertex, double[] u) {
    double[] derivatives = new double[9];
    int t = d.outline.triangle[side];
    int k = d.outline.sideOfTriangle[side];
    QuadraticElement.derivativesAtCorners(d.nodes, t, u, derivatives);
    boolean start = vertex == d.outline.start[side];
    int corner = start ? (k + 1) % 3 : (k + 2) % 3;
    int other = start ? (k + 2) % 3 : (k + 1) % 3;
    return d.outline.atEnd(
        side,
        start,
        QuadraticElement.sideFlux(d.couplings, t, k, corner, derivatives),
        QuadraticElement.sideFlux(d.couplings, t, k, other, derivatives));
  }
}
