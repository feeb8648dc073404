package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import coldseam.mesh.triangulation.Topology;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Geometry;
import java.util.Arrays;

/**
 * The quadratic stream functions S of a mesh: the flux q = (∂S/∂y, −∂S/∂x) has no divergence, and
 * the flow out across a piece of outline is the rise of S along it, walked counter-clockwise.
 *
 * <ul>
 *   <li>Along a connected chain of sides across which no heat flows S is one value; where a flow is
 *       given S falls by it, so that the chain goes on.
 *   <li>A rim inside a component through which heat may flow in all gets a cut to the first such
 *       rim of its component, and S jumps across the cut by an unknown J; by a given one where all
 *       flows through the rim are given. Nodes of a cut exist once for each side of it.
 *   <li>One value in each component is 0.
 * </ul>
 *
 * <p>Every node's value is that of its <em>base</em> node's chain plus jumps plus given falls; the
 * chain's own node stands for the chain.
 */
final class StreamSpace {
  private static final int[] NO_JUMPS = {};

  /** Six nodes a triangle, as in {@link QuadraticElement}; nodes of cuts exist more than once. */
  final int[] nodes;

  /** How many nodes, those of cuts counted once for each side. */
  final int nodeCount;

  /** For each node the mesh node that stands for its chain, or itself. */
  final int[] chain;

  /** For each node how often it adds the jump of each cut; empty where none. */
  private final int[][] jumps;

  /** For each node what is given of its value in the field of the given flows. */
  final double[] given;

  /** Chain nodes that are 0. */
  final boolean[] pinned;

  /** How many cuts. */
  final int cuts;

  /** For each cut its given jump in the field of the given flows; NaN where it is unknown. */
  final double[] givenJump;

  /** What holds beside the axis of a body of revolution; null for a prism. */
  private final AxisTies ties;

  private final Mesh mesh;
  private final Conditions conditions;
  private final Topology topology;
  private int[][] fanJumps;
  private int used;

  StreamSpace(Mesh mesh, Conditions conditions) {
    this(mesh, conditions, true);
  }

