package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.algebra.FillReducingOrder;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Geometry;
import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;
import java.util.Set;

/**
 * A mesh with its nodes, the couplings of its triangles, its outline and the nodes whose
 * temperature is fixed. Nodes are the vertices, then the middles of the sides.
 */
final class Discretisation {
  private static final int FREE = -1;
  private static final int SHARED = -2;

  final Mesh mesh;
  final int spaces;
  final int nodeCount;
  final int[] nodes;
  final double[] couplings;

  /** Three times the x of each triangle's centre, m. */
  final double[] centreX;

  /** Three times the y of each triangle's centre, m. */
  final double[] centreY;

  /** What the section stands for. */
  final Body body;

  final Outline outline;

  /** All nodes in an order good for elimination. */
  final int[] inOrder;

  /** Place of a node's unknown in the order of elimination, −1 for fixed nodes. */
  final int[] unknown;

  final int unknowns;

  /** Whether heat is made to enter anywhere. */
  final boolean hasFlow;

  /** Square of the mesh's extent, m². */
  final double extentSquared;

  private final int[] fixedSpace;
  private final Map<Integer, int[]> sharedNodes = new HashMap<>();

  Discretisation(Mesh mesh, Conditions conditions) {
    this.mesh = mesh;
    spaces = conditions.spaceCount();
    nodeCount = mesh.vertexCount() + mesh.sideCount();
    nodes = new int[QuadraticElement.NODES * mesh.triangleCount()];
    couplings = new double[3 * mesh.triangleCount()];
    centreX = new double[mesh.triangleCount()];
    centreY = new double[mesh.triangleCount()];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int vertex = mesh.vertex(t, k);
        nodes[QuadraticElement.NODES * t + k] = vertex;
        nodes[QuadraticElement.NODES * t + 3 + k] = mesh.vertexCount() + mesh.side(t, k);
        centreX[t] += mesh.x(vertex);
        centreY[t] += mesh.y(vertex);
      }
      QuadraticElement.couplings(mesh, t, conditions.material(mesh.label(t)), couplings, 3 * t);
    }
    extentSquared = extentSquared(mesh);
    double[] conjugate = QuadraticElement.conjugate(couplings);
    if (conditions.geometry() == Geometry.PLANE) {
      body = new Prism(nodes, couplings, conjugate);
      outline = new Outline(mesh, conditions);
    } else {
      body = new BodyOfRevolution(mesh, nodes, couplings, conjugate);
      outline = new RingOutline(mesh, conditions);
    }
    fixedSpace = new int[nodeCount];
    Arrays.fill(fixedSpace, FREE);
    boolean flow = false;
    for (int s = 0; s < outline.count; s++) {
      flow |= outline.kind[s] == Conditions.Kind.FLOW;
      if (outline.kind[s] == Conditions.Kind.FIXED) {
        fix(outline.start[s], outline.space[s]);
        fix(outline.middle[s], outline.space[s]);
        fix(outline.end[s], outline.space[s]);
      }
    }
    hasFlow = flow;
    boolean[] all = new boolean[nodeCount];
    Arrays.fill(all, true);
    int[] place = FillReducingOrder.of(all, nodes, QuadraticElement.NODES, centreX, centreY);
    inOrder = new int[nodeCount];
    for (int n = 0; n < nodeCount; n++) {
      inOrder[place[n]] = n;
    }
    unknown = place;
    int count = 0;
    for (int n : inOrder) {
      unknown[n] = fixedSpace[n] == FREE ? count++ : -1;
    }
    unknowns = count;
  }

  private static double extentSquared(Mesh mesh) {
    double left = Double.POSITIVE_INFINITY;
    double right = Double.NEGATIVE_INFINITY;
    double bottom = Double.POSITIVE_INFINITY;
    double top = Double.NEGATIVE_INFINITY;
    for (int v = 0; v < mesh.vertexCount(); v++) {
      left = Math.min(left, mesh.x(v));
      right = Math.max(right, mesh.x(v));
      bottom = Math.min(bottom, mesh.y(v));
      top = Math.max(top, mesh.y(v));
    }
    return (right - left) * (right - left) + (top - bottom) * (top - bottom);
  }

  private void fix(int node, int space) {
    if (fixedSpace[node] == FREE) {
      fixedSpace[node] = space;
    } else if (fixedSpace[node] == SHARED) {
      int[] before = sharedNodes.get(node);
      if (!contains(before, space)) {
        int[] more = Arrays.copyOf(before, before.length + 1);
        more[before.length] = space;
        sharedNodes.put(node, more);
      }
    } else if (fixedSpace[node] != space) {
      sharedNodes.put(node, new int[] {fixedSpace[node], space});
      fixedSpace[node] = SHARED;
    }
  }

  private static boolean contains(int[] spaces, int space) {
    for (int other : spaces) {
      if (other == space) {
        return true;
      }
    }
    return false;
  }

  /** Whether the temperature of a node is fixed. */
  boolean fixed(int node) {
    return fixedSpace[node] != FREE;
  }

  /**
   * Value of a fixed node in the unit field of a space: 1 or 0, or a mean where fixed temperatures
   * meet.
   */
  double fixedValue(int node, int field) {
    if (fixedSpace[node] != SHARED) {
      return fixedSpace[node] == field ? 1 : 0;
    }
    int[] meeting = sharedNodes.get(node);
    for (int space : meeting) {
      if (space == field) {
        return 1.0 / meeting.length;
      }
    }
    return 0;
  }

  /** Which spaces' fixed temperatures meet in a point. */
  boolean[][] meeting() {
    boolean[][] meeting = new boolean[spaces][spaces];
    for (int[] group : sharedNodes.values()) {
      for (int i : group) {
        for (int j : group) {
          meeting[i][j] |= i != j;
        }
      }
    }
    return meeting;
  }

  /** The vertices where fixed temperatures of different spaces meet. */
  Set<Integer> sharedNodes() {
    return sharedNodes.keySet();
  }
}
