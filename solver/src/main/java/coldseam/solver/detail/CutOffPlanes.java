package coldseam.solver.detail;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Resolution;
import coldseam.solver.detail.Conditions.Kind;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.Deque;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** Joins cut-off edges that continue each other into straight planes. */
final class CutOffPlanes {
  /** Sine of the angle up to which two edges are in line. */
  private static final double IN_LINE_SINE = 1e-6;

  /** How far a vertex between two edges may lie off the line, in closing lengths. */
  private static final double IN_LINE_OFFSET = 2;

  private final OutlineReading reading;
  private final Partition partition;

  /** Cut-off edges by the vertex they start from when walked with the section on the left. */
  private final Map<Integer, List<Integer>> leaving = new HashMap<>();

  private final Map<Integer, List<Integer>> arriving = new HashMap<>();

  CutOffPlanes(OutlineReading reading) {
    this.reading = reading;
    partition = reading.partition();
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      if (reading.kinds()[edge] == Kind.CUT_OFF) {
        add(leaving, start(edge), edge);
        add(arriving, end(edge), edge);
      }
    }
  }

  private static void add(Map<Integer, List<Integer>> edgesAt, int vertex, int edge) {
    List<Integer> edges = edgesAt.get(vertex);
    if (edges == null) {
      edges = new ArrayList<>(1);
      edgesAt.put(vertex, edges);
    }
    edges.add(edge);
  }

  List<CutOffPlane> find() {
    List<CutOffPlane> planes = new ArrayList<>();
    BitSet taken = new BitSet();
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      if (reading.kinds()[edge] == Kind.CUT_OFF && !taken.get(edge)) {
        planes.add(grow(edge, taken));
      }
    }
    return planes;
  }

  private CutOffPlane grow(int seed, BitSet taken) {
    Deque<Integer> edges = new ArrayDeque<>();
    edges.add(seed);
    taken.set(seed);
    for (int next = after(seed, taken); next >= 0; next = after(next, taken)) {
      edges.addLast(next);
      taken.set(next);
    }
    for (int next = before(seed, taken); next >= 0; next = before(next, taken)) {
      edges.addFirst(next);
      taken.set(next);
    }
    List<Integer> vertices = new ArrayList<>();
    vertices.add(start(edges.getFirst()));
    double length = 0;
    boolean stated = true;
    for (int edge : edges) {
      vertices.add(end(edge));
      length += partition.edgeLength(edge);
      stated &= reading.stated().get(edge);
    }
    return new CutOffPlane(
        vertices, List.copyOf(edges), reading.symmetry().get(seed), stated, length);
  }

  private int after(int edge, BitSet taken) {
    for (int next : leaving.getOrDefault(end(edge), List.of())) {
      if (!taken.get(next) && continues(edge, next)) {
        return next;
      }
    }
    return -1;
  }

  private int before(int edge, BitSet taken) {
    for (int previous : arriving.getOrDefault(start(edge), List.of())) {
      if (!taken.get(previous) && continues(previous, edge)) {
        return previous;
      }
    }
    return -1;
  }

  private boolean continues(int first, int second) {
    if (reading.symmetry().get(first) != reading.symmetry().get(second)) {
      return false;
    }
    int a = start(first);
    int b = end(first);
    int c = end(second);
    double ux = partition.x(b) - partition.x(a);
    double uy = partition.y(b) - partition.y(a);
    double vx = partition.x(c) - partition.x(b);
    double vy = partition.y(c) - partition.y(b);
    if (!(ux * vx + uy * vy > 0)) {
      return false;
    }
    double cross = Math.abs(ux * vy - uy * vx);
    double offset = cross / Math.hypot(ux + vx, uy + vy);
    return cross <= IN_LINE_SINE * Math.hypot(ux, uy) * Math.hypot(vx, vy)
        || offset <= IN_LINE_OFFSET * Resolution.STANDARD.closeM();
  }

  private int start(int edge) {
    return reading.conductsLeft(edge) ? partition.edgeStart(edge) : partition.edgeEnd(edge);
  }

  private int end(int edge) {
    return reading.conductsLeft(edge) ? partition.edgeEnd(edge) : partition.edgeStart(edge);
  }
}