  /**
   * Works the space out.
   *
   * @param mesh the mesh
   * @param conditions conditions on the partition's edges
   * @param withCuts false leaves the cuts out, for tests of what they are for
   */
  StreamSpace(Mesh mesh, Conditions conditions, boolean withCuts) {
    this.mesh = mesh;
    this.conditions = conditions;
    topology = Topology.of(mesh);
    int meshNodes = mesh.vertexCount() + mesh.sideCount();
    nodes = new int[QuadraticElement.NODES * mesh.triangleCount()];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        nodes[QuadraticElement.NODES * t + k] = mesh.vertex(t, k);
        nodes[QuadraticElement.NODES * t + 3 + k] = mesh.vertexCount() + mesh.side(t, k);
      }
    }
    used = meshNodes;
    int[][] paths = withCuts ? paths() : new int[0][];
    cuts = paths.length;
    givenJump = new double[cuts];
    Arrays.fill(givenJump, Double.NaN);
    fanJumps = new int[meshNodes][];
    int[] original = cuts == 0 ? null : duplicate(paths);
    nodeCount = used;
    chain = new int[nodeCount];
    jumps = new int[nodeCount][];
    given = new double[nodeCount];
    Arrays.fill(jumps, NO_JUMPS);
    for (int n = 0; n < nodeCount; n++) {
      chain[n] = n < meshNodes ? n : original[n];
    }
    int[][] nodeJumps = new int[meshNodes][];
    for (int loop = 0; loop < topology.loopCount(); loop++) {
      tie(topology.loop(loop), nodeJumps);
    }
    for (int n = nodeCount - 1; n >= 0; n--) {
      int base = n < meshNodes ? n : original[n];
      chain[n] = chain[base];
      given[n] = given[base];
      jumps[n] = sum(nodeJumps[base], n < fanJumps.length ? fanJumps[n] : null);
    }
    fanJumps = null;
    pinned = pins();
    ties = conditions.geometry() == Geometry.PLANE ? null : new AxisTies(mesh, nodes);
  }

  /** Whether a node's value follows from those of two others, see {@link AxisTies}. */
  boolean tiedToAxis(int node) {
    return ties != null && ties.tied(node);
  }

  /** Sets the values that follow from others. */
  void followAxis(double[] stream) {
    if (ties != null) {
      ties.follow(stream);
    }
  }

  /** How often a node adds the jump of a cut. */
  int jump(int node, int cut) {
    return jumps[node].length == 0 ? 0 : jumps[node][cut];
  }

  /** Whether a node adds any jump. */
  boolean jumps(int node) {
    return jumps[node].length > 0;
  }

  /** Whether the flow across a half-side of the outline is given: none, or a stated one. */
  private boolean flowGiven(int halfSide) {
    return switch (kind(halfSide)) {
      case FILM, FIXED -> false;
      case NONE, FLOW, CUT_OFF, HOLLOW, AXIS -> true;
    };
  }

  private Conditions.Kind kind(int halfSide) {
    int edge = mesh.partitionEdge(halfSide / 3, halfSide % 3);
    return edge == Mesh.NONE ? Conditions.Kind.NONE : conditions.kind(edge);
  }

  /** Given flow in across a half-side, W/m. */
  private double flowIn(int halfSide) {
    if (kind(halfSide) != Conditions.Kind.FLOW) {
      return 0;
    }
    int t = halfSide / 3;
    int a = mesh.vertex(t, (halfSide % 3 + 1) % 3);
    int b = mesh.vertex(t, (halfSide % 3 + 2) % 3);
    double length = Math.hypot(mesh.x(b) - mesh.x(a), mesh.y(b) - mesh.y(a));
    double area = length;
    if (conditions.geometry() == Geometry.AXISYMMETRIC) {
      area *= (Circumference.at(mesh, a) + Circumference.at(mesh, b)) / 2;
    }
    return area * conditions.flowWPerM2(mesh.partitionEdge(t, halfSide % 3));
  }

  /** What of the flow across a half-side enters along its first half. */
  private double shareOfFirstHalf(int halfSide) {
    if (conditions.geometry() == Geometry.PLANE) {
      return 0.5;
    }
    double a = Circumference.at(mesh, mesh.vertex(halfSide / 3, (halfSide % 3 + 1) % 3));
    double b = Circumference.at(mesh, mesh.vertex(halfSide / 3, (halfSide % 3 + 2) % 3));
    return (3 * a + b) / (4 * (a + b));
  }

  // --- cuts ---

  /** A path for each rim that needs a cut. */
  private int[][] paths() {
    int[] root = new int[topology.componentCount()];
    Arrays.fill(root, -1);
    boolean[] open = new boolean[topology.loopCount()];
    boolean[] fed = new boolean[topology.loopCount()];
    for (int loop = 0; loop < topology.loopCount(); loop++) {
      for (int h : topology.loop(loop)) {
        open[loop] |= !flowGiven(h);
        fed[loop] |= flowIn(h) != 0;
      }
      int component = topology.loopComponent(loop);
      if (open[loop] && root[component] < 0) {
        root[component] = loop;
      }
    }
    int[][] paths = new int[topology.loopCount()][];
    int count = 0;
    for (int loop = 0; loop < topology.loopCount(); loop++) {
      int to = root[topology.loopComponent(loop)];
      if ((open[loop] || fed[loop]) && to >= 0 && to != loop) {
        paths[count++] = topology.cut(loop, to);
      }
    }
    return Arrays.copyOf(paths, count);
  }

  /**
   * Gives nodes of cuts a copy for each side. Around a vertex S changes by ±J across each side of a
   * cut; the triangle the walk begins with keeps the node itself.
   *
   * @return for each node past those of the mesh, the node it copies
   */
  private int[] duplicate(int[][] paths) {
    int[][] crossing = new int[3 * mesh.triangleCount()][];
    boolean[] onCut = new boolean[mesh.vertexCount()];
    for (int c = 0; c < paths.length; c++) {
      boolean[] onPath = new boolean[mesh.vertexCount()];
      int[] at = new int[mesh.vertexCount()];
      for (int i = 0; i < paths[c].length; i++) {
        onPath[paths[c][i]] = true;
        onCut[paths[c][i]] = true;
        at[paths[c][i]] = i;
      }
      for (int h = 0; h < crossing.length; h++) {
        int a = mesh.vertex(h / 3, (h % 3 + 1) % 3);
        int b = mesh.vertex(h / 3, (h % 3 + 2) % 3);
        if (onPath[a] && onPath[b] && Math.abs(at[a] - at[b]) == 1) {
          crossing[h] = crossing[h] == null ? new int[paths.length] : crossing[h];
          crossing[h][c] += at[b] - at[a];
        }
      }
    }
    int[] original = new int[used];
    boolean[] seen = new boolean[3 * mesh.triangleCount()];
    for (int corner = 0; corner < seen.length; corner++) {
      if (onCut[mesh.vertex(corner / 3, corner % 3)] && !seen[corner]) {
        original = copyAround(corner, crossing, seen, original);
      }
    }
    for (int h = 0; h < crossing.length; h++) {
      int neighbour = mesh.neighbour(h / 3, h % 3);
      if (crossing[h] != null && neighbour > h / 3) {
        int other = sideToward(neighbour, h / 3);
        original = copyNode(neighbour, 3 + other, crossing[h], original);
      }
    }
    return original;
  }

  /** Walks the fan around a corner's vertex, counter-clockwise from where it begins. */
  private int[] copyAround(int corner, int[][] crossing, boolean[] seen, int[] original) {
    int t = corner / 3;
    int k = corner % 3;
    // clockwise to the beginning of an open fan: across the side before the corner
    int first = corner;
    while (true) {
      int previous = mesh.neighbour(t, (k + 2) % 3);
      if (previous == Mesh.NONE) {
        break;
      }
      k = (sideToward(previous, t) + 2) % 3;
      t = previous;
      if (3 * t + k == first) {
        break;
      }
    }
    int begin = 3 * t + k;
    int[] offset = new int[cuts(crossing)];
    int[] copies = original;
    while (true) {
      seen[3 * t + k] = true;
      copies = copyNode(t, k, offset, copies);
      int across = (k + 1) % 3;
      int next = mesh.neighbour(t, across);
      if (next == Mesh.NONE) {
        return copies;
      }
      if (crossing[3 * t + across] != null) {
        offset = sum(offset, crossing[3 * t + across]);
      }
      k = (sideToward(next, t) + 1) % 3;
      t = next;
      if (3 * t + k == begin) {
        return copies;
      }
    }
  }

  private static int cuts(int[][] crossing) {
    for (int[] c : crossing) {
      if (c != null) {
        return c.length;
      }
    }
    return 0;
  }

  /** Lets a triangle see its node with jumps added; a copy of it where there are any. */
  private int[] copyNode(int t, int local, int[] offset, int[] original) {
    boolean plain = true;
    for (int j : offset) {
      plain &= j == 0;
    }
    if (plain) {
      return original;
    }
    int at = QuadraticElement.NODES * t + local;
    int[] grown = original;
    if (used == grown.length) {
      grown = Arrays.copyOf(grown, 2 * used);
    }
    if (used >= fanJumps.length) {
      fanJumps = Arrays.copyOf(fanJumps, 2 * used);
    }
    grown[used] = nodes[at];
    fanJumps[used] = offset.clone();
    nodes[at] = used++;
    return grown;
  }

  private int sideToward(int t, int neighbour) {
    for (int k = 0; k < 3; k++) {
      if (mesh.neighbour(t, k) == neighbour) {
        return k;
      }
    }
    throw new IllegalStateException("triangles " + t + " and " + neighbour + " share no side");
  }

  // --- chains ---

  /** Ties the nodes of a loop's chains together and finds the jump given by a closed chain. */
  private void tie(int[] loop, int[][] nodeJumps) {
    int start = 0;
    boolean closed = true;
    for (int i = 0; i < loop.length; i++) {
      if (!flowGiven(loop[(i + loop.length - 1) % loop.length])) {
        closed = false;
        start = i;
        break;
      }
    }
    int[] sofar = NO_JUMPS;
    double fall = 0;
    int head = -1;
    int before = -1;
    for (int i = 0; i < loop.length; i++) {
      int h = loop[(start + i) % loop.length];
      if (!flowGiven(h)) {
        head = -1;
        continue;
      }
      int t = h / 3;
      int k = h % 3;
      int first = nodes[QuadraticElement.NODES * t + (k + 1) % 3];
      int middle = nodes[QuadraticElement.NODES * t + 3 + k];
      int last = nodes[QuadraticElement.NODES * t + (k + 2) % 3];
      if (head < 0) {
        head = mesh.vertex(t, (k + 1) % 3);
        sofar = fanJumps(first);
        fall = 0;
      } else {
        // a cut that ends here makes the two sides of the chain differ
        sofar = sum(sofar, difference(fanJumps(first), fanJumps(before)));
      }
      before = last;
      double flow = flowIn(h);
      double half = flow == 0 ? 0 : flow * shareOfFirstHalf(h);
      tie(middle, mesh.vertexCount() + mesh.side(t, k), head, sofar, fall + half, nodeJumps);
      fall += flow;
      int end = mesh.vertex(t, (k + 2) % 3);
      if (end == head) {
        closeChain(closed, fanJumps(last), sofar, fall);
      } else {
        tie(last, end, head, sofar, fall, nodeJumps);
      }
    }
  }

  private int[] fanJumps(int node) {
    return node < fanJumps.length && fanJumps[node] != null ? fanJumps[node] : NO_JUMPS;
  }

  /** The value seen at a node is the head's, {@code sofar} and minus what flowed in. */
  private void tie(int seen, int node, int head, int[] sofar, double fall, int[][] nodeJumps) {
    chain[node] = head;
    given[node] = -fall;
    nodeJumps[node] = difference(sofar, fanJumps(seen));
  }

  /** Back at its head a closed chain says what one cut's jump is. */
  private void closeChain(boolean closed, int[] seen, int[] sofar, double fall) {
    int[] rise = difference(seen, sofar);
    if (!closed) {
      return;
    }
    for (int c = 0; c < rise.length; c++) {
      if (rise[c] != 0) {
        givenJump[c] = -fall / rise[c];
        return;
      }
    }
  }

  private static int[] sum(int[] a, int[] b) {
    if (a == null || a.length == 0) {
      return b == null ? NO_JUMPS : b;
    }
    if (b == null || b.length == 0) {
      return a;
    }
    int[] sum = a.clone();
    for (int c = 0; c < sum.length; c++) {
      sum[c] += b[c];
    }
    return sum;
  }

  private static int[] difference(int[] a, int[] b) {
    if (b.length == 0) {
      return a;
    }
    int[] difference = a.length == 0 ? new int[b.length] : a.clone();
    for (int c = 0; c < b.length; c++) {
      difference[c] -= b[c];
    }
    return difference;
  }

  /** One chain or node of each component. */
  private boolean[] pins() {
    boolean[] pins = new boolean[mesh.vertexCount() + mesh.sideCount()];
    boolean[] done = new boolean[topology.componentCount()];
    for (int loop = 0; loop < topology.loopCount(); loop++) {
      int component = topology.loopComponent(loop);
      if (!done[component]) {
        int h = topology.loop(loop)[0];
        done[component] = true;
        pins[chain[mesh.vertex(h / 3, (h % 3 + 1) % 3)]] = true;
      }
    }
    return pins;
  }
}
